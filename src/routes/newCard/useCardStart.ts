import { useQuery } from '@tanstack/react-query';
import { useMemo } from 'react';
import type { Design, DesignInput, DesignResult } from '../../../shared/design.ts';
import { signalNames } from '../../../shared/designPoint.ts';
import { LIMITS } from '../../../shared/limits.ts';
import type { Stack } from '../../../shared/stack.ts';
import { usualTolerance } from '../../features/cards/model/cardDraft.ts';
import type { CardStart } from '../../features/cards/model/cardDraft.ts';
import { designedFilm } from '../../features/cards/model/designedFilm.ts';
import type { DesignChoice } from '../../features/cards/model/designedFilm.ts';
import { designQuery } from '../../features/designs/api/design.ts';
import { designResultQuery } from '../../features/designs/api/designResult.ts';
import { pointWords } from '../../features/designs/model/pointWords.ts';
import { stackQuery } from '../../features/stacks/api/stack.ts';
import { formatNumber } from '../../lib/format.ts';

/** What the address says a card begins with: a stack as it is, or the film that a design ended with. */
export function useCardStart(search: URLSearchParams) {
  const [stackId, designId] = [search.get('stack'), search.get('design')];
  const [candidateId, studyId] = [search.get('candidate'), search.get('study')];
  const place = search.get('member');
  const member = place !== null && /^\d+$/.test(place) ? Number(place) : null;
  const stack = useQuery({ ...stackQuery(stackId ?? ''), enabled: stackId !== null });
  const design = useQuery({ ...designQuery(designId ?? ''), enabled: designId !== null });
  const result = useQuery({ ...designResultQuery(`/designs/${designId}`), enabled: designId !== null });
  const start = useMemo((): CardStart | 'missing' | null => {
    const study = studyId === null ? {} : { studyId };
    if (designId !== null) {
      return design.data && result.data
        ? { ...fromDesign(design.data, result.data, { candidateId, member }), ...study }
        : null;
    }
    if (stackId === null) return 'missing';
    return stack.data ? { ...fromStack(stack.data), ...study } : null;
  }, [designId, stackId, studyId, candidateId, member, design.data, result.data, stack.data]);
  const failed = [stack, design, result].find(({ error }) => error !== null);
  return { start, error: failed?.error ?? null, retry: () => void failed?.refetch() };
}

function fromStack({ name, document }: Stack): CardStart {
  return {
    title: name,
    document,
    points: [
      { id: 'point-1', label: pointWords(document.workingPoint), workingPoint: document.workingPoint },
    ],
    signal: 'rotation',
    tolerance: usualTolerance,
  };
}

function fromDesign(design: Design, result: DesignResult, chosen: DesignChoice): CardStart {
  const { id, input } = design;
  return {
    title: filmTitle(design, result, chosen),
    document: designedFilm(design, result, chosen),
    points: input.points,
    signal: signalOf(input),
    tolerance: 'tolerance' in input ? input.tolerance : usualTolerance,
    designId: id,
  };
}

/** What a design looked for is what its card prints first; a goal that is no signal of its own is judged by the rotation. */
function signalOf(input: DesignInput): CardStart['signal'] {
  if (input.kind !== 'optimise') return input.signal;
  return signalNames.find((name) => name === input.goal.quantity) ?? 'rotation';
}

/** A card is of a film: it bears the name of its stack and what the design made of it, not the whole question. */
function filmTitle({ name, stackName }: Design, result: DesignResult, { candidateId }: DesignChoice): string {
  if (stackName === null) return name;
  if (result.kind === 'optimise') return `${stackName}, optimised`.slice(0, LIMITS.nameLength);
  if (result.kind !== 'cap') return stackName;
  const wanted = candidateId ?? result.ranking[0];
  const cap = result.candidates.find(({ id }) => id === wanted);
  if (!cap?.best) return stackName;
  const cover = `${cap.label} ${formatNumber(cap.best.thicknessNm, { digits: 3 })} nm`;
  return `${stackName}, cap ${cover}`.slice(0, LIMITS.nameLength);
}
