import { useMemo } from 'react';
import type { Goal, OptimiseResult } from '../../../../shared/optimiseDesign.ts';
import { LinePlot } from '../../../components/plot/LinePlot.tsx';
import { nearestIndex } from '../../../components/plot/curveValues.ts';
import { Select } from '../../../components/Select.tsx';
import { axisLabel, unitLabel, goalQuantityLooks, printQuantity } from '../model/quantities.ts';

type Props = {
  goal: Goal;
  second: Goal;
  pareto: NonNullable<OptimiseResult['pareto']>;
  member: number | null;
  onMember: (member: number | null) => void;
};

/** The films of which none is better in both goals; one is chosen on the curve, by Enter, or from the list. */
export function ParetoPlot({ goal, second, pareto, member, onMember }: Props) {
  const [first, other] = [goalQuantityLooks[goal.quantity], goalQuantityLooks[second.quantity]];
  const x = useMemo(
    () => pareto.map((film) => film.first * goalQuantityLooks[goal.quantity].scale),
    [pareto, goal],
  );
  const series = useMemo(() => {
    const look = goalQuantityLooks[second.quantity];
    return [
      {
        name: 'none better in both',
        x,
        y: pareto.map((film) => film.second * look.scale),
        tone: look.tone,
        width: 1,
        points: { x, y: pareto.map((film) => film.second * look.scale) },
        format: (value: number) => printQuantity({ ...look, scale: 1 }, value),
      },
    ];
  }, [x, pareto, second]);
  const xAxis = useMemo(() => {
    const look = goalQuantityLooks[goal.quantity];
    return {
      label: axisLabel(look),
      format: (value: number) => printQuantity({ ...look, scale: 1 }, value),
    };
  }, [goal]);
  const yAxes = useMemo(() => [{ label: unitLabel(goalQuantityLooks[second.quantity]) }], [second]);
  const chosen = member === null ? undefined : x[member];
  const options = [
    { value: 'best', label: 'the best of the first goal' },
    ...pareto.map((film, index) => ({
      value: String(index),
      label: `${printQuantity(first, film.first)}, ${printQuantity(other, film.second)}`,
    })),
  ];
  return (
    <section aria-label="Both goals">
      <h2 className="mb-2 text-lead">
        Both goals: {other.label} against {first.label}
      </h2>
      <LinePlot
        series={series}
        xAxis={xAxis}
        yAxes={yAxes}
        height={280}
        ariaLabel={`${other.label} against ${first.label} of films of which none is better in both`}
        {...(chosen === undefined ? {} : { marker: chosen })}
        onPickX={(value) => onMember(nearestIndex(x, value))}
        controls={
          <Select
            aria-label="Film chosen"
            value={member !== null && pareto[member] ? String(member) : 'best'}
            options={options}
            onValueChange={(value) => onMember(value === 'best' ? null : Number(value))}
          />
        }
      />
    </section>
  );
}
