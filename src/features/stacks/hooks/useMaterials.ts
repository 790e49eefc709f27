import { useQueries } from '@tanstack/react-query';
import type { UseQueryOptions, UseQueryResult } from '@tanstack/react-query';
import { useMemo } from 'react';
import type { Material, MaterialSummary } from '../../../../shared/material.ts';
import type { StackDocument } from '../../../../shared/stack.ts';
import { versionKey } from '../model/media.ts';
import type { Materials } from '../model/media.ts';
import { filmVersions, isOutdated } from '../model/versions.ts';

/** Asks for one material in one version; the newest when that is null. */
export type MaterialAt = (
  id: string,
  version: number | null,
) => UseQueryOptions<Material, Error, Material, (string | number | null)[]>;

/**
 * The library by id, and beside it the older versions that the film uses: their ranges and confidence may differ
 * from those of the newest.
 */
export function useMaterials(
  library: readonly MaterialSummary[],
  document: StackDocument,
  materialAt: MaterialAt,
): Materials {
  const newest = useMemo<Materials>(() => new Map(library.map((one) => [one.id, one])), [library]);
  const older = useMemo(() => filmVersions(document, newest).filter(isOutdated), [document, newest]);
  const loaded = useQueries({
    queries: older.map(({ id, version }) => materialAt(id, version)),
    combine: found,
  });
  return useMemo(() => {
    if (loaded.length === 0) return newest;
    return new Map([...newest, ...loaded.map((one) => [versionKey(one.id, one.version), one] as const)]);
  }, [newest, loaded]);
}

/** Until an older version is there the newest stands in for it; so it does when it cannot be had. */
function found(results: UseQueryResult<Material>[]): Material[] {
  return results.flatMap(({ data }) => (data ? [data] : []));
}
