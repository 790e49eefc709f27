import { useQuery, useQueryClient } from '@tanstack/react-query';
import { generatePath, useNavigate, useSearchParams } from 'react-router-dom';
import type { Membership } from '../../../shared/account.ts';
import type { Material } from '../../../shared/material.ts';
import { ButtonLink } from '../../components/Button.tsx';
import { ErrorState } from '../../components/ErrorState.tsx';
import { useNotify } from '../../components/Notices.tsx';
import { Page } from '../../components/Page.tsx';
import { QueryGate } from '../../components/QueryGate.tsx';
import { ImportWorkbench } from '../../features/materialImport/components/ImportWorkbench.tsx';
import { materialQuery } from '../../features/materials/api/material.ts';
import { materialListQuery } from '../../features/materials/api/materialList.ts';
import { GroupGate } from '../../features/session/components/GroupGate.tsx';
import { ApiError } from '../../lib/apiClient.ts';
import { formatFormula } from '../../lib/format.ts';
import { paths } from '../../lib/paths.ts';

/** A table of constants from a file or the clipboard becomes a material of the group, or a version of one (`?for=`). */
export function ImportMaterialPage() {
  return (
    <GroupGate>
      {(group) => (group.role === 'viewer' ? <OnlyEditors /> : <ImportMaterial group={group} />)}
    </GroupGate>
  );
}

function OnlyEditors() {
  return (
    <Page title="Import constants" width="text">
      <ErrorState error={new ApiError(403, 'forbidden', 'Viewers of a group cannot add materials to it.')} />
    </Page>
  );
}

function ImportMaterial({ group: { groupId } }: { group: Membership }) {
  const [search] = useSearchParams();
  const targetId = search.get('for');
  const target = useQuery({ ...materialQuery(targetId ?? '', null), enabled: targetId !== null });
  const materials = useQuery(materialListQuery(groupId));
  return (
    <Page
      title={target.data ? `Import constants for ${formatFormula(target.data.formula)}` : 'Import constants'}
      subtitle={
        target.data
          ? subtitleFor(target.data, groupId)
          : 'A table of n and k, of the permittivity, or of magneto-optic constants becomes a material of this group.'
      }
    >
      <QueryGate query={materials} what="materials">
        {({ materials: list }) =>
          targetId === null ? (
            <Workbench groupId={groupId} target={null} materials={list} />
          ) : (
            <QueryGate query={target} what="material">
              {(material) =>
                material.groupId === groupId ? (
                  <Workbench groupId={groupId} target={material} materials={list} />
                ) : (
                  <CopyFirst groupId={groupId} material={material} />
                )
              }
            </QueryGate>
          )
        }
      </QueryGate>
    </Page>
  );
}

function subtitleFor({ name, version, groupId: owner }: Material, groupId: string): string {
  if (owner !== groupId) return name;
  return `${name}: the table makes version ${version + 1}. What it does not give stays as it is.`;
}

/** A material of the shipped library or of another group stays as it is. */
function CopyFirst({ groupId, material: { id, name, version } }: { groupId: string; material: Material }) {
  const copy = new URLSearchParams({ from: id, version: String(version) });
  return (
    <div className="card flex max-w-prose flex-col items-start gap-3 px-4 py-3.5">
      <p>
        {name} is not of this group, so it cannot get a new version here. Keep a copy of it in this group
        first, then import the table for the copy. Its n, k and their source go with it.
      </p>
      <div className="flex flex-wrap gap-2">
        <ButtonLink tone="primary" to={`${generatePath(paths.newMaterial, { groupId })}?${copy}`}>
          Copy into this group
        </ButtonLink>
        <ButtonLink to={generatePath(paths.importMaterial, { groupId })}>
          Import as a material of its own
        </ButtonLink>
      </div>
    </div>
  );
}

type WorkbenchProps = Pick<Parameters<typeof ImportWorkbench>[0], 'groupId' | 'target' | 'materials'>;

function Workbench({ groupId, target, materials }: WorkbenchProps) {
  const [search, setSearch] = useSearchParams();
  const client = useQueryClient();
  const navigate = useNavigate();
  const notify = useNotify();
  const onKept = async (material: Material) => {
    await Promise.all([
      client.invalidateQueries({ queryKey: materialListQuery(groupId).queryKey }),
      client.invalidateQueries({ queryKey: ['materials', material.id] }),
    ]);
    notify.done(
      target
        ? `Version ${material.version} of ${material.name} is made`
        : `${material.name} is in the library of this group`,
    );
    await navigate(generatePath(paths.material, { materialId: material.id }));
  };
  return (
    <ImportWorkbench
      groupId={groupId}
      importId={search.get('import')}
      // Pushed, so that the way back of the browser is a way back here.
      onImport={(importId) =>
        setSearch((before) => {
          if (importId === null) before.delete('import');
          else before.set('import', importId);
          return before;
        })
      }
      target={target}
      materials={materials}
      loadMaterial={(id, version) => client.fetchQuery(materialQuery(id, version))}
      onKept={(material) => void onKept(material)}
    />
  );
}
