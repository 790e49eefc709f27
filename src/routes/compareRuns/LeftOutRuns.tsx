import { Link, generatePath } from 'react-router-dom';
import { paths } from '../../lib/paths.ts';

type LeftOut = { id: string; name: string | null; why: string };
type Props = { runs: readonly LeftOut[]; onRemove: (id: string) => void };

/** Runs that were asked for and are not drawn, each with the reason. */
export function LeftOutRuns({ runs, onRemove }: Props) {
  if (runs.length === 0) return null;
  return (
    <section aria-label="Runs that are left out" className="rounded-control bg-warn-soft px-4 py-3">
      <h2 className="mb-1 font-semibold">Left out</h2>
      <ul className="flex flex-col gap-1.5">
        {runs.map(({ id, name, why }) => (
          <li key={id}>
            <Link className="prose-link" to={generatePath(paths.run, { runId: id })}>
              {name ?? `Run ${id}`}
            </Link>
            : {why}{' '}
            <button type="button" className="prose-link" onClick={() => onRemove(id)}>
              Take it out<span className="sr-only"> ({name ?? id})</span>
            </button>
          </li>
        ))}
      </ul>
    </section>
  );
}
