import { Link, generatePath } from 'react-router-dom';
import type { IndexDispersion, PlainIndex } from '../../../../shared/dispersion.ts';
import { formatRange } from '../../../lib/format.ts';
import { paths } from '../../../lib/paths.ts';

type Mixture = Extract<IndexDispersion, { kind: 'mixture' }>;

const laws = {
  bruggeman: 'Bruggeman mixture (effective medium; both parts are treated alike)',
  'maxwell-garnett': 'Maxwell Garnett mixture (effective medium; spheres of the second part in the first)',
} as const;

/** A mixture: its law, and its parts as they were when they were mixed, each leading to that version. */
export function StoredMixture({ mixture }: { mixture: Mixture }) {
  const { model, fraction, parts } = mixture;
  const shares = [1 - fraction, fraction];
  return (
    <div className="flex flex-col gap-1">
      <p>{laws[model]}, by volume:</p>
      <ul className="flex list-disc flex-col gap-0.5 pl-5">
        {parts.map((part, position) => (
          <li key={position}>
            {Number((100 * (shares[position] ?? NaN)).toPrecision(6))} %{' '}
            <Link
              className="prose-link"
              to={`${generatePath(paths.material, { materialId: part.material })}?version=${part.version}`}
            >
              {part.name}, version {part.version}
            </Link>
            <span className="text-muted">
              {' '}
              ({kindOf(part.index)}
              {part.voigt ? ', with Q' : ''})
            </span>
          </li>
        ))}
      </ul>
      <p className="text-note text-muted">
        The parts are kept here whole: a newer version of a part does not change this mixture.
      </p>
    </div>
  );
}

function kindOf(index: PlainIndex): string {
  if (index.kind !== 'table') return `${index.kind} for ${formatRange(index.rangeNm, 'nm')}`;
  const [first = NaN] = index.wavelengthsNm;
  return `table for ${formatRange([first, index.wavelengthsNm.at(-1) ?? NaN], 'nm')}`;
}
