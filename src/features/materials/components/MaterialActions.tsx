import { Download } from 'lucide-react';
import { generatePath } from 'react-router-dom';
import type { Material } from '../../../../shared/material.ts';
import { ButtonLink } from '../../../components/Button.tsx';
import { paths } from '../../../lib/paths.ts';
import { DeleteMaterial } from './DeleteMaterial.tsx';

type Props = {
  material: Material;
  /** The group in which a change would be made; null for who may not change anything. */
  groupId: string | null;
  onDeleted: () => void;
};

/** What can be done with a material. A shipped one is changed by copying it into the group. */
export function MaterialActions({ material, groupId, onDeleted }: Props) {
  const { id, version } = material;
  const own = material.groupId !== null;
  const copy = new URLSearchParams({ from: id, version: String(version) });
  return (
    <>
      <a
        className="inline-flex items-center gap-1.5 rounded-control border border-edge bg-panel px-3.5 py-[7px] leading-[1.35] font-medium text-ink no-underline hover:bg-accent-soft"
        href={`/api/v1/materials/${encodeURIComponent(id)}/export.csv?version=${version}`}
        download
      >
        <Download size={15} aria-hidden />
        Export CSV
      </a>
      {groupId !== null ? (
        <ButtonLink to={`${generatePath(paths.importMaterial, { groupId })}?for=${encodeURIComponent(id)}`}>
          Import Q for it
        </ButtonLink>
      ) : null}
      {groupId !== null && own ? (
        <>
          <DeleteMaterial material={material} groupId={groupId} onDeleted={onDeleted} />
          <ButtonLink tone="primary" to={generatePath(paths.editMaterial, { materialId: id })}>
            Edit
          </ButtonLink>
        </>
      ) : null}
      {groupId !== null && !own ? (
        <ButtonLink tone="primary" to={`${generatePath(paths.newMaterial, { groupId })}?${copy}`}>
          Copy into this group and edit
        </ButtonLink>
      ) : null}
    </>
  );
}
