import type { Issue } from '../../shared/error.ts';
import { describeIssues } from '../../shared/issues.ts';
import { LIMITS } from '../../shared/limits.ts';
import type { SweepAxes } from '../../shared/run.ts';
import { axesOf } from '../../shared/runAxes.ts';
import { librarySolveCaseSchema, solveCaseSchema } from '../../shared/solve.ts';
import type { LibrarySolveCase, SolveCase } from '../../shared/solve.ts';
import { checkSolveRequest, forEachMedium } from '../../shared/solveRules.ts';
import { toSolveCase } from '../../shared/stackCase.ts';
import type { StackDocument } from '../../shared/stack.ts';
import { ResolutionError } from '../../worker/dispersion/resolveCase.ts';
import { checkStackDocument } from './checkStackDocument.ts';
import { checkSweptParts, cornersOf } from './runAxes.ts';
import { toDocumentIssues } from './runPaths.ts';

/**
 * What keeps a run from being computed, found before it waits in the queue: the rules of the solve contract on the
 * stack as it will be solved, and the reach of its materials at both ends of the axis.
 */

/** Puts numbers in place of library ids. @throws ResolutionError */
export type CaseResolver = (one: LibrarySolveCase) => Promise<SolveCase>;

/** The case at one wavelength of the run: for a wavelength axis at that one, else at the working point. */
export function runCase(document: StackDocument, wavelengthNm: number | number[]): LibrarySolveCase {
  return toSolveCase(document, wavelengthNm, document.workingPoint.angleDeg);
}

/** The axis of a run that sweeps the wavelength, if one does. */
export function wavelengthAxisOf(axes: SweepAxes) {
  return axesOf(axes).find(({ axis }) => axis.kind === 'wavelength') ?? null;
}

/** Wavelengths that the run reaches to, with the field that a person changes to change each. */
function reach(document: StackDocument, axes: SweepAxes): { wavelengthNm: number; path: string | null }[] {
  const swept = wavelengthAxisOf(axes);
  if (!swept) return [{ wavelengthNm: document.workingPoint.wavelengthNm, path: null }];
  const { axis, field } = swept;
  const ends = [
    { wavelengthNm: axis.from, path: `${field}.from` },
    { wavelengthNm: axis.to, path: `${field}.to` },
  ];
  return axis.points === 1 ? ends.slice(0, 1) : ends;
}

/** Rules that need no material. */
export function checkRunDocument(document: StackDocument, axes: SweepAxes): Issue[] {
  const issues = checkStackDocument(document);
  if (issues.length > 0) return issues;
  const sweepsWavelength = wavelengthAxisOf(axes) !== null;
  issues.push(...checkSweptParts(document, axes));
  if (sweepsWavelength) issues.push(...refuseSamples(document));
  issues.push(...caseIssues(document, sweepsWavelength));
  return issues.length > 0 ? issues : checkCorners(document, axes, sweepsWavelength);
}

/** What the solve contract says of the document at its working point, before any material is looked up. */
export function caseIssues(document: StackDocument, sweepsWavelength: boolean): Issue[] {
  const given = runCase(document, document.workingPoint.wavelengthNm);
  const parsed = librarySolveCaseSchema.safeParse(given);
  const problems = parsed.success
    ? checkSolveRequest({ cases: [given] }, { maxPoints: LIMITS.runPoints, beyond: '' })
    : describeIssues(parsed.error, given);
  // How many samples there should be does not matter once there should be none.
  const others = problems.filter(({ path }) => !sweepsWavelength || !path.endsWith('.samples'));
  return toDocumentIssues(others, document);
}

/** What goes wrong on the way, said at the end of the axis where it does. */
function checkCorners(document: StackDocument, axes: SweepAxes, sweepsWavelength: boolean): Issue[] {
  for (const corner of cornersOf(document, axes)) {
    const tooLarge = checkStackDocument(corner.document);
    const [problem] = tooLarge.length > 0 ? tooLarge : caseIssues(corner.document, sweepsWavelength);
    if (problem) {
      return [{ path: corner.path, message: `there, ${problem.path} ${problem.message}` }];
    }
  }
  return [];
}

/** Samples belong to one list of wavelengths, which the sweep would have to be. */
function refuseSamples(document: StackDocument): Issue[] {
  const given = runCase(document, document.workingPoint.wavelengthNm);
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
export async function checkRunMaterials(
  document: StackDocument,
  axes: SweepAxes,
  resolve: CaseResolver,
): Promise<Issue[]> {
  const places = reach(document, axes);
  const found = await Promise.all(
    places.map(({ wavelengthNm }) => resolutionIssues(document, wavelengthNm, resolve)),
  );
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

/** ... and with the numbers of its materials at one wavelength. */
export async function resolutionIssues(
  document: StackDocument,
  wavelengthNm: number,
  resolve: CaseResolver,
): Promise<Issue[]> {
  let resolved: SolveCase;
  try {
    resolved = await resolve(runCase(document, wavelengthNm));
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
