import { useQuery } from '@tanstack/react-query';
import type { StudyItem } from '../../../shared/study.ts';
import { designListQuery } from '../../features/designs/api/designList.ts';
import { runListQuery } from '../../features/runList/api/runList.ts';
import { formatDate } from '../../lib/format.ts';

type Named = { id: string; name: string };
type Listed = Named & { label: string };

/** The finished runs and designs of a group, newest first. */
export function useChoices(groupId: string): { runs: Listed[]; designs: Listed[] } {
  const runs = useQuery(runListQuery(groupId)).data?.runs ?? [];
  const designs = useQuery(designListQuery(groupId)).data?.designs ?? [];
  return { runs: runs.filter(isDone).map(listed), designs: designs.filter(isDone).map(listed) };
}

/** What an item is called in messages and by screen readers. */
export function itemNames(runs: readonly Named[], designs: readonly Named[]) {
  const named = (list: readonly Named[], id: string) => list.find((one) => one.id === id)?.name;
  return (item: StudyItem): string => {
    switch (item.kind) {
      case 'note':
        return `note “${firstWords(item.text) || 'empty'}”`;
      case 'run':
        return named(runs, item.runId) ?? 'run';
      case 'design':
        return named(designs, item.designId) ?? 'design';
    }
  };
}

/** The first line of a Markdown note without the marks of a heading or a list. */
function firstWords(text: string): string {
  return (text.trim().split('\n')[0] ?? '').replace(/^(#+|[-*])\s+/, '').slice(0, 40);
}

function isDone({ progress }: { progress: { state: string } }): boolean {
  return progress.state === 'done';
}

function listed({ id, name, createdAt }: { id: string; name: string; createdAt: string }): Listed {
  return { id, name, label: `${name}, ${formatDate(createdAt)}` };
}
