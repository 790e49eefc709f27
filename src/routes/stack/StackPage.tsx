import { useQuery } from '@tanstack/react-query';
import { useEffect } from 'react';
import { generatePath, useNavigate, useParams } from 'react-router-dom';
import { ButtonLink } from '../../components/Button.tsx';
import { ErrorState } from '../../components/ErrorState.tsx';
import { LoadingState } from '../../components/LoadingState.tsx';
import { Page, useDocumentTitle } from '../../components/Page.tsx';
import { materialQuery } from '../../features/materials/api/material.ts';
import { materialListQuery } from '../../features/materials/api/materialList.ts';
import { KeepAsRun } from '../../features/runs/components/KeepAsRun.tsx';
import { SamplePanel } from '../../features/sample/components/SamplePanel.tsx';
import { mayEdit, useMembership } from '../../features/session/hooks/useSession.ts';
import { SignalPanels } from '../../features/signal/components/SignalPanels.tsx';
import { stackQuery } from '../../features/stacks/api/stack.ts';
import { StackWorkbench } from '../../features/stacks/components/StackWorkbench.tsx';
import { profileHeights } from '../../features/stacks/model/depthScale.ts';
import { paths } from '../../lib/paths.ts';
import { rememberGroup } from '../../lib/rememberedGroup.ts';

/** `/stacks/:stackId`: the film, its readings and the current question. */
export function StackPage() {
  const { stackId = '' } = useParams();
  const stack = useQuery(stackQuery(stackId));
  const groupId = stack.data?.groupId;
  const library = useQuery({ ...materialListQuery(groupId ?? ''), enabled: groupId !== undefined });
  const membership = useMembership(groupId);
  const navigate = useNavigate();
  useDocumentTitle(stack.data?.name ?? 'Stack');
  useEffect(() => {
    if (groupId !== undefined) rememberGroup(groupId);
  }, [groupId]);

  const error = stack.error ?? library.error;
  if (error && (!stack.data || !library.data)) {
    const retry = () => void (stack.error ? stack.refetch() : library.refetch());
    return (
      <Page title="Stack">
        <ErrorState title="The stack could not be opened" error={error} onRetry={retry} />
      </Page>
    );
  }
  if (!stack.data || !library.data) {
    return (
      <Page title="Stack">
        <LoadingState label="Opening the stack" rows={8} />
      </Page>
    );
  }
  return (
    <StackWorkbench
      key={stackId}
      stack={stack.data}
      library={library.data.materials}
      materialAt={materialQuery}
      mayEdit={mayEdit(membership)}
      onCopied={({ id }) => void navigate(generatePath(paths.stack, { stackId: id }))}
      keepButton={({ document, sweep, readings, problem }) => (
        <KeepAsRun
          body={{ groupId: stack.data.groupId, stackId, document, ...sweep, readings }}
          problem={problem}
          onKept={({ id }) =>
            void navigate(generatePath(paths.run, { runId: id }), { state: { kept: true } })
          }
        />
      )}
      samplePanel={(film) => <SamplePanel {...film} />}
      explanation={({ onPoint, ...film }) => (
        <>
          <SignalPanels
            {...film}
            heightsOf={profileHeights}
            onAzimuth={(inputAzimuthDeg) => onPoint({ inputAzimuthDeg })}
          />
          {mayEdit(membership) && (
            <ButtonLink
              className="mt-4"
              to={`${generatePath(paths.newCard, { groupId: stack.data.groupId })}?stack=${stackId}`}
              title="A page for the chamber, of the stack as it is saved"
            >
              Make a growth card
            </ButtonLink>
          )}
        </>
      )}
    />
  );
}
