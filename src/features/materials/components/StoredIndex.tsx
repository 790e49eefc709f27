import type { IndexDispersion } from '../../../../shared/dispersion.ts';
import { formatRange } from '../../../lib/format.ts';
import { describeFormula } from '../model/describeFormula.ts';
import { describeModel } from '../model/describeModel.ts';
import { Law } from './Law.tsx';
import { PointTable } from './PointTable.tsx';
import { StoredMixture } from './StoredMixture.tsx';
import { TensorTable } from './TensorTable.tsx';

/** How an index is stored, in words and numbers. */
export function StoredIndex({ index }: { index: IndexDispersion }) {
  switch (index.kind) {
    case 'table':
      return (
        <PointTable
          wavelengthsNm={index.wavelengthsNm}
          values={index.n.map((n, position) => [n, index.k[position] ?? NaN])}
          heads={['n', 'k']}
        />
      );
    case 'formula':
      return (
        <>
          <Law {...describeFormula(index, index.quantity ?? 'n')} />
          <Extent rangeNm={index.rangeNm} />
        </>
      );
    case 'model':
      return (
        <>
          <Law {...describeModel(index.model)} />
          <Extent rangeNm={index.rangeNm} />
        </>
      );
    case 'tensor':
      return <TensorTable {...index} />;
    case 'mixture':
      return <StoredMixture mixture={index} />;
  }
}

/** Where a law may be used. */
export function Extent({ rangeNm }: { rangeNm: readonly [number, number] }) {
  return <p className="mt-1 text-note text-muted">Valid for {formatRange(rangeNm, 'nm')}.</p>;
}
