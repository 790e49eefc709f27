import type { Material } from '../../../../shared/material.ts';

/** What two materials are called beside each other: the id of a shipped one, which names its source. */
export function comparedNames(a: Material, b: Material): [string, string] {
  const nameOf = ({ id, name, groupId }: Material) => (groupId === null ? id : name);
  const [first, second] = [nameOf(a), nameOf(b)];
  if (first !== second) return [first, second];
  if (a.version !== b.version) return [`${first} v${a.version}`, `${second} v${b.version}`];
  return [`${first} (A)`, `${second} (B)`];
}
