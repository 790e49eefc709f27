import type { DesignInput } from '../../shared/design.ts';
import type { DesignPoint, Tolerance } from '../../shared/designPoint.ts';
import { materialKeyOf } from '../../shared/designPoint.ts';
import type { Issue } from '../../shared/error.ts';
import { forEachMedium } from '../../shared/solveRules.ts';
import { addsIntensities } from '../../shared/stackCase.ts';
import type { StackDocument } from '../../shared/stack.ts';
import { checkOptimise } from '../../worker/design/optimise/checkOptimise.ts';
import { checkCap, checkGrading } from './capChecks.ts';
import { checkStackDocument } from './checkStackDocument.ts';
import { candidateAlone, candidatesOf, filmAt, mediaWithErrors } from './designMedia.ts';
import { candidatePath, eachOnce, toDesignIssues } from './designPaths.ts';
import { caseIssues, resolutionIssues, runCase } from './runCases.ts';
import type { CaseResolver } from './runCases.ts';
import { toDocumentIssues } from './runPaths.ts';

/** What keeps a design question from being answered, found before any material is looked up. */
export function checkDesign(design: DesignInput): Issue[] {
  const film = checkFilm(design.document, design.points);
  if (film.length > 0) return film;
  const candidates = candidatesOf(design).flatMap(({ layers }, position) =>
    caseIssues(candidateAlone({ id: '', label: '', layers }, design.points[0]!), false).map(
      ({ path, message }) => ({ path: candidatePath(path, position, layers), message }),
    ),
  );
  return [...candidates, ...checkQuestion(design)];
}

/** @param before stands in front of every path */
export function checkFilm(document: StackDocument, points: DesignPoint[], before?: string): Issue[] {
  const shape = checkStackDocument(document);
  if (shape.length > 0) return toDesignIssues(shape, 0, before);
  return eachOnce([
    ...points.flatMap((point, position) =>
      toDesignIssues(
        [...caseIssues(filmAt(document, point), false), ...bandwidthIssues(document, point)],
        position,
        before,
      ),
    ),
    ...toDesignIssues(samplesIssues(document, points), 0, before),
  ]);
}

/** Whether every material is known at every working point. */
export async function checkDesignMaterials(design: DesignInput, resolve: CaseResolver): Promise<Issue[]> {
  const film = await checkFilmMaterials(design.document, design.points, resolve);
  const candidates = await Promise.all(
    candidatesOf(design).flatMap((candidate, position) =>
      design.points.map(async (point) => {
        const { wavelengthNm } = point.workingPoint;
        const issues = await resolutionIssues(candidateAlone(candidate, point), wavelengthNm, resolve);
        return issues.map(({ path, message }) => ({
          path: candidatePath(path, position, candidate.layers),
          message,
        }));
      }),
    ),
  );
  const graded = design.kind === 'cap' ? await checkGrading(design, resolve) : [];
  return eachOnce([...film, ...candidates.flat(), ...graded]);
}

export async function checkFilmMaterials(
  document: StackDocument,
  points: DesignPoint[],
  resolve: CaseResolver,
  before?: string,
): Promise<Issue[]> {
  const found = await Promise.all(
    points.map(async (point, position) => {
      const { wavelengthNm } = point.workingPoint;
      const issues = await resolutionIssues(filmAt(document, point), wavelengthNm, resolve);
      return toDesignIssues(issues, position, before);
    }),
  );
  return eachOnce(found.flat());
}

function bandwidthIssues({ spread }: StackDocument, { workingPoint }: DesignPoint): Issue[] {
  const bandwidthNm = spread?.bandwidthNm ?? 0;
  const { wavelengthNm } = workingPoint;
  if (bandwidthNm <= wavelengthNm / 4) return [];
  const message = `must be at least four times the bandwidth (${bandwidthNm} nm), got ${wavelengthNm} nm`;
  return [{ path: 'document.workingPoint.wavelengthNm', message }];
}

/** Samples belong to one list of wavelengths. */
function samplesIssues(document: StackDocument, points: DesignPoint[]): Issue[] {
  if (new Set(points.map(({ workingPoint }) => workingPoint.wavelengthNm)).size === 1) return [];
  const issues: Issue[] = [];
  forEachMedium(runCase(document, document.workingPoint.wavelengthNm), (medium, path) => {
    for (const key of ['index', 'voigt', 'extraordinary', 'epsilon'] as const) {
      const value = medium[key];
      if (typeof value !== 'object' || !('samples' in value)) continue;
      const message =
        'samples cannot be used at several wavelengths: use a material of the library or one value';
      issues.push({ path: `${path}.${key}`, message });
    }
  });
  return toDocumentIssues(issues, document);
}

function checkQuestion(design: DesignInput): Issue[] {
  switch (design.kind) {
    case 'cap':
      return [...checkCap(design), ...checkSignal(design), ...checkErrors(design, design.tolerance)];
    case 'optimise':
      return checkOptimise(design).map(({ path, message }) => ({ path: `input.${path}`, message }));
    case 'tolerance':
      return [...checkSignal(design), ...checkErrors(design, design.tolerance)];
  }
}

function checkSignal(design: Extract<DesignInput, { signal: unknown }>): Issue[] {
  if (!addsIntensities(design.document)) return [];
  const message = 'cannot be the amplitude: with a thick slab or averages only intensities add up';
  return [
    ...(design.signal === 'amplitude' ? [{ path: 'input.signal', message }] : []),
    ...(design.demands.leastAmplitude === undefined
      ? []
      : [{ path: 'input.demands.leastAmplitude', message }]),
  ];
}

function checkErrors(design: DesignInput, { materials }: Tolerance): Issue[] {
  const known = new Set(mediaWithErrors(design).map(materialKeyOf));
  return materials.flatMap(({ material }, position) => {
    const path = `input.tolerance.materials[${position}].material`;
    if (!known.has(material)) {
      return [{ path, message: `names no material of the film or its caps: ${material}` }];
    }
    const isSecond = materials.findIndex((other) => other.material === material) < position;
    return isSecond ? [{ path, message: `is named twice: ${material}` }] : [];
  });
}
