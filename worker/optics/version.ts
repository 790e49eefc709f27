/** Stored with every run. Raise it whenever a change can alter a digit of an answer. */
export const SOLVER_VERSION = '1.0.0';
