import { Link } from 'react-router-dom';
import { Quantity } from '../../../components/Quantity.tsx';
import { formatNumber } from '../../../lib/format.ts';
import type { AngleUnit } from '../../../lib/format.ts';
import { paths } from '../../../lib/paths.ts';
import { azimuthReadings, pairRows, singleRows } from '../model/moreReadings.ts';
import type { ThreeStates } from '../model/moreReadings.ts';

type Props = {
  states: ThreeStates;
  unit: AngleUnit;
  azimuthDeg: number;
  onAzimuth: (azimuthDeg: number) => void;
};

/** Everything else that is known at the working point, small; every name leads to its definition. */
export function MoreReadings({ states, unit, azimuthDeg, onAzimuth }: Props) {
  const azimuth = azimuthReadings(states, azimuthDeg, unit);
  return (
    <div className="flex flex-col gap-3">
      <div className="grid gap-x-8 gap-y-3 md:grid-cols-2">
        <table className="w-full self-start text-left text-note">
          <caption className="sr-only">Readings for p and s light</caption>
          <thead className="text-small text-muted">
            <tr>
              <th scope="col" className="font-medium">
                <span className="sr-only">Reading</span>
              </th>
              <th scope="col" className="text-right font-medium">
                p light
              </th>
              <th scope="col" className="pl-3 text-right font-medium">
                s light
              </th>
            </tr>
          </thead>
          <tbody>
            {pairRows(states, unit).map(({ label, anchor, p, s }) => (
              <tr key={label} className="border-t border-line">
                <Name label={label} anchor={anchor} />
                <Value text={p} />
                <Value text={s} />
              </tr>
            ))}
          </tbody>
        </table>
        <table className="w-full self-start text-left text-note">
          <caption className="sr-only">Readings of the film as a whole</caption>
          <tbody>
            {singleRows(states, unit).map(({ label, anchor, value }) => (
              <tr key={label} className="border-b border-line">
                <Name label={label} anchor={anchor} />
                <Value text={value} />
              </tr>
            ))}
            <tr>
              <th scope="row" className="py-1 font-normal">
                <Link className="no-underline hover:text-accent" to={`${paths.conventions}#input-azimuth`}>
                  Input azimuth
                </Link>{' '}
                <Quantity
                  label="input azimuth from p toward s"
                  unit="°"
                  value={azimuthDeg}
                  min={0}
                  max={180}
                  step={1}
                  onChange={onAzimuth}
                  className="[&>span:first-child]:bg-paper"
                />
              </th>
              <td className="py-1 text-right font-semibold">
                <span className="block">{azimuth.rotation ?? '–'}</span>
                <span className="block">{azimuth.ellipticity ?? '–'}</span>
              </td>
            </tr>
          </tbody>
        </table>
      </div>
      {states.given.mueller && <MuellerTable mueller={states.given.mueller} />}
      <p className="text-small text-muted">
        A dash: there is no such value here, such as a Faraday angle behind a magnetic substrate, or an
        amplitude where intensities are averaged.
      </p>
    </div>
  );
}

function Name({ label, anchor }: { label: string; anchor: string }) {
  return (
    <th scope="row" className="py-1 font-normal">
      <Link className="no-underline hover:text-accent" to={`${paths.conventions}#${anchor}`}>
        {label}
      </Link>
    </th>
  );
}

function Value({ text }: { text: string | null }) {
  return <td className="py-1 pl-3 text-right font-semibold whitespace-nowrap">{text ?? '–'}</td>;
}

const stokes = ['S0', 'S1', 'S2', 'S3'];

function MuellerTable({ mueller }: { mueller: readonly (readonly number[])[] }) {
  return (
    <details className="text-note">
      <summary className="w-fit rounded-box text-muted hover:text-ink">Mueller matrix of reflection</summary>
      <div className="overflow-x-auto">
        <table className="mt-1 text-right">
          <caption className="sr-only">Mueller matrix, rows: reflected, columns: incident</caption>
          <thead className="text-small text-muted">
            <tr>
              <th scope="col">
                <Link
                  className="font-medium no-underline hover:text-accent"
                  to={`${paths.conventions}#mueller`}
                >
                  out \ in
                </Link>
              </th>
              {stokes.map((name) => (
                <th key={name} scope="col" className="pl-5 font-medium">
                  {name}
                </th>
              ))}
            </tr>
          </thead>
          <tbody>
            {mueller.map((row, index) => (
              <tr key={stokes[index]} className="border-t border-line">
                <th scope="row" className="py-0.5 text-small font-medium text-muted">
                  {stokes[index]}
                </th>
                {row.map((value, column) => (
                  <td key={column} className="py-0.5 pl-5 whitespace-nowrap">
                    {Math.abs(value) < 1e-15 ? '0' : formatNumber(value, { digits: 5 })}
                  </td>
                ))}
              </tr>
            ))}
          </tbody>
        </table>
      </div>
    </details>
  );
}
