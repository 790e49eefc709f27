import type { PlotSeries } from './plotTypes.ts';

const dashArrays = { solid: undefined, dashed: '5 3', dotted: '1.5 2.5' } as const;

/** A short piece of the curve as it is drawn: colour, dash, width and marker. */
export function SeriesMark({ series }: { series: Pick<PlotSeries, 'tone' | 'dash' | 'width' | 'symbol'> }) {
  const stroke = `var(--${series.tone})`;
  return (
    <svg
      width="20"
      height="8"
      aria-hidden="true"
      focusable="false"
      className="inline-block shrink-0 align-middle"
    >
      <line
        x1="1"
        x2="19"
        y1="4"
        y2="4"
        stroke={stroke}
        strokeWidth={series.width ?? 2}
        strokeDasharray={dashArrays[series.dash ?? 'solid']}
      />
      {series.symbol === 'open' && (
        <circle cx="10" cy="4" r="2.8" fill="var(--panel)" stroke={stroke} strokeWidth="1.4" />
      )}
    </svg>
  );
}
