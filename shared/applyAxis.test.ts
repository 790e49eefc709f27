import { describe, expect, it } from 'vitest';
import { applyAxis } from './applyAxis.ts';
import type { SweepAxis } from './run.ts';
import type { StackDocument, StackLayer } from './stack.ts';
import { toSolveCase } from './stackCase.ts';

const span = { from: 0, to: 90, points: 3, spacing: 'linear' } as const;
const film: StackLayer = { id: 'film', medium: { index: 2, voigt: 0.1 }, thicknessNm: 2, m: [0, 0, 0.5] };
const pinned: StackLayer = { ...film, id: 'pinned', m: [1, 0, 0], fixed: true };
const document: StackDocument = {
  incident: { index: 1 },
  layers: [
    { id: 'block', repeat: 3, layers: [film, { id: 'spacer', medium: { index: 1.5 }, thicknessNm: 1 }] },
    pinned,
  ],
  substrate: { index: 2, voigt: 0.1 },
  substrateM: [0, 1, 0],
  workingPoint: { wavelengthNm: 633, angleDeg: 30, input: 'p', magnetization: { mode: 'drawn' } },
};

/** m of the film, the fixed layer and the substrate as they are solved. */
function solvedM(axis: SweepAxis, value: number, given = document) {
  const { layers, substrate } = toSolveCase(applyAxis(given, axis, value), 633, 30);
  const [block, fixed] = layers;
  const inBlock = block && 'layers' in block ? block.layers[0] : undefined;
  return [inBlock, fixed, substrate].map((one) => (one && 'm' in one ? one.m : undefined));
}

describe('applyAxis', () => {
  it.each([
    ['xz', [0, 0, 0.5], [0.5, 0, 0]],
    ['yz', [0, 0, 0.5], [0, 0.5, 0]],
    ['xy', [0.5, 0, 0], [0, 0.5, 0]],
  ] as const)('turns m in %s and keeps its length, except in fixed layers', (plane, atZero, atNinety) => {
    const axis: SweepAxis = { kind: 'direction', plane, ...span };
    expect(solvedM(axis, 0)).toEqual([atZero, [1, 0, 0], atZero.map((part) => 2 * part)]);
    expect(solvedM(axis, 90)).toEqual([atNinety, [1, 0, 0], atNinety.map((part) => 2 * part)]);
  });

  it('turns one layer alone, a fixed one too', () => {
    const axis: SweepAxis = { kind: 'direction', plane: 'xz', layerId: 'pinned', ...span };
    expect(solvedM(axis, 180)).toEqual([
      [0, 0, 0.5],
      [0, 0, -1],
      [0, 1, 0],
    ]);
  });

  it('keeps the common direction of the working point in the layers that are not swept', () => {
    const magnetization = { mode: 'direction' as const, m: [0, 0.8, 0] as [number, number, number] };
    const given = { ...document, workingPoint: { ...document.workingPoint, magnetization } };
    const axis: SweepAxis = { kind: 'direction', plane: 'xz', layerId: 'film', ...span };
    expect(solvedM(axis, 90, given)).toEqual([
      [0.8, 0, 0],
      [1, 0, 0],
      [0, 0.8, 0],
    ]);
  });

  it('scales Q of every magnetic layer and the substrate, or of one', () => {
    const scaled = (layerId?: string) => {
      const axis: SweepAxis = { kind: 'voigtScale', layerId, ...span };
      const { layers, substrate } = toSolveCase(applyAxis(document, axis, 2), 633, 30);
      const [block] = layers;
      const inner = block && 'layers' in block ? block.layers : [];
      return [...inner, substrate].map((one) => ('voigtScale' in one ? one.voigtScale : undefined));
    };
    expect(scaled()).toEqual([2, undefined, 2]);
    expect(scaled('film')).toEqual([2, undefined, undefined]);
  });

  it('sets repeats, thickness, interface width and the working point', () => {
    const changed = [
      applyAxis(document, { kind: 'repeat', blockId: 'block', ...span }, 7).layers[0],
      applyAxis(document, { kind: 'thickness', layerId: 'pinned', ...span }, 4).layers[1],
      applyAxis(document, { kind: 'graded', layerId: 'pinned', ...span }, 0.3).layers[1],
      applyAxis(document, { kind: 'graded', layerId: 'substrate', ...span }, 0.2),
      applyAxis(document, { kind: 'angle', ...span }, 12).workingPoint,
    ];
    expect(changed).toMatchObject([
      { repeat: 7 },
      { thicknessNm: 4 },
      { gradedNm: 0.3 },
      { substrateGradedNm: 0.2 },
      { angleDeg: 12, wavelengthNm: 633 },
    ]);
  });
});
