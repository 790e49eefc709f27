import type { DesignInput } from '../../shared/design.ts';
import type { SolveWarning } from '../../shared/solve.ts';
import { designTotal } from '../../worker/design/runDesign.ts';
import { SOLVER_VERSION } from '../../worker/optics/version.ts';
import { solveWarnings } from '../../worker/optics/warnings.ts';
import type { Dependencies } from '../dependencies.ts';
import { invalid } from '../errors.ts';
import type { DesignRun, DesignRunInput } from '../models/run.ts';
import { designAssumptions } from './designAssumptions.ts';
import { checkDesign, checkDesignMaterials } from './designChecks.ts';
import { candidateAlone, candidatesOf, filmAt, mediaOf, withMedia } from './designMedia.ts';
import { candidatePath, designPath, eachOnce } from './designPaths.ts';
import { resolveOneSafely } from './resolveSafely.ts';
import { runCase } from './runCases.ts';
import type { CaseResolver } from './runCases.ts';
import { hashDesignInput } from './runInputHash.ts';
import { documentPath } from './runPaths.ts';
import { describeUse, withVersions } from './runSnapshot.ts';

/** What the answer is computed from and rests on, taken when the question is asked and never changed. */
export type DesignSnapshot = Pick<
  DesignRun,
  'kind' | 'input' | 'materials' | 'assumptions' | 'warnings' | 'inputSha256' | 'solverVersion' | 'total'
>;

/** @throws Refusal 422 with everything that keeps the question from being answered; paths begin with `input.` */
export async function takeDesignSnapshot(
  { materials: store, pool }: Pick<Dependencies, 'materials' | 'pool'>,
  groupId: string,
  wanted: DesignInput,
): Promise<DesignSnapshot> {
  const issues = checkDesign(wanted);
  if (issues.length > 0) throw invalid(issues);
  const { wavelengthNm } = wanted.points[0]!.workingPoint;
  const films = [
    wanted.document,
    ...candidatesOf(wanted).map((candidate) => candidateAlone(candidate, wanted.points[0]!)),
  ];
  const loaded = await store.loadFor(
    films.map((film) => runCase(film, wavelengthNm)),
    [groupId],
  );
  const resolve: CaseResolver = (one) => resolveOneSafely(pool, one, loaded);
  const unknown = await checkDesignMaterials(wanted, resolve);
  if (unknown.length > 0) throw invalid(unknown);
  const materials = [...loaded.values()];
  const media = withVersions(mediaOf(wanted), loaded);
  const design = withMedia(wanted, media);
  const wavelengthsNm = design.points.map(({ workingPoint }) => workingPoint.wavelengthNm);
  const used = materials.map((material) => describeUse(material, media, wavelengthsNm));
  const input: DesignRunInput = { design, materials: materials.map(({ id, version }) => ({ id, version })) };
  return {
    kind: design.kind,
    input,
    materials: used,
    assumptions: designAssumptions(design, used),
    warnings: await warningsOf(design, resolve),
    inputSha256: hashDesignInput(design, materials),
    solverVersion: SOLVER_VERSION,
    total: designTotal(design),
  };
}

/** Of the film and of each candidate, at each working point; `case` counts working points. */
async function warningsOf(design: DesignInput, resolve: CaseResolver): Promise<SolveWarning[]> {
  const found = await Promise.all(
    design.points.map(async (point, position) => {
      const { wavelengthNm } = point.workingPoint;
      const film = filmAt(design.document, point);
      const of = async (document: typeof film, toPath: (path: string) => string) =>
        solveWarnings({ cases: [await resolve(runCase(document, wavelengthNm))] }).map(
          ({ path, message }) => ({
            case: position,
            path: toPath(documentPath(path, document)),
            message,
          }),
        );
      const caps = candidatesOf(design).map((candidate, which) =>
        of(candidateAlone(candidate, point), (path) => candidatePath(path, which, candidate.layers)),
      );
      return Promise.all([of(film, (path) => designPath(path, position)), ...caps]);
    }),
  );
  return eachOnce(found.flat(2));
}
