import type { MaterialContent } from '../../shared/material.ts';
import type { LibrarySolveCase, SolveCase } from '../../shared/solve.ts';
import { ResolutionError } from '../../worker/dispersion/resolveCase.ts';
import type { ResolvableMaterial } from '../../worker/dispersion/resolveCase.ts';
import type { ComputePool } from '../../worker/pool.ts';
import { resolveCases } from '../../worker/resolveCases.ts';
import { ComputeError } from '../../worker/sweep/computeError.ts';

type Resolvable = ResolvableMaterial & { material?: { groupId: string | null } };

/**
 * Cases with numbers in place of library ids. Where a material has a formula that somebody wrote, a thread with a time
 * limit evaluates it; all else is quicker done here.
 *
 * @param materials by `${id}@${version}`; those whose row is there and shipped have formulas of our own
 * @throws ResolutionError with paths such as `cases[0].layers[1].material`; ComputeError `timeout`, `crashed`, `closed`
 */
export async function resolveSafely(
  pool: Pick<ComputePool, 'resolve'>,
  cases: LibrarySolveCase[],
  materials: ReadonlyMap<string, Resolvable>,
): Promise<SolveCase[]> {
  if (![...materials.values()].some(hasForeignFormula)) return resolveCases(cases, materials);
  try {
    return await pool.resolve(cases, withoutRows(materials));
  } catch (error) {
    if (error instanceof ComputeError && error.issues.length > 0) throw new ResolutionError(error.issues);
    throw error;
  }
}

/** One case; the paths of its issues stand without `cases[0].`. */
export async function resolveOneSafely(
  pool: Pick<ComputePool, 'resolve'>,
  one: LibrarySolveCase,
  materials: ReadonlyMap<string, Resolvable>,
): Promise<SolveCase> {
  try {
    const [resolved] = await resolveSafely(pool, [one], materials);
    return resolved!;
  } catch (error) {
    if (!(error instanceof ResolutionError)) throw error;
    throw new ResolutionError(
      error.issues.map(({ path, message }) => ({ path: path.replace(/^cases\[0\]\.?/, ''), message })),
    );
  }
}

/** Rows of the database cannot be sent to a thread. */
function withoutRows(materials: ReadonlyMap<string, Resolvable>): Map<string, ResolvableMaterial> {
  return new Map(
    [...materials].map(([key, { id, version, name, content }]) => [key, { id, version, name, content }]),
  );
}

function hasForeignFormula({ content, material }: Resolvable): boolean {
  return material?.groupId !== null && hasFormula(content);
}

function hasFormula({ index, voigt, anisotropy }: MaterialContent): boolean {
  const parts = index.kind === 'mixture' ? index.parts : [];
  const constants = [
    index,
    voigt,
    anisotropy?.kind === 'uniaxial' ? anisotropy.extraordinary : null,
    ...parts.flatMap((part) => [part.index, part.voigt]),
  ];
  return constants.some((constant) => constant?.kind === 'formula');
}
