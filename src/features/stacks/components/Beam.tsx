import { memo } from 'react';
import { useElementWidth } from '../../../components/plot/useElementWidth.ts';
import type { Polarization } from '../../../../shared/stack.ts';
import { formatCount } from '../../../lib/format.ts';
import { along, angleArc, exaggeration, incomingRay, outgoingRay, raysApart } from '../model/beamGeometry.ts';
import type { Point } from '../model/beamGeometry.ts';

export type KerrAngles = { rotationDeg: number; ellipticityDeg: number };

type Props = {
  angleDeg: number;
  input: Polarization;
  /** Change of the reflected polarization for this input, deg; null where there is none or it is not known yet. */
  kerr: KerrAngles | null;
};

const HEIGHT = 206;
/** Left edge of the film, past the depth numbers. */
const FILM_LEFT = 38;
/** Where along the outgoing ray its polarization is drawn. */
const LENS_AT = 0.72;

/** Light arriving at its true angle, and the polarization it leaves with, tilted by a stated exaggeration. */
export const Beam = memo(function Beam({ angleDeg, input, kerr }: Props) {
  const [measure, width] = useElementWidth(372);
  const frame = { width, height: HEIGHT, x: (FILM_LEFT + width) / 2, surface: HEIGHT - 1 };
  const incoming = incomingRay(angleDeg, frame);
  const outgoing = outgoingRay(angleDeg, frame);
  const apart = raysApart(angleDeg, frame, LENS_AT, 17);
  const [inFrom, inTo] = [shifted(incoming.start, -apart), shifted(incoming.end, -apart)];
  const [outFrom, outTo] = [shifted(outgoing.start, apart), shifted(outgoing.end, apart)];
  const mark = along(inFrom, inTo, 0.34);
  const lens = along(outFrom, outTo, LENS_AT);
  const factor = kerr ? exaggeration(kerr.rotationDeg, kerr.ellipticityDeg) : 1;
  return (
    <div ref={measure}>
      <svg
        width={width}
        height={HEIGHT}
        viewBox={`0 0 ${width} ${HEIGHT}`}
        role="img"
        aria-label={`${input} polarized light arrives at ${angleDeg}° to the normal and is reflected`}
        className="block"
      >
        <line x1={frame.x} x2={frame.x} y1="22" y2={HEIGHT} stroke="var(--line)" strokeDasharray="3 4" />
        <Ray from={inFrom} to={inTo} />
        <Ray from={outFrom} to={outTo} opacity={0.75} />
        {angleDeg > 3 && <path d={angleArc(angleDeg, frame, 62)} fill="none" stroke="var(--muted)" />}
        <AngleText angleDeg={angleDeg} x={frame.x} y={frame.surface} apart={apart} />
        <PolarizationMark at={mark} angleDeg={angleDeg} input={input} />
        {kerr && (
          <Lens
            at={lens}
            width={width}
            input={input}
            rotationDeg={kerr.rotationDeg * factor}
            ellipticityDeg={kerr.ellipticityDeg * factor}
            factor={factor}
          />
        )}
      </svg>
    </div>
  );
});

function shifted(point: Point, by: number): Point {
  return { x: point.x + by, y: point.y };
}

function Ray({ from, to, opacity = 1 }: { from: Point; to: Point; opacity?: number }) {
  const direction = (Math.atan2(to.y - from.y, to.x - from.x) * 180) / Math.PI;
  return (
    <g opacity={opacity}>
      <line x1={from.x} y1={from.y} x2={to.x} y2={to.y} stroke="var(--accent)" strokeWidth="2" />
      <path
        d="M0 0l-11 -5v10z"
        transform={`translate(${to.x} ${to.y}) rotate(${direction})`}
        fill="var(--accent)"
      />
    </g>
  );
}

function AngleText({ angleDeg, x, y, apart }: { angleDeg: number; x: number; y: number; apart: number }) {
  const half = ((angleDeg / 2) * Math.PI) / 180;
  const steep = angleDeg < 14;
  return (
    <text
      x={steep ? x - apart - 80 * Math.sin(2 * half) - 8 : x - 80 * Math.sin(half)}
      y={y - 80 * Math.cos(half)}
      textAnchor={steep ? 'end' : 'middle'}
      fontSize="12"
      fill="var(--ink)"
    >
      {String(Number(angleDeg.toFixed(3)))}°
    </text>
  );
}

/** p swings in the drawing, across the beam; s swings across the drawing: a dot in a ring. */
function PolarizationMark({ at, angleDeg, input }: { at: Point; angleDeg: number; input: Polarization }) {
  return (
    <g transform={`translate(${at.x} ${at.y})`}>
      {input === 'p' ? (
        <line x1="-17" x2="17" transform={`rotate(${-angleDeg})`} stroke="var(--ink)" strokeWidth="2" />
      ) : (
        <>
          <circle r="6.5" fill="var(--paper)" stroke="var(--ink)" strokeWidth="2" />
          <circle r="2" fill="var(--ink)" />
        </>
      )}
      <text
        x={input === 'p' ? -15 : -13}
        y={input === 'p' ? 22 : 20}
        textAnchor="middle"
        fontSize="12"
        fill="var(--ink)"
      >
        {input}
      </text>
    </g>
  );
}

type LensProps = {
  at: Point;
  width: number;
  input: Polarization;
  rotationDeg: number;
  ellipticityDeg: number;
  factor: number;
};

/** The outgoing polarization as an observer sees it who looks into the beam: upright is the input's own direction. */
function Lens({ at, width, input, rotationDeg, ellipticityDeg, factor }: LensProps) {
  const ratio = Math.min(1, Math.abs(Math.tan((Math.min(44, Math.abs(ellipticityDeg)) * Math.PI) / 180)));
  const place = { x: Math.min(Math.max(at.x, 24), width - 24), y: Math.max(at.y, 36) };
  const words =
    rotationDeg === 0 && ellipticityDeg === 0
      ? 'not turned'
      : factor === 1
        ? 'tilt as it is'
        : `tilt drawn × ${formatCount(factor)}`;
  // Clear of the ray, which comes from below left and goes on up to the right.
  const text =
    width - place.x > 132
      ? ({ x: place.x + 28, y: place.y + 18, anchor: 'start' } as const)
      : ({ x: width - 1, y: place.y + (place.y + 44 < HEIGHT ? 38 : -30), anchor: 'end' } as const);
  return (
    <g>
      <g transform={`translate(${place.x} ${place.y})`}>
        <circle r="21" fill="var(--paper)" stroke="var(--line)" />
        <line y1="-19" y2="19" stroke="var(--muted)" strokeDasharray="2 3" />
        <ellipse
          rx={Math.max(0.9, 17 * ratio)}
          ry="17"
          fill="none"
          stroke="var(--rotation)"
          strokeWidth="2"
          transform={`rotate(${-rotationDeg})`}
        />
      </g>
      <text x={text.x} y={text.y} textAnchor={text.anchor} fontSize="11" fill="var(--muted)">
        {words}
        <title>
          The small ellipse is the reflected polarization for {input} light, looking into the beam.
        </title>
      </text>
    </g>
  );
}
