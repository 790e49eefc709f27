import type { ContentForm } from './form.ts';

/**
 * Whether a path of an issue leads to a single value of the form, which has a field on the page. Cells of tables have
 * other paths than the rows of the form and are fields too.
 */
export function isField(content: ContentForm, path: string): boolean {
  if (/\.(wavelengthsNm|n|k)\[\d+\]$|^voigt\.q\[\d+\]\[[01]\]$/.test(path)) return true;
  if (/^index\.epsilon\[\d+\]\[\d\]\[\d\]\[[01]\]$/.test(path)) return true;
  let value: unknown = content;
  for (const key of path.match(/[^.[\]]+/g) ?? []) {
    if (typeof value !== 'object' || value === null) return false;
    value = new Map(Object.entries(value)).get(key);
  }
  return typeof value === 'number' || (typeof value === 'string' && !path.endsWith('kind'));
}
