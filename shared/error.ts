import { z } from 'zod';

/** One thing wrong with a request: where (brackets for positions, dots for fields) and what to do about it. */
export const issueSchema = z.object({
  path: z.string().meta({ description: 'such as cases[3].layers[0].thicknessNm' }),
  message: z.string(),
});

export type Issue = z.infer<typeof issueSchema>;

export const errorCodes = [
  'invalid',
  'unauthenticated',
  'forbidden',
  'not-found',
  'conflict',
  'gone',
  'too-large',
  'too-many-requests',
  'unavailable',
  'internal',
] as const;

/** The one envelope of every refusal, on the command line and over HTTP. */
export const errorEnvelopeSchema = z.object({
  error: z.object({
    code: z.enum(errorCodes),
    message: z.string(),
    issues: z.array(issueSchema).optional(),
    requestId: z.string().optional(),
  }),
});

export type ErrorCode = (typeof errorCodes)[number];
export type ErrorEnvelope = z.infer<typeof errorEnvelopeSchema>;
