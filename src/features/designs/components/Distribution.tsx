import type { Distribution as Spread } from '../../../../shared/toleranceDesign.ts';
import { printQuantity, readingQuantities } from '../model/quantities.ts';
import type { SpreadReading } from '../model/readingNames.ts';

type Props = { reading: SpreadReading; nominal: number | null; distribution: Spread | null };

const WIDTH = 320;
const HEIGHT = 110;
const BASE = 92;

/** The histogram of one reading over all films, with the film as drawn, the median and the one-sigma quantiles. */
export function Distribution({ reading, nominal, distribution }: Props) {
  const look = readingQuantities[reading];
  return (
    <figure className="card m-0 min-w-0 px-4 py-3" aria-label={`Spread of the ${look.label}`}>
      <figcaption className="font-semibold first-letter:uppercase">{look.label}</figcaption>
      {distribution === null ? (
        <p className="mt-1 text-note text-muted">
          {nominal === null
            ? 'It does not exist for any of the films.'
            : `${printQuantity(look, nominal)} as drawn. Its spread is computed when it is the signal or a demand.`}
        </p>
      ) : (
        <>
          <Histogram distribution={distribution} nominal={nominal} />
          <dl className="grid grid-cols-[auto_minmax(0,1fr)] gap-x-3 text-note">
            <Fact term="As drawn">{printQuantity(look, nominal)}</Fact>
            <Fact term="Median">{printQuantity(look, distribution.quantiles[2] ?? null)}</Fact>
            <Fact term="68.27 % within">{between(reading, distribution, 1, 3)}</Fact>
            <Fact term="95.45 % within">{between(reading, distribution, 0, 4)}</Fact>
            <Fact term="Standard deviation">
              {printQuantity({ ...look, signed: false }, distribution.deviation, 3)}
            </Fact>
          </dl>
        </>
      )}
    </figure>
  );
}

function Fact({ term, children }: { term: string; children: string }) {
  return (
    <>
      <dt className="text-muted">{term}</dt>
      <dd className="text-right">{children}</dd>
    </>
  );
}

function between(reading: SpreadReading, { quantiles }: Spread, low: number, high: number): string {
  const look = readingQuantities[reading];
  return `${printQuantity({ ...look, unit: '' }, quantiles[low] ?? null)} to ${printQuantity(look, quantiles[high] ?? null)}`;
}

function Histogram({ distribution, nominal }: { distribution: Spread; nominal: number | null }) {
  const { from, to, counts } = distribution.histogram;
  const most = Math.max(...counts, 1);
  const bar = WIDTH / counts.length;
  // All films alike: one bar, in the middle.
  const place = (value: number) => (to > from ? ((value - from) / (to - from)) * WIDTH : WIDTH / 2);
  const lines = [
    { at: distribution.quantiles[1], dash: '2 3', label: '' },
    { at: distribution.quantiles[2], dash: '6 3', label: 'median' },
    { at: distribution.quantiles[3], dash: '2 3', label: '' },
    { at: nominal, dash: undefined, label: 'drawn' },
  ].flatMap(({ at, ...line }) => (at === null || at === undefined ? [] : [{ ...line, x: place(at) }]));
  return (
    <svg viewBox={`0 0 ${WIDTH} ${HEIGHT}`} className="my-1 w-full" aria-hidden="true" focusable="false">
      {counts.map((count, index) => (
        <rect
          key={index}
          x={index * bar + 0.5}
          width={bar - 1}
          y={BASE - (count / most) * (BASE - 16)}
          height={(count / most) * (BASE - 16)}
          fill="var(--reflectance)"
          opacity="0.45"
        />
      ))}
      <line x1="0" x2={WIDTH} y1={BASE} y2={BASE} stroke="var(--edge)" />
      {lines.map(({ x, dash, label }, index) => (
        <g key={index}>
          <line
            x1={x}
            x2={x}
            y1={label === 'drawn' ? 8 : 14}
            y2={BASE}
            stroke="var(--ink)"
            strokeWidth={label === 'drawn' ? 1.8 : 1.2}
            strokeDasharray={dash}
          />
          {label !== '' && (
            <text
              x={Math.min(Math.max(x, 20), WIDTH - 20)}
              y={label === 'drawn' ? 7 : HEIGHT - 6}
              textAnchor="middle"
              fontSize="10.5"
              fill="var(--muted)"
            >
              {label}
            </text>
          )}
        </g>
      ))}
    </svg>
  );
}
