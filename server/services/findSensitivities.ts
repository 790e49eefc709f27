import { LIMITS } from '../../shared/limits.ts';
import type { SensitivityAnswer, SensitivityRequest } from '../../shared/toleranceDesign.ts';
import { drawnLayers } from '../../worker/design/expandBlocks.ts';
import type { Dependencies } from '../dependencies.ts';
import { invalid } from '../errors.ts';
import { checkFilm, checkFilmMaterials } from './designChecks.ts';
import { resolveOneSafely } from './resolveSafely.ts';
import { runCase } from './runCases.ts';
import { withVersions } from './runSnapshot.ts';

/**
 * How much every reading changes with every thickness and constant.
 *
 * @param groupIds groups whose materials are in reach, beside the shipped library
 * @throws Refusal 422 with every issue; ComputeError `timeout` (20 s), `crashed`, `closed`
 */
export async function findSensitivities(
  { materials: store, pool }: Pick<Dependencies, 'materials' | 'pool'>,
  { document, points }: SensitivityRequest,
  groupIds: Iterable<string>,
): Promise<SensitivityAnswer> {
  const layers = drawnLayers(document.layers).length;
  if (layers > LIMITS.sensitivityLayers) {
    const message = `must draw at most ${LIMITS.sensitivityLayers} layers, got ${layers}: put those that repeat into a block`;
    throw invalid([{ path: 'document.layers', message }]);
  }
  const issues = checkFilm(document, points, '');
  if (issues.length > 0) throw invalid(issues);
  const loaded = await store.loadFor([runCase(document, document.workingPoint.wavelengthNm)], groupIds);
  const unknown = await checkFilmMaterials(
    document,
    points,
    (one) => resolveOneSafely(pool, one, loaded),
    '',
  );
  if (unknown.length > 0) throw invalid(unknown);
  // Rows of the database cannot be sent to a thread.
  const materials = [...loaded.values()].map(({ id, version, name, content, material }) => ({
    ...{ id, version, name, content },
    formula: material.formula,
  }));
  return pool.sensitivity({ document: withVersions(document, loaded), points }, materials);
}
