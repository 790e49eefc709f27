import type { Complex, Vector } from '../../shared/complex.ts';
import type { SolveCase, StackItemInput } from '../../shared/solve.ts';
import type { Batch } from '../optics/fast/fastSolver.ts';

/** A stack and the grid of points it is solved on, wavelength outermost. */
export type Workload = { name: string; solveCase: SolveCase };

type Material = { index: Complex; voigt?: Complex };

/** Constants of the bench, near 633 nm; given once per wavelength, as measured dispersion would be. */
const MATERIALS = {
  Au: { index: [0.18, 3.43] },
  Co: { index: [2.25, 4.07], voigt: [0.03, 0.01] },
  Cr: { index: [3.14, 3.31] },
  Fe: { index: [2.87, 3.36], voigt: [0.0376, 0.0066] },
  MgO: { index: [1.735, 0] },
  Pt: { index: [2.33, 4.14] },
  Si: { index: [3.88, 0.02] },
  SiO2: { index: [1.457, 0] },
  Ta: { index: [3.5, 3.6] },
} satisfies Record<string, Material>;

const WAVELENGTH_RANGE_NM: [number, number] = [400, 800];

function grid(count: number, from: number, to: number): number[] {
  return Array.from({ length: count }, (_, i) => (count === 1 ? to : from + ((to - from) * i) / (count - 1)));
}

/** Media and layers whose constants are sampled at `count` wavelengths. */
function sampled(count: number) {
  const repeat = <Value>(value: Value) => ({ samples: Array.from({ length: count }, () => value) });
  const medium = (name: keyof typeof MATERIALS, m?: Vector) => {
    const material: Material = MATERIALS[name];
    const magnetic = material.voigt && m ? { voigt: repeat(material.voigt), m } : {};
    return { index: repeat(material.index), ...magnetic };
  };
  const layer = (name: keyof typeof MATERIALS, thicknessNm: number, m?: Vector) => ({
    thicknessNm,
    ...medium(name, m),
  });
  return { medium, layer };
}

type Sampled = ReturnType<typeof sampled>;

function workload(
  name: string,
  [wavelengths, angles, lastAngleDeg]: [number, number, number],
  layers: (media: Sampled) => StackItemInput[],
  substrate: keyof typeof MATERIALS,
): Workload {
  const media = sampled(wavelengths);
  return {
    name,
    solveCase: {
      wavelengthNm: grid(wavelengths, ...WAVELENGTH_RANGE_NM),
      angleDeg: grid(angles, 0, lastAngleDeg),
      incident: { index: 1 },
      layers: layers(media),
      substrate: media.medium(substrate),
    },
  };
}

const polarFilm = ({ layer }: Sampled): StackItemInput[] => [
  layer('Pt', 3),
  layer('Co', 1, [0, 0, 1]),
  layer('Pt', 5),
  layer('Ta', 5),
  layer('SiO2', 100),
];

export const WORKLOADS: Workload[] = [
  workload('W1-map', [200, 200, 85], polarFilm, 'Si'),
  workload(
    'W2-multilayer',
    [500, 20, 76],
    ({ layer }) => [
      layer('Pt', 2),
      { repeat: 20, layers: [layer('Co', 0.4, [0.6, 0, 0.8]), layer('Pt', 1)] },
      layer('Ta', 5),
    ],
    'Si',
  ),
  workload(
    'W3-oblique',
    [300, 90, 89],
    ({ layer }) => [
      layer('Au', 2),
      layer('Fe', 10, [0.48, 0.6, 0.64]),
      layer('Cr', 1),
      layer('Fe', 10, [-0.48, 0.6, 0.64]),
    ],
    'MgO',
  ),
  // Not in the comparison: W1's stack as a spectrum at one angle, which must not fall far behind its map.
  workload('W1-spectrum', [500, 1, 60], polarFilm, 'Si'),
];

/** The points of a workload. */
export function pointsOf({ solveCase }: Workload): Batch {
  const angles = [solveCase.angleDeg].flat();
  const wavelengths = [solveCase.wavelengthNm].flat();
  return {
    wavelengthIndex: Int32Array.from({ length: wavelengths.length * angles.length }, (_, i) =>
      Math.floor(i / angles.length),
    ),
    anglesDeg: Float64Array.from(wavelengths.flatMap(() => angles)),
  };
}
