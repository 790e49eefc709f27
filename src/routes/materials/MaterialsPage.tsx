import { useQuery } from '@tanstack/react-query';
import { useMemo } from 'react';
import type { Membership } from '../../../shared/account.ts';
import type { MaterialSummary } from '../../../shared/material.ts';
import { Button } from '../../components/Button.tsx';
import { EmptyState } from '../../components/EmptyState.tsx';
import { Page } from '../../components/Page.tsx';
import { QueryGate } from '../../components/QueryGate.tsx';
import { materialListQuery } from '../../features/materials/api/materialList.ts';
import { MaterialFilterBar } from '../../features/materials/components/MaterialFilterBar.tsx';
import { MaterialTable } from '../../features/materials/components/MaterialTable.tsx';
import { filterMaterials, useMaterialFilter } from '../../features/materials/hooks/useMaterialFilter.ts';
import { GroupGate } from '../../features/session/components/GroupGate.tsx';

/** The constants that stacks are made of, each with its source. */
export function MaterialsPage() {
  return <GroupGate>{(group) => <Materials group={group} />}</GroupGate>;
}

function Materials({ group }: { group: Membership }) {
  const materials = useQuery(materialListQuery(group.groupId));
  return (
    <Page
      title="Materials"
      subtitle="Optical constants N = n + ik and Voigt constants Q, with source, range and what to beware of."
    >
      <QueryGate query={materials} what="materials">
        {(data) => <MaterialList materials={data.materials} />}
      </QueryGate>
    </Page>
  );
}

function MaterialList({ materials }: { materials: readonly MaterialSummary[] }) {
  const [filter, change] = useMaterialFilter();
  const found = useMemo(() => filterMaterials(materials, filter), [materials, filter]);
  return (
    <>
      <MaterialFilterBar filter={filter} onChange={change} found={found.length} total={materials.length} />
      <div className={found.length > 0 ? 'card' : ''}>
        <MaterialTable
          materials={found}
          empty={
            <EmptyState
              title="No material fits"
              action={
                <Button onClick={() => change({ words: '', class: 'all', magnetoOptic: false })}>
                  Show all materials
                </Button>
              }
            >
              The search looks into names, formulas and sources. Constants that are not in the library can be
              typed into a layer on the page of a stack.
            </EmptyState>
          }
        />
      </div>
    </>
  );
}
