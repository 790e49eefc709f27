import type { LibrarySolveCase, LibrarySolveRequest, SolveOutput } from '../../../../shared/solve.ts';
import type { StackDocument, WorkingPoint } from '../../../../shared/stack.ts';
import { addsIntensities, inMagnetizationState, toSolveCase } from '../../../../shared/stackCase.ts';

/** One request for all that explains the readings: the film as given, with m = 0 and reversed, in this order. */
export function explainRequest(document: StackDocument, point: WorkingPoint): LibrarySolveRequest {
  const given = toSolveCase(document, point.wavelengthNm, point.angleDeg, point.magnetization);
  const ask = (one: LibrarySolveCase, outputs: SolveOutput[]): LibrarySolveCase => ({ ...one, outputs });
  const compared: SolveOutput[] = addsIntensities(document) ? ['mueller'] : ['mueller', 'faraday'];
  const taken: SolveOutput[] = addsIntensities(document)
    ? ['mueller']
    : ['mueller', 'faraday', 'contributions', 'depth', 'ceiling'];
  return {
    cases: [
      ask(given, taken),
      ask(inMagnetizationState(given, 'zero'), compared),
      ask(inMagnetizationState(given, 'reversed'), compared),
    ],
  };
}
