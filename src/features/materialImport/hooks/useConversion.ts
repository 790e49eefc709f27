import { useQuery } from '@tanstack/react-query';
import { useMemo } from 'react';
import { ownHabits } from '../../../../shared/materialImport.ts';
import { useSettled } from '../../../lib/useSettled.ts';
import { importPreviewQuery } from '../api/importPreview.ts';
import { mappingOf } from '../model/columnPlan.ts';
import type { ImportDraft } from '../model/importDraft.ts';
import { neededHabits } from '../model/neededHabits.ts';
import { planProblems } from '../model/planProblems.ts';

/** Answers come in bursts; a table of many rows is not converted for each of them. */
const SETTLE_MS = 350;

/** How far the answers go, and what the server makes of the table once they are complete. */
export function useConversion(importId: string, { plan, answers }: Pick<ImportDraft, 'plan' | 'answers'>) {
  const problems = useMemo(() => planProblems(plan), [plan]);
  const needed = useMemo(() => neededHabits(plan), [plan]);
  const unanswered = needed.filter((name) => answers[name] === undefined);
  const complete = problems.length === 0 && unanswered.length === 0;
  // Habits that nothing depends on are stored as those of this program.
  const mapping = useMemo(
    () => (complete ? mappingOf(plan, { ...ownHabits, ...answers }) : null),
    [complete, plan, answers],
  );
  const settled = useSettled(mapping, SETTLE_MS);
  const preview = useQuery(importPreviewQuery(importId, mapping && settled));
  const stale = mapping !== settled || preview.isPlaceholderData;
  return { problems, needed, unanswered, mapping, preview, stale };
}
