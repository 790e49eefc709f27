import { useQuery } from '@tanstack/react-query';
import { useMemo } from 'react';
import type { Material, MaterialSummary } from '../../../shared/material.ts';
import type { StackDocument } from '../../../shared/stack.ts';
import { ErrorState } from '../../components/ErrorState.tsx';
import { LoadingState } from '../../components/LoadingState.tsx';
import { comparedNames } from '../../features/materials/model/comparedNames.ts';
import { sweepQuery } from '../../features/stacks/api/solve.ts';
import { readSweepResponse } from '../../features/stacks/model/solveStates.ts';
import { formatPlain, formatRange } from '../../lib/format.ts';
import { EffectPlot } from './EffectPlot.tsx';
import { planEffect } from './effectPlan.ts';

type Props = {
  document: StackDocument;
  /** Ids of the materials in whose place A and B stand. */
  outgoing: readonly string[];
  a: Material;
  b: Material;
  library: readonly MaterialSummary[];
};

/** The stack solved with either material: its Kerr angles (for transverse m its contrast) against wavelength. */
export function EffectPlots({ document, outgoing, a, b, library }: Props) {
  const place = outgoing.join(' ');
  const plan = useMemo(
    () => planEffect(document, place.split(' '), a, b, library),
    [document, place, a, b, library],
  );
  const asked = useMemo(
    () => plan?.requests.map((request) => ({ sweep: plan.sweep, request })) ?? [],
    [plan],
  );
  const withA = useQuery({ ...sweepQuery(asked[0] ?? null), retry: false });
  const withB = useQuery({ ...sweepQuery(asked[1] ?? null), retry: false });
  const names = useMemo(() => comparedNames(a, b), [a, b]);
  const columns = useMemo(
    () =>
      withA.data && withB.data
        ? [withA.data, withB.data].map(({ response, sweep }) => readSweepResponse(response, sweep))
        : null,
    [withA.data, withB.data],
  );
  if (!plan) {
    return (
      <p className="text-muted">
        The constants of this film with A and with B are known at no common wavelength, so there is nothing to
        compare.
      </p>
    );
  }
  const error = withA.error ?? withB.error;
  if (error) {
    const retry = () => void Promise.all([withA.refetch(), withB.refetch()]);
    return <ErrorState title="The stack could not be solved" error={error} onRetry={retry} />;
  }
  const [first, second] = columns ?? [];
  if (!first || !second) return <LoadingState label="Solving the stack with either material" rows={6} />;
  const { grid, readings } = plan.sweep;
  const { angleDeg, wavelengthNm, input } = document.workingPoint;
  return (
    <>
      <p className="mb-3 text-note text-muted">
        {formatPlain(angleDeg)}° incidence, {input} light, magnetization as the stack’s working point has it;{' '}
        {formatRange([grid[0] ?? NaN, grid.at(-1) ?? NaN], 'nm')}, where all constants are known.
      </p>
      <div className="grid grid-cols-1 gap-x-6 gap-y-5 lg:grid-cols-2">
        {readings.map((reading) => (
          <EffectPlot
            key={reading}
            reading={reading}
            grid={grid}
            values={[first[reading] ?? [], second[reading] ?? []]}
            names={names}
            workingNm={wavelengthNm}
          />
        ))}
      </div>
    </>
  );
}
