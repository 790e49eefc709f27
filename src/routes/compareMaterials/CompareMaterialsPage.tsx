import { useQuery } from '@tanstack/react-query';
import { ArrowLeftRight } from 'lucide-react';
import { useSearchParams } from 'react-router-dom';
import type { Membership } from '../../../shared/account.ts';
import type { MaterialSummary } from '../../../shared/material.ts';
import { IconButton } from '../../components/Button.tsx';
import { EmptyState } from '../../components/EmptyState.tsx';
import { Page } from '../../components/Page.tsx';
import { QueryGate } from '../../components/QueryGate.tsx';
import { materialQuery } from '../../features/materials/api/material.ts';
import { materialListQuery } from '../../features/materials/api/materialList.ts';
import { CompareCard } from '../../features/materials/components/CompareCard.tsx';
import { CompareChooser } from '../../features/materials/components/CompareChooser.tsx';
import { ComparedMaterial } from '../../features/materials/components/ComparedMaterial.tsx';
import { GroupGate } from '../../features/session/components/GroupGate.tsx';
import { readCompared, writeCompared } from './comparedSearch.ts';
import { StackEffect } from './StackEffect.tsx';

/** `/groups/:groupId/materials/compare`: two sources of a substance, and what the choice does to a film. */
export function CompareMaterialsPage() {
  return <GroupGate>{(group) => <Compare group={group} />}</GroupGate>;
}

function Compare({ group }: { group: Membership }) {
  const library = useQuery(materialListQuery(group.groupId));
  return (
    <Page
      title="Compare two materials"
      subtitle="Their constants over each other, their sources side by side, and what exchanging them does to a stack."
    >
      <QueryGate query={library} what="materials">
        {(data) => <Compared group={group} library={data.materials} />}
      </QueryGate>
    </Page>
  );
}

function Compared({ group, library }: { group: Membership; library: readonly MaterialSummary[] }) {
  const [search, setSearch] = useSearchParams();
  const { a, b } = readCompared(search);
  const first = useQuery({ ...materialQuery(a.id ?? '', a.version), enabled: a.id !== null });
  const second = useQuery({ ...materialQuery(b.id ?? '', b.version), enabled: b.id !== null });
  const put = (change: Partial<ReturnType<typeof readCompared>>) =>
    setSearch((before) => writeCompared(before, { ...readCompared(before), ...change }), { replace: true });
  return (
    <>
      <div className="mb-4 grid grid-cols-1 items-end gap-3 md:grid-cols-[1fr_auto_1fr]">
        <CompareChooser
          letter="A"
          library={library}
          chosen={a.id}
          material={first.data ?? null}
          onChoose={(id) => put({ a: { id, version: null } })}
          onVersion={(version) => put({ a: { ...a, version } })}
        />
        <IconButton label="Exchange A and B" onClick={() => put({ a: b, b: a })}>
          <ArrowLeftRight size={16} aria-hidden />
        </IconButton>
        <CompareChooser
          letter="B"
          library={library}
          chosen={b.id}
          material={second.data ?? null}
          onChoose={(id) => put({ b: { id, version: null } })}
          onVersion={(version) => put({ b: { ...b, version } })}
        />
      </div>
      {a.id === null || b.id === null ? (
        <EmptyState title="Choose two materials">
          Take two sources of one substance, such as the two of platinum, or two candidates for a layer. Two
          versions of one material can be compared too.
        </EmptyState>
      ) : (
        <QueryGate query={first} what="first material">
          {(one) => (
            <QueryGate query={second} what="second material">
              {(other) => (
                <div className="flex flex-col gap-4">
                  <CompareCard a={one} b={other} />
                  <StackEffect groupId={group.groupId} a={one} b={other} library={library} />
                  <div className="grid grid-cols-1 items-start gap-4 md:grid-cols-2">
                    <ComparedMaterial letter="A" material={one} />
                    <ComparedMaterial letter="B" material={other} />
                  </div>
                </div>
              )}
            </QueryGate>
          )}
        </QueryGate>
      )}
    </>
  );
}
