type Point = readonly [x: number, y: number];

type ArrowProps = { from: Point; to: Point; color: string; width?: number; head?: number; dash?: string };

/** A straight arrow of the conventions drawings; the shaft ends where the head begins. */
export function Arrow({ from, to, color, width = 2, head = 9, dash }: ArrowProps) {
  const [dx, dy] = [to[0] - from[0], to[1] - from[1]];
  const length = Math.hypot(dx, dy);
  const [ux, uy] = [dx / length, dy / length];
  const base: Point = [to[0] - head * ux, to[1] - head * uy];
  const half = head * 0.42;
  const corners = [
    to,
    [base[0] - half * uy, base[1] + half * ux],
    [base[0] + half * uy, base[1] - half * ux],
  ];
  return (
    <g>
      <line
        x1={from[0]}
        y1={from[1]}
        x2={base[0]}
        y2={base[1]}
        stroke={color}
        strokeWidth={width}
        strokeDasharray={dash}
      />
      <polygon points={corners.map((corner) => corner.join(',')).join(' ')} fill={color} />
    </g>
  );
}

/** A vector that points out of the page at the reader: the tip of an arrow seen from the front. */
export function TowardReader({ at, color }: { at: Point; color: string }) {
  return (
    <g>
      <circle cx={at[0]} cy={at[1]} r="7" fill="var(--panel)" stroke={color} strokeWidth="1.8" />
      <circle cx={at[0]} cy={at[1]} r="2.2" fill={color} />
    </g>
  );
}
