import { useQuery } from '@tanstack/react-query';
import { Link, generatePath } from 'react-router-dom';
import type { RunResult } from '../../../../shared/resultFormat.ts';
import { readingDefinitions } from '../../../../shared/readings.ts';
import type { Run } from '../../../../shared/run.ts';
import { LoadingState } from '../../../components/LoadingState.tsx';
import { formatDateTime, formatNumber } from '../../../lib/format.ts';
import { paths } from '../../../lib/paths.ts';
import { runQuery } from '../api/run.ts';
import { runDataQuery } from '../api/runData.ts';
import { largestDifferences } from '../model/largestDifferences.ts';
import type { Difference } from '../model/largestDifferences.ts';

type Props = {
  run: Run;
  result: RunResult;
  olderId: string;
  /** A point of the result in words. */
  placeOf: (index: number) => string;
};

/** What today's solver changed against the stored answer of an older run of the same input. */
export function Comparison({ run, result, olderId, placeOf }: Props) {
  const older = useQuery(runQuery(olderId));
  const data = useQuery(runDataQuery(`/runs/${olderId}`));
  const error = older.error ?? data.error;
  return (
    <section aria-label="Difference to the stored answer" className="card px-5 py-4">
      <h2 className="text-lead">Difference to the stored answer</h2>
      {error && <p className="mt-1 text-danger">The older run cannot be read: {error.message}</p>}
      {!error && (!older.data || !data.data) && <LoadingState label="Loading the older run" rows={2} />}
      {older.data && data.data && (
        <>
          <p className="mt-0.5 text-note text-muted">
            Against{' '}
            <Link className="prose-link" to={generatePath(paths.run, { runId: olderId })}>
              the run of {formatDateTime(older.data.createdAt)}
            </Link>{' '}
            with solver {older.data.solverVersion}; this one has solver {run.solverVersion}.
            {older.data.inputSha256 === run.inputSha256
              ? ' Both have the same input.'
              : ' Their inputs differ, so the numbers may too.'}
          </p>
          <Differences differences={largestDifferences(data.data, result)} place={placeOf} />
        </>
      )}
    </section>
  );
}

type DifferencesProps = { differences: Difference[] | null; place: (index: number) => string };

function Differences({ differences, place }: DifferencesProps) {
  if (differences === null) {
    return (
      <p className="mt-2">The two runs have different points, so they cannot be compared point by point.</p>
    );
  }
  if (differences.every(({ largest, oneSided }) => largest === 0 && oneSided === 0)) {
    return <p className="mt-2 font-semibold">Every stored value is the same, to the last digit.</p>;
  }
  return (
    <table className="mt-2 text-left">
      <thead className="text-small text-muted">
        <tr>
          <th scope="col" className="pr-6 font-medium">
            Reading
          </th>
          <th scope="col" className="pr-6 text-right font-medium">
            Largest difference
          </th>
          <th scope="col" className="font-medium">
            at
          </th>
        </tr>
      </thead>
      <tbody>
        {differences.map(({ reading, largest, index, oneSided }) => (
          <tr key={reading}>
            <th scope="row" className="pr-6 font-normal">
              {readingDefinitions[reading].label}
            </th>
            <td className="pr-6 text-right font-semibold">
              {formatNumber(largest, { digits: 3 })}
              {readingDefinitions[reading].unit === 'deg' ? '°' : ''}
            </td>
            <td className="text-muted">
              {largest > 0 ? place(index) : ''}
              {oneSided > 0 ? `; ${oneSided} points have a value in one run only` : ''}
            </td>
          </tr>
        ))}
      </tbody>
    </table>
  );
}
