import { Quantity } from '../../../components/Quantity.tsx';
import { sweepXAxis } from '../../../components/plot/readingSeries.ts';
import { axisUnitOf } from '../../../../shared/resultFormat.ts';
import { MOST_CURVES } from '../model/heldQuantities.ts';
import type { HeldQuantity } from '../model/heldQuantities.ts';
import type { CompareView } from '../model/planComparison.ts';
import { quantityWords } from '../model/runAxes.ts';

type Props = {
  views: readonly CompareView[];
  view: CompareView;
  onView: (id: string) => void;
  held: readonly HeldQuantity[];
  onHeld: (key: string, value: number | 'all') => void;
};

const box =
  'h-7 max-w-full field-sizing-content rounded-box border border-line bg-panel px-1.5 text-note text-ink';

/** Over what the runs are drawn, and at which value each other swept quantity is held. */
export function CompareChoices({ views, view, onView, held, onHeld }: Props) {
  if (views.length < 2 && held.length === 0) return null;
  return (
    <div className="flex flex-wrap items-center gap-x-5 gap-y-2 text-note">
      {views.length > 1 && (
        <label className="inline-flex max-w-full flex-wrap items-center gap-1.5">
          Draw
          <select value={view.id} onChange={(event) => onView(event.target.value)} className={box}>
            {views.map(({ id, label }) => (
              <option key={id} value={id}>
                {label}
              </option>
            ))}
          </select>
        </label>
      )}
      {held.map((quantity) => (
        <HeldControl key={quantity.key} held={quantity} onChange={(value) => onHeld(quantity.key, value)} />
      ))}
    </div>
  );
}

function HeldControl({ held, onChange }: { held: HeldQuantity; onChange: (value: number | 'all') => void }) {
  const { source, choices, value, mayBeAll, apart } = held;
  const { axis, word } = source;
  const print = sweepXAxis(axis, word).format ?? String;
  const words = quantityWords(source);
  if (choices === null || choices.length === 0) {
    const unit = { nm: 'nm', deg: '°', 1: '' }[axisUnitOf(axis)];
    return (
      <span className="inline-flex items-center gap-1.5">
        At {words}
        <Quantity
          label={`Cut at ${words}`}
          value={typeof value === 'number' ? value : axis.from}
          min={Math.min(axis.from, axis.to)}
          max={Math.max(axis.from, axis.to)}
          unit={unit}
          onChange={onChange}
          className="[&>span]:border [&>span]:border-line"
        />
      </span>
    );
  }
  return (
    <label className="inline-flex max-w-full flex-wrap items-center gap-1.5">
      At {words}
      <select
        value={String(value)}
        onChange={(event) => onChange(event.target.value === 'all' ? 'all' : Number(event.target.value))}
        className={box}
      >
        {mayBeAll && <option value="all">every value</option>}
        {choices.map((one) => (
          <option key={one} value={String(one)}>
            {print(one)}
          </option>
        ))}
      </select>
      {!mayBeAll && choices.length > 1 && (
        <span
          className="text-muted"
          title={
            apart
              ? 'Another run sweeps another layer or plane: one curve of each is held against the other'
              : `A plot holds ${MOST_CURVES} curves that can be told apart`
          }
        >
          one of {choices.length}
        </span>
      )}
    </label>
  );
}
