import { createHash } from 'node:crypto';

/** A row id that follows from who asks and the key: the database itself then refuses the second row. */
export function idOfKey(actor: { userId: string }, group: { id: string }, key: string): string {
  const bytes = createHash('sha256').update(`${actor.userId}\n${group.id}\n${key}`).digest().subarray(0, 16);
  // Version 8 and the variant of RFC 9562: a UUID made by a rule of one's own.
  bytes[6] = (bytes[6]! & 0x0f) | 0x80;
  bytes[8] = (bytes[8]! & 0x3f) | 0x80;
  return bytes.toString('hex').replace(/^(.{8})(.{4})(.{4})(.{4})(.{12})$/, '$1-$2-$3-$4-$5');
}
