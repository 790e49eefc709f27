import type { Demands } from '../../../../shared/designPoint.ts';
import { demandLooks, demandNames } from '../model/demands.ts';
import { formatNumber } from '../../../lib/format.ts';

/** The demands that were made, in a sentence. */
export function DemandWords({ demands, className }: { demands: Demands; className?: string }) {
  const made = demandNames.flatMap((name) => {
    const value = demands[name];
    if (value === undefined) return [];
    const { label, bound, unit, scale } = demandLooks[name];
    return [`${label} ${bound} ${formatNumber(value * scale, { digits: 3 })}${unit ? ` ${unit}` : ''}`];
  });
  return (
    <p className={className}>
      {made.length === 0 ? 'No demands were made.' : `Demands at every working point: ${made.join('; ')}.`}
    </p>
  );
}
