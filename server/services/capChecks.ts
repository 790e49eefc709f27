import type { CapDesign } from '../../shared/capDesign.ts';
import type { Issue } from '../../shared/error.ts';
import { candidateFilm, capLayerId } from '../../worker/design/cap/candidateFilm.ts';
import { leastThicknesses } from '../../worker/design/leastThicknesses.ts';
import { candidateAlone, gradedUnderCap } from './designMedia.ts';
import { candidatePath, eachOnce } from './designPaths.ts';
import { resolutionIssues } from './runCases.ts';
import type { CaseResolver } from './runCases.ts';

/** Samples x working points x thicknesses that are held at once, 9 bytes each. */
const MOST_CAP_VALUES = 12_000_000;

/** What keeps the caps of a design from being compared, of the question alone. */
export function checkCap(design: CapDesign): Issue[] {
  const { document, replaces, candidates, points, range, tolerance } = design;
  const onTop = document.layers.slice(0, replaces.length).map(({ id }) => id);
  const values = tolerance.samples * points.length * range.points;
  return [
    ...replaces.flatMap((id, position) => {
      const path = `input.replaces[${position}]`;
      if (replaces.indexOf(id) < position) return [{ path, message: `is named twice: ${id}` }];
      const isLayer = document.layers.some((item) => item.id === id && !('layers' in item));
      if (!isLayer) return [{ path, message: `names no single layer of the film: ${id}` }];
      const message = `must be a layer at the top of the film, where the candidates are put: ${id} is not`;
      return onTop.includes(id) ? [] : [{ path, message }];
    }),
    ...candidates.flatMap(({ id }, position) =>
      candidates.findIndex((other) => other.id === id) < position
        ? [{ path: `input.candidates[${position}].id`, message: `is used twice: ${id}` }]
        : [],
    ),
    ...(values > MOST_CAP_VALUES
      ? [
          {
            path: 'input.tolerance.samples',
            message: `times working points times thicknesses must be at most ${MOST_CAP_VALUES}, got ${values}: take fewer samples, working points or points of the range`,
          },
        ]
      : []),
    ...checkGradedRoom(design),
  ];
}

/** A graded interface needs room in the cap, at the least thickness too. */
function checkGradedRoom(design: CapDesign): Issue[] {
  return eachOnce(
    design.candidates.flatMap((candidate, position) => {
      const least = leastThicknesses(candidateFilm(design, candidate).document);
      return candidate.layers.flatMap(({ fixedNm }, layer) => {
        const leastNm = least.get(capLayerId(layer)) ?? 0;
        if ((fixedNm ?? design.range.fromNm) >= leastNm) return [];
        const path =
          fixedNm === null ? 'input.range.fromNm' : `input.candidates[${position}].layers[${layer}].fixedNm`;
        const message = `must be at least ${leastNm} nm: the graded interface with the film below takes as much of the cap`;
        return [{ path, message }];
      });
    }),
  );
}

/** Whether the candidates can be graded into the film, whatever room that takes. */
export async function checkGrading(design: CapDesign, resolve: CaseResolver): Promise<Issue[]> {
  const under = gradedUnderCap(design);
  if (!under) return [];
  const found = await Promise.all(
    design.candidates.map(async ({ layers, ...candidate }, position) => {
      const alone = candidateAlone({ ...candidate, layers: layers.slice(-1) }, design.points[0]!);
      const [cap] = alone.layers;
      const film = { ...alone, layers: [{ ...cap!, thicknessNm: under.gradedNm! }, under] };
      const issues = await resolutionIssues(film, design.points[0]!.workingPoint.wavelengthNm, resolve);
      return issues
        .filter(({ path }) => path === 'document.layers[1].gradedNm')
        .map(({ message }) => ({
          path: candidatePath(`document.layers[${layers.length - 1}].medium`, position, layers),
          message: `${message}: the interface with the film below is graded`,
        }));
    }),
  );
  return found.flat();
}
