import { expect, test } from 'vitest';
import type { StudyDocument, StudyItem } from '../../shared/study.ts';
import { studyChanges } from './studyChanges.ts';

const note = (id: string, text = 'text'): StudyItem => ({ kind: 'note', id, text });
const run = (id: string, more: { view?: string; caption?: string; runId?: string } = {}): StudyItem => ({
  ...{ kind: 'run', id, runId: `run of ${id}`, view: '', caption: '' },
  ...more,
});
const names = new Map([
  ['run of a', 'Angles'],
  ['run of b', 'Colours'],
]);
const study = (items: StudyItem[], more: Partial<StudyDocument> = {}, title = 'Cap') => ({
  title,
  document: { question: 'Which?', items, decision: '', ...more },
});
const changes = (before: ReturnType<typeof study>, after: ReturnType<typeof study>) =>
  studyChanges(before, after, (item) => (item.kind === 'run' ? (names.get(item.runId) ?? null) : null));

// The sentences are our own; each is counted out by hand from the two lists.
test('says what was added, removed and moved, and no more than had to be moved', () => {
  const before = study([note('n'), run('a'), run('b'), note('m')]);
  expect(changes(before, before)).toEqual([]);
  expect(changes(before, study([run('b'), note('n'), run('a'), note('m')]))).toEqual([
    'Run "Colours" moved from place 3 to place 1.',
  ]);
  expect(changes(before, study([run('a'), run('b'), note('m'), note('new')]))).toEqual([
    'Note removed, which stood at place 1.',
    'Note added at place 4.',
  ]);
  expect(changes(before, study([note('n'), run('a'), note('b'), note('m')]))).toEqual([
    'Run "Colours" removed, which stood at place 3.',
    'Note added at place 3.',
  ]);
});

test('says what changed inside an item', () => {
  const before = study([note('n'), run('a')]);
  const after = study([note('n', 'other'), run('a', { view: 'x=1', caption: 'Look', runId: 'gone' })]);
  expect(changes(before, after)).toEqual([
    'Note at place 1 changed.',
    'Place 2 shows a run that was deleted instead of run "Angles".',
    'View of a run that was deleted at place 2 pinned anew.',
    'Caption of a run that was deleted at place 2 changed.',
  ]);
});

test('tells a decision that is made, changed and withdrawn, and a new title or question', () => {
  const decided = study([], { decision: 'Gold.' });
  expect(changes(study([]), decided)).toEqual(['Decision made.']);
  expect(changes(decided, study([], { decision: 'Ruthenium.' }))).toEqual(['Decision changed.']);
  expect(changes(decided, study([], { decision: ' ' }))).toEqual(['Decision withdrawn.']);
  expect(changes(study([]), study([], { question: 'Why?' }, 'Caps'))).toEqual([
    'Title changed from "Cap" to "Caps".',
    'Question changed.',
  ]);
});
