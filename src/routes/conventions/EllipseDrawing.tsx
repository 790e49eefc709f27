import { Arrow } from '../../components/Arrow.tsx';

const center = [150, 132] as const;
const major = 92;
const minor = 34;
const tiltDeg = 28;

/** Looking into the arriving beam: the sense in which rotation and ellipticity are positive. */
export function EllipseDrawing() {
  const tilt = (tiltDeg * Math.PI) / 180;
  // p is up; s lies a quarter turn counter-clockwise from it, to the left. The page's y points down.
  const axisEnd = [center[0] - major * Math.sin(tilt), center[1] - major * Math.cos(tilt)] as const;
  const minorEnd = [center[0] - minor * Math.cos(tilt), center[1] + minor * Math.sin(tilt)] as const;
  const arc = 108;
  const arcEnd = [center[0] - arc * Math.sin(tilt), center[1] - arc * Math.cos(tilt)] as const;
  return (
    <svg
      viewBox="0 0 300 250"
      role="img"
      aria-label="Looking into the arriving beam, p points up and s to the left. The long axis of the ellipse is turned counter-clockwise from p toward s by the positive angle phi. The field runs counter-clockwise for positive ellipticity chi, whose tangent is the short axis over the long axis."
      className="w-full max-w-[340px]"
      fontSize="13"
    >
      <Arrow from={[center[0], center[1] + 104]} to={[center[0], 14]} color="var(--muted)" width={1.4} />
      <Arrow from={[center[0] + 118, center[1]]} to={[24, center[1]]} color="var(--muted)" width={1.4} />
      <text x={center[0] + 8} y="24" fill="var(--ink)" fontStyle="italic" fontWeight="600">
        p
      </text>
      <text x="22" y={center[1] - 9} fill="var(--ink)" fontStyle="italic" fontWeight="600">
        s
      </text>
      <ellipse
        cx={center[0]}
        cy={center[1]}
        rx={minor}
        ry={major}
        transform={`rotate(${-tiltDeg} ${center[0]} ${center[1]})`}
        fill="none"
        stroke="var(--accent)"
        strokeWidth="2.2"
      />
      <line
        x1={center[0]}
        y1={center[1]}
        x2={axisEnd[0]}
        y2={axisEnd[1]}
        stroke="var(--rotation)"
        strokeWidth="2"
      />
      <line
        x1={center[0]}
        y1={center[1]}
        x2={minorEnd[0]}
        y2={minorEnd[1]}
        stroke="var(--ellipticity)"
        strokeWidth="2"
        strokeDasharray="5 3"
      />
      <path
        d={`M ${center[0]} ${center[1] - arc} A ${arc} ${arc} 0 0 0 ${arcEnd[0] + 5} ${arcEnd[1] - 3}`}
        fill="none"
        stroke="var(--rotation)"
        strokeWidth="1.6"
      />
      <Arrow
        from={[arcEnd[0] + 12, arcEnd[1] - 6]}
        to={[arcEnd[0] - 3, arcEnd[1] + 2]}
        color="var(--rotation)"
        width={1.6}
      />
      <text x={center[0] - 50} y="14" fill="var(--rotation)" fontWeight="600">
        +φ
      </text>
      <text x="0" y={center[1] + 48} fill="var(--ellipticity)" fontWeight="600">
        tan χ = short / long
      </text>
      <Arrow
        from={[center[0] + 62, center[1] + 40]}
        to={[center[0] + 66, center[1] + 18]}
        color="var(--accent)"
      />
      <text x={center[0] + 60} y={center[1] + 62} fill="var(--muted)">
        +χ turns so
      </text>
    </svg>
  );
}
