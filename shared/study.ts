import { z } from 'zod';
import { sharedDesignSchema } from './design.ts';
import { LIMITS } from './limits.ts';
import { sharedRunSchema } from './run.ts';
import { stackNameSchema } from './stack.ts';
import { strictObject } from './strictObject.ts';

/** A question with its runs, pinned plots, notes and decision. Every save is a version. */

const itemId = z.string().min(1).max(40);
const caption = z.string().max(LIMITS.noteLength).default('');
/** The part of the page's address after `?`: axes, scales, marked values, as the plot was when it was pinned. */
const view = z.string().max(2_000).default('');

export const studyItemSchema = z.discriminatedUnion('kind', [
  strictObject({ kind: z.literal('note'), id: itemId, text: z.string().max(LIMITS.studyNoteLength) }),
  strictObject({ kind: z.literal('run'), id: itemId, runId: z.string(), view, caption }),
  strictObject({ kind: z.literal('design'), id: itemId, designId: z.string(), view, caption }),
]);

export const studyDocumentSchema = strictObject({
  question: z.string().trim().min(1, { error: 'must not be empty' }).max(LIMITS.noteLength),
  items: z
    .array(studyItemSchema)
    .max(LIMITS.studyItems)
    .superRefine((items, context) => {
      items.forEach(({ id }, position) => {
        if (items.findIndex((other) => other.id === id) < position) {
          context.addIssue({ code: 'custom', path: [position, 'id'], message: `is used twice: ${id}` });
        }
      });
    }),
  /** Markdown; empty while there is none. The server keeps who decided and when. */
  decision: z.string().max(LIMITS.studyNoteLength).default(''),
});

export const createStudySchema = strictObject({ title: stackNameSchema, document: studyDocumentSchema });

/** `version` is the one the edit started from; over a newer one it is a conflict (409). */
export const updateStudySchema = strictObject({
  version: z.int().min(1),
  title: stackNameSchema.optional(),
  document: studyDocumentSchema.optional(),
});

const decidedSchema = z.object({ by: z.string(), at: z.iso.datetime() }).nullable();

export const studySummarySchema = z.object({
  id: z.string(),
  groupId: z.string(),
  title: z.string(),
  question: z.string(),
  version: z.int(),
  itemCount: z.int(),
  decided: decidedSchema,
  isDemo: z.boolean(),
  updatedAt: z.iso.datetime(),
  updatedBy: z.string().nullable(),
});

export const studySchema = studySummarySchema.extend({ document: studyDocumentSchema });
export const studyListSchema = z.object({ studies: z.array(studySummarySchema) });

export const studyVersionListSchema = z.object({
  versions: z.array(
    z.object({
      version: z.int(),
      savedAt: z.iso.datetime(),
      savedBy: z.string().nullable(),
      /** What differs from the version before, in sentences. */
      changes: z.array(z.string()),
    }),
  ),
});

/** A study as a share link shows it, with what it holds; items whose run was deleted have no entry here. */
export const sharedStudySchema = z.object({
  title: z.string(),
  document: studyDocumentSchema,
  decided: decidedSchema,
  updatedAt: z.iso.datetime(),
  runs: z.array(z.object({ id: z.string(), run: sharedRunSchema })),
  designs: z.array(z.object({ id: z.string(), design: sharedDesignSchema })),
});

export type StudyItem = z.infer<typeof studyItemSchema>;
export type StudyDocument = z.infer<typeof studyDocumentSchema>;
export type CreateStudy = z.input<typeof createStudySchema>;
export type UpdateStudy = z.input<typeof updateStudySchema>;
export type Study = z.infer<typeof studySchema>;
export type StudySummary = z.infer<typeof studySummarySchema>;
export type SharedStudy = z.infer<typeof sharedStudySchema>;
