import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import type { Complex, Vector } from '../../shared/complex.ts';
import type { IndexDispersion } from '../../shared/dispersion.ts';
import { sampleIndex, sampleVoigt } from '../../worker/dispersion/sample.ts';
import { Medium } from '../../worker/optics/medium.ts';

type Mixture = Extract<IndexDispersion, { kind: 'mixture' }>;
type Part = { index: Complex; voigt: Complex | null };

function buildMixture(model: Mixture['model'], fraction: number, parts: Part[]): Mixture {
  return {
    kind: 'mixture',
    model,
    fraction,
    parts: parts.map(({ index, voigt }, i) => ({
      material: `part-${i}`,
      version: 1,
      name: `Part ${i}`,
      index: { kind: 'table', wavelengthsNm: [600], n: [index[0]], k: [index[1]] },
      voigt: voigt && { kind: 'table', wavelengthsNm: [600], q: [voigt] },
    })),
  };
}

const tensorOf = (medium: Medium): number[] => {
  medium.load(0);
  return Array.from(medium.tensor);
};

const index = fc.tuple(
  fc.double({ min: 0.1, max: 5, noNaN: true }),
  fc.double({ min: 0, max: 6, noNaN: true }),
);
const voigt = fc.tuple(
  fc.double({ min: -0.2, max: 0.2, noNaN: true }),
  fc.double({ min: -0.2, max: 0.2, noNaN: true }),
);
const m: Vector = [0.48, 0.6, 0.64];

describe('a mixture as a material', () => {
  // Source: the solver's own mixture of two media (worker/optics/medium.ts), physics.md section 6.
  test.each(['bruggeman', 'maxwell-garnett'] as const)('%s is the mixture of the solver', (model) => {
    fc.assert(
      fc.property(
        index,
        index,
        voigt,
        voigt,
        fc.double({ min: 0, max: 1, noNaN: true }),
        (n1, n2, q1, q2, f) => {
          const host = model === 'bruggeman' ? q1 : null;
          const mixture = buildMixture(model, f, [
            { index: n1, voigt: host },
            { index: n2, voigt: q2 },
          ]);
          const { n, k } = sampleIndex('it', mixture, [600]);
          const q = sampleVoigt('it', { index: mixture, voigt: { kind: 'mixture' } }, [600]);
          const asMaterial = tensorOf(new Medium({ index: [n[0]!, k[0]!], voigt: [q.re[0]!, q.im[0]!], m }));
          const parts: [object, object] = [
            { index: n1, ...(host && { voigt: host }), m },
            { index: n2, voigt: q2, m },
          ];
          const bySolver = tensorOf(new Medium({ mixture: { model, fraction: f, parts } }));
          const size = Math.max(...bySolver.map(Math.abs));
          asMaterial.forEach((value, i) => expect(Math.abs(value - bySolver[i]!)).toBeLessThan(1e-12 * size));
        },
      ),
    );
  });

  // physics.md section 6: Fe/Au 50:50 at 632.8 nm gives g = i Q eps = -0.2195 - 0.2553i.
  test('Fe/Au 50:50 has the gyration of the page of physics', () => {
    const mixture = buildMixture('bruggeman', 0.5, [
      { index: [2.87, 3.36], voigt: [0.0376, 0.0066] },
      { index: [0.18, 3.43], voigt: null },
    ]);
    const { n, k } = sampleIndex('it', mixture, [600]);
    const { re, im } = sampleVoigt('it', { index: mixture, voigt: { kind: 'mixture' } }, [600]);
    const eps = [n[0]! ** 2 - k[0]! ** 2, 2 * n[0]! * k[0]!];
    const qEps = [re[0]! * eps[0]! - im[0]! * eps[1]!, re[0]! * eps[1]! + im[0]! * eps[0]!];
    expect([-qEps[1]!, qEps[0]!]).toEqual([expect.closeTo(-0.2195, 4), expect.closeTo(-0.2553, 4)]);
  });

  test('names the part that is not known where it is asked', () => {
    const mixture = buildMixture('bruggeman', 0.5, [
      { index: [2, 0], voigt: null },
      { index: [3, 1], voigt: null },
    ]);
    expect(() => sampleIndex('Mix (mix)', mixture, [700])).toThrow(
      'Part 0 in Mix (mix) is known at 600 nm only; 700 nm was asked',
    );
    expect(sampleIndex('Mix', mixture, [700], { assumeConstant: true }).n).toHaveLength(1);
  });
});
