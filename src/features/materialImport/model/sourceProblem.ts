import { LIMITS } from '../../../../shared/limits.ts';
import { formatCount } from '../../../lib/format.ts';

const megabytes = (bytes: number) => formatCount(Math.ceil(bytes / 1e5) / 10);

/** Why a file need not be sent at all, with the remedy; the server checks everything else. */
export function fileProblem({ name, size }: Pick<File, 'name' | 'size'>): string | undefined {
  if (size === 0) return `${name} is empty. Choose the file that holds the table.`;
  if (size <= LIMITS.importBytes) return undefined;
  return `${name} has ${megabytes(size)} MB; at most ${megabytes(LIMITS.importBytes)} MB can be read. Keep only the columns and the range that you need.`;
}

export function pasteProblem(text: string): string | undefined {
  if (text.trim() === '') return 'Paste the rows of the table first.';
  const { size } = new Blob([text]);
  // The text travels quoted within JSON, which needs a little more room.
  if (size <= LIMITS.bodyBytes * 0.9) return undefined;
  return `The text has ${megabytes(size)} MB, too much to paste. Save it as a file and upload that.`;
}
