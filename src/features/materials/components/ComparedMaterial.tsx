import { Link, generatePath } from 'react-router-dom';
import type { Material } from '../../../../shared/material.ts';
import { formatRange } from '../../../lib/format.ts';
import { paths } from '../../../lib/paths.ts';
import { materialTitle } from '../model/materialTitle.ts';
import { SourceList } from './SourceList.tsx';

/** One of two compared materials: what it is, where it is known and where its constants come from. */
export function ComparedMaterial({ letter, material }: { letter: 'A' | 'B'; material: Material }) {
  const { id, version, content, rangeNm, voigtRangeNm } = material;
  return (
    <section aria-label={`Sources of ${letter}`} className="card min-w-0 px-4 py-3.5">
      <h2 className="text-body">
        {letter}:{' '}
        <Link
          className="prose-link"
          to={`${generatePath(paths.material, { materialId: id })}?version=${version}`}
        >
          {materialTitle(material)}, version {version}
        </Link>
      </h2>
      <p className="mt-0.5 mb-3 text-note text-muted">
        {material.groupId ? 'Of the group' : 'Shipped library'}; n, k for {formatRange(rangeNm, 'nm')};{' '}
        {voigtRangeNm ? `Q for ${formatRange(voigtRangeNm, 'nm')}` : 'no Q'}
      </p>
      <SourceList source={content.indexSource} />
      {content.voigtSource ? (
        <>
          <h3 className="mt-4 mb-2 text-note">Q</h3>
          <SourceList source={content.voigtSource} />
        </>
      ) : null}
    </section>
  );
}
