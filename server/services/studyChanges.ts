import type { StudyDocument, StudyItem } from '../../shared/study.ts';

type StudyText = { title: string; document: StudyDocument };

/** What a run or design is called; null for one that is gone. */
export type NameOfItem = (item: Exclude<StudyItem, { kind: 'note' }>) => string | null;

/**
 * What differs between two versions of a study, in sentences. Places count from 1, those of the newer version unless
 * the item is gone from it.
 */
export function studyChanges(before: StudyText, after: StudyText, nameOf: NameOfItem): string[] {
  const [old, now] = [before.document, after.document];
  const lasting = new Set(old.items.flatMap((item) => (now.items.some(isSameItem(item)) ? [item.id] : [])));
  return [
    ...(before.title === after.title ? [] : [`Title changed from "${before.title}" to "${after.title}".`]),
    ...(old.question === now.question ? [] : ['Question changed.']),
    ...old.items.flatMap((item, position) =>
      lasting.has(item.id)
        ? []
        : [`${capital(called(item, nameOf))} removed, which stood at place ${position + 1}.`],
    ),
    ...now.items.flatMap((item, position) =>
      lasting.has(item.id) ? [] : [`${capital(called(item, nameOf))} added at place ${position + 1}.`],
    ),
    ...movements(old.items, now.items, lasting, nameOf),
    ...now.items.flatMap((item, position) => {
      const former = old.items.find(isSameItem(item));
      return former ? itemChanges(former, item, position + 1, nameOf) : [];
    }),
    ...decisionChange(old.decision.trim(), now.decision.trim()),
  ];
}

/** An id that stands for another kind of thing than before is another item. */
const isSameItem = (item: StudyItem) => (other: StudyItem) =>
  other.id === item.id && other.kind === item.kind;

/** The fewest items that must be taken up and put down again to bring the old order into the new one. */
function movements(
  old: StudyItem[],
  now: StudyItem[],
  lasting: ReadonlySet<string>,
  nameOf: NameOfItem,
): string[] {
  const formerPlace = new Map(old.map(({ id }, position) => [id, position]));
  const kept = now.filter(({ id }) => lasting.has(id));
  const still = new Set(longestRising(kept.map(({ id }) => formerPlace.get(id)!)).map((at) => kept[at]!.id));
  return now.flatMap((item, position) =>
    lasting.has(item.id) && !still.has(item.id)
      ? [
          `${capital(called(item, nameOf))} moved from place ${formerPlace.get(item.id)! + 1} to place ${position + 1}.`,
        ]
      : [],
  );
}

/** Positions of a longest rising subsequence; the lists of a study are short enough for comparing all pairs. */
function longestRising(values: number[]): number[] {
  const best: number[][] = [];
  values.forEach((value, at) => {
    const before = best.filter((_, earlier) => values[earlier]! < value);
    const longest = before.reduce<number[]>((found, one) => (one.length > found.length ? one : found), []);
    best.push([...longest, at]);
  });
  return best.reduce<number[]>((found, one) => (one.length > found.length ? one : found), []);
}

function itemChanges(former: StudyItem, item: StudyItem, place: number, nameOf: NameOfItem): string[] {
  if (item.kind === 'note') {
    return former.kind === 'note' && former.text !== item.text ? [`Note at place ${place} changed.`] : [];
  }
  if (former.kind === 'note') return [];
  const name = called(item, nameOf);
  return [
    ...(subjectOf(former) === subjectOf(item)
      ? []
      : [`Place ${place} shows ${name} instead of ${called(former, nameOf)}.`]),
    ...(former.view === item.view ? [] : [`View of ${name} at place ${place} pinned anew.`]),
    ...(former.caption === item.caption ? [] : [`Caption of ${name} at place ${place} changed.`]),
  ];
}

function decisionChange(old: string, now: string): string[] {
  if (old === now) return [];
  if (old === '') return ['Decision made.'];
  return [now === '' ? 'Decision withdrawn.' : 'Decision changed.'];
}

const subjectOf = (item: Exclude<StudyItem, { kind: 'note' }>) =>
  item.kind === 'run' ? item.runId : item.designId;

function called(item: StudyItem, nameOf: NameOfItem): string {
  if (item.kind === 'note') return 'note';
  const name = nameOf(item);
  return name === null ? `a ${item.kind} that was deleted` : `${item.kind} "${name}"`;
}

const capital = (text: string) => text.charAt(0).toUpperCase() + text.slice(1);
