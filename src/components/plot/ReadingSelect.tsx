import { readingDefinitions } from '../../../shared/readings.ts';
import type { ReadingName } from '../../../shared/run.ts';

type Props = {
  readings: readonly ReadingName[];
  value: ReadingName;
  onChange: (reading: ReadingName) => void;
};

/** Which one reading a map or a family shows. */
export function ReadingSelect({ readings, value, onChange }: Props) {
  return (
    <select
      aria-label="Reading shown"
      value={value}
      onChange={(event) => {
        const chosen = readings.find((one) => one === event.target.value);
        if (chosen) onChange(chosen);
      }}
      className="h-7 max-w-full field-sizing-content rounded-box border border-line bg-panel px-1.5 text-note text-ink"
    >
      {readings.map((name) => (
        <option key={name} value={name}>
          {readingDefinitions[name].label}
        </option>
      ))}
    </select>
  );
}
