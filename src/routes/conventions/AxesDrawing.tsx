import { useId } from 'react';
import { Arrow, TowardReader } from '../../components/Arrow.tsx';

const origin = [330, 232] as const;
const thetaDeg = 50;
const [sin, cos] = [Math.sin((thetaDeg * Math.PI) / 180), Math.cos((thetaDeg * Math.PI) / 180)];
/** Direction inside the film, only for the drawing. */
const [sinIn, cosIn] = [0.42, 0.908];

/** A point at `along` pixels on the beam that has this direction on the page (y of the page points down, as z does). */
function onBeam(direction: readonly [number, number], along: number): readonly [number, number] {
  return [origin[0] + along * direction[0], origin[1] + along * direction[1]];
}

const incident = [sin, cos] as const;
const reflected = [sin, -cos] as const;
const transmitted = [sinIn, cosIn] as const;

function shifted(point: readonly [number, number], by: readonly [number, number], times: number) {
  return [point[0] + times * by[0], point[1] + times * by[1]] as const;
}

/** The plane of incidence seen along y: axes, beams and the triads p, s, k of each. */
export function AxesDrawing() {
  const hatch = useId();
  const atIncident = onBeam(incident, -120);
  const atReflected = onBeam(reflected, 120);
  const atTransmitted = onBeam(transmitted, 84);
  const pIncident = [cos, -sin] as const;
  const pReflected = [-cos, -sin] as const;
  const pTransmitted = [cosIn, -sinIn] as const;
  return (
    <svg
      viewBox="14 50 540 312"
      role="img"
      aria-label="The plane of incidence. x runs to the right along the film, z down into the sample, y out of the page at the reader. The incident beam comes from the upper left at the angle theta to the normal, the reflected beam leaves to the upper right. s points at the reader for every beam. p of the incident beam points up and to the right, p of the reflected beam up and to the left."
      className="w-full max-w-[720px]"
      fontSize="15"
    >
      <defs>
        <pattern id={hatch} width="7" height="7" patternTransform="rotate(45)" patternUnits="userSpaceOnUse">
          <line x1="0" y1="0" x2="0" y2="7" stroke="var(--magnet)" strokeWidth="1.3" opacity="0.42" />
        </pattern>
      </defs>
      <g>
        <rect x="120" y="232" width="420" height="34" fill="var(--noble)" />
        <rect x="120" y="266" width="420" height="34" fill="var(--magnet-soft)" />
        <rect x="120" y="266" width="420" height="34" fill={`url(#${hatch})`} />
        <rect x="120" y="300" width="420" height="56" fill="var(--semiconductor)" opacity="0.6" />
        <text x="528" y="254" textAnchor="end" fill="var(--ink)">
          layers
        </text>
        <text x="528" y="334" textAnchor="end" fill="var(--ink)">
          substrate
        </text>
      </g>
      <line x1={origin[0]} y1="62" x2={origin[0]} y2="356" stroke="var(--muted)" strokeDasharray="3 4" />
      <path
        d={`M ${origin[0]} ${origin[1] - 64} A 64 64 0 0 0 ${origin[0] - 64 * sin} ${origin[1] - 64 * cos}`}
        fill="none"
        stroke="var(--muted)"
      />
      <text x={origin[0] - 33} y={origin[1] - 68} fill="var(--ink)" fontStyle="italic">
        θ
      </text>

      <Arrow from={onBeam(incident, -226)} to={onBeam(incident, -3)} color="var(--accent)" />
      <Arrow from={onBeam(reflected, 3)} to={onBeam(reflected, 226)} color="var(--accent)" />
      <Arrow from={onBeam(transmitted, 2)} to={onBeam(transmitted, 128)} color="var(--accent)" dash="5 4" />

      <Arrow from={atIncident} to={shifted(atIncident, pIncident, 56)} color="var(--ink)" />
      <TowardReader at={atIncident} color="var(--ink)" />
      <Label x={atIncident[0] + 44} y={atIncident[1] - 36} main="p" low="i" />
      <Label x={atIncident[0] - 22} y={atIncident[1] + 22} main="s" />

      <Arrow from={atReflected} to={shifted(atReflected, pReflected, 56)} color="var(--ink)" />
      <TowardReader at={atReflected} color="var(--ink)" />
      <Label x={atReflected[0] - 54} y={atReflected[1] - 36} main="p" low="r" />
      <Label x={atReflected[0] + 12} y={atReflected[1] + 22} main="s" />

      <Arrow from={atTransmitted} to={shifted(atTransmitted, pTransmitted, 48)} color="var(--ink)" />
      <TowardReader at={atTransmitted} color="var(--ink)" />
      <Label x={atTransmitted[0] + 50} y={atTransmitted[1] - 12} main="p" low="t" />

      <text x="157" y="76" textAnchor="middle" fill="var(--accent)" fontWeight="600">
        incident
      </text>
      <text x="503" y="76" textAnchor="middle" fill="var(--accent)" fontWeight="600">
        reflected
      </text>

      <g>
        <Arrow from={[46, 250]} to={[104, 250]} color="var(--ink)" />
        <Arrow from={[46, 250]} to={[46, 310]} color="var(--ink)" />
        <TowardReader at={[46, 250]} color="var(--ink)" />
        <Label x={106} y={246} main="x" />
        <Label x={54} y={320} main="z" />
        <Label x={26} y={242} main="y" />
      </g>
    </svg>
  );
}

function Label({ x, y, main, low }: { x: number; y: number; main: string; low?: string }) {
  return (
    <text x={x} y={y} fill="var(--ink)" fontStyle="italic" fontWeight="600">
      {main}
      {low ? (
        <tspan dy="4" fontSize="11" fontStyle="normal">
          {low}
        </tspan>
      ) : null}
    </text>
  );
}
