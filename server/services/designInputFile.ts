import type { DesignInput, DesignResult } from '../../shared/design.ts';
import type { LibrarySolveCase } from '../../shared/solve.ts';
import { addsIntensities, inMagnetizationState, toSolveCase } from '../../shared/stackCase.ts';
import type { ResolvableMaterial } from '../../worker/dispersion/resolveCase.ts';
import type { ComputePool } from '../../worker/pool.ts';
import { materialKey } from '../../worker/sweep/sweepInput.ts';
import { shownFilms } from './designFilms.ts';
import { filmAt } from './designMedia.ts';
import { resolveSafely } from './resolveSafely.ts';

const FILMS_AT_A_TIME = 100;
const STATES = ['given', 'zero', 'reversed'] as const;

/**
 * An answer as a request of the solve contract, piece by piece: `npm run -s solve -- input.json` gives the readings that
 * are shown. At each working point in turn come the films of `shownFilms`, and each film three times: as magnetized
 * there, with m = 0 and reversed. Constants stand as numbers.
 */
export async function* designInputFile(
  pool: Pick<ComputePool, 'resolve'>,
  design: DesignInput,
  result: DesignResult,
  materials: ResolvableMaterial[],
): AsyncGenerator<string> {
  const known = new Map(materials.map((material) => [materialKey(material), material]));
  const films = shownFilms(design, result);
  let separator = '';
  yield '{"cases":[';
  for (const point of design.points) {
    const { wavelengthNm, angleDeg } = point.workingPoint;
    for (let start = 0; start < films.length; start += FILMS_AT_A_TIME) {
      const cases = films.slice(start, start + FILMS_AT_A_TIME).flatMap((film): LibrarySolveCase[] => {
        const given = toSolveCase(filmAt(film, point), wavelengthNm, angleDeg);
        return STATES.map((state) => {
          const one = inMagnetizationState(given, state);
          return state === 'given' && !addsIntensities(film) ? { ...one, outputs: ['ceiling'] } : one;
        });
      });
      const resolved = await resolveSafely(pool, cases, known);
      yield `${separator}${resolved.map((one) => JSON.stringify(one)).join(',')}`;
      separator = ',';
    }
  }
  yield ']}\n';
}
