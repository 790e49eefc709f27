import { Link, generatePath } from 'react-router-dom';
import type { ReadingName } from '../../../../shared/run.ts';
import { SeriesMark } from '../../../components/plot/SeriesMark.tsx';
import { paths } from '../../../lib/paths.ts';
import { lookOf } from '../model/comparedCurves.ts';
import type { ComparedRun } from '../model/comparedRun.ts';

type Props = {
  runs: readonly ComparedRun[];
  reference: ComparedRun;
  /** Whose curves are marked; null of maps, which have no line. */
  reading: ReadingName | null;
  onReference: (id: string) => void;
  onRemove: (id: string) => void;
};

/** Which curve is which run: what sets its input apart and nothing else, and which one the others are held against. */
export function CompareLegend({ runs, reference, reading, onReference, onRemove }: Props) {
  const alike = runs.every(({ slices }) => slices.every(({ phrases }) => phrases.length === 0));
  return (
    <section aria-label="Compared runs" className="card px-4 py-3">
      {alike && (
        <p className="mb-2">
          The inputs of these runs are the same; whatever differs comes from the solver (
          {[...new Set(runs.map(({ run }) => run.solverVersion))].join(', ')})
          {runs.some(({ notes }) => notes.length > 0) && ' or from how they are cut'}.
        </p>
      )}
      <ul className="flex flex-col gap-2">
        {runs.map((one) => (
          <li key={one.run.id} className="flex flex-wrap items-center gap-x-3 gap-y-1">
            {reading !== null && one.slices[0] && <SeriesMark series={lookOf(one.slices[0], reading)} />}
            <span className="w-4 font-semibold">{one.letter}</span>
            <span className="min-w-0 flex-1 basis-56">
              <span className="block font-semibold wrap-anywhere">{inputWords(one)}</span>
              {one.notes.map((note) => (
                <span key={note} className="block text-note">
                  {note}
                </span>
              ))}
              <Link className="text-note text-muted" to={generatePath(paths.run, { runId: one.run.id })}>
                {one.run.name}
              </Link>
            </span>
            <label className="flex items-center gap-1.5 text-note">
              <input
                type="radio"
                name="reference"
                checked={one === reference}
                onChange={() => onReference(one.run.id)}
                className="accent-accent"
              />
              reference<span className="sr-only"> {one.letter}</span>
            </label>
            <button
              type="button"
              onClick={() => onRemove(one.run.id)}
              className="rounded-control px-2 py-1 text-note text-accent hover:bg-accent-soft"
            >
              Take out<span className="sr-only"> {one.letter}</span>
            </button>
          </li>
        ))}
      </ul>
    </section>
  );
}

/** What all curves of a run have in common, then what each of several has of its own. */
function inputWords({ slices, phrases, members }: ComparedRun): string {
  if (slices.length < 2) return phrases.join(', ') || (slices.length === 1 ? 'same input' : 'nothing drawn');
  const curves = `${slices.length} curves (${members} ${slices.map(({ member }) => member).join(', ')})`;
  return [...phrases, curves].join(', ');
}
