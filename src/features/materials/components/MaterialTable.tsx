import { TriangleAlert } from 'lucide-react';
import { useMemo } from 'react';
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
        <div className="text-small font-normal text-muted">{remarks(material)}</div>
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
    cell: (material) => (
      <div className="whitespace-nowrap">
        {formatRange(material.rangeNm, 'nm')}
        <div className="text-small text-muted">{material.indexKind}</div>
      </div>
    ),
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

const anisotropyTexts = { uniaxial: 'uniaxial', cubic: 'cubic, second order in m', tensor: 'free tensor' };

/** What to know of a row beside its columns; only of several sources of one substance is one preferred. */
function remarks({ anisotropy, version, preferred, groupId }: MaterialSummary): string {
  return [
    anisotropy ? anisotropyTexts[anisotropy] : null,
    version > 1 ? `version ${version}` : null,
    preferred || groupId ? null : 'another source is preferred',
  ]
    .filter(Boolean)
    .join(', ');
}

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

type MaterialTableProps = {
  caption: string;
  materials: readonly MaterialSummary[];
  /** Ids of the rows picked for a comparison. */
  picked: readonly string[];
  onPick: (id: string) => void;
  empty: ReactNode;
};

export function MaterialTable({ caption, materials, picked, onPick, empty }: MaterialTableProps) {
  const all = useMemo<readonly Column<MaterialSummary>[]>(
    () => [
      ...columns,
      {
        id: 'pick',
        header: 'Compare',
        hideHeader: true,
        sortable: false,
        value: () => null,
        cell: (material) => (
          <label className="inline-flex cursor-pointer p-2">
            <input
              type="checkbox"
              className="size-4 accent-accent"
              aria-label={`Compare ${material.name}`}
              title="Pick two to compare"
              checked={picked.includes(material.id)}
              onChange={() => onPick(material.id)}
            />
          </label>
        ),
      },
    ],
    [picked, onPick],
  );
  return (
    <DataTable
      caption={caption}
      columns={all}
      rows={materials}
      rowKey={(material) => material.id}
      empty={empty}
      initialSort={{ id: 'material', descending: false }}
    />
  );
}
