import { useQuery } from '@tanstack/react-query';
import { generatePath, useNavigate, useSearchParams } from 'react-router-dom';
import { designKinds } from '../../../shared/design.ts';
import type { DesignKind } from '../../../shared/design.ts';
import type { MaterialSummary } from '../../../shared/material.ts';
import { EmptyState } from '../../components/EmptyState.tsx';
import { Field } from '../../components/Field.tsx';
import { Page } from '../../components/Page.tsx';
import { QueryGate } from '../../components/QueryGate.tsx';
import { Select } from '../../components/Select.tsx';
import { Tabs } from '../../components/Tabs.tsx';
import { DesignForm } from '../../features/designs/components/DesignForm.tsx';
import { kindLabels } from '../../features/designs/model/kinds.ts';
import { materialListQuery } from '../../features/materials/api/materialList.ts';
import { GroupGate } from '../../features/session/components/GroupGate.tsx';
import { mayEdit } from '../../features/session/hooks/useSession.ts';
import { stackListQuery } from '../../features/stackList/api/stackList.ts';
import { stackQuery } from '../../features/stacks/api/stack.ts';
import { MaterialSearch } from '../../features/stacks/components/MaterialSearch.tsx';
import { paths } from '../../lib/paths.ts';

const tabs = designKinds.map((kind) => ({ value: kind, label: kindLabels[kind] }));

/** `/groups/:groupId/designs/new?kind=&stack=`: one design question about one stack. */
export function NewDesignPage() {
  return (
    <GroupGate>
      {(group) =>
        mayEdit(group) ? (
          <NewDesign key={group.groupId} groupId={group.groupId} />
        ) : (
          <Page title="New design" width="text">
            <EmptyState title="You may look, not start">
              Owners and editors of the group ask design questions.
            </EmptyState>
          </Page>
        )
      }
    </GroupGate>
  );
}

function NewDesign({ groupId }: { groupId: string }) {
  const [search, setSearch] = useSearchParams();
  const stacks = useQuery(stackListQuery(groupId));
  const library = useQuery(materialListQuery(groupId));
  const kind = designKinds.find((one) => one === search.get('kind')) ?? 'cap';
  const change = (key: 'kind' | 'stack', value: string) =>
    setSearch(
      (before) => {
        before.set(key, value);
        return before;
      },
      { replace: true },
    );
  return (
    <Page
      title="New design"
      subtitle="A question about a film, with what must hold and how far it may be off."
    >
      <Tabs label="Question" value={kind} tabs={tabs} onValueChange={(chosen) => change('kind', chosen)}>
        <div className="pt-4">
          <QueryGate query={stacks} what="stacks">
            {(data) => {
              const chosen = data.stacks.find(({ id }) => id === search.get('stack')) ?? data.stacks[0];
              if (!chosen) {
                return (
                  <EmptyState title="No stacks yet">
                    A design starts from a saved stack: make one on the page of the group.
                  </EmptyState>
                );
              }
              return (
                <>
                  <Field label="Stack" className="mb-4 max-w-lg">
                    {(control) => (
                      <Select
                        {...control}
                        value={chosen.id}
                        options={data.stacks.map(({ id, name }) => ({ value: id, label: name }))}
                        onValueChange={(id) => change('stack', id)}
                      />
                    )}
                  </Field>
                  <QueryGate query={library} what="materials">
                    {({ materials }) => (
                      <OfStack
                        key={`${kind} ${chosen.id}`}
                        kind={kind}
                        stackId={chosen.id}
                        library={materials}
                      />
                    )}
                  </QueryGate>
                </>
              );
            }}
          </QueryGate>
        </div>
      </Tabs>
    </Page>
  );
}

type OfStackProps = { kind: DesignKind; stackId: string; library: readonly MaterialSummary[] };

function OfStack({ kind, stackId, library }: OfStackProps) {
  const stack = useQuery(stackQuery(stackId));
  const navigate = useNavigate();
  return (
    <QueryGate query={stack} what="film">
      {(loaded) => (
        <DesignForm
          kind={kind}
          stack={loaded}
          library={library}
          pickMaterial={(onChoose) => (
            <MaterialSearch materials={library} chosen={undefined} onChoose={onChoose} />
          )}
          onStarted={({ id }) => void navigate(generatePath(paths.design, { designId: id }))}
        />
      )}
    </QueryGate>
  );
}
