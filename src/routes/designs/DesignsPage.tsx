import { useQuery } from '@tanstack/react-query';
import { Plus } from 'lucide-react';
import { useCallback } from 'react';
import { generatePath } from 'react-router-dom';
import type { Membership } from '../../../shared/account.ts';
import type { DesignSummary } from '../../../shared/design.ts';
import { ButtonLink } from '../../components/Button.tsx';
import { EmptyState } from '../../components/EmptyState.tsx';
import { useNotify } from '../../components/Notices.tsx';
import { Page } from '../../components/Page.tsx';
import { QueryGate } from '../../components/QueryGate.tsx';
import { useCancelDesign } from '../../features/designs/api/changeDesign.ts';
import { designListQuery } from '../../features/designs/api/designList.ts';
import { DesignTable } from '../../features/designs/components/DesignTable.tsx';
import { RunStateCell } from '../../features/runList/components/RunStateCell.tsx';
import { GroupGate } from '../../features/session/components/GroupGate.tsx';
import { mayEdit } from '../../features/session/hooks/useSession.ts';
import { paths } from '../../lib/paths.ts';

/** `/groups/:groupId/designs`: the design questions of a group. */
export function DesignsPage() {
  return <GroupGate>{(group) => <Designs key={group.groupId} group={group} />}</GroupGate>;
}

function Designs({ group }: { group: Membership }) {
  const { groupId } = group;
  const editable = mayEdit(group);
  const designs = useQuery(designListQuery(groupId));
  const { mutate: cancel, isPending, variables } = useCancelDesign(groupId);
  const notify = useNotify();
  const stateOf = useCallback(
    (design: DesignSummary) => (
      <RunStateCell
        run={design}
        noun="films"
        cancelling={isPending && variables === design.id}
        onCancel={
          editable
            ? () =>
                cancel(design.id, { onError: (error) => notify.problem(`Not cancelled: ${error.message}`) })
            : undefined
        }
      />
    ),
    [editable, cancel, isPending, variables, notify],
  );
  return (
    <Page
      title="Designs"
      subtitle="Which cap, which thicknesses, how far the film may be off: questions with their answers."
      actions={
        editable && (
          <ButtonLink
            to={generatePath(paths.newDesign, { groupId })}
            tone="primary"
            icon={<Plus aria-hidden="true" className="size-4" />}
          >
            New design
          </ButtonLink>
        )
      }
    >
      <QueryGate query={designs} what="designs">
        {(data) => (
          <div className={data.designs.length > 0 ? 'card' : ''}>
            <DesignTable
              designs={data.designs}
              stateOf={stateOf}
              empty={
                <EmptyState title="No designs yet">
                  {editable
                    ? 'Choose a cap, search the best thicknesses or see what errors of growth do: press “New design”.'
                    : 'Owners and editors of the group ask design questions; they appear here.'}
                </EmptyState>
              }
            />
          </div>
        )}
      </QueryGate>
    </Page>
  );
}
