import type { Issue } from '../../../../shared/error.ts';
import type { ContentForm } from './form.ts';

const isEmpty = (rows: readonly string[][]) => rows.every((row) => row.every((cell) => cell.trim() === ''));

/** Problems without those of a table that nobody has begun to fill: these are said when it is to be saved. */
export function withoutUntouched(issues: readonly Issue[], content: ContentForm): readonly Issue[] {
  const { index, voigt, anisotropy } = content;
  const untouched = [
    ...(index.kind === 'table' && isEmpty(index.rows) ? ['index.'] : []),
    ...(voigt.kind === 'table' && isEmpty(voigt.rows) ? ['voigt.'] : []),
    ...(anisotropy.kind === 'uniaxial' &&
    anisotropy.extraordinary.kind === 'table' &&
    isEmpty(anisotropy.extraordinary.rows)
      ? ['anisotropy.extraordinary.']
      : []),
    // A part of a mixture that is not chosen yet.
    ...(index.kind === 'mixture of'
      ? index.parts.flatMap(({ material }, at) => (material === '' ? [`index.parts[${at}].`] : []))
      : []),
  ];
  return issues.filter(({ path }) => !untouched.some((start) => path.startsWith(start)));
}
