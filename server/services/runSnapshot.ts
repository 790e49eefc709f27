import type { IndexDispersion } from '../../shared/dispersion.ts';
import type { MaterialContent } from '../../shared/material.ts';
import type { ReadingName, SweepAxes, UsedMaterial } from '../../shared/run.ts';
import { pointCountOf } from '../../shared/runAxes.ts';
import type { SolveWarning } from '../../shared/solve.ts';
import type { StackDocument } from '../../shared/stack.ts';
import {
  indexRangeNm,
  isSameWavelength,
  quadraticRangeNm,
  voigtRangeNm,
} from '../../worker/dispersion/range.ts';
import { ResolutionError } from '../../worker/dispersion/resolveCase.ts';
import { SOLVER_VERSION } from '../../worker/optics/version.ts';
import { solveWarnings } from '../../worker/optics/warnings.ts';
import { axisValues } from '../../shared/axisValues.ts';
import type { Dependencies } from '../dependencies.ts';
import { invalid } from '../errors.ts';
import type { RunInput, SweepRun } from '../models/run.ts';
import type { LoadedMaterial } from './materialStore.ts';
import { resolveOneSafely } from './resolveSafely.ts';
import { runAssumptions } from './runAssumptions.ts';
import { checkRunDocument, checkRunMaterials, runCase, wavelengthAxisOf } from './runCases.ts';
import type { CaseResolver } from './runCases.ts';
import { hashRunInput } from './runInputHash.ts';
import { mapNamedMaterials, namedMaterialsOf } from './runMedia.ts';
import { documentPath, toDocumentIssues } from './runPaths.ts';

/** What a run is computed from and rests on, taken at the moment of its making and never changed. */
export type RunSnapshot = Pick<
  SweepRun,
  'input' | 'materials' | 'assumptions' | 'warnings' | 'inputSha256' | 'solverVersion' | 'total'
>;

type Mixture = Extract<IndexDispersion, { kind: 'mixture' }>;

/** Wavelengths at which media are looked at for warnings. */
const WARNING_POINTS = 21;

/**
 * @param wanted what is to be swept; every reading named
 * @throws Refusal 422 with everything that keeps it from being computed
 */
export async function takeRunSnapshot(
  { materials: store, pool }: Pick<Dependencies, 'materials' | 'pool'>,
  groupId: string,
  wanted: SweepAxes & { document: StackDocument; readings: ReadingName[] },
): Promise<RunSnapshot> {
  const { axis, second, family, readings } = wanted;
  const axes = { axis, ...(second && { second }), ...(family && { family }) };
  const issues = checkRunDocument(wanted.document, axes);
  if (issues.length > 0) throw invalid(issues);
  const given = runCase(wanted.document, wanted.document.workingPoint.wavelengthNm);
  const loaded = await store.loadFor([given], [groupId]);
  const resolve: CaseResolver = (one) => resolveOneSafely(pool, one, loaded);
  const outOfReach = await checkRunMaterials(wanted.document, axes, resolve);
  if (outOfReach.length > 0) throw invalid(outOfReach);
  const materials = [...loaded.values()];
  const document = withVersions(wanted.document, loaded);
  const input: RunInput = {
    document,
    ...axes,
    readings,
    materials: materials.map(({ id, version }) => ({ id, version })),
  };
  const used = materials.map((material) => describeUse(material, document, sweptNm(input)));
  return {
    input,
    materials: used,
    assumptions: runAssumptions(document, axes, readings, used),
    warnings: await warningsOf(input, resolve),
    inputSha256: hashRunInput(input, materials),
    solverVersion: SOLVER_VERSION,
    total: pointCountOf(axes),
  };
}

/** The document with the version of every material named: the newest one may be another tomorrow. */
export function withVersions<Holder extends object>(
  document: Holder,
  materials: ReadonlyMap<string, LoadedMaterial>,
): Holder {
  const newest = new Map([...materials.values()].map(({ id, material }) => [id, material.version]));
  return mapNamedMaterials(document, (named) =>
    named.version === undefined ? { ...named, version: newest.get(named.material) } : named,
  );
}

/** The wavelengths at the ends of the run. */
function sweptNm(input: RunInput): number[] {
  const swept = wavelengthAxisOf(input)?.axis;
  return swept ? [swept.from, swept.to] : [input.document.workingPoint.wavelengthNm];
}

/** @param media where it is used; @param wavelengthsNm at which */
export function describeUse(
  { id, version, content, material }: LoadedMaterial,
  media: object,
  wavelengthsNm: number[],
): UsedMaterial {
  const knownVoigtNm = voigtRangeNm(content);
  const rangeNm = indexRangeNm(content);
  const stretched = [rangeNm, knownVoigtNm, quadraticRangeNm(content)].some(
    (range) =>
      range !== null &&
      range[0] === range[1] &&
      wavelengthsNm.some((one) => !isSameWavelength(one, range[0])),
  );
  return {
    id,
    version,
    name: material.name,
    formula: material.formula,
    class: material.class,
    indexSource: content.indexSource,
    voigtSource: content.voigtSource,
    rangeNm,
    voigtRangeNm: knownVoigtNm,
    ...(content.anisotropySource && { anisotropySource: content.anisotropySource }),
    ...(content.index.kind === 'mixture' && { mixture: mixtureInWords(content.index) }),
    ...(content.origin && { origin: originSentences(content.origin) }),
    assumedConstant: stretched && isAssumedConstant(media, id, version),
  };
}

function mixtureInWords({ model, fraction, parts }: Mixture): string {
  const said = parts.map(({ name, material, version }, position) => {
    const share = position === 0 ? 1 - fraction : fraction;
    return `${Number((100 * share).toPrecision(6))} % ${name} (${material}, version ${version})`;
  });
  const law = {
    bruggeman: 'Bruggeman',
    'maxwell-garnett': 'Maxwell Garnett, spheres of the second in the first',
  }[model];
  return `${said.join(' and ')} by volume, as an effective medium after ${law}`;
}

/** How imported constants were read, and what was noticed then. */
function originSentences({ index, voigt }: NonNullable<MaterialContent['origin']>): string[] {
  const given = [index && { what: 'n and k', ...index }, voigt && { what: 'Q', ...voigt }];
  return given.flatMap((origin) =>
    origin
      ? [
          `${origin.what} imported from ${origin.fileName} (${origin.rows} rows, SHA-256 ${origin.sha256}).`,
          ...origin.sentences.map((sentence) => `${origin.what}: ${sentence}`),
          ...origin.warnings.map(({ message }) => `${origin.what}, warning at import: ${message}`),
        ]
      : [],
  );
}

function isAssumedConstant(media: object, id: string, version: number): boolean {
  return namedMaterialsOf(media).some(
    (named) => named.material === id && named.version === version && named.assumeConstant === true,
  );
}

async function warningsOf(input: RunInput, resolve: CaseResolver): Promise<SolveWarning[]> {
  const { document } = input;
  const swept = wavelengthAxisOf(input)?.axis;
  const wavelengths = swept
    ? axisValues({ ...swept, points: Math.min(swept.points, WARNING_POINTS) })
    : document.workingPoint.wavelengthNm;
  try {
    const warnings = solveWarnings({ cases: [await resolve(runCase(document, wavelengths))] });
    return warnings.map((warning) => ({ ...warning, path: documentPath(warning.path, document) }));
  } catch (error) {
    // A formula may have no value between two wavelengths where it has one.
    if (error instanceof ResolutionError) throw invalid(toDocumentIssues(error.issues, document));
    throw error;
  }
}
