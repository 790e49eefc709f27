import { useMemo } from 'react';
import type { Goal, ParetoFilm } from '../../../../shared/optimiseDesign.ts';
import { paretoRoles } from '../../../../shared/paretoSet.ts';
import { LinePlot } from '../../../components/plot/LinePlot.tsx';
import { nearestIndex } from '../../../components/plot/curveValues.ts';
import { Select } from '../../../components/Select.tsx';
import { axisLabel, unitLabel, goalQuantityLooks, printQuantity } from '../model/quantities.ts';
import { memberName } from '../model/shownFilm.ts';

type Props = {
  goal: Goal;
  second: Goal;
  /** At least one. */
  pareto: readonly ParetoFilm[];
  /** The film shown, by its place in the set. */
  member: number;
  /** Left out while the set still changes. */
  onMember?: (member: number) => void;
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
  const roles = useMemo(() => paretoRoles(pareto), [pareto]);
  const marks = useMemo(() => [...roles].map(([place, role]) => ({ x: x[place]!, label: role })), [roles, x]);
  // Those with a name stand in front: of hundreds the compromise would be hard to find.
  const places = [...roles.keys(), ...pareto.map((_, place) => place).filter((place) => !roles.has(place))];
  const options = places.map((place) => {
    const film = pareto[place]!;
    const values = `${printQuantity(first, film.first)}, ${printQuantity(other, film.second)}`;
    return { value: String(place), label: `${memberName(pareto, place)}: ${values}` };
  });
  return (
    <section aria-label="Both goals">
      <h2 className="mb-2 text-lead">
        Both goals: {other.label} against {first.label}
      </h2>
      {roles.size > 2 && (
        <p className="mb-2 text-note text-muted">
          The compromise is the film nearest to both bests, the difference from each taken as a share of its
          range over the set: common practice, no source.
        </p>
      )}
      <LinePlot
        series={series}
        xAxis={xAxis}
        yAxes={yAxes}
        height={280}
        ariaLabel={`${other.label} against ${first.label} of films of which none is better in both`}
        {...(onMember
          ? {
              marker: x[member]!,
              onPickX: (value: number) => onMember(nearestIndex(x, value)),
              controls: (
                <Select
                  aria-label="Film chosen"
                  className="max-w-full"
                  value={String(member)}
                  options={options}
                  onValueChange={(value) => onMember(Number(value))}
                />
              ),
            }
          : {})}
        marks={marks}
      />
    </section>
  );
}
