import { useId } from 'react';
import type { MaterialClass } from '../../../../shared/material.ts';
import type { Band, Outline } from '../outline.ts';

const width = 56;
const height = 36;
const substrateHeight = 9;

const fills: Record<MaterialClass, string> = {
  magnet: 'var(--magnet-soft)',
  noble: 'var(--noble)',
  refractory: 'var(--refractory)',
  dielectric: 'var(--dielectric)',
  semiconductor: 'var(--semiconductor)',
};

function fillOf(band: Pick<Band, 'class'>): string {
  return band.class ? fills[band.class] : 'var(--line)';
}

/** Thickness on the compressed scale that shows 0.4 nm beside 500 nm. */
function weightOf(thicknessNm: number): number {
  return 0.35 + Math.log1p(thicknessNm);
}

type Placed = { band: Band; top: number; height: number };

/** The bands from the surface down to the substrate. */
function place(bands: readonly Band[]): Placed[] {
  const total = bands.reduce((sum, band) => sum + weightOf(band.thicknessNm), 0);
  // A film of few layers does not fill the room: one thick bar would look like one thick layer.
  const room = Math.min(height - substrateHeight, 4 + total * 4);
  const placed: Placed[] = [];
  let top = height - substrateHeight - room;
  for (const band of bands) {
    const bandHeight = (room * weightOf(band.thicknessNm)) / total;
    placed.push({ band, top, height: bandHeight });
    top += bandHeight;
  }
  return placed;
}

/** The cross-section as a thumbnail: bands by class, magnetic ones hatched. The text beside it says the same. */
export function StackGlyph({ outline }: { outline: Outline | null }) {
  const hatch = useId();
  const bands = place(outline?.bands ?? []);
  return (
    <svg
      width={width}
      height={height}
      viewBox={`0 0 ${width} ${height}`}
      aria-hidden="true"
      className="shrink-0 rounded-[4px]"
    >
      <defs>
        <pattern id={hatch} width="4" height="4" patternTransform="rotate(45)" patternUnits="userSpaceOnUse">
          <line x1="0" y1="0" x2="0" y2="4" stroke="var(--magnet)" strokeWidth="1.6" opacity="0.6" />
        </pattern>
      </defs>
      <rect width={width} height={height} fill="var(--paper)" />
      {bands.map(({ band, top, height: bandHeight }, position) => (
        <g key={position}>
          <rect y={top} width={width} height={bandHeight} fill={fillOf(band)} />
          {band.magnetic ? <rect y={top} width={width} height={bandHeight} fill={`url(#${hatch})`} /> : null}
          {bands.length < 16 ? (
            <line
              x2={width}
              y1={top + bandHeight}
              y2={top + bandHeight}
              stroke="var(--paper)"
              strokeWidth="0.8"
            />
          ) : null}
        </g>
      ))}
      <rect
        y={height - substrateHeight}
        width={width}
        height={substrateHeight}
        fill={outline ? fillOf(outline.substrate) : 'var(--line)'}
        opacity="0.75"
      />
    </svg>
  );
}
