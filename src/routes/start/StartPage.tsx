import { Navigate, generatePath } from 'react-router-dom';
import { EmptyState } from '../../components/EmptyState.tsx';
import { Page } from '../../components/Page.tsx';
import { useCurrentGroup } from '../../features/session/hooks/useCurrentGroup.ts';
import { paths } from '../../lib/paths.ts';

/** `/`: on to the group worked in last. */
export function StartPage() {
  const group = useCurrentGroup();
  if (group) return <Navigate to={generatePath(paths.groupHome, { groupId: group.groupId })} replace />;
  return (
    <Page title="No group" width="text">
      <EmptyState title="You are not a member of any group">
        Ask an owner of a group to add your e-mail address under “People and links”.
      </EmptyState>
    </Page>
  );
}
