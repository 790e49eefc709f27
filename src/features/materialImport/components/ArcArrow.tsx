type ArcArrowProps = {
  center: readonly [x: number, y: number];
  radius: number;
  /** Height over width: below 1 the path is an ellipse. */
  flatten?: number;
  /** Counter-clockwise from the right, as on paper; the head stands at `toDeg`. */
  fromDeg: number;
  toDeg: number;
  color: string;
  width?: number;
};

const HEAD = 8;
const STEPS = 48;

/** A curved arrow of the drawings of sign habits. */
export function ArcArrow(props: ArcArrowProps) {
  const { center, radius, flatten = 1, fromDeg, toDeg, color, width = 2 } = props;
  // The page's y points down.
  const at = (angleDeg: number): [number, number] => {
    const angle = (angleDeg * Math.PI) / 180;
    return [center[0] + radius * Math.cos(angle), center[1] - radius * flatten * Math.sin(angle)];
  };
  // The shaft ends where the head begins.
  const baseDeg = toDeg - Math.sign(toDeg - fromDeg) * ((HEAD / radius) * (180 / Math.PI));
  const shaft = Array.from({ length: STEPS + 1 }, (_, step) =>
    at(fromDeg + ((baseDeg - fromDeg) * step) / STEPS),
  );
  const [tip, base] = [at(toDeg), at(baseDeg)];
  const [dx, dy] = [tip[0] - base[0], tip[1] - base[1]];
  const half = HEAD / 2 / Math.hypot(dx, dy);
  const head = [tip, [base[0] - dy * half, base[1] + dx * half], [base[0] + dy * half, base[1] - dx * half]];
  return (
    <g>
      <polyline
        points={shaft.map((point) => point.join(',')).join(' ')}
        fill="none"
        stroke={color}
        strokeWidth={width}
      />
      <polygon points={head.map((corner) => corner.join(',')).join(' ')} fill={color} />
    </g>
  );
}
