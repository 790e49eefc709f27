import { CopyButton } from '../../../components/CopyButton.tsx';
import { formatPlain } from '../../../lib/format.ts';
import { exactJson, exactLatex } from '../model/exactText.ts';
import { exactValues } from '../model/exactValues.ts';
import type { ThreeStates } from '../model/moreReadings.ts';

const cell = 'py-0.5 pl-4 text-right whitespace-nowrap';

/** Everything at the working point with all the digits that a double holds. */
export function ExactTables({ states }: { states: ThreeStates }) {
  const values = exactValues(states);
  return (
    <div className="flex flex-col gap-3">
      <div className="flex flex-wrap gap-2">
        <CopyButton text={exactJson(values)} label="Copy JSON" what="of the exact values" />
        <CopyButton text={exactLatex(values)} label="Copy LaTeX" what="of the exact values" />
      </div>
      {values.amplitudes.length > 0 && (
        <div className="overflow-x-auto">
          <table className="text-left text-note tabular-nums">
            <caption className="sr-only">Amplitudes of reflection and transmission</caption>
            <thead className="text-small text-muted">
              <tr>
                <th scope="col" className="font-medium">
                  amplitude
                </th>
                {['real part', 'imaginary part', 'modulus', 'phase (deg)'].map((name) => (
                  <th key={name} scope="col" className="pl-4 text-right font-medium">
                    {name}
                  </th>
                ))}
              </tr>
            </thead>
            <tbody>
              {values.amplitudes.map(({ name, re, im, modulus, phaseDeg }) => (
                <tr key={name} className="border-t border-line">
                  <th scope="row" className="py-0.5 font-semibold whitespace-nowrap">
                    {name}
                  </th>
                  {[re, im, modulus, phaseDeg].map((value, index) => (
                    <td key={index} className={cell}>
                      {formatPlain(value)}
                    </td>
                  ))}
                </tr>
              ))}
            </tbody>
          </table>
        </div>
      )}
      <div className="overflow-x-auto">
        <table className="text-left text-note tabular-nums">
          <caption className="sr-only">Reflectance, transmittance, absorptance and Kerr angles</caption>
          <tbody>
            {values.numbers.map(({ name, unit, value }) => (
              <tr key={name} className="border-b border-line">
                <th scope="row" className="py-0.5 font-normal whitespace-nowrap">
                  {name}
                </th>
                <td className={`${cell} font-semibold`}>
                  {value === null ? '–' : formatPlain(value)}
                  {value !== null && unit === 'deg' ? '°' : ''}
                </td>
              </tr>
            ))}
          </tbody>
        </table>
      </div>
      <p className="text-small text-muted">
        As many digits as the numbers are computed with. How many of them mean something is up to the
        constants: few are known to four.
      </p>
    </div>
  );
}
