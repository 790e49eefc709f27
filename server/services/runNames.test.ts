import { describe, expect, it } from 'vitest';
import type { SweepAxis } from '../../shared/run.ts';
import type { StackDocument } from '../../shared/stack.ts';
import { runNameFor } from './runNames.ts';

const platinum = { material: 'pt-source' };
const film: StackDocument = {
  incident: { index: 1 },
  layers: [
    { id: 'a', note: 'cap', medium: platinum, thicknessNm: 3 },
    { id: 'b', medium: platinum, thicknessNm: 5 },
  ],
  substrate: { index: 1.5 },
  workingPoint: { wavelengthNm: 632.8, angleDeg: 0, input: 'p', magnetization: { mode: 'drawn' } },
};
const thicknessOf = (layerId: string): SweepAxis => ({
  kind: 'thickness',
  layerId,
  from: 1,
  to: 5,
  points: 9,
  spacing: 'linear',
});
const nameOf = (layerId: string, document = film) =>
  runNameFor({ axis: thicknessOf(layerId) }, document, [{ id: 'pt-source', formula: 'Pt' }], null);

describe('runNameFor', () => {
  it('calls a layer by formula and note, not by the id of its source', () => {
    expect(nameOf('a')).toBe('thickness of Pt (cap) 1 to 5 nm');
    expect(nameOf('b')).toBe('thickness of Pt 1 to 5 nm');
  });

  it('calls a layer of typed-in constants by its label, and by nothing without one', () => {
    const typed = (label?: string): StackDocument => ({
      ...film,
      layers: [{ id: 'a', medium: { index: 2, ...(label && { label }) }, thicknessNm: 3 }],
    });
    expect(nameOf('a', typed('Spacer'))).toBe('thickness of Spacer 1 to 5 nm');
    expect(nameOf('a', typed())).toBe('thickness 1 to 5 nm');
  });
});
