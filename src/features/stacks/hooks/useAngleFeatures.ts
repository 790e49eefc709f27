import { keepPreviousData, useQuery } from '@tanstack/react-query';
import { useMemo } from 'react';
import type { AngleFeatures } from '../../../../shared/live.ts';
import type { StackDocument, WorkingPoint } from '../../../../shared/stack.ts';
import { useSettled } from '../../../lib/useSettled.ts';
import { angleFeaturesQuery } from '../api/angleFeatures.ts';

/** They take a thousand solves and come when the film stands still. */
const PAUSE_MS = 250;

/**
 * The angles of the film as it is now; null while they are not known or not wanted. What they do not depend on, the angle
 * and the light of the working point, is left out of the question.
 */
export function useAngleFeatures(
  document: StackDocument,
  point: WorkingPoint,
  wanted: boolean,
): AngleFeatures | null {
  const { wavelengthNm, magnetization } = point;
  const asked = useMemo<StackDocument | null>(
    () =>
      wanted ? { ...document, workingPoint: { wavelengthNm, magnetization, angleDeg: 0, input: 'p' } } : null,
    [document, wavelengthNm, magnetization, wanted],
  );
  const settled = useSettled(asked, PAUSE_MS);
  const { data } = useQuery({
    ...angleFeaturesQuery(settled),
    placeholderData: keepPreviousData,
    retry: false,
  });
  return wanted && settled === asked && data ? data : null;
}
