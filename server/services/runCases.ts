import type { Issue } from '../../shared/error.ts';
import { describeIssues } from '../../shared/issues.ts';
import { LIMITS } from '../../shared/limits.ts';
import type { SweepAxis } from '../../shared/run.ts';
import { librarySolveCaseSchema, solveCaseSchema } from '../../shared/solve.ts';
import type { LibrarySolveCase, SolveCase } from '../../shared/solve.ts';
import { checkSolveRequest, forEachMedium } from '../../shared/solveRules.ts';
import { toSolveCase } from '../../shared/stackCase.ts';
import type { StackDocument } from '../../shared/stack.ts';
import { ResolutionError, resolveCase } from '../../worker/dispersion/resolveCase.ts';
import type { ResolvableMaterial } from '../../worker/dispersion/resolveCase.ts';
import { checkStackDocument } from './checkStackDocument.ts';
import { findLayer } from './runNames.ts';
import { toDocumentIssues } from './runPaths.ts';

/**
 * What keeps a run from being computed, found before it waits in the queue: the rules of the solve contract on the
 * stack as it will be solved, and the reach of its materials at both ends of the axis.
 */

/** The case at one wavelength of the run: for a wavelength axis at that one, else at the working point. */
export function runCase(document: StackDocument, wavelengthNm: number | number[]): LibrarySolveCase {
  return toSolveCase(document, wavelengthNm, document.workingPoint.angleDeg);
}

/** Wavelengths that the run reaches to, with the field that a person changes to change each. */
function reach(document: StackDocument, axis: SweepAxis): { wavelengthNm: number; path: string | null }[] {
  if (axis.kind !== 'wavelength') return [{ wavelengthNm: document.workingPoint.wavelengthNm, path: null }];
  const ends = [
    { wavelengthNm: axis.from, path: 'axis.from' },
    { wavelengthNm: axis.to, path: 'axis.to' },
  ];
  return axis.points === 1 ? ends.slice(0, 1) : ends;
}

/** Rules that need no material. */
export function checkRunDocument(document: StackDocument, axis: SweepAxis): Issue[] {
  const issues = checkStackDocument(document);
  if (issues.length > 0) return issues;
  if (axis.kind === 'thickness') issues.push(...checkSweptLayer(document, axis));
  const given = runCase(document, document.workingPoint.wavelengthNm);
  if (axis.kind === 'wavelength') issues.push(...refuseSamples(document, given));
  const parsed = librarySolveCaseSchema.safeParse(given);
  const problems = parsed.success
    ? checkSolveRequest({ cases: [given] }, { maxPoints: LIMITS.runPoints, beyond: '' })
    : describeIssues(parsed.error, given);
  // How many samples there should be does not matter once there should be none.
  const others = problems.filter(({ path }) => axis.kind !== 'wavelength' || !path.endsWith('.samples'));
  return [...issues, ...toDocumentIssues(others, document)];
}

/** The layer must be there, and thick enough at every point for what has become of its parts. */
function checkSweptLayer(document: StackDocument, axis: SweepAxis & { kind: 'thickness' }): Issue[] {
  const layer = findLayer(document.layers, axis.layerId);
  if (!layer) {
    return [{ path: 'axis.layerId', message: `the stack has no layer with the id ${axis.layerId}` }];
  }
  const { oxide, dead } = layer;
  const usedNm = (oxide?.consumedNm ?? 0) + (dead?.topNm ?? 0) + (dead?.bottomNm ?? 0);
  const ends = [
    { path: 'axis.from', thicknessNm: axis.from },
    { path: 'axis.to', thicknessNm: axis.to },
  ];
  return ends
    .filter(({ thicknessNm }) => thicknessNm < usedNm)
    .map(({ path, thicknessNm }) => ({
      path,
      message: `must be at least the ${usedNm} nm that the oxide and the dead parts of the layer take, got ${thicknessNm}`,
    }));
}

/** Samples belong to one list of wavelengths, which the sweep would have to be. */
function refuseSamples(document: StackDocument, given: LibrarySolveCase): Issue[] {
  const issues: Issue[] = [];
  forEachMedium(given, (medium, path) => {
    for (const key of ['index', 'voigt', 'extraordinary', 'epsilon'] as const) {
      const value = medium[key];
      if (typeof value !== 'object' || !('samples' in value)) continue;
      issues.push({
        path: `${path}.${key}`,
        message: 'samples cannot be swept over wavelength: use a material of the library or one value',
      });
    }
  });
  return toDocumentIssues(issues, document);
}

/** Whether every material reaches over the whole axis, and what comes out may be solved. */
export function checkRunMaterials(
  document: StackDocument,
  axis: SweepAxis,
  materials: ReadonlyMap<string, ResolvableMaterial>,
): Issue[] {
  const places = reach(document, axis);
  const found = places.map(({ wavelengthNm }) => resolutionIssues(document, wavelengthNm, materials));
  const everywhere = (message: string) =>
    found.every((issues) => issues.some((issue) => issue.message === message));
  const issues = found.flatMap((some, index) =>
    some.map((issue) => ({
      // What is wrong at one end only is a matter of the axis, the rest one of the medium.
      path: everywhere(issue.message) ? issue.path : (places[index]!.path ?? issue.path),
      message: issue.message,
    })),
  );
  const seen = new Set<string>();
  return issues.filter(({ path, message }) => {
    const key = `${path}\n${message}`;
    return seen.has(key) ? false : seen.add(key);
  });
}

function resolutionIssues(
  document: StackDocument,
  wavelengthNm: number,
  materials: ReadonlyMap<string, ResolvableMaterial>,
): Issue[] {
  let resolved: SolveCase;
  try {
    resolved = resolveCase(runCase(document, wavelengthNm), materials);
  } catch (error) {
    if (error instanceof ResolutionError) return toDocumentIssues(error.issues, document);
    throw error;
  }
  const parsed = solveCaseSchema.safeParse(resolved);
  const problems = parsed.success
    ? checkSolveRequest({ cases: [resolved] }, { maxPoints: LIMITS.runPoints, beyond: '' })
    : describeIssues(parsed.error, resolved);
  return toDocumentIssues(problems, document);
}
