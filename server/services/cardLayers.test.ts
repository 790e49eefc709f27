import { expect, test } from 'vitest';
import type { StackItem } from '../../shared/stack.ts';
import { buildDocument } from '../../tests/factories.ts';
import { cardLayers } from './cardLayers.ts';

const layer = (id: string, thicknessNm: number): StackItem => ({
  id,
  medium: { index: [2, 1], label: id.slice(0, 2) },
  thicknessNm,
});
const tolerance = {
  ...{ ratePercent: 3, randomPercent: 4, indexPercent: 0, voigtPercent: 0, materials: [] },
  ...{ samples: 100, seed: 1 },
};

test('the substrate comes first, the layer that light meets first comes last, with time by the rate', () => {
  const lines = cardLayers(buildDocument(), [], tolerance, [{ layerId: 'cap', nmPerMin: 1.5 }]);
  expect(lines.map(({ step, material, thicknessNm }) => [step, material, thicknessNm])).toEqual([
    [null, 'Si', null],
    [1, 'Pt', 5],
    [2, 'Co', 1],
    [3, 'Pt', 3],
  ]);
  // 3 nm at 1.5 nm/min take 120 s; rate and random error are independent: sqrt(3^2 + 4^2) = 5 % of 3 nm.
  expect(lines[3]).toMatchObject({ nmPerMin: 1.5, seconds: 120, block: null });
  expect(lines[3]!.deviationNm).toBeCloseTo(0.15, 12);
  expect(lines[1]).toMatchObject({ nmPerMin: null, seconds: null });
});

test('blocks say how often which steps are repeated, inner ones too; what is not grown takes no line', () => {
  const inner: StackItem = { id: 'inner', repeat: 6, layers: [layer('Co 2', 0.4), layer('Pt 2', 1)] };
  const outer: StackItem = { id: 'outer', repeat: 2, layers: [layer('Ru', 0.9), inner] };
  const never: StackItem = { id: 'never', repeat: 0, layers: [layer('Au', 5)] };
  const document = buildDocument({ layers: [layer('Ta', 2), never, outer, layer('Cu', 8)] });
  const lines = cardLayers(document, [], tolerance, []);
  const within = '2 times steps 2 to 4, in each 6 times steps 2 to 3';
  expect(lines.map(({ step, material, block }) => [step, material, block])).toEqual([
    [null, 'Si', null],
    [1, 'Cu', null],
    [2, 'Pt', within],
    [3, 'Co', within],
    [4, 'Ru', '2 times steps 2 to 4'],
    [5, 'Ta', null],
  ]);
});
