import { describe, expect, test } from 'vitest';
import type { Complex } from '../../shared/complex.ts';
import type { Issue } from '../../shared/error.ts';
import { ownHabits, signHabitsSchema, spectralUnits } from '../../shared/materialImport.ts';
import type { ImportMapping } from '../../shared/materialImport.ts';
import { convertTable } from '../../worker/import/convertTable.ts';
import { readTable } from '../../worker/import/readTable.ts';
import { mappingOf, times, written } from './importWritten.ts';
import type { Physical } from './importWritten.ts';
import { randomNumbers } from './fastRandomStack.ts';

const bytesOf = (text: string) => new TextEncoder().encode(text);
const read = (rows: (number | string)[][]) => readTable(bytesOf(rows.map((row) => row.join(',')).join('\n')));

// Made up; what is tested are the definitions of physics.md section 2 and their inverses.
const next = randomNumbers(7);
const physical: Physical[] = Array.from({ length: 12 }, (_, i) => ({
  wavelengthNm: 400 + 37.5 * i,
  index: [0.2 + 3 * next(), 0.5 + 4 * next()],
  voigt: [0.1 * (next() - 0.5), 0.1 * (next() - 0.5)],
}));

function expectClose(actual: Complex, expected: Complex, said: string): void {
  const size = Math.hypot(...expected);
  expect(Math.hypot(actual[0] - expected[0], actual[1] - expected[1]) / size, said).toBeLessThan(1e-12);
}

describe('the same physical data', () => {
  for (const time of signHabitsSchema.shape.time.options) {
    for (const voigtSign of signHabitsSchema.shape.voigtSign.options) {
      test(`with ${time} and ${voigtSign}, in every unit and quantity, gives the same constants`, () => {
        const habits = { ...ownHabits, time, voigtSign };
        for (const unit of spectralUnits) {
          for (const quantity of ['Q', 'eps_xy', 'S/m', 's^-1'] as const) {
            for (const from of ['n, k', 'eps1, eps2'] as const) {
              const rows = physical.map((one) => written(one, unit, quantity, from, habits));
              const { index, voigt } = convertTable(
                read(rows),
                mappingOf(unit, quantity, from, habits),
                null,
              );
              physical.forEach((one, i) => {
                const said = `${unit} ${quantity} ${from} at ${one.wavelengthNm} nm`;
                expectClose([index!.wavelengthsNm[i]!, 0], [one.wavelengthNm, 0], said);
                expectClose([index!.n[i]!, index!.k[i]!], one.index, said);
                expectClose(voigt!.q[i]!, one.voigt, said);
              });
            }
          }
        }
      });
    }
  }

  test('with +m out of the film gives Q with the other sign', () => {
    const rows = physical.map(({ wavelengthNm, index, voigt }) => [wavelengthNm, ...index, ...voigt]);
    const habits = { ...ownHabits, magnetization: 'out of the film' } as const;
    const { voigt, sentences } = convertTable(read(rows), mappingOf('nm', 'Q', 'n, k', habits), null);
    expect(voigt!.q).toEqual(physical.map(({ voigt: [re, im] }) => [-re, -im]));
    expect(sentences.join(' ')).toMatch(/along -z of the axes of its tensor.*multiplied by -1/);
  });

  test('with k written without its sign, N = n - ik, gives the same k and a warning that says so', () => {
    const rows = physical.map(({ wavelengthNm, index }) => [wavelengthNm, ...index]);
    const mapping = { ...mappingOf('nm', 'Q', 'n, k', { ...ownHabits, time: 'exp(+iwt)' }), voigt: null };
    const { index, warnings, sentences } = convertTable(read(rows), mapping, null);
    expect(index!.k).toEqual(physical.map((one) => one.index[1]));
    expect(warnings.map(({ code }) => code)).toContain('negative-k');
    expect(sentences.join(' ')).toContain('N = n - i k');
  });
});

