import { useMemo } from 'react';
import type { FitResult } from '../../../../shared/materialFit.ts';
import { LinePlot } from '../../../components/plot/LinePlot.tsx';
import type { PlotSeries } from '../../../components/plot/plotTypes.ts';
import { formatCount, formatNumber } from '../../../lib/format.ts';

type Props = {
  target: 'index' | 'voigt';
  result: FitResult;
  dataName: string;
  /** Parameters that a further fit leaves as they are. */
  fixed: readonly string[];
  onHold: (name: string, held: boolean) => void;
};

/** What a fit found: values with uncertainties, what is left over, and what to beware of. */
export function FitReport({ target, result, dataName, fixed, onHold }: Props) {
  const { parameters, deviation, points, iterations, remarks } = result;
  return (
    <div className="flex flex-col gap-3">
      <p>
        {formatCount(points)} points of {dataName}; root mean square of the residuals{' '}
        {formatNumber(deviation, { digits: 3 })} after {formatCount(iterations)} steps.
      </p>
      <div className="overflow-x-auto">
        <table aria-label="Fitted parameters" className="border-collapse text-note">
          <thead>
            <tr className="border-b border-line text-left text-muted">
              <th scope="col" className="py-1 pr-5 font-medium">
                parameter
              </th>
              <th scope="col" className="py-1 pr-5 text-right font-medium">
                value
              </th>
              <th scope="col" className="py-1 pr-5 text-right font-medium">
                uncertainty (1σ)
              </th>
              <th scope="col" className="py-1 pr-5 font-medium">
                unit
              </th>
              <th scope="col" className="py-1 font-medium">
                hold at the form's value
              </th>
            </tr>
          </thead>
          <tbody>
            {parameters.map(({ name, unit, value, uncertainty, fixed: wasFixed }) => (
              <tr key={name} className="border-b border-line last:border-b-0">
                <th scope="row" className="py-1 pr-5 text-left font-normal">
                  <code>{name}</code>
                </th>
                <td className="py-1 pr-5 text-right">{formatNumber(value, { digits: 6 })}</td>
                <td className="py-1 pr-5 text-right">
                  {uncertainty === null
                    ? wasFixed
                      ? 'held'
                      : 'not determined'
                    : `± ${formatNumber(uncertainty, { digits: 2 })}`}
                </td>
                <td className="py-1 pr-5">{unit}</td>
                <td className="py-1">
                  <input
                    type="checkbox"
                    className="size-4 accent-accent"
                    aria-label={`Hold ${name}`}
                    checked={fixed.includes(name)}
                    onChange={(event) => onHold(name, event.target.checked)}
                  />
                </td>
              </tr>
            ))}
          </tbody>
        </table>
      </div>
      {remarks.length > 0 ? (
        <ul className="list-disc pl-5 text-note text-warn">
          {remarks.map((remark) => (
            <li key={remark}>{remark}</li>
          ))}
        </ul>
      ) : null}
      <Residuals target={target} residuals={result.residuals} />
    </div>
  );
}

const xAxis = { label: 'vacuum wavelength (nm)' };
const yAxes = [{ label: 'table − fit', include: [0] }];

function Residuals({ target, residuals }: { target: Props['target']; residuals: FitResult['residuals'] }) {
  const series = useMemo<PlotSeries[]>(() => {
    const [first, second] = target === 'index' ? ['n', 'k'] : ['Re Q', 'Im Q'];
    const { wavelengthsNm: x } = residuals;
    return [
      { name: first, x, y: residuals.first, tone: 'ink', symbol: 'open', width: 1.2 },
      { name: second, x, y: residuals.second, tone: 'accent', dash: 'dashed', width: 1.6 },
    ];
  }, [target, residuals]);
  return (
    <LinePlot
      series={series}
      xAxis={xAxis}
      yAxes={yAxes}
      height={180}
      ariaLabel="Residuals: the table less the fit"
      fileName="residuals"
    />
  );
}
