import { TriangleAlert } from 'lucide-react';
import type { ReactNode } from 'react';
import type { MaterialSource } from '../../../../shared/materialSource.ts';

/** Where a constant comes from and how far it can be trusted. */
export function SourceList({ source }: { source: MaterialSource }) {
  return (
    <div className="flex flex-col gap-3">
      {source.caution ? (
        <p className="flex gap-2 rounded-control bg-warn-soft px-3 py-2 text-warn">
          <TriangleAlert aria-hidden="true" className="mt-0.5 size-4 shrink-0" />
          {source.caution}
        </p>
      ) : null}
      <dl className="grid grid-cols-[auto_1fr] gap-x-4 gap-y-1.5">
        <Entry name="Source">
          {source.citation}
          {source.doi ? (
            <>
              {' '}
              <a
                href={`https://doi.org/${source.doi}`}
                target="_blank"
                rel="noreferrer"
                className="prose-link wrap-anywhere"
              >
                doi:{source.doi}
              </a>
            </>
          ) : null}
        </Entry>
        <Entry name="Confidence">{source.confidence}</Entry>
        <Entry name="Sample">{source.sample}</Entry>
        <Entry name="Temperature">{source.temperature ?? null}</Entry>
        <Entry name="Method">{source.method}</Entry>
        <Entry name="Licence">{source.licence}</Entry>
      </dl>
    </div>
  );
}

function Entry({ name, children }: { name: string; children: ReactNode }) {
  if (children === null) return null;
  return (
    <>
      <dt className="text-muted">{name}</dt>
      <dd className="min-w-0">{children}</dd>
    </>
  );
}
