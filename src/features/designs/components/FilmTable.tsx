import type { OptimiseDesign } from '../../../../shared/optimiseDesign.ts';
import { formatNumber, formatPlain } from '../../../lib/format.ts';
import { layerWords } from '../model/layerNames.ts';
import type { NamedMaterial } from '../model/layerNames.ts';

type Props = {
  input: OptimiseDesign;
  materials: readonly NamedMaterial[];
  startNm: readonly number[];
  chosenNm: readonly number[];
  chosenLabel: string;
};

const cell = 'px-2 py-1.5 sm:px-3 text-right whitespace-nowrap';

/** The thicknesses that were varied: as drawn, as found, and between what bounds. */
export function FilmTable({ input, materials, startNm, chosenNm, chosenLabel }: Props) {
  return (
    <section aria-label="Film" className="min-w-0">
      <h2 className="mb-2 text-lead">Film</h2>
      <div className="card overflow-x-auto">
        <table className="w-full">
          <thead>
            <tr className="border-b border-line text-note text-muted">
              <th scope="col" className="px-3 py-1.5 text-left font-medium">
                Layer
              </th>
              {['As drawn', chosenLabel, 'Bounds'].map((header) => (
                <th key={header} scope="col" className={`${cell} font-medium`}>
                  {header}
                </th>
              ))}
            </tr>
          </thead>
          <tbody>
            {input.variables.map(({ layerId, fromNm, toNm }, position) => (
              <tr key={layerId} className="border-b border-line last:border-b-0">
                <th scope="row" className="px-3 py-1.5 text-left font-semibold">
                  {layerWords(input.document, layerId, materials)}
                </th>
                <td className={cell}>{nm(startNm[position])}</td>
                <td className={`${cell} font-semibold`}>{nm(chosenNm[position])}</td>
                <td className={`${cell} text-muted`}>
                  {formatPlain(fromNm)}–{formatPlain(toNm)} nm
                </td>
              </tr>
            ))}
          </tbody>
        </table>
      </div>
    </section>
  );
}

function nm(value: number | undefined): string {
  return value === undefined ? '–' : `${formatNumber(value)} nm`;
}
