import { TriangleAlert } from 'lucide-react';
import type { ReactNode } from 'react';
import type { MaterialSource } from '../../../../shared/materialSource.ts';
import { formatRange } from '../../../lib/format.ts';
import { ConfidenceMark } from './ConfidenceMark.tsx';

type Props = { what: string; range: readonly [number, number]; source: MaterialSource };

/** Everything that is known of where a constant comes from; what the source does not say is left out. */
export function SourceFacts({ what, range, source }: Props) {
  const { citation, doi, sample, temperature, method, licence, caution, confidence } = source;
  return (
    <section aria-label={what} className="mt-1.5 text-note wrap-anywhere">
      <p className="flex flex-wrap items-baseline gap-x-2 gap-y-0.5">
        <span>
          {what}, {formatRange(range, 'nm')}
        </span>
        <ConfidenceMark of={confidence} />
      </p>
      {caution && (
        <p className="text-warn">
          <TriangleAlert aria-hidden="true" className="mr-1 inline size-3 align-[-1px]" />
          {caution}
        </p>
      )}
      <dl className="grid grid-cols-[auto_minmax(0,1fr)] gap-x-3">
        <Fact name="Source">
          {citation}
          {doi && (
            <>
              {' '}
              <a className="prose-link" href={`https://doi.org/${doi}`} rel="noreferrer" target="_blank">
                doi:{doi}
              </a>
            </>
          )}
        </Fact>
        <Fact name="Sample">{sample}</Fact>
        <Fact name="Temperature">{temperature}</Fact>
        <Fact name="Method">{method}</Fact>
        <Fact name="Licence">{licence}</Fact>
      </dl>
    </section>
  );
}

function Fact({ name, children }: { name: string; children: ReactNode }) {
  if (!children) return null;
  return (
    <>
      <dt className="text-muted">{name}</dt>
      <dd>{children}</dd>
    </>
  );
}
