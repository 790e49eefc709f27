import { useQuery } from '@tanstack/react-query';
import { useSearchParams } from 'react-router-dom';
import type { SharedDesign } from '../../../shared/design.ts';
import { ErrorState } from '../../components/ErrorState.tsx';
import { LoadingState } from '../../components/LoadingState.tsx';
import { Page } from '../../components/Page.tsx';
import { designResultQuery } from '../../features/designs/api/designResult.ts';
import { DesignResultView } from '../../features/designs/components/DesignResultView.tsx';
import { RunProvenance } from '../../features/runs/components/RunProvenance.tsx';
import { sharedPath } from '../../features/sharing/api/sharedRun.ts';
import { formatDateTime } from '../../lib/format.ts';
import { DesignFiles } from './DesignFiles.tsx';
import { OpenFilm, SignInToOpen } from './OpenFilm.tsx';

const kindWords = { cap: 'cap chooser', optimise: 'optimisation', tolerance: 'tolerance' } as const;

/** A shared design: its answer and everything it rests on. */
export function OpenDesign({ token, design }: { token: string; design: SharedDesign }) {
  const [search, setSearch] = useSearchParams();
  const path = sharedPath(token);
  const result = useQuery(designResultQuery(path));
  return (
    <Page
      title={design.name}
      subtitle={`Shared design (${kindWords[design.kind]})${design.finishedAt ? `, computed ${formatDateTime(design.finishedAt)}` : ''}. It stays as it was, whatever happens to the stack.`}
      actions={<OpenFilm token={token} />}
    >
      {result.data ? (
        <DesignResultView
          input={design.input}
          result={result.data}
          materials={design.materials}
          search={search}
          onSearch={(next) => setSearch(next, { replace: true, preventScrollReset: true })}
        />
      ) : result.error ? (
        <ErrorState
          title="The result could not be loaded"
          error={result.error}
          onRetry={() => void result.refetch()}
        />
      ) : (
        <LoadingState label="Loading the result" rows={8} />
      )}
      <div className="mt-6 flex flex-col gap-6 border-t border-line pt-5">
        <RunProvenance run={design} />
        <DesignFiles path={path} />
        <SignInToOpen token={token} />
      </div>
    </Page>
  );
}
