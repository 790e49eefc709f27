type ArcArrowProps = {
  center: readonly [x: number, y: number];
  radius: number;
  /** Counter-clockwise from the right, as on paper; the head stands at `toDeg`. */
  fromDeg: number;
  toDeg: number;
  color: string;
  width?: number;
};

const HEAD = 8;

/** A circular arrow of the drawings of sign habits. */
export function ArcArrow({ center, radius, fromDeg, toDeg, color, width = 2 }: ArcArrowProps) {
  const sense = Math.sign(toDeg - fromDeg);
  // The shaft ends where the head begins.
  const baseDeg = toDeg - sense * ((HEAD / radius) * (180 / Math.PI));
  const at = (angleDeg: number, distance = radius): [number, number] => {
    const angle = (angleDeg * Math.PI) / 180;
    return [center[0] + distance * Math.cos(angle), center[1] - distance * Math.sin(angle)];
  };
  const large = Math.abs(baseDeg - fromDeg) > 180 ? 1 : 0;
  // The page's y points down, so counter-clockwise is sweep 0.
  const sweep = sense > 0 ? 0 : 1;
  const head = [at(toDeg), at(baseDeg, radius - HEAD * 0.5), at(baseDeg, radius + HEAD * 0.5)];
  return (
    <g>
      <path
        d={`M ${at(fromDeg).join(' ')} A ${radius} ${radius} 0 ${large} ${sweep} ${at(baseDeg).join(' ')}`}
        fill="none"
        stroke={color}
        strokeWidth={width}
      />
      <polygon points={head.map((corner) => corner.join(',')).join(' ')} fill={color} />
    </g>
  );
}
