import type { Relation } from '../model/curveDifference.ts';

type Props = { value: Relation; letter: string; onChange: (relation: Relation) => void };

/** Whether what is against the reference is shown as a difference or as a ratio. */
export function RelationSelect({ value, letter, onChange }: Props) {
  return (
    <select
      aria-label="Against the reference"
      value={value}
      onChange={(event) => onChange(event.target.value === 'ratio' ? 'ratio' : 'difference')}
      className="h-7 field-sizing-content rounded-box border border-line bg-panel px-1.5 text-note text-ink"
    >
      <option value="difference">difference to {letter}</option>
      <option value="ratio">ratio to {letter}</option>
    </select>
  );
}
