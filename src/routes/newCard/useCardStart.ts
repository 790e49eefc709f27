import { useQuery } from '@tanstack/react-query';
import { useMemo } from 'react';
import type { Design, DesignResult } from '../../../shared/design.ts';
import type { Stack } from '../../../shared/stack.ts';
import { usualTolerance } from '../../features/cards/model/cardDraft.ts';
import type { CardStart } from '../../features/cards/model/cardDraft.ts';
import { designedFilm } from '../../features/cards/model/designedFilm.ts';
import { designQuery } from '../../features/designs/api/design.ts';
import { designResultQuery } from '../../features/designs/api/designResult.ts';
import { stackQuery } from '../../features/stacks/api/stack.ts';

/** What the address says a card begins with: a stack as it is, or the film that a design ended with. */
export function useCardStart(search: URLSearchParams) {
  const [stackId, designId] = [search.get('stack'), search.get('design')];
  const [candidate, studyId] = [search.get('candidate'), search.get('study')];
  const stack = useQuery({ ...stackQuery(stackId ?? ''), enabled: stackId !== null });
  const design = useQuery({ ...designQuery(designId ?? ''), enabled: designId !== null });
  const result = useQuery({ ...designResultQuery(`/designs/${designId}`), enabled: designId !== null });
  const start = useMemo((): CardStart | 'missing' | null => {
    const study = studyId === null ? {} : { studyId };
    if (designId !== null) {
      return design.data && result.data
        ? { ...fromDesign(design.data, result.data, candidate), ...study }
        : null;
    }
    if (stackId === null) return 'missing';
    return stack.data ? { ...fromStack(stack.data), ...study } : null;
  }, [designId, stackId, studyId, candidate, design.data, result.data, stack.data]);
  const failed = [stack, design, result].find(({ error }) => error !== null);
  return { start, error: failed?.error ?? null, retry: () => void failed?.refetch() };
}

function fromStack({ name, document }: Stack): CardStart {
  return {
    title: name,
    document,
    points: [{ id: 'point-1', label: 'Working point', workingPoint: document.workingPoint }],
    signal: 'rotation',
    tolerance: usualTolerance,
  };
}

function fromDesign(design: Design, result: DesignResult, candidate: string | null): CardStart {
  const { id, name, input } = design;
  return {
    title: name,
    document: designedFilm(design, result, candidate),
    points: input.points,
    signal: 'signal' in input ? input.signal : 'rotation',
    tolerance: 'tolerance' in input ? input.tolerance : usualTolerance,
    designId: id,
  };
}
