import { describe as group, expect, it } from 'vitest';
import type { StackDocument } from '../../../../shared/stack.ts';
import { addsIntensities, toSolveCase } from '../../../../shared/stackCase.ts';
import { arrowChain, namedArrows } from './arrowChain.ts';
import { explainRequest } from './explainRequest.ts';
import { filmLayers } from './filmLayers.ts';
import type { DescribeMedium } from './filmLayers.ts';
import { magneticStates, stepRequest } from './magneticStates.ts';
import { depthScale, layerAt } from './profile.ts';
import { partOfTotal, sharesOf } from './shares.ts';

const describe: DescribeMedium = ({ label = '?' }) => ({ name: label, fill: 'grey' });
const co = { index: [2.3, 4.1] as [number, number], voigt: [0.03, 0.01] as [number, number], label: 'Co' };
const pt = { index: [2.3, 4.2] as [number, number], label: 'Pt' };

/** An invented film: cap, [Co / Pt] x 3 with dead parts, an oxidised layer. */
const film: StackDocument = {
  incident: { index: 1 },
  layers: [
    {
      id: 'cap',
      medium: pt,
      thicknessNm: 2,
      oxide: { medium: { index: 2, label: 'PtO' }, consumedNm: 1, expansion: 2 },
    },
    {
      id: 'block',
      repeat: 3,
      layers: [
        { id: 'co', medium: co, thicknessNm: 1, m: [0, 0, 1], dead: { topNm: 0.2, bottomNm: 0 } },
        { id: 'pt', medium: pt, thicknessNm: 1.5 },
      ],
    },
  ],
  substrate: { index: 3.9, label: 'Si' },
  workingPoint: { wavelengthNm: 633, angleDeg: 0, input: 'p', magnetization: { mode: 'drawn' } },
};

group('the expanded film', () => {
  const layers = filmLayers(film, describe);

  it('has oxide and dead parts as layers of their own, and counts the magnetic ones', () => {
    expect(layers.map(({ label }) => label).slice(0, 6)).toEqual([
      'PtO',
      'Pt',
      'Co, dead',
      'Co 1',
      'Pt',
      'Co, dead',
    ]);
    expect(layers).toHaveLength(11);
    expect(layers.at(-1)!.topNm + layers.at(-1)!.thicknessNm).toBeCloseTo(2 + 1 + 3 * 2.5, 12);
  });

  it('names the places that the solve case gives its layers', () => {
    const solved = toSolveCase(film, 633, 0);
    const paths = new Set<string>();
    solved.layers.forEach((item, index) => {
      if ('layers' in item) item.layers.forEach((_, inner) => paths.add(`layers[${index}].layers[${inner}]`));
      else paths.add(`layers[${index}]`);
    });
    expect(new Set(layers.map(({ path }) => path))).toEqual(paths);
  });
});

group('layer shares', () => {
  const layers = filmLayers(film, describe);
  const share = (depthNm: number, re: number) => ({
    path: 'layers[2].layers[1]',
    position: 0,
    depthNm,
    sp: [re, 0] as [number, number],
    ps: [0, 0] as [number, number],
    pp: [0, 0] as [number, number],
  });
  const none = {
    sp: [0, 0] as [number, number],
    ps: [0, 0] as [number, number],
    pp: [0, 0] as [number, number],
  };
  const contributions = {
    layers: [share(3.2, 3), share(5.7, 2), share(8.2, 1)],
    total: { ...none, sp: [6, 0] as [number, number] },
    exact: { ...none, sp: [6, 0.1] as [number, number] },
  };

  it('go to the repetition that lies at their depth', () => {
    const { shares, difference } = sharesOf(contributions, layers, 'Si', 'sp');
    expect(shares.map(({ label, value }) => [label, value[0]])).toEqual([
      ['Co 1', 3],
      ['Co 2', 2],
      ['Co 3', 1],
    ]);
    expect(difference).toBeCloseTo(0.1, 12);
    expect(sharesOf(contributions, layers, 'Si', 'ps').shares).toEqual([]);
  });

  it('are drawn tip to tail on one scale, ending at the sum', () => {
    const sum = sharesOf(contributions, layers, 'Si', 'sp');
    const chain = arrowChain(sum, { width: 400, height: 240 });
    expect(chain.arrows[0]!.from).toEqual(chain.origin);
    expect(chain.arrows[1]!.from).toEqual(chain.arrows[0]!.to);
    expect(chain.arrows.at(-1)!.to.x).toBeCloseTo(chain.total.x, 9);
    const px = (arrow: { from: { x: number }; to: { x: number } }) => arrow.to.x - arrow.from.x;
    expect(px(chain.arrows[0]!) / px(chain.arrows[2]!)).toBeCloseTo(3, 9);
    expect(chain.total.y - chain.exact.y).toBeCloseTo(px(chain.arrows[2]!) * 0.1, 9);
  });

  it('carry their names up to twelve, then the ends and the one pointed at', () => {
    expect(namedArrows(12, null).size).toBe(12);
    expect([...namedArrows(20, 7)]).toEqual([0, 19, 7]);
  });

  it('make up a part of the sum, negative where they work against it', () => {
    expect(partOfTotal([-1, 5], [2, 0])).toBe(-0.5);
  });
});

group('the depth scale', () => {
  const layers = filmLayers(film, describe);
  const scale = depthScale(
    layers,
    layers.map(() => 10),
    70.5,
    30,
  );

  it('is even within a layer, meets at the faces and ends in the substrate', () => {
    expect(scale.toPixel(0)).toBe(0);
    expect(scale.toPixel(1)).toBeCloseTo(5, 9);
    expect(scale.toPixel(2)).toBeCloseTo(10, 9);
    expect(scale.toPixel(10.5)).toBe(110);
    expect(scale.toPixel(40.5)).toBeCloseTo(125, 9);
    expect(scale.toPixel(70.5)).toBe(140);
  });

  it('finds the layer at a depth', () => {
    expect(layerAt(layers, 3.5)!.label).toBe('Co 1');
    expect(layerAt(layers, 11)).toBeNull();
  });
});

group('what is asked of the solver', () => {
  it('is no amplitude where intensities add', () => {
    const slab: StackDocument = { ...film, backside: { thicknessNm: 5e5, exit: { index: 1 } } };
    expect(addsIntensities(film)).toBe(false);
    expect(addsIntensities(slab)).toBe(true);
    expect(explainRequest(slab, film.workingPoint).cases.map(({ outputs }) => outputs)).toEqual([
      ['mueller'],
      ['mueller'],
      ['mueller'],
    ]);
    expect(explainRequest(film, film.workingPoint).cases[0]!.outputs).toContain('contributions');
  });

  it('can be one switched layer, the others as drawn', () => {
    const two: StackDocument = {
      ...film,
      layers: [
        { id: 'upper', medium: co, thicknessNm: 1, m: [0, 0, 1] },
        { id: 'lower', medium: co, thicknessNm: 1, m: [0, 0, 1] },
      ],
    };
    const states = magneticStates(two, describe);
    expect(states.map(({ label }) => label)).toContain('only Co (layer 2) switched');
    const [, switched] = stepRequest(two, two.workingPoint, 'drawn', 'switched lower').cases;
    expect(switched!.layers.map((layer) => ('m' in layer ? layer.m : null))).toEqual([
      [0, 0, 1],
      [0, 0, -1],
    ]);
  });
});
