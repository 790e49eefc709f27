import { useQuery } from '@tanstack/react-query';
import { Plus, Users } from 'lucide-react';
import { useState } from 'react';
import { Link, generatePath, useNavigate } from 'react-router-dom';
import type { Membership } from '../../../shared/account.ts';
import { Button, ButtonLink } from '../../components/Button.tsx';
import { EmptyState } from '../../components/EmptyState.tsx';
import { Page } from '../../components/Page.tsx';
import { QueryGate } from '../../components/QueryGate.tsx';
import { cardListQuery } from '../../features/cards/api/cards.ts';
import { CardTable } from '../../features/cards/components/CardTable.tsx';
import { materialListQuery } from '../../features/materials/api/materialList.ts';
import { runListQuery } from '../../features/runList/api/runList.ts';
import { RunTable } from '../../features/runList/components/RunTable.tsx';
import { GroupGate } from '../../features/session/components/GroupGate.tsx';
import { mayEdit } from '../../features/session/hooks/useSession.ts';
import { stackListQuery } from '../../features/stackList/api/stackList.ts';
import { NewStackForm } from '../../features/stackList/components/NewStackForm.tsx';
import { StackTable } from '../../features/stackList/components/StackTable.tsx';
import { paths } from '../../lib/paths.ts';

const runsShown = 6;
const none: never[] = [];

/** The stacks of a group and its newest runs. */
export function GroupHomePage() {
  // The key gives each group a page of its own: an open form does not follow into another group.
  return <GroupGate>{(group) => <GroupHome key={group.groupId} group={group} />}</GroupGate>;
}

function GroupHome({ group }: { group: Membership }) {
  const { groupId } = group;
  const editable = mayEdit(group);
  const navigate = useNavigate();
  const [creating, setCreating] = useState(false);
  const stacks = useQuery(stackListQuery(groupId));
  const materials = useQuery(materialListQuery(groupId));
  const library = materials.data?.materials ?? none;

  return (
    <Page
      title={group.groupName}
      subtitle={<GroupLine group={group} />}
      actions={
        <>
          <ButtonLink
            to={generatePath(paths.people, { groupId })}
            icon={<Users aria-hidden="true" className="size-4" />}
          >
            People and links
          </ButtonLink>
          {editable && !creating ? (
            <Button
              tone="primary"
              icon={<Plus aria-hidden="true" className="size-4" />}
              onClick={() => setCreating(true)}
            >
              New stack
            </Button>
          ) : null}
        </>
      }
    >
      {creating ? (
        <NewStackForm
          groupId={groupId}
          materials={library}
          onCancel={() => setCreating(false)}
          onCreated={(stack) => void navigate(generatePath(paths.stack, { stackId: stack.id }))}
        />
      ) : null}
      <section aria-labelledby="stacks-heading" className="mb-8">
        <h2 id="stacks-heading" className="mb-2 text-lead">
          Stacks
        </h2>
        <QueryGate query={stacks} what="stacks">
          {(data) => (
            <div className={data.stacks.length > 0 ? 'card' : ''}>
              <StackTable
                groupId={groupId}
                stacks={data.stacks}
                materials={library}
                mayEdit={editable}
                empty={
                  <EmptyState title="No stacks yet">
                    {editable
                      ? 'A stack is a film on its substrate, layer by layer. Make the first with “New stack”.'
                      : 'Owners and editors of the group make stacks; they appear here.'}
                  </EmptyState>
                }
              />
            </div>
          )}
        </QueryGate>
      </section>
      <NewestRuns groupId={groupId} editable={editable} />
      <Cards groupId={groupId} />
    </Page>
  );
}

function GroupLine({ group }: { group: Membership }) {
  const kind = group.isDemo
    ? 'Demo group of invented people. '
    : group.isPersonal
      ? 'Your personal group. '
      : '';
  const may = {
    owner: 'You are an owner: you may change everything and decide who takes part.',
    editor: 'You are an editor: you may change stacks, runs and links.',
    viewer: 'You are a viewer: you may look at everything and change nothing.',
  }[group.role];
  return kind + may;
}

function NewestRuns({ groupId, editable }: { groupId: string; editable: boolean }) {
  const runs = useQuery(runListQuery(groupId));
  const all = runs.data?.runs ?? none;
  return (
    <section aria-labelledby="runs-heading">
      <div className="mb-2 flex items-baseline justify-between gap-4">
        <h2 id="runs-heading" className="text-lead">
          Newest runs
        </h2>
        {all.length > runsShown ? (
          <Link to={generatePath(paths.runs, { groupId })} className="prose-link">
            All {all.length} runs
          </Link>
        ) : null}
      </div>
      <QueryGate query={runs} what="runs">
        {(data) => (
          <div className={data.runs.length > 0 ? 'card' : ''}>
            <RunTable
              groupId={groupId}
              runs={data.runs.slice(0, runsShown)}
              mayEdit={editable}
              empty={
                <EmptyState title="No runs yet">
                  A run is a sweep that is kept: open a stack, choose what to sweep, and press “Keep as run”.
                </EmptyState>
              }
            />
          </div>
        )}
      </QueryGate>
    </section>
  );
}

/** Growth cards, once there are some: a card is made from a stack or a design. */
function Cards({ groupId }: { groupId: string }) {
  const { data } = useQuery(cardListQuery(groupId));
  if (!data || data.cards.length === 0) return null;
  return (
    <section aria-labelledby="cards-heading" className="mt-8">
      <h2 id="cards-heading" className="mb-2 text-lead">
        Growth cards
      </h2>
      <div className="card">
        <CardTable cards={data.cards} />
      </div>
    </section>
  );
}
