import { z } from 'zod';
import { readingOf } from './readings.ts';
import { readingNames, usualReadings } from './run.ts';
import { solveWarningSchema } from './solve.ts';
import type { LibrarySolveRequest, SolveResponse } from './solve.ts';
import type { StackDocument, WorkingPoint } from './stack.ts';
import { addsIntensities, inMagnetizationState, toSolveCase } from './stackCase.ts';

/** What the strip on the stack page shows of a film at its working point, and the share of the ceiling. */
const stripNames = [...usualReadings, 'ceilingShare'] as const;

export const readingsStripSchema = z.object({
  /** deg or plain numbers; null where a reading does not exist. Empty without an answer. */
  readings: z.partialRecord(z.enum(readingNames), z.number().nullable()),
  warnings: z.array(solveWarningSchema),
});

export type ReadingsStrip = z.infer<typeof readingsStripSchema>;
export type StripReadings = ReadingsStrip['readings'];

/** Everything the strip shows in one request: the film as given, with m = 0 and reversed. */
export function stripRequest(document: StackDocument, point: WorkingPoint): LibrarySolveRequest {
  const given = toSolveCase(document, point.wavelengthNm, point.angleDeg, point.magnetization);
  const cases = (['given', 'zero', 'reversed'] as const).map((state) => inMagnetizationState(given, state));
  if (!addsIntensities(document)) cases[0] = { ...given, outputs: ['ceiling'] };
  return { cases };
}

/** The answer to `stripRequest`. */
export function readStrip(response: SolveResponse): ReadingsStrip {
  const [given, zero, reversed] = response.results.map((result) => result.points[0]);
  if (!given || !zero || !reversed) return { readings: {}, warnings: [] };
  return {
    readings: Object.fromEntries(stripNames.map((name) => [name, readingOf(name, given, zero, reversed)])),
    // The three states say the same of the same media; what the film as given says is enough.
    warnings: (response.warnings ?? []).filter((warning) => warning.case === 0),
  };
}
