import { useQuery } from '@tanstack/react-query';
import { useMemo } from 'react';
import { Link } from 'react-router-dom';
import type { SharedDesign } from '../../../shared/design.ts';
import { ErrorState } from '../../components/ErrorState.tsx';
import { LoadingState } from '../../components/LoadingState.tsx';
import { designResultQuery } from '../../features/designs/api/designResult.ts';
import { DesignResultView } from '../../features/designs/components/DesignResultView.tsx';
import { useInView } from '../../lib/useInView.ts';

type Props = {
  design: Pick<SharedDesign, 'name' | 'input' | 'materials'>;
  /** Where its result is: `/designs/…` or below `/shared/…`. */
  dataPath: string;
  /** The part of the design page's address after `?` when it was pinned. */
  view: string;
  /** The design's page with that view; null where the reader cannot open it. */
  href: string | null;
};

/** The answer of a design as it was pinned. */
export function PinnedDesign({ design, dataPath, view, href }: Props) {
  const search = useMemo(() => new URLSearchParams(view), [view]);
  const [target, seen] = useInView<HTMLDivElement>();
  const result = useQuery({ ...designResultQuery(dataPath), enabled: seen });
  return (
    <div ref={target}>
      <h3 className="mb-2 font-semibold">
        {href === null ? (
          design.name
        ) : (
          <Link className="text-ink no-underline hover:text-accent hover:underline" to={href}>
            {design.name}
          </Link>
        )}
      </h3>
      {result.data ? (
        <DesignResultView
          input={design.input}
          result={result.data}
          materials={design.materials}
          search={search}
        />
      ) : result.error ? (
        <ErrorState
          title="The result could not be loaded"
          error={result.error}
          onRetry={() => void result.refetch()}
        />
      ) : (
        <LoadingState label="Loading the result" rows={6} />
      )}
    </div>
  );
}
