type Pair = readonly [number, number];

function times(a: Pair, b: Pair): [number, number] {
  return [a[0] * b[0] - a[1] * b[1], a[0] * b[1] + a[1] * b[0]];
}

/** The permittivity eps = N^2 = (n^2 - k^2) + 2ink of a medium that is not magnetic at optical frequencies. */
export function permittivityOf(index: Pair): [number, number] {
  return times(index, index);
}

/** The off-diagonal element of the permittivity, eps_xy = i Q N^2 for m = +z (physics of the conventions page). */
export function offDiagonalOf(voigt: Pair, index: Pair): [number, number] {
  const [re, im] = times(voigt, permittivityOf(index));
  return [0 - im, re];
}
