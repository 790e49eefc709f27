import { TriangleAlert } from 'lucide-react';
import type { ReactNode } from 'react';
import { Link, generatePath } from 'react-router-dom';
import type { MaterialSummary } from '../../../../shared/material.ts';
import { DataTable } from '../../../components/DataTable.tsx';
import type { Column } from '../../../components/DataTable.tsx';
import { formatFormula, formatRange } from '../../../lib/format.ts';
import { paths } from '../../../lib/paths.ts';
import { ClassMark } from './ClassMark.tsx';

const columns: readonly Column<MaterialSummary>[] = [
  {
    id: 'material',
    header: 'Material',
    value: (material) => material.formula,
    cell: (material) => (
      <div>
        <Link
          to={generatePath(paths.material, { materialId: material.id })}
          className="font-semibold text-ink no-underline hover:text-accent hover:underline"
        >
          {formatFormula(material.formula)}
          <span className="font-normal text-muted"> {material.name}</span>
        </Link>
        <div className="text-small font-normal text-muted">
          {[
            material.preferred ? null : 'another source is preferred',
            material.groupId ? 'of this group' : null,
          ]
            .filter(Boolean)
            .join(', ')}
        </div>
      </div>
    ),
  },
  {
    id: 'class',
    header: 'Class',
    value: (material) => material.class,
    cell: (material) => <ClassMark of={material.class} />,
  },
  {
    id: 'range',
    header: 'n, k known',
    value: (material) => material.rangeNm[0],
    cell: (material) => <span className="whitespace-nowrap">{formatRange(material.rangeNm, 'nm')}</span>,
  },
  {
    id: 'voigt',
    header: 'Q known',
    value: (material) => material.voigtRangeNm?.[0] ?? null,
    cell: (material) => <VoigtCell material={material} />,
  },
  {
    id: 'source',
    header: 'Source of n, k',
    value: (material) => material.citation,
    cell: (material) => (
      <div className="max-w-md">
        <div className="line-clamp-1 text-note" title={material.citation}>
          {material.citation}
        </div>
        <div className="text-small text-muted">{material.confidence}</div>
      </div>
    ),
  },
];

function VoigtCell({ material }: { material: MaterialSummary }) {
  if (!material.voigtRangeNm) return <span className="text-muted">–</span>;
  const doubtful = material.voigtConfidence !== 'measured';
  return (
    <div className="whitespace-nowrap">
      {formatRange(material.voigtRangeNm, 'nm')}
      {material.voigtConfidence ? (
        <div className={`flex items-center gap-1 text-small ${doubtful ? 'text-warn' : 'text-muted'}`}>
          {doubtful ? <TriangleAlert aria-hidden="true" className="size-3" /> : null}
          {material.voigtConfidence}
        </div>
      ) : null}
    </div>
  );
}

export function MaterialTable({
  materials,
  empty,
}: {
  materials: readonly MaterialSummary[];
  empty: ReactNode;
}) {
  return (
    <DataTable
      caption="Materials"
      columns={columns}
      rows={materials}
      rowKey={(material) => material.id}
      empty={empty}
      initialSort={{ id: 'material', descending: false }}
    />
  );
}
