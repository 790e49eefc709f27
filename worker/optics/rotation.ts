import type { Vector } from '../../shared/complex.ts';

/** A rotation of space: three rows of three. */
export type Rotation = [Vector, Vector, Vector];

/**
 * About z by the first angle, then about the new y by the second, then about the new z by the third; deg.
 * Columns of the result are the turned x, y, z axes.
 */
export function eulerRotation([alphaDeg, betaDeg, gammaDeg]: Vector): Rotation {
  return composed(composed(aboutZ(alphaDeg), aboutY(betaDeg)), aboutZ(gammaDeg));
}

function cosSin(angleDeg: number): [cos: number, sin: number] {
  const angle = (angleDeg * Math.PI) / 180;
  return [Math.cos(angle), Math.sin(angle)];
}

function aboutZ(angleDeg: number): Rotation {
  const [cos, sin] = cosSin(angleDeg);
  return [
    [cos, -sin, 0],
    [sin, cos, 0],
    [0, 0, 1],
  ];
}

function aboutY(angleDeg: number): Rotation {
  const [cos, sin] = cosSin(angleDeg);
  return [
    [cos, 0, sin],
    [0, 1, 0],
    [-sin, 0, cos],
  ];
}

/** First `second`, then `first`: the matrix product. */
export function composed(first: Rotation, second: Rotation): Rotation {
  const row = (i: number): Vector => rotatedVector(first[i]!, transposed(second));
  return [row(0), row(1), row(2)];
}

export function transposed([x, y, z]: Rotation): Rotation {
  return [
    [x[0], y[0], z[0]],
    [x[1], y[1], z[1]],
    [x[2], y[2], z[2]],
  ];
}

export function rotatedVector(v: Vector, rotation: Rotation): Vector {
  const along = (axis: Vector) => axis[0] * v[0] + axis[1] * v[1] + axis[2] * v[2];
  return [along(rotation[0]), along(rotation[1]), along(rotation[2])];
}

/** R t R^T for a tensor of 18 doubles (tensor.ts). */
export function rotated(tensor: Float64Array, rotation: Rotation): Float64Array {
  const out = new Float64Array(18);
  for (let row = 0; row < 3; row++) {
    for (let column = 0; column < 3; column++) {
      let re = 0;
      let im = 0;
      for (let i = 0; i < 3; i++) {
        for (let j = 0; j < 3; j++) {
          const weight = rotation[row]![i]! * rotation[column]![j]!;
          re += weight * tensor[2 * (3 * i + j)]!;
          im += weight * tensor[2 * (3 * i + j) + 1]!;
        }
      }
      out[2 * (3 * row + column)] = re;
      out[2 * (3 * row + column) + 1] = im;
    }
  }
  return out;
}
