import { z } from 'zod';
import { LIMITS } from './limits.ts';
import { strictObject } from './strictObject.ts';

export const createLinkSchema = strictObject({
  label: z.string().trim().max(LIMITS.nameLength).default(''),
  /** When the link stops to open; null or absent for never. */
  expiresAt: z.iso.datetime().nullable().optional(),
});

export const linkSubjects = ['run', 'design', 'study', 'card'] as const;

/** What a link opens, before it is opened. */
export const sharedSubjectSchema = z.object({ opens: z.enum(linkSubjects) });

export const linkSchema = z.object({
  id: z.string(),
  /** What it opens; a design is a run with a question in place of axes. */
  opens: z.enum(linkSubjects),
  subjectId: z.string(),
  subjectName: z.string(),
  label: z.string(),
  createdAt: z.iso.datetime(),
  createdBy: z.string().nullable(),
  expiresAt: z.iso.datetime().nullable(),
  revokedAt: z.iso.datetime().nullable(),
  lastUsedAt: z.iso.datetime().nullable(),
  useCount: z.int(),
});

/** Only the answer to its making carries the address: the server keeps a hash and cannot show it again. */
export const createdLinkSchema = linkSchema.extend({ url: z.string() });
export const linkListSchema = z.object({ links: z.array(linkSchema) });

/** "Open in my group": the shared run's stack becomes a stack of that group. */
export const openInGroupSchema = strictObject({ groupId: z.string() });

export type CreateLink = z.input<typeof createLinkSchema>;
export type Link = z.infer<typeof linkSchema>;
export type CreatedLink = z.infer<typeof createdLinkSchema>;
