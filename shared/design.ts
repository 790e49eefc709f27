import { z } from 'zod';
import { capDesignSchema, capResultSchema } from './capDesign.ts';
import { optimiseDesignSchema, optimiseResultSchema } from './optimiseDesign.ts';
import { runProgressSchema, usedMaterialSchema } from './run.ts';
import { solveWarningSchema } from './solve.ts';
import { stackNameSchema } from './stack.ts';
import { strictObject } from './strictObject.ts';
import { toleranceDesignSchema, toleranceResultSchema } from './toleranceDesign.ts';

/** A stored design calculation: a run like any other, with a question about layers in place of axes. */

export const designKinds = ['cap', 'optimise', 'tolerance'] as const;
export type DesignKind = (typeof designKinds)[number];

export const designInputSchema = z.discriminatedUnion('kind', [
  capDesignSchema,
  optimiseDesignSchema,
  toleranceDesignSchema,
]);

export const designResultSchema = z.discriminatedUnion('kind', [
  capResultSchema,
  optimiseResultSchema,
  toleranceResultSchema,
]);

export const createDesignSchema = strictObject({
  groupId: z.string(),
  name: stackNameSchema.optional(),
  /** The stack the document comes from, when it is a saved one. */
  stackId: z.string().optional(),
  input: designInputSchema,
});

export const designSummarySchema = z.object({
  id: z.string(),
  groupId: z.string(),
  name: z.string(),
  kind: z.enum(designKinds),
  stackId: z.string().nullable(),
  stackName: z.string().nullable(),
  progress: runProgressSchema,
  createdAt: z.iso.datetime(),
  finishedAt: z.iso.datetime().nullable(),
  createdBy: z.string().nullable(),
  isDemo: z.boolean(),
});

const snapshotFields = {
  input: designInputSchema,
  materials: z.array(usedMaterialSchema),
  warnings: z.array(solveWarningSchema),
  assumptions: z.array(z.string()),
  solverVersion: z.string(),
  inputSha256: z.string(),
  computeSeconds: z.number().nullable(),
};

export const designSchema = designSummarySchema.extend(snapshotFields);
export const designListSchema = z.object({ designs: z.array(designSummarySchema) });

/** A design as a share link shows it. */
export const sharedDesignSchema = z.object({
  name: z.string(),
  kind: z.enum(designKinds),
  finishedAt: z.iso.datetime().nullable(),
  ...snapshotFields,
});

export type DesignInput = z.infer<typeof designInputSchema>;
export type DesignResult = z.infer<typeof designResultSchema>;
export type CreateDesign = z.input<typeof createDesignSchema>;
export type Design = z.infer<typeof designSchema>;
export type DesignSummary = z.infer<typeof designSummarySchema>;
export type SharedDesign = z.infer<typeof sharedDesignSchema>;