// First order, from physics.md section 2: kappa = i N0 N Q / (N^2 - N0^2); N = 2i, N0 = 1 make it 0.4 Q, so a rotation of
// 0.4e-6 rad belongs to Q = 1e-6 and an ellipticity of the same size to Q = 1e-6 i.
describe('Kerr angles', () => {
  const angle = 0.4e-6;
  const perRadian = {
    deg: 180 / Math.PI,
    mdeg: 180_000 / Math.PI,
    mrad: 1000,
    rad: 1,
    arcmin: 10_800 / Math.PI,
  };
  const converted = (
    rotation: number,
    ellipticity: number,
    habits: Partial<ImportMapping['habits']>,
    unit: keyof typeof perRadian = 'rad',
  ) => {
    const scale = perRadian[unit];
    const k = habits.time === 'exp(+iwt)' ? -2 : 2;
    const mapping: ImportMapping = {
      ...mappingOf('nm', 'Q', 'n, k', { ...ownHabits, ...habits }),
      voigt: { from: 'Kerr angles', rotation: 3, ellipticity: 4, unit, incidentIndex: 1 },
    };
    return convertTable(read([[600, 0, k, rotation * scale, ellipticity * scale]]), mapping, null).voigt!
      .q[0]!;
  };
  const expectQ = ([re, im]: Complex, [wantedRe, wantedIm]: Complex) =>
    expect(Math.hypot(re - wantedRe, im - wantedIm) / 1e-6).toBeLessThan(1e-9);

  test('become Q in every unit', () => {
    for (const unit of ['deg', 'mdeg', 'mrad', 'rad', 'arcmin'] as const)
      expectQ(converted(angle, angle, {}, unit), [1e-6, 1e-6]);
  });

  test('follow the senses and the field of the source; the time factor changes N alone', () => {
    expectQ(converted(angle, 0, { rotation: 'clockwise' }), [-1e-6, 0]);
    expectQ(converted(0, angle, { rotation: 'clockwise' }), [0, 1e-6]);
    expectQ(converted(0, angle, { ellipticity: 'clockwise' }), [0, -1e-6]);
    expectQ(converted(angle, angle, { magnetization: 'out of the film' }), [-1e-6, -1e-6]);
    expectQ(converted(angle, angle, { time: 'exp(+iwt)' }), [1e-6, 1e-6]);
  });

  test('of 45 degrees or more are refused with their line', () => {
    expect(() => converted(Math.PI / 4, 0, {})).toThrow(/voigt.unit: the values in line 1 belong to no Q/);
  });
});

function issuesOf(rows: (number | string)[][], mapping: ImportMapping): Issue[] {
  try {
    convertTable(read(rows), mapping, null);
  } catch (error) {
    if (error instanceof Error && 'issues' in error) return error.issues as Issue[];
    throw error;
  }
  throw new Error('expected issues');
}

const indexOnly: ImportMapping = { ...mappingOf('nm', 'Q', 'n, k', ownHabits), voigt: null };

describe('a table that cannot be constants is refused', () => {
  test.each<[string, (number | string)[][], string, RegExp]>([
    [
      'k < 0 throughout',
      [
        [400, 1, -2],
        [500, 1, -3],
      ],
      'habits.time',
      /k < 0.*lines 1, 2: does the source use exp\(\+iwt\)\?/,
    ],
    [
      'N beyond what can be calculated with (bounds of the solve contract)',
      [
        [400, 1e300, 2],
        [500, 1e-320, 0],
      ],
      'index.n',
      /lines 1, 2/,
    ],
    [
      'a wavelength of 0',
      [
        [0, 1, 2],
        [500, 1, 2],
      ],
      'spectral.column',
      /line 1/,
    ],
    [
      'k < 0 by noise',
      [
        [400, 1, 2],
        [500, 1, -1e-9],
      ],
      'index.k',
      /line 2.*write 0 in the file/,
    ],
    ['n < 0', [[400, -1, 2]], 'index.n', /n < 0 in line 1/],
    ['N = 0', [[400, 0, 0]], 'index.n', /N = 0 in line 1/],
    [
      'rows that contradict each other',
      [
        [400, 1, 2],
        [400, 1, 3],
      ],
      'spectral.column',
      /differ \(lines 1, 2\)/,
    ],
    [
      'a wavelength of 0',
      [
        [0, 1, 2],
        [400, 1, 2],
      ],
      'spectral.column',
      /above 0.*line 1/,
    ],
  ])('%s', (_what, rows, path, message) => {
    const [issue] = issuesOf(rows, indexOnly);
    expect(issue!.path).toBe(path);
    expect(issue!.message).toMatch(message);
  });

  test('a photon energy whose wavelength is not finite', () => {
    const inEv: ImportMapping = { ...indexOnly, spectral: { column: 0, unit: 'eV' } };
    const rows = [
      [1e-320, 1, 2],
      [2, 1, 2],
    ];
    const [issue] = issuesOf(rows, inEv);
    expect(issue).toMatchObject({ path: 'spectral.column' });
    expect(issue!.message).toMatch(/finite wavelength.*line 1/);
  });

  test('columns that do not exist or are named twice', () => {
    const mapping: ImportMapping = {
      ...indexOnly,
      index: { from: 'n, k', n: 1, k: 1 },
      spectral: { column: 9, unit: 'nm' },
    };
    expect(
      issuesOf(
        [
          [400, 1, 2],
          [500, 1, 2],
        ],
        mapping,
      ).map(({ path }) => path),
    ).toEqual(['spectral.column', 'index.k']);
  });
});

