import { generatePath, useNavigate, useSearchParams } from 'react-router-dom';
import type { Design } from '../../../shared/design.ts';
import { Button, ButtonLink } from '../../components/Button.tsx';
import { ErrorState } from '../../components/ErrorState.tsx';
import { LoadingState } from '../../components/LoadingState.tsx';
import { useNotify } from '../../components/Notices.tsx';
import { DesignResultView } from '../../features/designs/components/DesignResultView.tsx';
import type { FoundFilm } from '../../features/designs/components/OptimiseResultView.tsx';
import { useCreateStack } from '../../features/stackList/api/createStack.ts';
import { paths } from '../../lib/paths.ts';
import type { DesignAnswer as Answer } from './useDesignAnswer.ts';

type Props = { design: Design; answer: Answer; mayEdit: boolean };

/** The answer of a design that is done; of a search that is not, what it has found. */
export function DesignAnswer({ design, answer: { shown, error, retry }, mayEdit }: Props) {
  const { state } = design.progress;
  const [search, setSearch] = useSearchParams();
  const done = state === 'done';
  if (!shown) {
    if (!done) return null;
    return error ? (
      <ErrorState title="The answer could not be loaded" error={error} onRetry={retry} />
    ) : (
      <LoadingState label="Loading the answer" rows={8} />
    );
  }
  return (
    <div className={done ? '' : 'mt-5'}>
      {!done && (
        <h2 className="mb-3 text-lead">
          {state === 'running' ? 'Found so far' : 'Found before it was stopped'}
        </h2>
      )}
      <DesignResultView
        input={design.input}
        result={shown}
        materials={design.materials}
        search={search}
        onSearch={(next) => setSearch(next, { replace: true, preventScrollReset: true })}
        running={state === 'running'}
        {...(mayEdit && state !== 'running'
          ? {
              capActions: (candidateId: string) => (
                <CardLink design={design} film={{ candidate: candidateId }} />
              ),
              filmActions: (film: FoundFilm) => (
                <div className="flex flex-wrap gap-2">
                  {done && (
                    <CardLink
                      design={design}
                      film={film.member === null ? {} : { member: String(film.member) }}
                    />
                  )}
                  <MakeStack design={design} film={film} />
                </div>
              ),
            }
          : {})}
      />
    </div>
  );
}

function CardLink({ design: { id, groupId }, film }: { design: Design; film: Record<string, string> }) {
  const query = new URLSearchParams({ design: id, ...film });
  return (
    <ButtonLink className="py-1!" to={`${generatePath(paths.newCard, { groupId })}?${query.toString()}`}>
      Growth card
    </ButtonLink>
  );
}

/** A film that the search has found becomes a stack of the group. */
function MakeStack({ design, film }: { design: Design; film: FoundFilm }) {
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
            description: `Found by the design “${design.name}”: ${film.name}.`,
            // The readings of the new stack stand where the search looked.
            document: {
              ...film.document,
              workingPoint: design.input.points[0]?.workingPoint ?? film.document.workingPoint,
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
