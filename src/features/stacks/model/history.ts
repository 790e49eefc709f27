/** What can be undone: the states before, the one now, the ones taken back. */
export type History<State> = {
  past: readonly State[];
  present: State;
  future: readonly State[];
  /** The edit that made the present; typing on in the same field is one step. */
  lastEdit: string | null;
};

const MOST_STEPS = 200;

export function startHistory<State>(present: State): History<State> {
  return { past: [], present, future: [], lastEdit: null };
}

/**
 * A new present. Edits in a row with the same `edit` name (a number being typed, an arrow being dragged) become
 * one step; null is always a step of its own.
 */
export function recordEdit<State>(
  history: History<State>,
  present: State,
  edit: string | null,
): History<State> {
  if (Object.is(present, history.present)) return history;
  const goesOn = edit !== null && edit === history.lastEdit;
  const past = goesOn ? history.past : [...history.past, history.present].slice(-MOST_STEPS);
  return { past, present, future: [], lastEdit: edit };
}

export function undo<State>(history: History<State>): History<State> {
  const before = history.past.at(-1);
  if (before === undefined) return history;
  return {
    past: history.past.slice(0, -1),
    present: before,
    future: [history.present, ...history.future],
    lastEdit: null,
  };
}

export function redo<State>(history: History<State>): History<State> {
  const [after, ...later] = history.future;
  if (after === undefined) return history;
  return { past: [...history.past, history.present], present: after, future: later, lastEdit: null };
}

/** Ends the step in hand, so that the next edit of the same field is a step of its own. */
export function closeStep<State>(history: History<State>): History<State> {
  return history.lastEdit === null ? history : { ...history, lastEdit: null };
}
