import { NumberField } from './NumberField.tsx';

type Props = {
  path: string;
  rangeNm: [number, number];
  onChange: (rangeNm: [number, number]) => void;
};

/** Between which wavelengths a model or formula holds; outside, a stack refuses it. */
export function RangeFields({ path, rangeNm: [from, to], onChange }: Props) {
  return (
    <div role="group" aria-label="Range of validity" className="flex flex-wrap gap-3">
      <NumberField
        label="Valid from"
        unit="nm"
        path={`${path}[0]`}
        step={10}
        value={from}
        onChange={(next) => onChange([next, to])}
      />
      <NumberField
        label="Valid to"
        unit="nm"
        path={`${path}[1]`}
        step={10}
        value={to}
        onChange={(next) => onChange([from, next])}
      />
    </div>
  );
}
