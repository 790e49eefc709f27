import { useQuery } from '@tanstack/react-query';
import { useMemo } from 'react';
import { generatePath } from 'react-router-dom';
import type { Membership } from '../../../shared/account.ts';
import type { MaterialSummary } from '../../../shared/material.ts';
import { Button, ButtonLink } from '../../components/Button.tsx';
import { EmptyState } from '../../components/EmptyState.tsx';
import { Page } from '../../components/Page.tsx';
import { QueryGate } from '../../components/QueryGate.tsx';
import { materialListQuery } from '../../features/materials/api/materialList.ts';
import { CompareLink } from '../../features/materials/components/CompareLink.tsx';
import { MaterialFilterBar } from '../../features/materials/components/MaterialFilterBar.tsx';
import { MaterialTable } from '../../features/materials/components/MaterialTable.tsx';
import { useMaterialFilter } from '../../features/materials/hooks/useMaterialFilter.ts';
import { usePicked } from '../../features/materials/hooks/usePicked.ts';
import { filterMaterials } from '../../features/materials/model/materialFilter.ts';
import { GroupGate } from '../../features/session/components/GroupGate.tsx';
import { mayEdit } from '../../features/session/hooks/useSession.ts';
import { paths } from '../../lib/paths.ts';

/** The constants that stacks are made of, each with its source. */
export function MaterialsPage() {
  return <GroupGate>{(group) => <Materials group={group} />}</GroupGate>;
}

function Materials({ group }: { group: Membership }) {
  const { groupId } = group;
  const materials = useQuery(materialListQuery(groupId));
  const [picked, pick] = usePicked();
  return (
    <Page
      title="Materials"
      subtitle="Optical constants N = n + ik and Voigt constants Q, with source, range and what to beware of."
      actions={
        <>
          <CompareLink groupId={groupId} picked={picked} />
          {mayEdit(group) ? (
            <>
              <ButtonLink to={generatePath(paths.newMaterial, { groupId })}>New material</ButtonLink>
              <ButtonLink tone="primary" to={generatePath(paths.importMaterial, { groupId })}>
                Import a table
              </ButtonLink>
            </>
          ) : null}
        </>
      }
    >
      <QueryGate query={materials} what="materials">
        {(data) => <MaterialList group={group} materials={data.materials} picked={picked} onPick={pick} />}
      </QueryGate>
    </Page>
  );
}

type ListProps = {
  group: Membership;
  materials: readonly MaterialSummary[];
  picked: readonly string[];
  onPick: (id: string) => void;
};

/** The group's own materials and the shipped ones, apart. */
function MaterialList({ group, materials, picked, onPick }: ListProps) {
  const [filter, change] = useMaterialFilter();
  const found = useMemo(() => filterMaterials(materials, filter), [materials, filter]);
  const own = found.filter(({ groupId }) => groupId !== null);
  const shipped = found.filter(({ groupId }) => groupId === null);
  const hasOwn = materials.some(({ groupId }) => groupId !== null);
  const nothing = (
    <EmptyState
      title="No material fits"
      action={<Button onClick={() => change(null)}>Show all materials</Button>}
    >
      The search looks into names, formulas and sources. Constants that are not in the library can be
      imported, entered as a new material, or typed into a layer on the page of a stack.
    </EmptyState>
  );
  return (
    <>
      <MaterialFilterBar filter={filter} onChange={change} found={found.length} total={materials.length} />
      {found.length === 0 ? nothing : null}
      {found.length > 0 && filter.place !== 'shipped' ? (
        <section aria-labelledby="own-heading" className="mb-6">
          <h2 id="own-heading" className="mb-2 text-lead">
            Of {group.groupName} <Count of={own.length} />
          </h2>
          <div className={own.length > 0 ? 'card' : ''}>
            <MaterialTable
              caption={`Materials of ${group.groupName}`}
              materials={own}
              picked={picked}
              onPick={onPick}
              empty={
                <p className="text-muted">
                  {hasOwn
                    ? 'None of the group’s own materials fits.'
                    : 'The group has no materials of its own yet. Import a table, enter a new material, or copy a shipped one from its page.'}
                </p>
              }
            />
          </div>
        </section>
      ) : null}
      {found.length > 0 && filter.place !== 'group' ? (
        <section aria-labelledby="shipped-heading">
          <h2 id="shipped-heading" className="mb-2 text-lead">
            Shipped library <Count of={shipped.length} />
          </h2>
          <div className={shipped.length > 0 ? 'card' : ''}>
            <MaterialTable
              caption="Materials of the shipped library"
              materials={shipped}
              picked={picked}
              onPick={onPick}
              empty={<p className="text-muted">No shipped material fits.</p>}
            />
          </div>
        </section>
      ) : null}
    </>
  );
}

function Count({ of }: { of: number }) {
  return <span className="text-note font-normal text-muted">{of}</span>;
}
