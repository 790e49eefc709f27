import { Link } from 'react-router-dom';
import { readingDefinitions } from '../../../../shared/readings.ts';
import type { ReadingName } from '../../../../shared/run.ts';
import { readingNames } from '../../../../shared/run.ts';
import { familyLooks } from '../../../components/plot/readingSeries.ts';
import { SeriesMark } from '../../../components/plot/SeriesMark.tsx';
import { formatAngle, formatNumber } from '../../../lib/format.ts';
import type { AngleUnit } from '../../../lib/format.ts';
import { paths } from '../../../lib/paths.ts';
import type { PlaceValues } from '../model/sweepPlace.ts';

type Props = { place: string; values: PlaceValues['values']; unit: AngleUnit };
type Row = { family: string; label: string; anchor: string; p: ReadingName | null; s: ReadingName | null };

/** Every stored reading at one place of the sweep, for both lights. */
export function ValueTable({ place, values, unit }: Props) {
  const rows = rowsOf(values);
  return (
    <table className="w-full text-left">
      <caption className="pb-1 text-left text-note text-muted">Values at {place}</caption>
      <thead>
        <tr className="border-b border-line text-small text-muted">
          <th scope="col" className="py-1 font-medium">
            <span className="sr-only">Reading</span>
          </th>
          <th scope="col" className="py-1 text-right font-medium">
            p light
          </th>
          <th scope="col" className="py-1 pl-4 text-right font-medium">
            s light
          </th>
        </tr>
      </thead>
      <tbody>
        {rows.map((row) => (
          <tr key={row.family} className="border-b border-line last:border-b-0">
            <th scope="row" className="py-1.5 pr-2 font-normal">
              <span className="flex items-center gap-2">
                <Mark family={row.family} />
                <Link
                  to={`${paths.conventions}#${row.anchor}`}
                  className="no-underline hover:text-accent hover:underline"
                >
                  {row.label}
                </Link>
              </span>
            </th>
            {[row.p, row.s].map((name, index) => (
              <td key={index} className="py-1.5 pl-3 text-right font-semibold whitespace-nowrap">
                {name ? print(name, values[name] ?? NaN, unit) : ''}
              </td>
            ))}
          </tr>
        ))}
      </tbody>
    </table>
  );
}

function Mark({ family }: { family: string }) {
  switch (family) {
    case 'rotation':
    case 'ellipticity':
    case 'reflectance':
    case 'cross':
    case 'contrast':
      return <SeriesMark series={familyLooks[family]} />;
    default:
      return <span className="inline-block w-5" />;
  }
}

function rowsOf(values: PlaceValues['values']): Row[] {
  const rows = new Map<string, Row>();
  for (const name of readingNames) {
    if (values[name] === undefined) continue;
    const { family, label, anchor, polarization } = readingDefinitions[name];
    const row = rows.get(family) ?? { family, label: label.split(',')[0] ?? label, anchor, p: null, s: null };
    rows.set(family, { ...row, [polarization ?? 'p']: name });
  }
  return [...rows.values()];
}

function print(name: ReadingName, value: number, unit: AngleUnit): string {
  if (Number.isNaN(value)) return '–';
  const { family, unit: stored } = readingDefinitions[name];
  if (stored === 'deg') return `${formatAngle(value, unit)} ${unit}`;
  if (family !== 'cross' && family !== 'contrast') return formatNumber(value);
  // Below this a contrast is the rounding of two equal reflectances.
  if (Math.abs(value) < 1e-13) return '0';
  return `${formatNumber(value * 1000, { signed: family === 'contrast' })} × 10⁻³`;
}
