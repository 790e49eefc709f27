import { useQuery } from '@tanstack/react-query';
import { useEffect } from 'react';
import { generatePath, useNavigate, useParams, useSearchParams } from 'react-router-dom';
import type { Design } from '../../../shared/design.ts';
import { Button } from '../../components/Button.tsx';
import { ErrorState } from '../../components/ErrorState.tsx';
import { LoadingState } from '../../components/LoadingState.tsx';
import { Page } from '../../components/Page.tsx';
import { useRerunDesign } from '../../features/designs/api/changeDesign.ts';
import { designQuery } from '../../features/designs/api/design.ts';
import { DeleteDesign } from '../../features/designs/components/DeleteDesign.tsx';
import { DesignState } from '../../features/designs/components/DesignState.tsx';
import { useDesignProgress } from '../../features/designs/hooks/useDesignProgress.ts';
import { RunDownloads } from '../../features/runs/components/RunDownloads.tsx';
import { RunProvenance } from '../../features/runs/components/RunProvenance.tsx';
import { mayEdit, useMembership } from '../../features/session/hooks/useSession.ts';
import { SharePanel } from '../../features/sharing/components/SharePanel.tsx';
import { PinToStudy } from '../../features/studies/components/PinToStudy.tsx';
import { paths } from '../../lib/paths.ts';
import { rememberGroup } from '../../lib/rememberedGroup.ts';
import { DesignAnswer } from './DesignAnswer.tsx';
import { DesignLine } from './DesignLine.tsx';
import { useDesignAnswer } from './useDesignAnswer.ts';

/** `/designs/:designId`: progress while it runs, then the answer and everything it rests on. */
export function DesignPage() {
  const { designId = '' } = useParams();
  const design = useQuery(designQuery(designId));
  useDesignProgress(design.data);
  const groupId = design.data?.groupId;
  useEffect(() => {
    if (groupId !== undefined) rememberGroup(groupId);
  }, [groupId]);

  if (design.data) return <LoadedDesign key={designId} design={design.data} />;
  return (
    <Page title="Design">
      {design.error ? (
        <ErrorState
          title="The design could not be opened"
          error={design.error}
          onRetry={() => void design.refetch()}
        />
      ) : (
        <LoadingState label="Opening the design" rows={8} />
      )}
    </Page>
  );
}

function LoadedDesign({ design }: { design: Design }) {
  const editor = mayEdit(useMembership(design.groupId));
  const navigate = useNavigate();
  const [search] = useSearchParams();
  const rerun = useRerunDesign(design);
  const answer = useDesignAnswer(design);
  const done = design.progress.state === 'done';
  const path = `/designs/${design.id}`;
  const startRerun = () =>
    rerun.mutate(undefined, {
      onSuccess: ({ id }) => void navigate(generatePath(paths.design, { designId: id })),
    });
  return (
    <Page
      title={design.name}
      subtitle={<DesignLine design={design} />}
      actions={
        editor && (
          <>
            {done && (
              <>
                <PinToStudy
                  groupId={design.groupId}
                  pinned={{ kind: 'design', designId: design.id }}
                  view={search.toString()}
                  name={design.name}
                />
                <Button busy={rerun.isPending} onClick={startRerun} title="Compute the same question again">
                  Rerun with today’s solver
                </Button>
              </>
            )}
            <DeleteDesign
              design={design}
              onDeleted={() => void navigate(generatePath(paths.designs, { groupId: design.groupId }))}
            />
          </>
        )
      }
    >
      {rerun.error && (
        <p role="alert" className="mb-3 text-danger">
          Not started: {rerun.error.message}
        </p>
      )}
      {!done && (
        <DesignState
          design={design}
          mayEdit={editor}
          kept={answer.kept}
          onRerun={startRerun}
          rerunning={rerun.isPending}
        />
      )}
      <DesignAnswer design={design} answer={answer} mayEdit={editor} />
      <div className="mt-8 flex flex-col gap-7 border-t border-line pt-5">
        <RunProvenance run={design} />
        <div className="grid grid-cols-1 gap-7 lg:grid-cols-2">
          {done && <RunDownloads path={path} valuesFile="result.csv" hasData />}
          {editor && done && <SharePanel subject={{ opens: 'design', id: design.id }} />}
        </div>
      </div>
    </Page>
  );
}
