import { describe, expect, test } from 'vitest';
import type { PlainIndex, PlainVoigt } from '../../shared/dispersion.ts';
import type { MaterialContent } from '../../shared/material.ts';
import { materialContentSchema } from '../../shared/material.ts';
import { checkContent } from './checkContent.ts';
import { buildContent, givenTensor, madeUpSource } from './materialFixtures.ts';

const table = (wavelengthsNm: number[]): PlainIndex => ({
  kind: 'table',
  wavelengthsNm,
  n: wavelengthsNm.map(() => 2),
  k: wavelengthsNm.map(() => 1),
});
const lines = (of: 'voigt' | 'gyration', rangeNm: [number, number] = [450, 700]): PlainVoigt => ({
  kind: 'lines',
  of,
  rangeNm,
  lines: [{ shape: 'diamagnetic', amplitude: 0.01, centreEv: 2, dampingEv: 0.3 }],
});
const formula = (expression: string, rangeNm: [number, number] = [400, 800]) => ({
  kind: 'formula' as const,
  expression,
  coefficients: [1],
  rangeNm,
});
const magnetic = (voigt: MaterialContent['voigt'], index: MaterialContent['index'] = table([400, 800])) =>
  buildContent({ index, voigt, voigtSource: madeUpSource });
const mixed = (
  first: [PlainIndex, PlainVoigt | null],
  second: [PlainIndex, PlainVoigt | null],
  model: 'bruggeman' | 'maxwell-garnett' = 'bruggeman',
): MaterialContent['index'] => ({
  kind: 'mixture',
  model,
  fraction: 0.5,
  parts: [first, second].map(([index, voigt], i) => ({
    material: 'x',
    version: 1,
    name: `Part ${i}`,
    index,
    voigt,
  })),
});
const uniaxial = (extraordinary: PlainIndex, axis: [number, number, number] = [0, 0, 1]) =>
  buildContent({
    anisotropy: { kind: 'uniaxial', extraordinary, axis },
    anisotropySource: madeUpSource,
  });
const tensor = (epsilon = [givenTensor], wavelengthsNm = [600]): MaterialContent['index'] => ({
  kind: 'tensor',
  wavelengthsNm,
  epsilon,
});

const sellmeier = (cUm2: number): PlainIndex => ({
  kind: 'model',
  rangeNm: [400, 800],
  model: { name: 'sellmeier', constant: 1, terms: [{ b: 1, cUm2 }] },
});

describe('a content that can be used', () => {
  test.each<[string, MaterialContent]>([
    ['a table', buildContent()],
    ['a model', buildContent({ index: sellmeier(0.01) })],
    ['a complex formula', buildContent({ index: { ...formula('4 + i/E'), quantity: 'eps' } })],
    ['a formula of Q', magnetic(formula('0.01*(c1 - 2*i)/L'))],
    ['lines of Q beyond the index', magnetic(lines('voigt', [100, 3000]))],
    ['lines of a gyration that overlap the index', magnetic(lines('gyration', [100, 3000]))],
    [
      'a mixture',
      magnetic(
        { kind: 'mixture' },
        mixed([table([300, 700]), null], [table([400]), lines('voigt', [300, 900])]),
      ),
    ],
    ['a tensor', buildContent({ index: tensor() })],
    ['a uniaxial crystal of which less is known along its axis', uniaxial(table([500, 600]))],
  ])('%s', (_what, content) => {
    expect(materialContentSchema.safeParse(content).error).toBeUndefined();
    expect(checkContent(content)).toEqual([]);
  });
});

