import { useQuery } from '@tanstack/react-query';
import { useEffect } from 'react';
import { Link, generatePath, useNavigate, useParams, useSearchParams } from 'react-router-dom';
import type { Material } from '../../../shared/material.ts';
import { useNotify } from '../../components/Notices.tsx';
import { Page } from '../../components/Page.tsx';
import { QueryGate } from '../../components/QueryGate.tsx';
import { materialQuery } from '../../features/materials/api/material.ts';
import { ClassMark } from '../../features/materials/components/ClassMark.tsx';
import { MaterialActions } from '../../features/materials/components/MaterialActions.tsx';
import { OlderVersionBanner } from '../../features/materials/components/OlderVersionBanner.tsx';
import { materialTitle } from '../../features/materials/model/materialTitle.ts';
import { useCurrentGroup } from '../../features/session/hooks/useCurrentGroup.ts';
import { mayEdit, useMembership } from '../../features/session/hooks/useSession.ts';
import { formatFormula } from '../../lib/format.ts';
import { paths } from '../../lib/paths.ts';
import { rememberGroup } from '../../lib/rememberedGroup.ts';
import { MaterialDetail } from './MaterialDetail.tsx';

/** The version in the address, when there is one that can be. */
function versionOf(text: string | null): number | null {
  const version = Number(text);
  return Number.isInteger(version) && version > 0 ? version : null;
}

/** `/materials/:materialId`: the constants of one version, where they come from and where they are used. */
export function MaterialPage() {
  const { materialId = '' } = useParams();
  const [search] = useSearchParams();
  const material = useQuery(materialQuery(materialId, versionOf(search.get('version'))));
  const groupId = material.data?.groupId;
  useEffect(() => {
    if (groupId) rememberGroup(groupId);
  }, [groupId]);
  const title = material.data ? materialTitle(material.data) : 'Material';
  return (
    <Page
      title={title}
      subtitle={material.data ? <MaterialLine material={material.data} /> : null}
      actions={material.data ? <Actions material={material.data} /> : null}
    >
      <QueryGate query={material} what="material">
        {(data) => (
          <>
            <OlderVersionBanner material={data} />
            <MaterialDetail material={data} />
          </>
        )}
      </QueryGate>
    </Page>
  );
}

function Actions({ material }: { material: Material }) {
  const current = useCurrentGroup();
  const owning = useMembership(material.groupId ?? undefined);
  const navigate = useNavigate();
  const notify = useNotify();
  const group = material.groupId === null ? current : owning;
  return (
    <MaterialActions
      material={material}
      groupId={group && mayEdit(group) ? group.groupId : null}
      onDeleted={() => {
        notify.done(`“${material.name}” is deleted.`);
        if (group) void navigate(generatePath(paths.materials, { groupId: group.groupId }));
      }}
    />
  );
}

function MaterialLine({ material }: { material: Material }) {
  const owning = useMembership(material.groupId ?? undefined);
  const current = useCurrentGroup();
  const groupId = material.groupId ?? current?.groupId;
  return (
    <span className="flex flex-wrap items-center gap-x-4 gap-y-1">
      <ClassMark of={material.class} />
      <span>version {material.version}</span>
      <span>{material.groupId ? `of ${owning?.groupName ?? 'a group'}` : 'shipped library'}</span>
      {material.preferred ? <span>preferred source for {formatFormula(material.formula)}</span> : null}
      <span>
        id <code className="select-all">{material.id}</code>
      </span>
      {groupId ? (
        <Link
          className="prose-link"
          to={`${generatePath(paths.compareMaterials, { groupId })}?a=${encodeURIComponent(material.id)}`}
        >
          compare with another
        </Link>
      ) : null}
    </span>
  );
}
