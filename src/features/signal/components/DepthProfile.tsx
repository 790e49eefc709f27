import { useMemo, useState } from 'react';
import type { KeyboardEvent, PointerEvent } from 'react';
import { Link } from 'react-router-dom';
import { useElementWidth } from '../../../components/plot/useElementWidth.ts';
import { formatNumber } from '../../../lib/format.ts';
import { paths } from '../../../lib/paths.ts';
import type { FilmLayer } from '../model/filmLayers.ts';
import { depthScale, layerAt, profileCurves, profileQuantities } from '../model/profile.ts';
import type { Depth, ProfileQuantity } from '../model/profile.ts';
import { ProfileCurves } from './ProfileCurves.tsx';

type Props = {
  depth: Depth;
  film: readonly FilmLayer[];
  substrate: { name: string; fill: string };
  /** Heights of layers on the compressed scale of the cross-section, px. */
  heightsOf: (thicknessesNm: readonly number[], roomPx: number, leastPx: number) => readonly number[];
  pending: boolean;
};

/** Room for the layers and for the part of the substrate that is shown, px. */
const FILM_PX = 210;
const SUBSTRATE_PX = 34;
/** Width of the strip of the film beside the curves, px. */
const STRIP_PX = 78;

const quantities: Record<ProfileQuantity, { label: string; unit: string }> = {
  field: { label: '|E|', unit: '' },
  absorbed: { label: 'absorbed per nm', unit: '/nm' },
  signal: { label: '|signal| per nm', unit: '/nm' },
};

/** What the light does on its way down: curves against depth beside the film, on the depth scale of the drawing. */
export function DepthProfile({ depth, film, substrate, heightsOf, pending }: Props) {
  const [measure, width] = useElementWidth(330);
  const [quantity, setQuantity] = useState<ProfileQuantity>('field');
  const [cursor, setCursor] = useState<number | null>(null);
  const scale = useMemo(() => {
    const least = Math.min(24, (0.6 * FILM_PX) / Math.max(1, film.length));
    const heights = heightsOf(
      film.map(({ thicknessNm }) => thicknessNm),
      FILM_PX,
      least,
    );
    return depthScale(film, heights, depth.depthNm.at(-1) ?? 0, SUBSTRATE_PX);
  }, [film, depth, heightsOf]);
  const curves = useMemo(() => profileCurves(depth, quantity), [depth, quantity]);
  const pixels = useMemo(() => depth.depthNm.map(scale.toPixel), [depth, scale]);
  const at = cursor !== null && cursor < pixels.length ? cursor : null;

  const onPointerMove = (event: PointerEvent<HTMLElement>) => {
    const y = event.clientY - event.currentTarget.getBoundingClientRect().top;
    let near = 0;
    for (const [index, pixel] of pixels.entries()) {
      if (Math.abs(pixel - y) < Math.abs(pixels[near]! - y)) near = index;
    }
    setCursor(near);
  };
  const onKeyDown = (event: KeyboardEvent) => {
    const last = pixels.length - 1;
    const from = at ?? -1;
    const steps: Record<string, number> = {
      ArrowDown: from + 1,
      ArrowRight: from + 1,
      ArrowUp: from - 1,
      ArrowLeft: from - 1,
      PageDown: from + Math.ceil(last / 10),
      PageUp: from - Math.ceil(last / 10),
      Home: 0,
      End: last,
    };
    const next = steps[event.key];
    if (next !== undefined) setCursor(Math.min(Math.max(next, 0), last));
    else if (event.key === 'Escape') setCursor(null);
    else return;
    event.preventDefault();
  };
  const text = at === null ? null : readout(at);
  function readout(index: number): string {
    const depthNm = depth.depthNm[index]!;
    const inSubstrate = (depth.position[index] ?? 0) === (depth.position.at(-1) ?? 0);
    const layer = inSubstrate ? null : layerAt(film, depthNm);
    const values = curves.map(
      ({ light, values: own }) =>
        `${light ? `${light} ` : ''}${formatNumber(own[index]!, { digits: 3 })}${quantities[quantity].unit}`,
    );
    return `${formatNumber(depthNm, { digits: 3 })} nm, ${layer?.label ?? substrate.name}: ${quantities[quantity].label.replace(' per nm', '')} ${values.join(', ')}`;
  }

  return (
    <section aria-label="Depth profile" className="card min-w-0 px-4 pt-3.5 pb-3">
      <div className="flex flex-wrap items-center justify-between gap-x-3 gap-y-1">
        <h2 className="text-[14px]">
          <Link className="no-underline hover:text-accent" to={`${paths.conventions}#depth-profile`}>
            Depth profile
          </Link>
        </h2>
        <select
          aria-label="Quantity against depth"
          value={quantity}
          onChange={(event) =>
            setQuantity(profileQuantities.find((one) => one === event.target.value) ?? 'field')
          }
          className="-mr-1 h-7 field-sizing-content rounded-control border border-transparent bg-transparent px-1 text-note text-muted hover:border-edge hover:text-ink"
        >
          {profileQuantities.map((one) => (
            <option key={one} value={one}>
              {quantities[one].label}
            </option>
          ))}
        </select>
      </div>
      <div
        ref={measure}
        className={`relative mt-1 transition-opacity ${pending ? 'opacity-55' : ''}`}
        style={{ height: scale.height + 22 }}
      >
        <ProfileCurves
          width={width}
          stripPx={STRIP_PX}
          scale={scale}
          pixels={pixels}
          curves={curves}
          substrate={substrate}
          cursor={at}
        />
        <div
          role="slider"
          tabIndex={0}
          aria-orientation="vertical"
          aria-label="Depth at which values are read"
          aria-valuemin={0}
          aria-valuemax={Number((depth.depthNm.at(-1) ?? 0).toPrecision(6))}
          aria-valuenow={Number((depth.depthNm[at ?? 0] ?? 0).toPrecision(6))}
          aria-valuetext={text ?? 'no value is being read'}
          className="absolute inset-x-0 top-0 cursor-crosshair touch-pan-y"
          style={{ height: scale.height }}
          onKeyDown={onKeyDown}
          onPointerMove={onPointerMove}
          onPointerDown={onPointerMove}
          onPointerLeave={() => setCursor(null)}
        />
      </div>
      <p className="min-h-[2.8em] text-small text-muted" aria-hidden="true">
        {text ?? 'For incident light of unit amplitude and power. Point at a depth to read values.'}
      </p>
    </section>
  );
}
