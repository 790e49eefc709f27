import type { Issue } from '../../shared/error.ts';
import type { MaterialContent } from '../../shared/material.ts';
import type { ImportMapping } from '../../shared/materialImport.ts';
import type { ConvertedTable } from '../../worker/import/convertTable.ts';
import { ComputeError } from '../../worker/sweep/computeError.ts';
import type { Dependencies } from '../dependencies.ts';
import { conflict, invalid } from '../errors.ts';
import type { MaterialImport } from '../models/materialImport.ts';
import { readImportBytes } from './imports.ts';
import { findMaterial } from './findMaterial.ts';

type ConversionDependencies = Pick<Dependencies, 'models' | 'materials' | 'pool'>;

/**
 * The constants that a file gives when its columns mean what the mapping says.
 *
 * @param path of the mapping in the request, such as `content.index.mapping.`; empty for the mapping itself
 * @throws Refusal 409 for a file that is not read yet or was refused, 422 with issues at the fields of the mapping
 */
export async function convertImport(
  dependencies: ConversionDependencies,
  row: MaterialImport,
  mapping: ImportMapping,
  path: string,
): Promise<ConvertedTable> {
  if (row.state === 'reading') throw conflict('This file is still being read. Ask again in a moment.');
  const indexOf = await loadIndexOf(dependencies, row.groupId, mapping, path);
  const bytes = await readImportBytes(dependencies.models, row);
  try {
    return await dependencies.pool.convertTable(bytes, mapping, indexOf);
  } catch (error) {
    if (!(error instanceof ComputeError) || error.issues.length === 0) throw error;
    throw invalid(error.issues.map((issue): Issue => ({ ...issue, path: `${path}${issue.path}` })));
  }
}

async function loadIndexOf(
  { models, materials }: ConversionDependencies,
  groupId: string,
  { indexOf }: ImportMapping,
  path: string,
): Promise<MaterialContent | null> {
  if (indexOf === null) return null;
  const found = await findMaterial({ models, materials }, groupId, indexOf);
  if (!found) throw invalid([{ path: `${path}indexOf`, message: 'there is no such material in this group' }]);
  return found.content;
}
