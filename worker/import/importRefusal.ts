/** A file that cannot be read as a table: what was found, where, and what to do about it. */
export class ImportRefusal extends Error {
  override readonly name = 'ImportRefusal';
}
