import { LIMITS } from '../../shared/limits.ts';

/** A name made of letters, digits, points and hyphens that every system takes, for a file handed out. */
export function plainFileName(name: string, otherwise: string): string {
  const plain = name
    .normalize('NFKD')
    .replace(/[^\w.-]+/g, '-')
    .replace(/^[-.]+|-+$/g, '')
    .slice(0, 60);
  return plain || otherwise;
}

/** What somebody called a file, without folders and without what cannot be shown or stored. */
export function shownFileName(given: string): string {
  const last = given.split(/[/\\]/).at(-1) ?? '';
  const shown = last
    .replace(/[\p{C}\p{Zl}\p{Zp}]/gu, '')
    .trim()
    .slice(0, LIMITS.nameLength);
  return shown || 'unnamed table';
}
