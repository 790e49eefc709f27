import type { ReactNode } from 'react';
import { useParams } from 'react-router-dom';
import type { Membership } from '../../../../shared/account.ts';
import { ErrorState } from '../../../components/ErrorState.tsx';
import { Page } from '../../../components/Page.tsx';
import { ApiError } from '../../../lib/apiClient.ts';
import { useMembership } from '../hooks/useSession.ts';

/** The group that the address names, if the person is in it; the same answer for no such group and somebody else's. */
export function GroupGate({ children }: { children: (group: Membership) => ReactNode }) {
  const { groupId } = useParams();
  const group = useMembership(groupId);
  if (group) return children(group);
  return (
    <Page title="No such group" width="text">
      <ErrorState
        error={new ApiError(404, 'not-found', 'There is no group with this address among yours.')}
      />
    </Page>
  );
}
