import type { PlotLayout } from './plotLayout.ts';
import { toPixel } from './plotScale.ts';
import type { PlotSeries } from './plotTypes.ts';
import { SeriesMark } from './SeriesMark.tsx';

type Props = {
  layout: PlotLayout;
  rows: readonly { series: PlotSeries; value: string }[];
  cursor: number;
  title: string;
};

/** The values of all curves at the crosshair, on the side of it that has more room. */
export function PlotReadout({ layout, rows, cursor, title }: Props) {
  const x = toPixel(layout.x, cursor);
  const leftSide = x > (layout.frame.left + layout.frame.right) / 2;
  return (
    <div
      aria-hidden="true"
      className="border-line bg-panel pointer-events-none absolute z-10 rounded-lg border px-3 py-2 text-[12.5px] shadow-sm"
      style={{
        top: layout.frame.top + 6,
        left: x + (leftSide ? -12 : 12),
        transform: leftSide ? 'translateX(-100%)' : undefined,
      }}
    >
      <div className="text-muted mb-1 whitespace-nowrap">{title}</div>
      <table>
        <tbody>
          {rows.map(({ series, value }) => (
            <tr key={series.name}>
              <td className="pr-2">
                <SeriesMark series={series} />
              </td>
              <td className="pr-3 whitespace-nowrap">{series.name}</td>
              <td className="text-right font-semibold whitespace-nowrap">{value}</td>
            </tr>
          ))}
        </tbody>
      </table>
    </div>
  );
}
