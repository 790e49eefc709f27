import { useQuery } from '@tanstack/react-query';
import { Plus } from 'lucide-react';
import { useState } from 'react';
import { generatePath, useNavigate } from 'react-router-dom';
import type { Membership } from '../../../shared/account.ts';
import { Button } from '../../components/Button.tsx';
import { EmptyState } from '../../components/EmptyState.tsx';
import { Page } from '../../components/Page.tsx';
import { QueryGate } from '../../components/QueryGate.tsx';
import { GroupGate } from '../../features/session/components/GroupGate.tsx';
import { mayEdit } from '../../features/session/hooks/useSession.ts';
import { studyListQuery } from '../../features/studies/api/studyList.ts';
import { NewStudyForm } from '../../features/studies/components/NewStudyForm.tsx';
import { StudyTable } from '../../features/studies/components/StudyTable.tsx';
import { paths } from '../../lib/paths.ts';

/** `/groups/:groupId/studies`: the questions of a group and what was decided. */
export function StudiesPage() {
  return <GroupGate>{(group) => <Studies key={group.groupId} group={group} />}</GroupGate>;
}

function Studies({ group }: { group: Membership }) {
  const studies = useQuery(studyListQuery(group.groupId));
  const [creating, setCreating] = useState(false);
  const navigate = useNavigate();
  const editable = mayEdit(group);
  return (
    <Page
      title="Studies"
      subtitle="A question with the runs, designs and notes that answer it, and what was decided."
      actions={
        editable && !creating ? (
          <Button
            tone="primary"
            icon={<Plus aria-hidden="true" className="size-4" />}
            onClick={() => setCreating(true)}
          >
            New study
          </Button>
        ) : null
      }
    >
      {creating && (
        <NewStudyForm
          groupId={group.groupId}
          onCancel={() => setCreating(false)}
          onCreated={(study) => void navigate(generatePath(paths.study, { studyId: study.id }))}
        />
      )}
      <QueryGate query={studies} what="studies">
        {(data) => (
          <div className={data.studies.length > 0 ? 'card' : ''}>
            <StudyTable
              studies={data.studies}
              empty={
                <EmptyState title="No studies yet">
                  {editable
                    ? 'A study begins with a question. Make the first with “New study”, or press “Pin to a study” on the page of a run.'
                    : 'Owners and editors of the group make studies; they appear here.'}
                </EmptyState>
              }
            />
          </div>
        )}
      </QueryGate>
    </Page>
  );
}
