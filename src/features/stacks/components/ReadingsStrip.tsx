import { memo } from 'react';
import type { Polarization } from '../../../../shared/stack.ts';
import { familyLooks } from '../../../components/plot/readingSeries.ts';
import { SeriesMark } from '../../../components/plot/SeriesMark.tsx';
import { ApiError } from '../../../lib/apiClient.ts';
import type { AngleUnit } from '../../../lib/format.ts';
import type { LiveReadings } from '../hooks/useReadings.ts';
import type { CeilingCell } from '../model/stripReadings.ts';
import { stripReadings } from '../model/stripReadings.ts';
import { CeilingReading } from './CeilingReading.tsx';
import { ReadingCell } from './ReadingCell.tsx';

type Props = {
  live: LiveReadings;
  input: Polarization;
  transverse: boolean;
  unit: AngleUnit;
  ceiling: CeilingCell | null;
  /** Said in place of the cross-polarized amplitude where there is none. */
  averaged: boolean;
};

/** The readings at the working point, large for the input light. */
export const ReadingsStrip = memo(function ReadingsStrip(props: Props) {
  const { live, input, transverse, unit, ceiling, averaged } = props;
  const cells = stripReadings(live.readings, input, transverse, unit);
  const spoken = cells.map(({ label, value, unit: own }) => `${label} ${value ?? 'none'} ${own}`).join(', ');
  return (
    <section aria-label="Readings at the working point">
      <div className="card grid grid-cols-1 overflow-hidden sm:grid-cols-5" aria-busy={live.pending}>
        {cells.map((cell) => (
          <ReadingCell
            key={cell.family}
            {...cell}
            {...(averaged && cell.family === 'cross' ? { other: 'intensities are averaged' } : {})}
            mark={
              cell.family === 'rotation' || cell.family === 'ellipticity' ? (
                <SeriesMark series={familyLooks[cell.family]} />
              ) : null
            }
            pending={live.pending || live.error !== null}
          />
        ))}
        <CeilingReading ceiling={ceiling} pending={live.pending || live.error !== null} />
      </div>
      <p className="sr-only" role="status">
        {live.pending || live.error ? '' : spoken}
      </p>
      {live.error && <SolveProblem error={live.error} />}
      {live.warnings.length > 0 && (
        <ul className="mt-2 text-note text-warn">
          {live.warnings.map(({ path, message }) => (
            <li key={path + message}>
              {path.replace(/^cases\[\d+\]\.?/, '')}: {message}
            </li>
          ))}
        </ul>
      )}
    </section>
  );
});

/** Why there is no new number. Issues at a layer are shown at that layer, so one line is enough here. */
export function SolveProblem({ error }: { error: Error }) {
  const issues = error instanceof ApiError ? error.issues : [];
  const first = issues[0];
  const text = first
    ? `${first.path.replace(/^(cases\[\d+\]|document)\.?/, '')}: ${first.message}`
    : error.message;
  const more = new Set(issues.map(({ message }) => message)).size - 1;
  return (
    <p role="alert" className="mt-2 rounded-control bg-danger-soft px-3 py-1.5 text-note text-danger">
      {text}
      {more > 0 ? ` (and ${more} more, marked on the drawing)` : ''}
    </p>
  );
}
