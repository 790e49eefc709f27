import { describe, expect, it } from 'vitest';
import { closeStep, recordEdit, redo, startHistory, undo } from './history.ts';

describe('history', () => {
  it('takes a number typed in one go back in one step', () => {
    let history = startHistory('3');
    for (const text of ['4', '42', '425']) history = recordEdit(history, text, 'thickness of pt');
    history = recordEdit(history, '425!', 'note of pt');
    expect(undo(history).present).toBe('425');
    expect(undo(undo(history)).present).toBe('3');
    expect(redo(undo(undo(history))).present).toBe('425');
  });

  it('keeps edits without a name apart', () => {
    const history = recordEdit(recordEdit(startHistory(0), 1, null), 2, null);
    expect(undo(history).present).toBe(1);
  });

  it('begins a new step after a save, and after undo', () => {
    const saved = closeStep(recordEdit(startHistory('a'), 'b', 'name'));
    expect(undo(recordEdit(saved, 'c', 'name')).present).toBe('b');
    const undone = undo(recordEdit(startHistory('a'), 'b', 'name'));
    expect(undo(recordEdit(undone, 'c', 'name')).present).toBe('a');
  });

  it('forgets what was undone once something else is done', () => {
    const history = recordEdit(undo(recordEdit(startHistory(0), 1, null)), 2, null);
    expect(redo(history).present).toBe(2);
  });

  it('has ends', () => {
    const history = startHistory(0);
    expect(undo(history)).toBe(history);
    expect(redo(history)).toBe(history);
    expect(recordEdit(history, 0, null)).toBe(history);
  });
});
