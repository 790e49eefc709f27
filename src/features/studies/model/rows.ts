import type { StudyItem } from '../../../../shared/study.ts';

/** An item on the page: one that was removed stays in its place, and can come back, until the study is saved. */
export type StudyRow = { item: StudyItem; removed: boolean };

export function rowsOf(items: readonly StudyItem[]): StudyRow[] {
  return items.map((item) => ({ item, removed: false }));
}

export function itemsOf(rows: readonly StudyRow[]): StudyItem[] {
  return rows.filter(({ removed }) => !removed).map(({ item }) => item);
}

export function changeItem(rows: readonly StudyRow[], changed: StudyItem): StudyRow[] {
  return rows.map((row) => (row.item.id === changed.id ? { ...row, item: changed } : row));
}

export function setRemoved(rows: readonly StudyRow[], id: string, removed: boolean): StudyRow[] {
  return rows.map((row) => (row.item.id === id ? { ...row, removed } : row));
}

/** The item one place up or down among those that are not removed; the same rows at either end. */
export function moveByOne(rows: readonly StudyRow[], id: string, step: -1 | 1): StudyRow[] {
  const from = rows.findIndex(({ item }) => item.id === id);
  if (from < 0) return [...rows];
  const others = rows.map((row, index) => ({ row, index })).filter(({ row }) => !row.removed);
  const place = others.findIndex(({ index }) => index === from);
  const beside = others[place + step];
  if (place < 0 || !beside) return [...rows];
  return moveTo(rows, id, step === -1 ? beside.index : beside.index + 1);
}

/** The item before what stands at `before` now; at the end when that is the number of rows. */
export function moveTo(rows: readonly StudyRow[], id: string, before: number): StudyRow[] {
  const from = rows.findIndex(({ item }) => item.id === id);
  const moved = rows[from];
  if (!moved) return [...rows];
  const rest = rows.filter((row) => row !== moved);
  rest.splice(before > from ? before - 1 : before, 0, moved);
  return rest;
}

/** An id that no other item of the study has by chance. */
export function newItemId(): string {
  return crypto.randomUUID().slice(0, 13);
}
