import { useQuery } from '@tanstack/react-query';
import { generatePath, useNavigate, useSearchParams } from 'react-router-dom';
import type { Design } from '../../../shared/design.ts';
import type { StackDocument } from '../../../shared/stack.ts';
import { Button, ButtonLink } from '../../components/Button.tsx';
import { ErrorState } from '../../components/ErrorState.tsx';
import { LoadingState } from '../../components/LoadingState.tsx';
import { useNotify } from '../../components/Notices.tsx';
import { designResultQuery, partialDesignResultQuery } from '../../features/designs/api/designResult.ts';
import { DesignResultView } from '../../features/designs/components/DesignResultView.tsx';
import { useCreateStack } from '../../features/stackList/api/createStack.ts';
import { paths } from '../../lib/paths.ts';

type Props = { design: Design; mayEdit: boolean };

/** The answer of a design that is done; of a search under way what it has found so far. */
export function DesignAnswer({ design, mayEdit }: Props) {
  const { state } = design.progress;
  const path = `/designs/${design.id}`;
  const [search, setSearch] = useSearchParams();
  const done = state === 'done';
  // Before the first films are solved there is nothing to ask for.
  const searching = state === 'running' && design.kind === 'optimise' && design.progress.done > 0;
  const result = useQuery({ ...designResultQuery(path), enabled: done });
  const partial = useQuery({ ...partialDesignResultQuery(path), enabled: searching });
  const shown = done ? result.data : searching ? partial.data : undefined;
  if (!shown) {
    if (!done) return null;
    return result.error ? (
      <ErrorState
        title="The answer could not be loaded"
        error={result.error}
        onRetry={() => void result.refetch()}
      />
    ) : (
      <LoadingState label="Loading the answer" rows={8} />
    );
  }
  return (
    <div className={done ? '' : 'mt-5'}>
      <DesignResultView
        input={design.input}
        result={shown}
        materials={design.materials}
        search={search}
        onSearch={(next) => setSearch(next, { replace: true, preventScrollReset: true })}
        {...(mayEdit && done
          ? {
              capActions: (candidateId: string) => <CardLink design={design} candidateId={candidateId} />,
              filmActions: (document: StackDocument) => <MakeStack design={design} document={document} />,
            }
          : {})}
      />
    </div>
  );
}

function CardLink({ design: { id, groupId }, candidateId }: { design: Design; candidateId: string }) {
  const query = new URLSearchParams({ design: id, candidate: candidateId });
  return (
    <ButtonLink className="py-1!" to={`${generatePath(paths.newCard, { groupId })}?${query.toString()}`}>
      Growth card
    </ButtonLink>
  );
}

/** A film that the search has found becomes a stack of the group. */
function MakeStack({ design, document }: { design: Design; document: StackDocument }) {
  const create = useCreateStack(design.groupId);
  const navigate = useNavigate();
  const notify = useNotify();
  return (
    <Button
      tone="primary"
      busy={create.isPending || create.isSuccess}
      onClick={() =>
        create.mutate(
          {
            name: `${design.stackName ?? 'Film'}, optimised`.slice(0, 120),
            description: `Found by the design “${design.name}”.`,
            // The readings of the new stack stand where the search looked.
            document: {
              ...document,
              workingPoint: design.input.points[0]?.workingPoint ?? document.workingPoint,
            },
          },
          {
            onSuccess: ({ id }) => void navigate(generatePath(paths.stack, { stackId: id })),
            onError: (error) => notify.problem(`The stack was not made: ${error.message}`),
          },
        )
      }
    >
      Make a stack of it
    </Button>
  );
}
