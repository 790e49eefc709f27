import { useQuery } from '@tanstack/react-query';
import { generatePath, useNavigate, useSearchParams } from 'react-router-dom';
import type { Membership } from '../../../shared/account.ts';
import type { Material, MaterialSummary } from '../../../shared/material.ts';
import { Page } from '../../components/Page.tsx';
import { QueryGate } from '../../components/QueryGate.tsx';
import { materialVersionQuery } from '../../features/materialEdit/api/materialVersion.ts';
import { MaterialEditorForm } from '../../features/materialEdit/components/MaterialEditorForm.tsx';
import { useMaterialEditor } from '../../features/materialEdit/hooks/useMaterialEditor.ts';
import { blankForm } from '../../features/materialEdit/model/blankForm.ts';
import { formOfMaterial } from '../../features/materialEdit/model/formOfMaterial.ts';
import { materialListQuery } from '../../features/materials/api/materialList.ts';
import { GroupGate } from '../../features/session/components/GroupGate.tsx';
import { mayEdit } from '../../features/session/hooks/useSession.ts';
import { paths } from '../../lib/paths.ts';
import { MayNotEdit } from './MayNotEdit.tsx';
import { versionInAddress } from './versionInAddress.ts';

/** `/groups/:groupId/materials/new`, with `?from=<id>&version=` a copy of another material. */
export function NewMaterialPage() {
  return (
    <GroupGate>{(group) => (mayEdit(group) ? <NewMaterial group={group} /> : <MayNotEdit />)}</GroupGate>
  );
}

function NewMaterial({ group }: { group: Membership }) {
  const [search] = useSearchParams();
  const from = search.get('from');
  const version = versionInAddress(search.get('version'));
  const materials = useQuery(materialListQuery(group.groupId));
  const original = useQuery({ ...materialVersionQuery(from ?? '', version), enabled: from !== null });
  return (
    <Page
      title={original.data ? `Copy of ${original.data.name}` : 'New material'}
      subtitle={`Becomes a material of ${group.groupName}. Every constant has a source.`}
    >
      <QueryGate query={materials} what="materials">
        {(list) =>
          from === null ? (
            <Editor key="blank" group={group} materials={list.materials} original={null} />
          ) : (
            <QueryGate query={original} what="material">
              {(data) => <Editor key={from} group={group} materials={list.materials} original={data} />}
            </QueryGate>
          )
        }
      </QueryGate>
    </Page>
  );
}

type EditorProps = {
  group: Membership;
  materials: readonly MaterialSummary[];
  original: Material | null;
};

function Editor({ group: { groupId }, materials, original }: EditorProps) {
  const navigate = useNavigate();
  const editor = useMaterialEditor({
    groupId,
    material: null,
    start: original ? formOfMaterial(original) : blankForm(),
    keptUnder: `new.${groupId}.${original ? `${original.id}.${original.version}` : 'blank'}`,
    onSaved: ({ id }) =>
      void navigate(generatePath(paths.material, { materialId: id }), { state: { saved: true } }),
  });
  return <MaterialEditorForm editor={editor} groupId={groupId} materials={materials} nextVersion={null} />;
}
