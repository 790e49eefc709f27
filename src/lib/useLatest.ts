import { useEffect, useRef, useState } from 'react';
import { ApiError } from './apiClient.ts';
import { LatestWins } from './latestWins.ts';

/** A server that does not answer at all is asked again after this; one that hangs is given up after that. */
const RETRY_MS = 3_000;
const PATIENCE_MS = 30_000;

export type Latest<Answer> = {
  /** The last answer there was, also while another is awaited. */
  answer: Answer | null;
  /** Whether the newest question is still to be answered. */
  pending: boolean;
  /** Why the newest question has no answer. */
  error: Error | null;
};

type State<Question, Answer> = {
  answer: Answer | null;
  settled: Question | null;
  failed: { question: Question; error: Error } | null;
};

/**
 * The answer to a question that changes quickly, at most two of them under way. Keep `ask` stable, and the question
 * while it is the same.
 *
 * @param question null while there is nothing to ask
 */
export function useLatest<Question, Answer>(
  question: Question | null,
  ask: (question: Question, signal: AbortSignal) => Promise<Answer>,
): Latest<Answer> {
  const [state, setState] = useState<State<Question, Answer>>({
    answer: null,
    settled: null,
    failed: null,
  });
  const pipeline = useRef<LatestWins<Question, Answer> | null>(null);
  useEffect(() => {
    const latest = new LatestWins<Question, Answer>({
      ask: (asked, signal) => ask(asked, AbortSignal.any([signal, AbortSignal.timeout(PATIENCE_MS)])),
      onAnswer: (answer, settled) => setState({ answer, settled, failed: null }),
      onError: (error, failed) => setState((now) => ({ ...now, failed: { question: failed, error } })),
    });
    pipeline.current = latest;
    return () => latest.stop();
  }, [ask]);
  useEffect(() => {
    // What is under way when there is nothing more to ask would come as an answer to something else.
    if (question === null) pipeline.current?.stop();
    else pipeline.current?.ask(question);
  }, [question, ask]);
  const lost = state.failed?.question === question && isAway(state.failed?.error);
  useEffect(() => {
    if (!lost || question === null) return undefined;
    const timer = setInterval(() => pipeline.current?.ask(question), RETRY_MS);
    return () => clearInterval(timer);
  }, [lost, question]);
  const failed = state.failed?.question === question && question !== null ? state.failed.error : null;
  return {
    answer: state.answer,
    pending: question !== null && state.settled !== question && failed === null,
    error: failed,
  };
}

function isAway(error: Error | undefined): boolean {
  return error instanceof ApiError && (error.status === 0 || error.status === 503);
}
