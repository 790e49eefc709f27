import type { AngleUnit } from '../../lib/format.ts';
import { familyLooks } from './readingSeries.ts';
import type { Family, Light, ReadingView } from './readingView.ts';
import { SeriesMark } from './SeriesMark.tsx';

const names: Record<Family, string> = {
  rotation: 'rotation',
  ellipticity: 'ellipticity',
  reflectance: 'reflectance',
  cross: 'cross-polarized',
  contrast: 'contrast',
  ceiling: 'ceiling',
};

const chip =
  'inline-flex h-7 items-center gap-1.5 rounded-control px-2 text-note whitespace-nowrap text-muted hover:text-ink aria-pressed:font-semibold aria-pressed:text-ink [&>svg]:opacity-40 aria-pressed:[&>svg]:opacity-100';

type FamilyProps = {
  /** What there is to choose from. */
  families: readonly Family[];
  shown: readonly Family[];
  onChange: (change: Partial<ReadingView>) => void;
};

/** Which readings a plot shows. */
export function FamilyControls({ families, shown, onChange }: FamilyProps) {
  const toggle = (family: Family) => {
    const next = shown.includes(family) ? shown.filter((one) => one !== family) : [...shown, family];
    // An empty plot answers nothing: the last curve stays.
    if (next.length > 0) onChange({ shown: next });
  };
  return (
    <div role="group" aria-label="Readings shown" className="-ml-2 flex flex-wrap">
      {families.map((family) => (
        <button
          key={family}
          type="button"
          aria-pressed={shown.includes(family)}
          onClick={() => toggle(family)}
          className={chip}
        >
          <SeriesMark series={familyLooks[family]} />
          {names[family]}
        </button>
      ))}
    </div>
  );
}

type ScaleProps = Pick<ReadingView, 'unit'> & {
  /** Null where there is no choice of scale. */
  log: boolean | null;
  light: Light;
  /** The lights that there are readings for. */
  lights: Light;
  onChange: (change: Partial<ReadingView>) => void;
};

/** For which light, in which unit and on which scale readings are shown. */
export function ScaleControls({ light, lights, log, unit, onChange }: ScaleProps) {
  return (
    <span className="inline-flex items-center gap-1">
      {lights === 'ps' && (
        <select
          aria-label="Light shown"
          value={light}
          onChange={(event) => onChange({ light: asLight(event.target.value) })}
          className={quietSelect}
        >
          <option value="p">p light</option>
          <option value="s">s light</option>
          <option value="ps">p and s</option>
        </select>
      )}
      <select
        aria-label="Unit of the angles"
        value={unit}
        onChange={(event) => onChange({ unit: asUnit(event.target.value) })}
        className={quietSelect}
      >
        <option value="mdeg">mdeg</option>
        <option value="deg">deg</option>
        <option value="mrad">mrad</option>
      </select>
      {log !== null && (
        <select
          aria-label="Scale of the readings"
          value={log ? 'log' : 'linear'}
          onChange={(event) => onChange({ log: event.target.value === 'log' })}
          title="The logarithm is that of the absolute value"
          className={quietSelect}
        >
          <option value="linear">linear</option>
          <option value="log">log of abs</option>
        </select>
      )}
    </span>
  );
}

const quietSelect =
  'h-7 field-sizing-content rounded-control border border-transparent bg-transparent px-1 text-note text-muted hover:border-edge hover:text-ink';

function asLight(value: string): Light {
  return value === 's' || value === 'ps' ? value : 'p';
}

function asUnit(value: string): AngleUnit {
  return value === 'deg' || value === 'mrad' ? value : 'mdeg';
}
