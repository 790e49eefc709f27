import { useMemo, useState } from 'react';
import { Link } from 'react-router-dom';
import { readingDefinitions } from '../../../../shared/readings.ts';
import type { StackDocument, WorkingPoint } from '../../../../shared/stack.ts';
import type { AngleUnit } from '../../../lib/format.ts';
import { paths } from '../../../lib/paths.ts';
import { useSolved } from '../hooks/useSolved.ts';
import type { DescribeMedium } from '../model/filmLayers.ts';
import { magneticStates, stepRequest, stepRows } from '../model/magneticStates.ts';
import { printReading } from '../model/moreReadings.ts';

type Props = {
  document: StackDocument;
  /** Whether the film on the page has gone on since. */
  stale: boolean;
  point: WorkingPoint;
  describe: DescribeMedium;
  unit: AngleUnit;
};

/** The step that a loop shows between two magnetization states of the film, such as one layer switched. */
export function StateStep({ document, stale, point, describe, unit }: Props) {
  const states = useMemo(() => magneticStates(document, describe), [document, describe]);
  const [a, setA] = useState('drawn');
  const [b, setB] = useState('reversed');
  const known = (id: string, other: string) => (states.some((state) => state.id === id) ? id : other);
  const [from, to] = [known(a, 'drawn'), known(b, 'reversed')];
  const request = useMemo(() => stepRequest(document, point, from, to), [document, point, from, to]);
  const { response, pending: unanswered, error } = useSolved(request);
  const pending = stale || unanswered;
  const rows = response ? stepRows(response) : [];
  const choice = (label: string, value: string, onChange: (id: string) => void) => (
    <label className="inline-flex items-center gap-1.5 text-note text-muted">
      {label}
      <select
        value={value}
        onChange={(event) => onChange(event.target.value)}
        className="h-7 max-w-64 field-sizing-content rounded-box border border-line bg-panel px-1.5 text-ink"
      >
        {states.map(({ id, label: name }) => (
          <option key={id} value={id}>
            {name}
          </option>
        ))}
      </select>
    </label>
  );
  return (
    <div>
      <div className="flex flex-wrap items-center gap-x-4 gap-y-1.5">
        {choice('from A', from, setA)}
        {choice('to B', to, setB)}
      </div>
      {error ? (
        <p className="mt-2 text-note text-danger">{error.message}</p>
      ) : (
        <table className={`mt-2 w-full max-w-xl text-left text-note ${pending ? 'opacity-55' : ''}`}>
          <caption className="sr-only">Readings in both states and the step from A to B</caption>
          <thead className="text-small text-muted">
            <tr>
              <th scope="col" className="font-medium">
                <span className="sr-only">Reading</span>
              </th>
              {['A', 'B', 'step B − A'].map((name) => (
                <th key={name} scope="col" className="pl-3 text-right font-medium">
                  {name}
                </th>
              ))}
            </tr>
          </thead>
          <tbody>
            {rows.map(({ reading, a: first, b: second, step }) => (
              <tr key={reading} className="border-t border-line">
                <th scope="row" className="py-1 font-normal">
                  <Link
                    className="no-underline hover:text-accent"
                    to={`${paths.conventions}#${readingDefinitions[reading].anchor}`}
                  >
                    {readingDefinitions[reading].label}
                  </Link>
                </th>
                {[first, second, step].map((value, index) => (
                  <td
                    key={index}
                    className={`py-1 pl-3 text-right whitespace-nowrap ${index === 2 ? 'font-semibold' : ''}`}
                  >
                    {printReading(reading, value, unit) ?? '–'}
                  </td>
                ))}
              </tr>
            ))}
          </tbody>
        </table>
      )}
    </div>
  );
}
