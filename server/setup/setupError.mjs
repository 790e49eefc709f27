/** A failure that the reader can act on: what went wrong, and the command or change that remedies it. */
export class SetupError extends Error {
  /**
   * @param {string} message what went wrong, in one sentence
   * @param {string} [remedy] what to do about it
   */
  constructor(message, remedy) {
    super(message);
    this.name = 'SetupError';
    this.remedy = remedy;
  }
}

/** Thrown by whatever was under way when a signal asked the process to stop; printed by nobody. */
export class Interrupted extends Error {}
