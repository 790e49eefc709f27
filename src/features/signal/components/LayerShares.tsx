import { useState } from 'react';
import { Link } from 'react-router-dom';
import { useElementWidth } from '../../../components/plot/useElementWidth.ts';
import { formatNumber } from '../../../lib/format.ts';
import { paths } from '../../../lib/paths.ts';
import type { FilmLayer } from '../model/filmLayers.ts';
import { thousandths } from '../model/moreReadings.ts';
import { amplitudes, modulus, partOfTotal, sharesOf } from '../model/shares.ts';
import type { Amplitude, Contributions, ShareSum } from '../model/shares.ts';
import { ShareArrows } from './ShareArrows.tsx';

type Props = {
  contributions: Contributions;
  film: readonly FilmLayer[];
  substrateName: string;
  pending: boolean;
  /** Told the layer of the document that is pointed at. */
  onActiveLayer?: ((layerId: string | null) => void) | undefined;
};

const names: Record<Amplitude, string> = { sp: 'r_sp', ps: 'r_ps', pp: 'r_pp' };

/** Where the signal comes from: what each magnetic layer adds to a reflected amplitude, to first order in Q. */
export function LayerShares({ contributions, film, substrateName, pending, onActiveLayer }: Props) {
  const [measure, width] = useElementWidth(390);
  const [amplitude, setAmplitude] = useState<Amplitude>('sp');
  const [active, setActive] = useState<number | null>(null);
  const sum = sharesOf(contributions, film, substrateName, amplitude);
  const point = (index: number | null) => {
    setActive(index);
    onActiveLayer?.(index === null ? null : (sum.shares[index]?.layerId ?? null));
  };
  return (
    <section aria-label="Where the signal comes from" className="card min-w-0 px-4 pt-3.5 pb-3">
      <div className="flex flex-wrap items-center justify-between gap-x-3 gap-y-1">
        <h2 className="text-[14px]">
          <Link className="no-underline hover:text-accent" to={`${paths.conventions}#layer-shares`}>
            Where the signal comes from
          </Link>
        </h2>
        <span role="group" aria-label="Amplitude" className="-mr-1.5 inline-flex gap-0.5">
          {amplitudes.map((one) => (
            <button
              key={one}
              type="button"
              aria-pressed={one === amplitude}
              onClick={() => setAmplitude(one)}
              className="rounded-box px-1.5 py-0.5 text-note text-muted hover:text-ink aria-pressed:bg-accent-soft aria-pressed:font-semibold aria-pressed:text-accent"
            >
              {names[one]}
            </button>
          ))}
        </span>
      </div>
      <div ref={measure} className={`transition-opacity ${pending ? 'opacity-55' : ''}`}>
        {sum.shares.length === 0 ? (
          <p className="py-10 text-center text-note text-muted">
            No layer adds to {names[amplitude]} for this magnetization, to first order.
          </p>
        ) : (
          <ShareArrows
            sum={sum}
            width={width}
            height={236}
            active={active !== null && active < sum.shares.length ? active : null}
            onActive={point}
            label={describe(sum, names[amplitude])}
          />
        )}
      </div>
      {sum.shares.length > 0 && (
        <>
          <p className="text-small text-muted">
            Dashed: the sum, |{names[amplitude]}| {thousandths(modulus(sum.total))}. Ring: exact,{' '}
            {thousandths(modulus(sum.exact))}; they differ by {thousandths(sum.difference, 2)}.
          </p>
          <details className="mt-1 text-small">
            <summary className="w-fit rounded-box text-muted hover:text-ink">
              {sum.shares.length} {sum.shares.length === 1 ? 'share' : 'shares'} as a table
            </summary>
            <ShareTable sum={sum} onActive={point} />
          </details>
        </>
      )}
    </section>
  );
}

function ShareTable({ sum, onActive }: { sum: ShareSum; onActive: (index: number | null) => void }) {
  const rows = sum.shares
    .map((share, index) => ({ share, index }))
    .sort((one, other) => modulus(other.share.value) - modulus(one.share.value));
  return (
    <div className="mt-1 max-h-64 overflow-auto" tabIndex={0} role="group" aria-label="Shares by size">
      <table className="w-full text-left">
        <thead className="text-muted">
          <tr>
            <th scope="col" className="font-medium">
              Layer
            </th>
            <th scope="col" className="text-right font-medium">
              size × 10³
            </th>
            <th scope="col" className="text-right font-medium">
              phase
            </th>
            <th scope="col" className="text-right font-medium">
              of the sum
            </th>
          </tr>
        </thead>
        <tbody>
          {rows.map(({ share, index }) => (
            <tr
              key={share.key}
              className="border-t border-line hover:bg-accent-soft"
              onPointerEnter={() => onActive(index)}
              onPointerLeave={() => onActive(null)}
            >
              <th scope="row" className="py-0.5 font-normal">
                {share.label}
              </th>
              <td className="text-right">{formatNumber(modulus(share.value) * 1000)}</td>
              <td className="text-right">{phase(share.value)}</td>
              <td className="text-right">{percent(partOfTotal(share.value, sum.total))}</td>
            </tr>
          ))}
        </tbody>
      </table>
    </div>
  );
}

function phase([re, im]: readonly [number, number]): string {
  return `${formatNumber((Math.atan2(im, re) * 180) / Math.PI, { digits: 3, signed: true })}°`;
}

function percent(share: number): string {
  return Number.isNaN(share) ? '–' : `${formatNumber(100 * share, { digits: 3 })} %`;
}

function describe(sum: ShareSum, name: string): string {
  const largest = [...sum.shares].sort((a, b) => modulus(b.value) - modulus(a.value))[0];
  return (
    `${sum.shares.length} layer shares of ${name} add up to ${thousandths(modulus(sum.total))}; ` +
    `the largest is that of ${largest?.label ?? 'none'}. The table below lists them.`
  );
}
