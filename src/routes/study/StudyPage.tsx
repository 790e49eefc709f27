import { useQuery } from '@tanstack/react-query';
import { useEffect } from 'react';
import { useParams } from 'react-router-dom';
import { ErrorState } from '../../components/ErrorState.tsx';
import { LoadingState } from '../../components/LoadingState.tsx';
import { Page } from '../../components/Page.tsx';
import { mayEdit, useMembership } from '../../features/session/hooks/useSession.ts';
import { studyQuery } from '../../features/studies/api/study.ts';
import { rememberGroup } from '../../lib/rememberedGroup.ts';
import { StudyEditorPage } from './StudyEditorPage.tsx';
import { StudyReader } from './StudyReader.tsx';

/** `/studies/:studyId`: a question, what was computed for it, and what was decided. */
export function StudyPage() {
  const { studyId = '' } = useParams();
  const study = useQuery(studyQuery(studyId));
  const groupId = study.data?.groupId;
  const editor = mayEdit(useMembership(groupId ?? ''));
  useEffect(() => {
    if (groupId !== undefined) rememberGroup(groupId);
  }, [groupId]);
  if (study.data) {
    return editor ? <StudyEditorPage key={studyId} study={study.data} /> : <StudyReader study={study.data} />;
  }
  return (
    <Page title="Study">
      {study.error ? (
        <ErrorState
          title="The study could not be opened"
          error={study.error}
          onRetry={() => void study.refetch()}
        />
      ) : (
        <LoadingState label="Opening the study" rows={8} />
      )}
    </Page>
  );
}
