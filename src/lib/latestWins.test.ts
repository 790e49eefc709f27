import { describe, expect, test } from 'vitest';
import { LatestWins } from './latestWins.ts';

/** A server whose answers come when the test says so. */
function slowServer() {
  const asked: { question: string; signal: AbortSignal; answer: () => void; fail: (error: Error) => void }[] =
    [];
  const shown: string[] = [];
  const failed: string[] = [];
  const pipeline = new LatestWins<string, string>({
    ask: (question, signal) =>
      new Promise((resolve, reject) => {
        signal.addEventListener('abort', () => reject(new DOMException('aborted', 'AbortError')));
        asked.push({ question, signal, answer: () => resolve(question.toUpperCase()), fail: reject });
      }),
    onAnswer: (answer) => shown.push(answer),
    onError: (error) => failed.push(error.message),
  });
  return { pipeline, asked, shown, failed };
}

const settled = () => new Promise((resolve) => setTimeout(resolve, 0));

describe('questions that follow each other quickly', () => {
  test('are asked two at a time, and of those that wait only the newest', async () => {
    const { pipeline, asked, shown } = slowServer();
    for (const question of ['a', 'b', 'c', 'd']) pipeline.ask(question);
    expect(asked.map(({ question }) => question)).toEqual(['a', 'b']);
    asked[0]!.answer();
    await settled();
    expect(asked.map(({ question }) => question)).toEqual(['a', 'b', 'd']);
    asked[1]!.answer();
    asked[2]!.answer();
    await settled();
    expect(shown).toEqual(['A', 'B', 'D']);
  });

  test('never show an older answer after a newer one, and let the older go', async () => {
    const { pipeline, asked, shown, failed } = slowServer();
    pipeline.ask('a');
    pipeline.ask('b');
    asked[1]!.answer();
    await settled();
    expect(asked[0]!.signal.aborted).toBe(true);
    asked[0]!.answer();
    await settled();
    expect(shown).toEqual(['B']);
    expect(failed).toEqual([]);
  });

  test('report a failure of the newest only, and go on after it', async () => {
    const { pipeline, asked, shown, failed } = slowServer();
    pipeline.ask('a');
    pipeline.ask('b');
    asked[0]!.fail(new Error('old'));
    asked[1]!.fail(new Error('unreachable'));
    await settled();
    expect(failed).toEqual(['unreachable']);
    pipeline.ask('c');
    asked[2]!.answer();
    await settled();
    expect(shown).toEqual(['C']);
  });

  test('say nothing once nobody wants to know', async () => {
    const { pipeline, asked, shown, failed } = slowServer();
    pipeline.ask('a');
    pipeline.ask('b');
    pipeline.ask('c');
    pipeline.stop();
    await settled();
    expect(asked.map(({ signal }) => signal.aborted)).toEqual([true, true]);
    expect([shown, failed]).toEqual([[], []]);
  });
});