describe('a doubtful table is taken as it is, with a warning', () => {
  const warningsOf = (rows: (number | string)[][], mapping = indexOnly) =>
    convertTable(read(rows), mapping, null).warnings;
  const smooth = Array.from({ length: 30 }, (_, i) => [400 + 10 * i, 2 + 0.01 * i, 3 + 0.02 * i]);
  const withVoigt = (re: number, im: number, k = 3) => smooth.map(([nm, n]) => [nm!, n!, k, re, im]);
  const all = mappingOf('nm', 'Q', 'n, k', ownHabits);

  test('none for a smooth one', () => {
    expect(warningsOf(smooth)).toEqual([]);
    expect(warningsOf(withVoigt(0.03, 0.01), all)).toEqual([]);
  });

  test.each<[string, (number | string)[][], ImportMapping, RegExp, number[]]>([
    ['duplicate', [...smooth, smooth[3]!], indexOnly, /Line 31/, [31]],
    ['unsorted', [smooth[1]!, smooth[0]!, ...smooth.slice(2)], indexOnly, /sorted/, [2]],
    ['unit', smooth.map(([nm, ...rest]) => [nm! / 1000, ...rest]), indexOnly, /um or eV/, [1]],
    ['jump', smooth.map((row, i) => (i === 9 ? [row[0]!, 20.9, row[2]!] : row)), indexOnly, /n jumps/, [10]],
    ['few-points', smooth.slice(0, 2), indexOnly, /2 wavelengths/, [1, 2]],
    ['large-voigt', withVoigt(0.3, 0), all, /above 0.2/, [1, 2, 3, 4, 5, 6, 7, 8, 9, 10]],
    ['not-passive', withVoigt(0.03, 0.02, 0.001), all, /amplified/, [1, 2, 3, 4, 5, 6, 7, 8, 9, 10]],
    ['empty-cells', [[390, '', 3], ...smooth], indexOnly, /line 1/, [1]],
  ])('%s', (code, rows, mapping, message, lines) => {
    const warning = warningsOf(rows, mapping).find((one) => one.code === code)!;
    expect(warning.message).toMatch(message);
    expect(warning.lines).toEqual(lines);
  });

  test('kramers-kronig where n turns against a Lorentz line, and not where it follows it', () => {
    // eps = 2 + 1.5 E0^2 / (E0^2 - E^2 - i G E), E0 = 3 eV, G = 0.4 eV: Born & Wolf, sec. 2.3.4 (from memory).
    const rows = Array.from({ length: 60 }, (_, i) => {
      const energy = 1 + i * 0.08;
      const [a, b] = [9 - energy ** 2, -0.4 * energy];
      const eps: Complex = [2 + (1.5 * 9 * a) / (a * a + b * b), (-1.5 * 9 * b) / (a * a + b * b)];
      const size = Math.hypot(...eps);
      return [energy, Math.sqrt((size + eps[0]) / 2), Math.sqrt((size - eps[0]) / 2)];
    });
    const inEv: ImportMapping = { ...indexOnly, spectral: { column: 0, unit: 'eV' } };
    const codes = (table: number[][]) => warningsOf(table, inEv).map(({ code }) => code);
    expect(codes(rows)).not.toContain('kramers-kronig');
    expect(codes(rows.map(([energy, n, k]) => [energy!, 4 - n!, k!]))).toContain('kramers-kronig');
  });

  test('outside-index where N of another material is not known', () => {
    const content = {
      index: { kind: 'table' as const, wavelengthsNm: [450, 650], n: [2, 2], k: [3, 3] },
      voigt: null,
      indexSource: source,
      voigtSource: null,
    };
    const mapping: ImportMapping = {
      ...indexOnly,
      index: null,
      voigt: { from: 'eps_xy', re: 1, im: 2 },
      indexOf: { material: 'x', version: 1 },
    };
    const { voigt, warnings } = convertTable(
      read([
        [400, 0.1, 0.2],
        [500, 0.1, 0.2],
      ]),
      mapping,
      content,
    );
    expect(voigt!.wavelengthsNm).toEqual([500]);
    const [q] = voigt!.q;
    // eps_xy = i Q N^2 gives back what was entered.
    expectClose(times([0, 1], times(q!, times([2, 3], [2, 3]))), [0.1, 0.2], 'eps_xy');
    expect(warnings.find(({ code }) => code === 'outside-index')!.lines).toEqual([1]);
    expect(() => convertTable(read([[400, 0.1, 0.2]]), mapping, content)).toThrow(/indexOf: gives N at none/);
  });
});

const source = {
  citation: 'made up for this test',
  doi: null,
  licence: null,
  sample: null,
  method: null,
  confidence: 'invented for the demo',
  caution: null,
} as const;
