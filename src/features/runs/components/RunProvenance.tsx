import type { ReactNode } from 'react';
import { Link } from 'react-router-dom';
import type { SharedRun } from '../../../../shared/run.ts';
import { formatDuration } from '../../../lib/format.ts';
import { paths } from '../../../lib/paths.ts';
import { MaterialProvenance } from './MaterialProvenance.tsx';

type Props = {
  run: Pick<
    SharedRun,
    'assumptions' | 'warnings' | 'materials' | 'solverVersion' | 'computeSeconds' | 'inputSha256'
  >;
};

/** Everything the numbers of a run or a design rest on: assumptions, warnings, the source of each constant, solver and input. */
export function RunProvenance({ run }: Props) {
  return (
    <div className="grid gap-x-8 gap-y-6 lg:grid-cols-2">
      <Part title="Assumptions">
        <ul className="list-disc space-y-1 pl-5">
          {run.assumptions.map((sentence) => (
            <li key={sentence}>{sentence}</li>
          ))}
        </ul>
        <p className="mt-2">
          <Link to={paths.conventions} className="prose-link">
            Axes, signs and definitions
          </Link>
        </p>
        {run.warnings.length > 0 && (
          <>
            <h3 className="mt-4 mb-1 font-semibold text-warn">Warnings</h3>
            <ul className="list-disc space-y-1 pl-5 text-warn">
              {run.warnings.map(({ path, message }) => (
                <li key={path + message}>
                  {path.replace(/^cases\[\d+\]\.?/, '')}: {message}
                </li>
              ))}
            </ul>
          </>
        )}
        <h3 className="mt-4 mb-1 font-semibold">Computed with</h3>
        <dl className="grid grid-cols-[auto_minmax(0,1fr)] gap-x-3 gap-y-1">
          <dt className="text-muted">Solver</dt>
          <dd>{run.solverVersion}</dd>
          {run.computeSeconds !== null && (
            <>
              <dt className="text-muted">Time</dt>
              <dd>{formatDuration(run.computeSeconds)}</dd>
            </>
          )}
          <dt className="text-muted">Input SHA-256</dt>
          <dd>
            <code className="text-small break-all select-all">{run.inputSha256}</code>
          </dd>
        </dl>
      </Part>
      <Part title="Sources of the constants">
        {run.materials.length === 0 ? (
          <p className="text-muted">Every constant was typed in; the drawing shows them.</p>
        ) : (
          <ul className="space-y-4">
            {run.materials.map((material) => (
              <li key={`${material.id} ${material.version}`}>
                <MaterialProvenance material={material} />
              </li>
            ))}
          </ul>
        )}
      </Part>
    </div>
  );
}

function Part({ title, children }: { title: string; children: ReactNode }) {
  return (
    <section aria-label={title} className="min-w-0">
      <h2 className="mb-2 text-lead">{title}</h2>
      {children}
    </section>
  );
}
