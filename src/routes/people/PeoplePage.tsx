import { useQuery, useQueryClient } from '@tanstack/react-query';
import { useCallback } from 'react';
import type { Membership } from '../../../shared/account.ts';
import { Page } from '../../components/Page.tsx';
import { QueryGate } from '../../components/QueryGate.tsx';
import { groupLinkListQuery } from '../../features/links/api/groupLinkList.ts';
import { GroupLinkTable } from '../../features/links/components/GroupLinkTable.tsx';
import { memberListQuery } from '../../features/people/api/memberList.ts';
import { AddMemberForm } from '../../features/people/components/AddMemberForm.tsx';
import { MemberTable } from '../../features/people/components/MemberTable.tsx';
import { sessionQuery } from '../../features/session/api/session.ts';
import { GroupGate } from '../../features/session/components/GroupGate.tsx';
import { useSession } from '../../features/session/hooks/useSession.ts';

/** Who takes part in a group, and for owners every link that leads out of it. */
export function PeoplePage() {
  return <GroupGate>{(group) => <People key={group.groupId} group={group} />}</GroupGate>;
}

function People({ group }: { group: Membership }) {
  const { groupId } = group;
  const isOwner = group.role === 'owner';
  const session = useSession();
  const members = useQuery(memberListQuery(groupId));
  const client = useQueryClient();
  const askSessionAgain = useCallback(
    () => void client.invalidateQueries({ queryKey: sessionQuery().queryKey }),
    [client],
  );
  return (
    <Page title="People and links" subtitle={group.groupName}>
      <section aria-labelledby="people-heading" className="mb-9">
        <h2 id="people-heading" className="text-lead">
          People
        </h2>
        <p className="mb-3 max-w-prose text-note text-muted">
          Owners decide who takes part. Editors change stacks, runs and links. Viewers look at everything and
          change nothing. {isOwner ? '' : 'Ask an owner for another role.'}
        </p>
        <QueryGate query={members} what="people">
          {(data) => (
            <div className="card">
              <MemberTable
                groupId={groupId}
                members={data.members}
                userId={session?.user.id ?? ''}
                isOwner={isOwner}
                onOwnPlaceChanged={askSessionAgain}
              />
            </div>
          )}
        </QueryGate>
        {isOwner ? <AddMemberForm groupId={groupId} /> : null}
      </section>
      {isOwner ? <GroupLinks groupId={groupId} /> : null}
    </Page>
  );
}

function GroupLinks({ groupId }: { groupId: string }) {
  const links = useQuery(groupLinkListQuery(groupId));
  return (
    <section aria-labelledby="links-heading">
      <h2 id="links-heading" className="text-lead">
        Share links
      </h2>
      <p className="mb-3 max-w-prose text-note text-muted">
        Every link that opens something of this group without an account. Revoking one does not touch what it
        opens.
      </p>
      <QueryGate query={links} what="share links">
        {(data) => (
          <div className={data.links.length > 0 ? 'card' : ''}>
            <GroupLinkTable groupId={groupId} links={data.links} />
          </div>
        )}
      </QueryGate>
    </section>
  );
}
