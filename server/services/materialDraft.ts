import { isDeepStrictEqual } from 'node:util';
import { LIMITS } from '../../shared/limits.ts';
import type { MaterialContent } from '../../shared/material.ts';
import type { MaterialDraft } from '../../shared/materialEdit.ts';
import type { ImportMapping, ImportOrigin } from '../../shared/materialImport.ts';
import type { ConvertedTable } from '../../worker/import/convertTable.ts';
import type { Dependencies } from '../dependencies.ts';
import { invalid } from '../errors.ts';
import type { MaterialImport } from '../models/materialImport.ts';
import { isRowId } from '../routing/pathParams.ts';
import { convertImport } from './importConversion.ts';
import { mixtureOf } from './mixtureOf.ts';

type DraftDependencies = Pick<Dependencies, 'models' | 'materials' | 'pool'>;
type Imported = { importId: string; mapping: ImportMapping };
type Converted = { table: ConvertedTable; origin: ImportOrigin };

/**
 * The content that a draft stands for: imports converted, parts of mixtures put in whole, everything checked.
 * Formulas are evaluated in the pool only.
 *
 * @param former content from which the edit started; constants that stay keep what is known of their file
 * @throws Refusal 422 with issues below `content`, 409 for an import that is not ready
 */
export async function contentOfDraft(
  dependencies: DraftDependencies,
  groupId: string,
  draft: MaterialDraft,
  former: MaterialContent | null,
): Promise<MaterialContent> {
  const { index: givenIndex, voigt: givenVoigt, ...rest } = draft;
  const converter = new Converter(dependencies, groupId);
  const index = await indexOfDraft(dependencies, groupId, givenIndex, converter);
  const voigt = await voigtOfDraft(givenVoigt, converter);
  const origin = {
    index: index.origin ?? keptOrigin(former, 'index', index.value),
    voigt: voigt.origin ?? keptOrigin(former, 'voigt', voigt.value),
  };
  const content: MaterialContent = {
    ...rest,
    index: index.value,
    voigt: voigt.value,
    ...((origin.index ?? origin.voigt) && { origin }),
  };
  await checkMaterialContent(dependencies, content, 'content.');
  // As the database gives it back: without what is undefined, and without negative zeros.
  return JSON.parse(JSON.stringify(content)) as MaterialContent;
}

/** @throws Refusal 422 with every issue, each below `path` */
export async function checkMaterialContent(
  { pool }: Pick<Dependencies, 'pool'>,
  content: MaterialContent,
  path: string,
): Promise<void> {
  const issues = [...tooLong(content), ...(await pool.checkContent(content))];
  if (issues.length > 0) throw invalid(issues.map((issue) => ({ ...issue, path: `${path}${issue.path}` })));
}

function tooLong({ index, voigt, anisotropy }: MaterialContent) {
  const tables = [
    { path: 'index.wavelengthsNm', table: index },
    { path: 'voigt.wavelengthsNm', table: voigt },
    {
      path: 'anisotropy.extraordinary.wavelengthsNm',
      table: anisotropy?.kind === 'uniaxial' ? anisotropy.extraordinary : null,
    },
  ];
  return tables.flatMap(({ path, table }) => {
    const points = table && 'wavelengthsNm' in table ? table.wavelengthsNm.length : 0;
    if (points <= LIMITS.importRows) return [];
    return [{ path, message: `must have at most ${LIMITS.importRows} points, got ${points}` }];
  });
}

function keptOrigin(
  former: MaterialContent | null,
  constant: 'index' | 'voigt',
  value: unknown,
): ImportOrigin | undefined {
  return former && isDeepStrictEqual(former[constant], value) ? former.origin?.[constant] : undefined;
}

async function indexOfDraft(
  dependencies: DraftDependencies,
  groupId: string,
  given: MaterialDraft['index'],
  converter: Converter,
): Promise<{ value: MaterialContent['index']; origin?: ImportOrigin }> {
  if (given.kind === 'mixture of') {
    return { value: await mixtureOf(dependencies, groupId, given, 'content.index') };
  }
  if (given.kind !== 'import') return { value: given };
  const { table, origin } = await converter.convert(given, 'content.index');
  if (table.index) return { value: table.index, origin };
  throw invalid([{ path: 'content.index.mapping.index', message: 'choose the columns of n and k' }]);
}

async function voigtOfDraft(
  given: MaterialDraft['voigt'],
  converter: Converter,
): Promise<{ value: MaterialContent['voigt']; origin?: ImportOrigin }> {
  if (given?.kind !== 'import') return { value: given };
  const { table, origin } = await converter.convert(given, 'content.voigt');
  if (table.voigt) return { value: table.voigt, origin };
  throw invalid([
    { path: 'content.voigt.mapping.voigt', message: 'choose the columns of the magneto-optic constant' },
  ]);
}

/** Index and Q often come from one file by one mapping, which is then converted once. */
class Converter {
  private last: { given: Imported; converted: Converted } | null = null;

  constructor(
    private readonly dependencies: DraftDependencies,
    private readonly groupId: string,
  ) {}

  async convert({ importId, mapping }: Imported, path: string): Promise<Converted> {
    const given = { importId, mapping };
    if (this.last && isDeepStrictEqual(this.last.given, given)) return this.last.converted;
    const row = await this.find(importId, path);
    const table = await convertImport(this.dependencies, row, mapping, `${path}.mapping.`);
    const { sentences } = table;
    const { fileName, sha256 } = row;
    const rows = row.tableJson?.rowCount ?? 0;
    const warnings = [...(row.tableJson?.warnings ?? []), ...table.warnings];
    const origin = { importId, fileName, sha256, rows, mapping, sentences, warnings };
    this.last = { given, converted: { table, origin } };
    return this.last.converted;
  }

  private async find(importId: string, path: string): Promise<MaterialImport> {
    const { models } = this.dependencies;
    const row = isRowId(importId)
      ? await models.MaterialImport.findOne({ where: { id: importId, groupId: this.groupId } })
      : null;
    if (row) return row;
    throw invalid([
      { path: `${path}.importId`, message: 'there is no such import in this group: send the file again' },
    ]);
  }
}
