import fc from 'fast-check';
import type { Complex, Vector } from '../../shared/complex.ts';
import type { MediumInput } from '../../shared/medium.ts';

/** Random media and directions for the property tests; numbers are spread over the decades that films have. */

export const between = (min: number, max: number): fc.Arbitrary<number> =>
  fc.double({ min, max, noNaN: true, noDefaultInfinity: true });

/** As likely between 1 and 10 as between 10 and 100. */
export const decades = (min: number, max: number): fc.Arbitrary<number> =>
  between(Math.log(min), Math.log(max)).map(Math.exp);

export const complexWithin = (size: number): fc.Arbitrary<Complex> =>
  fc.tuple(between(-size, size), between(-size, size));

/** A direction times a length from 0 to 1. */
export const magnetization: fc.Arbitrary<Vector> = fc
  .tuple(between(-1, 1), between(0, 2 * Math.PI), between(0, 1))
  .map(([z, azimuth, length]) => {
    const plane = Math.sqrt(1 - z * z);
    return [length * plane * Math.cos(azimuth), length * plane * Math.sin(azimuth), length * z];
  });

export const axis: fc.Arbitrary<Vector> = fc
  .tuple(between(-1, 1), between(-1, 1), between(-1, 1))
  .filter((v) => Math.hypot(...v) > 0.1);

export const metalIndex: fc.Arbitrary<Complex> = fc.tuple(between(0.05, 4), between(0.5, 6));
export const clearIndex: fc.Arbitrary<number> = between(1, 3.5);

/** Far enough below 90 deg for the energy balance to keep its digits; grazing has tests of its own. */
export const angle: fc.Arbitrary<number> = fc.oneof(fc.constant(0), between(0.01, 89.5));
export const wavelength: fc.Arbitrary<number> = between(300, 1600);
export const incidentIndex: fc.Arbitrary<number> = fc.constantFrom(1, 1.33, 1.515, 2.5);
export const thickness: fc.Arbitrary<number> = fc.oneof(decades(0.1, 30), decades(10, 1000));

/** Hermitian tensor: no loss, whatever its principal axes and gyration. */
const hermitian: fc.Arbitrary<MediumInput> = fc
  .tuple(
    fc.tuple(between(1.5, 8), between(1.5, 8), between(1.5, 8)),
    fc.tuple(complexWithin(0.4), complexWithin(0.4), complexWithin(0.4)),
  )
  .map(([[xx, yy, zz], [xy, xz, yz]]) => {
    const conjugate = ([re, im]: Complex): Complex => [re, -im];
    return {
      epsilon: [
        [xx, xy, xz],
        [conjugate(xy), yy, yz],
        [conjugate(xz), conjugate(yz), zz],
      ],
    };
  });

const uniaxialClear: fc.Arbitrary<MediumInput> = fc.record({
  index: clearIndex,
  extraordinary: clearIndex,
  axis,
});

const garnet: fc.Arbitrary<MediumInput> = fc.record({
  index: clearIndex,
  voigt: fc.oneof(decades(1e-15, 1e-2), between(-0.5, 0.5)),
  m: magnetization,
});

export const losslessMedium: fc.Arbitrary<MediumInput> = fc.oneof(
  fc.record({ index: clearIndex }),
  garnet,
  uniaxialClear,
  hermitian,
);

/** A magnetic metal that is passive: |Q eps| <= Im eps. */
export const magneticMetal: fc.Arbitrary<MediumInput> = fc
  .tuple(metalIndex, complexWithin(0.5), magnetization)
  .map(([index, q, m]) => {
    const [n, k] = index;
    const room = (2 * n * k) / (n * n + k * k);
    return { index, voigt: [q[0] * room, q[1] * room], m };
  });

const uniaxialMetal: fc.Arbitrary<MediumInput> = fc.record({
  index: metalIndex,
  extraordinary: metalIndex,
  axis,
});

/** A tensor given as such, whose loss i B B^H is passive by construction and whose Hermitian part has any sign. */
const passiveTensor: fc.Arbitrary<MediumInput> = fc
  .tuple(
    // Away from 0, where a wave neither enters nor leaves at normal incidence.
    fc.array(fc.oneof(between(-12, -1.5), between(1.5, 8)), { minLength: 3, maxLength: 3 }),
    fc.array(complexWithin(0.4), { minLength: 9, maxLength: 9 }),
    fc.array(complexWithin(0.8), { minLength: 9, maxLength: 9 }),
  )
  .map(([diagonal, offDiagonal, b]) => {
    const at = (list: Complex[], i: number, j: number): Complex => list[3 * i + j] ?? [0, 0];
    const element = (i: number, j: number): Complex => {
      const [re, im] = at(offDiagonal, Math.min(i, j), Math.max(i, j));
      const hermitianPart: Complex = i === j ? [diagonal[i] ?? 1, 0] : [re, i < j ? im : -im];
      return [0, 1, 2].reduce<Complex>((sum, k) => {
        const [a, c] = [at(b, i, k), at(b, j, k)];
        // plus i a conj(c)
        return [sum[0] - a[1] * c[0] + a[0] * c[1], sum[1] + a[0] * c[0] + a[1] * c[1]];
      }, hermitianPart);
    };
    const row = (i: number): [Complex, Complex, Complex] => [element(i, 0), element(i, 1), element(i, 2)];
    return { epsilon: [row(0), row(1), row(2)] };
  });

export const passiveMedium: fc.Arbitrary<MediumInput> = fc.oneof(
  losslessMedium,
  fc.record({ index: metalIndex }),
  magneticMetal,
  uniaxialMetal,
  passiveTensor,
);

/** Bounded so that the whole of the property tests stays within seconds; the seed is fixed, so a failure repeats. */
export const runs = (numRuns: number): fc.Parameters<unknown> => ({ numRuns, seed: 20240611 });
