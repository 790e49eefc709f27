import type { Complex, Vector } from '../../shared/complex.ts';
import type { OptimiseDesign, OptimiseResult } from '../../shared/optimiseDesign.ts';
import { optimiseDesignSchema, optimiseResultSchema } from '../../shared/optimiseDesign.ts';
import type { DesignTask } from '../../worker/design/designInput.ts';
import type { DesignOptions } from '../../worker/design/designThreads.ts';
import { designStep } from '../../worker/design/designTask.ts';
import { runDesign } from '../../worker/design/runDesign.ts';
import { solvePoint } from './solvePoint.ts';

type Options = Omit<DesignOptions<unknown>, 'onPartial'> & { onPartial?: (soFar: unknown) => void };

/** Threads of this process; steps of one generation settle out of order, as those of real threads do. */
export async function optimise(
  design: OptimiseDesign,
  threads = 1,
  options: Options = {},
): Promise<OptimiseResult> {
  const submit = async (task: DesignTask) => {
    const { step } = task;
    if (threads > 1 && step.kind === 'optimise films' && step.nm.length > 1) {
      await new Promise((resolve) => setTimeout(resolve, (1000 * step.nm[0]![0]!) % 2));
    }
    return designStep(task);
  };
  const { result } = await runDesign({ design, materials: [] }, threads, submit, options);
  return optimiseResultSchema.parse(result);
}

/** A working point. */
export const at = (wavelengthNm: number, angleDeg = 0, input: 'p' | 's' = 'p', m?: Vector) => ({
  wavelengthNm,
  angleDeg,
  input,
  magnetization: m ? { mode: 'direction' as const, m } : { mode: 'drawn' as const },
});

/** One layer on glass in green light. */
export function buildOvercoat(index: number, overrides: Partial<OptimiseDesign> = {}): OptimiseDesign {
  return optimiseDesignSchema.parse({
    kind: 'optimise',
    document: {
      incident: { index: 1 },
      layers: [{ id: 'coat', medium: { index }, thicknessNm: 40 }],
      substrate: { index: 1.52 },
      workingPoint: at(550),
    },
    variables: [{ layerId: 'coat', fromNm: 20, toNm: 180 }],
    points: [{ id: 'a', label: 'green', workingPoint: at(550) }],
    goal: { quantity: 'least reflectance' },
    effort: 'quick',
    seed: 1,
    ...overrides,
  });
}

// Constants of physics.md section 8 (Mansuripur, Appl. Phys. Lett. 49, 19 (1986), from memory).
const epsilon: Complex = [-4.898, 19.415];
const size = Math.hypot(...epsilon);
const n = Math.sqrt((size + epsilon[0]) / 2);
const film = {
  index: [n, epsilon[1] / (2 * n)] as Complex,
  // Q = eps_xy / (i eps_d) = (0.006 - 0.432i) / eps_d
  voigt: [
    (0.006 * epsilon[0] - 0.432 * epsilon[1]) / size ** 2,
    (-0.432 * epsilon[0] - 0.006 * epsilon[1]) / size ** 2,
  ] as Complex,
};

/** Dielectric, magnetic film, dielectric, silver, in red light. */
export function buildQuadrilayer(overrides: Partial<OptimiseDesign> = {}): OptimiseDesign {
  return optimiseDesignSchema.parse({
    kind: 'optimise',
    document: {
      incident: { index: 1 },
      layers: [
        { id: 'over', medium: { index: 2 }, thicknessNm: 50 },
        { id: 'film', medium: film, thicknessNm: 20, m: [0, 0, 1] },
        { id: 'under', medium: { index: 2 }, thicknessNm: 50 },
      ],
      substrate: { index: [0.06, 4.2] },
      workingPoint: at(632.8),
    },
    variables: [
      { layerId: 'over', fromNm: 0, toNm: 160 },
      { layerId: 'film', fromNm: 2, toNm: 60 },
      { layerId: 'under', fromNm: 0, toNm: 160 },
    ],
    points: [{ id: 'a', label: 'red', workingPoint: at(632.8) }],
    goal: { quantity: 'amplitude' },
    effort: 'quick',
    seed: 1,
    ...overrides,
  });
}

/** The quadrilayer by the solve contract, without anything of the optimiser's. */
export function solveQuadrilayer([over, magnet, under]: number[], point = at(632.8)) {
  const { wavelengthNm, angleDeg, input, magnetization } = point;
  const m: Vector = magnetization.mode === 'direction' ? magnetization.m : [0, 0, 1];
  const solve = (direction: Vector) =>
    solvePoint({
      wavelengthNm,
      angleDeg,
      incident: { index: 1 },
      layers: [
        { thicknessNm: over!, index: 2 },
        { thicknessNm: magnet!, ...film, m: direction },
        { thicknessNm: under!, index: 2 },
      ],
      substrate: { index: [0.06, 4.2] },
    });
  const [plus, minus] = [solve(m), solve([-m[0], -m[1], -m[2]])];
  const [r, reversed] = [plus.R[input], minus.R[input]];
  return {
    rotation: Math.abs(plus.kerr[input]!.rotationDeg),
    ellipticity: Math.abs(plus.kerr[input]!.ellipticityDeg),
    amplitude: Math.hypot(...(input === 'p' ? plus.r.sp : plus.r.ps)),
    contrast: Math.abs((r - reversed) / (r + reversed)),
    reflectance: r,
  };
}
