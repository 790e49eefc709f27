/** Hands a file to the browser's downloads. */
export function saveFile(name: string, content: Blob | string, type = 'text/plain'): void {
  const blob = typeof content === 'string' ? new Blob([content], { type }) : content;
  const url = URL.createObjectURL(blob);
  const link = document.createElement('a');
  link.href = url;
  link.download = name;
  link.click();
  // Some browsers read the address only after the click has returned.
  setTimeout(() => URL.revokeObjectURL(url), 10_000);
}

/** A name for a file from a title: letters, digits and dashes. */
export function fileNameOf(title: string, ending: string): string {
  const plain = title
    .normalize('NFKD')
    .replace(/[^\w]+/g, '-')
    .replace(/^-+|-+$/g, '');
  return `${(plain || 'skewlight').slice(0, 80)}.${ending}`;
}

/** Columns of numbers as CSV with full doubles, an empty field for NaN. */
export function toCsv(columns: readonly { header: string; values: ArrayLike<number> }[]): string {
  const quote = (text: string) => (/[",\n]/.test(text) ? `"${text.replace(/"/g, '""')}"` : text);
  const rows = [columns.map(({ header }) => quote(header)).join(',')];
  const count = Math.max(0, ...columns.map(({ values }) => values.length));
  for (let row = 0; row < count; row++) {
    rows.push(columns.map(({ values }) => fieldOf(values[row])).join(','));
  }
  return rows.join('\n') + '\n';
}

function fieldOf(value: number | undefined): string {
  return value === undefined || Number.isNaN(value) ? '' : String(value);
}