describe('a content that cannot be used', () => {
  test.each<[string, MaterialContent, string, string]>([
    [
      'a model with a pole in its range',
      buildContent({ index: sellmeier(0.25) }),
      'index.model',
      'the Sellmeier formula gives n^2 = ',
    ],
    [
      'N that cannot be calculated with (bounds of the solve contract)',
      buildContent({ index: { kind: 'table', wavelengthsNm: [400, 500], n: [2, 1e300], k: [0, 0] } }),
      'index.n[1]',
      '|N| must lie between',
    ],
    [
      'Q that cannot be calculated with (bounds of the solve contract)',
      magnetic({ kind: 'table', wavelengthsNm: [400], q: [[1e300, 0]] }),
      'voigt.q[0]',
      '|Q| must be at most',
    ],
    [
      'a range that does not rise',
      buildContent({ index: formula('2', [500, 500]) }),
      'index.rangeNm',
      'must rise, got 500 to 500 nm',
    ],
    [
      'a formula of N with gain',
      buildContent({ index: { ...formula('2 - 0.1*i'), quantity: 'N' } }),
      'index.expression',
      'gives N = 2 - 0.1i at 400 nm',
    ],
    [
      'a formula that fails between its ends',
      buildContent({ index: formula('2 + log(abs(L - 0.5657))/2') }),
      'index.expression',
      'n must be a real number > 0',
    ],
    [
      'an overdamped Tauc-Lorentz oscillator',
      buildContent({
        index: {
          kind: 'model',
          rangeNm: [400, 800],
          model: {
            name: 'oscillators',
            epsInfinity: 1,
            terms: [{ kind: 'tauc-lorentz', amplitudeEv: 1, gapEv: 1, centreEv: 2, dampingEv: 5 }],
          },
        },
      }),
      'index.model',
      'damping below twice its centre energy',
    ],
    [
      'a tensor with eps_zz = 0',
      buildContent({
        index: tensor(
          [
            givenTensor,
            [
              givenTensor[0],
              givenTensor[1],
              [
                [0, 0],
                [0, 0],
                [0, 0],
              ],
            ],
          ],
          [500, 600],
        ),
      }),
      'index.epsilon[1][2][2]',
      'eps_zz must not be 0',
    ],
    [
      'a tensor with a column too short',
      buildContent({ index: tensor([givenTensor], [500, 600]) }),
      'index.epsilon',
      'must have 2 entries',
    ],
    ['Q beside a tensor', magnetic(lines('voigt'), tensor()), 'voigt', 'must be null beside a free tensor'],
    [
      'axes beside a tensor',
      { ...uniaxial(table([500])), index: tensor() },
      'anisotropy',
      'must be absent beside a free tensor',
    ],
    [
      'a formula of Q without a value',
      magnetic(formula('1/(L - c1*0.4)')),
      'voigt.expression',
      'at 400 nm: Q must be finite',
    ],
    ['lines with no range', magnetic(lines('voigt', [700, 600])), 'voigt.rangeNm', 'must rise'],
    [
      'lines of a gyration where the index is not known',
      magnetic(lines('gyration', [900, 1000])),
      'voigt',
      'is known at no wavelength at which the index is (400 to 800 nm)',
    ],
    [
      'a Q of parts without parts',
      magnetic({ kind: 'mixture' }),
      'voigt',
      'needs a mixed index with a magnetic part',
    ],
    [
      'a Q of parts none of which is magnetic',
      magnetic({ kind: 'mixture' }, mixed([table([400, 800]), null], [table([400, 800]), null])),
      'voigt',
      'needs a mixed index with a magnetic part',
    ],
    [
      'parts known nowhere together',
      buildContent({ index: mixed([table([400, 500]), null], [table([600, 700]), null]) }),
      'index.parts',
      'Part 0 400 to 500 nm, Part 1 600 to 700 nm',
    ],
    [
      'a part that cannot be used',
      buildContent({ index: mixed([table([400, 500]), null], [formula('c9'), null]) }),
      'index.parts[1].index.expression',
      'c9 is not known here',
    ],
    [
      'a Q of a part that cannot be used',
      buildContent({ index: mixed([table([400, 500]), null], [table([400]), formula('1/0')]) }),
      'index.parts[1].voigt.expression',
      'Q must be finite',
    ],
    [
      'a magnetic host',
      buildContent({
        index: mixed([table([400, 500]), lines('voigt')], [table([400, 500]), null], 'maxwell-garnett'),
      }),
      'index.parts[0].voigt',
      'the host of a maxwell-garnett mixture must not be magnetic',
    ],
    [
      'an axis of no length',
      uniaxial(table([500]), [0, 0, 0]),
      'anisotropy.axis',
      'must not be the zero vector',
    ],
    [
      'two indices known nowhere together',
      uniaxial(table([900, 1000])),
      'anisotropy.extraordinary',
      'is known from 900 to 1000 nm, the ordinary index from 400 to 800 nm',
    ],
    [
      'an extraordinary index that cannot be used',
      uniaxial(sellmeier(0.25)),
      'anisotropy.extraordinary.model',
      'n^2',
    ],
    [
      'axes without a source',
      { ...uniaxial(table([500])), anisotropySource: undefined },
      'anisotropySource',
      'every constant has a source',
    ],
    [
      'a source without axes',
      { ...buildContent(), anisotropySource: madeUpSource },
      'anisotropySource',
      'and only then',
    ],
    [
      'Q without a source',
      { ...magnetic(lines('voigt')), voigtSource: null },
      'voigtSource',
      'every constant has a source',
    ],
  ])('%s', (_what, content, path, message) => {
    const issues = checkContent(content);
    expect(issues.map((issue) => issue.path)).toEqual([path]);
    expect(issues[0]!.message).toContain(message);
  });
});
