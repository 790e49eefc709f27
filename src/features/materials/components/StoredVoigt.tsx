import type { VoigtDispersion } from '../../../../shared/dispersion.ts';
import { describeFormula } from '../model/describeFormula.ts';
import { describeLines } from '../model/describeModel.ts';
import { Law } from './Law.tsx';
import { PointTable } from './PointTable.tsx';
import { Extent } from './StoredIndex.tsx';

/** How Q is stored, in words and numbers. */
export function StoredVoigt({ voigt }: { voigt: VoigtDispersion }) {
  switch (voigt.kind) {
    case 'table':
      return <PointTable wavelengthsNm={voigt.wavelengthsNm} values={voigt.q} heads={['Re Q', 'Im Q']} />;
    case 'formula':
      return (
        <>
          <Law {...describeFormula(voigt, 'Q')} />
          <Extent rangeNm={voigt.rangeNm} />
        </>
      );
    case 'lines':
      return (
        <>
          <Law {...describeLines(voigt.lines, voigt.of)} />
          <Extent rangeNm={voigt.rangeNm} />
        </>
      );
    case 'mixture':
      return <p>Q follows from those of the two parts by the law of the mixture.</p>;
  }
}
