import { generatePath } from 'react-router-dom';
import { paths } from '../../../lib/paths.ts';

/** The page of a material in the version that a film uses. */
export function versionPath(id: string, version: number | null): string {
  const page = generatePath(paths.material, { materialId: id });
  return version === null ? page : `${page}?version=${version}`;
}

/** Where its versions are listed with what changed, by whom and when. */
export function historyPath(id: string): string {
  return `${generatePath(paths.material, { materialId: id })}#history`;
}
