import { useQuery } from '@tanstack/react-query';
import { useEffect } from 'react';
import { generatePath, useNavigate, useParams } from 'react-router-dom';
import type { Material } from '../../../shared/material.ts';
import { ButtonLink } from '../../components/Button.tsx';
import { EmptyState } from '../../components/EmptyState.tsx';
import { Page } from '../../components/Page.tsx';
import { QueryGate } from '../../components/QueryGate.tsx';
import { materialVersionQuery } from '../../features/materialEdit/api/materialVersion.ts';
import { MaterialEditorForm } from '../../features/materialEdit/components/MaterialEditorForm.tsx';
import { useMaterialEditor } from '../../features/materialEdit/hooks/useMaterialEditor.ts';
import { formOfMaterial } from '../../features/materialEdit/model/formOfMaterial.ts';
import { materialListQuery } from '../../features/materials/api/materialList.ts';
import { useCurrentGroup } from '../../features/session/hooks/useCurrentGroup.ts';
import { mayEdit, useMembership } from '../../features/session/hooks/useSession.ts';
import { paths } from '../../lib/paths.ts';
import { rememberGroup } from '../../lib/rememberedGroup.ts';
import { MayNotEdit } from './MayNotEdit.tsx';

/** `/materials/:materialId/edit`: the next version of a material of one's own group. */
export function EditMaterialPage() {
  const { materialId = '' } = useParams();
  const material = useQuery(materialVersionQuery(materialId, null));
  const groupId = material.data?.groupId ?? null;
  const membership = useMembership(groupId ?? undefined);
  useEffect(() => {
    if (groupId !== null) rememberGroup(groupId);
  }, [groupId]);
  if (!material.data) {
    return (
      <Page title="Edit material">
        <QueryGate query={material} what="material">
          {() => null}
        </QueryGate>
      </Page>
    );
  }
  if (groupId === null) return <Shipped material={material.data} />;
  if (!mayEdit(membership)) return <MayNotEdit />;
  return <OwnMaterial key={materialId} material={material.data} groupId={groupId} />;
}

/** The shipped library stays as it is for everybody; a copy of one's own can be changed. */
function Shipped({ material }: { material: Material }) {
  const group = useCurrentGroup();
  const copy = group && `${generatePath(paths.newMaterial, { groupId: group.groupId })}?from=${material.id}`;
  return (
    <Page title={material.name} width="text">
      <EmptyState
        title="The shipped library is the same for everybody"
        action={copy ? <ButtonLink to={copy}>Copy into {group.groupName}</ButtonLink> : null}
      >
        Its materials cannot be changed here. A copy in your group can; stacks that use the original keep it.
      </EmptyState>
    </Page>
  );
}

function OwnMaterial({ material, groupId }: { material: Material; groupId: string }) {
  const materials = useQuery(materialListQuery(groupId));
  const navigate = useNavigate();
  const editor = useMaterialEditor({
    groupId,
    material,
    start: formOfMaterial(material),
    keptUnder: material.id,
    onSaved: ({ id }) =>
      void navigate(generatePath(paths.material, { materialId: id }), { state: { saved: true } }),
  });
  return (
    <Page
      title={`Edit ${material.name}`}
      subtitle={`From version ${editor.startedFrom ?? material.version}.`}
    >
      <QueryGate query={materials} what="materials">
        {(list) => (
          <MaterialEditorForm
            editor={editor}
            groupId={groupId}
            materials={list.materials}
            nextVersion={(editor.startedFrom ?? material.version) + 1}
          />
        )}
      </QueryGate>
    </Page>
  );
}
