import type { SolveCase, StackItemInput } from '../../shared/solve.ts';
import { IncoherentSlabSolver } from './incoherentSlab.ts';
import type { Mueller, Stokes } from './mueller.ts';
import { createMueller, muellerOf, stokesForAzimuth } from './mueller.ts';
import type { Polarized } from './observables.ts';
import { StackSolver } from './stackSolver.ts';

/** What is left of a point once intensities have been added up. */
export type IntensityPoint = { reflection: Mueller; T: Polarized };

type Solve = (wavelengthIndex: number, angleDeg: number) => IntensityPoint;

/**
 * A case with an incoherent backside, an average, or both (physics.md section 6): sums of intensities, that is of
 * Mueller matrices.
 */
export class IntensitySolver {
  readonly #wavelengthWeights: number[];
  readonly #angleWeights: number[];
  readonly #anglesDeg: number[];
  readonly #nodes: { weight: number; solve: Solve }[];

  constructor(solveCase: SolveCase, slices: number | undefined) {
    const { average, ...plain } = solveCase;
    this.#wavelengthWeights = average?.wavelengthWeights ?? [1];
    this.#angleWeights = average?.angleWeights ?? [1];
    this.#anglesDeg = [solveCase.angleDeg].flat();
    this.#nodes = (average?.thickness ?? [{ factor: 1, weight: 1 }]).map(({ factor, weight }) => ({
      weight,
      solve: solveOf(scaledThickness(plain, factor), slices),
    }));
  }

  /** Positions of the answer's points: groups of wavelengths and of angles. */
  get groups(): { wavelengths: number; angles: number } {
    return { wavelengths: this.#wavelengthWeights.length, angles: this.#angleWeights.length };
  }

  /**
   * @param wavelengthGroup, angleGroup positions of the group among the groups
   */
  solve(wavelengthGroup: number, angleGroup: number): IntensityPoint {
    const reflection = createMueller();
    const T = { p: 0, s: 0 };
    const { wavelengths, angles } = this.groups;
    for (const node of this.#nodes) {
      this.#wavelengthWeights.forEach((wavelengthWeight, i) => {
        this.#angleWeights.forEach((angleWeight, j) => {
          const weight = node.weight * wavelengthWeight * angleWeight;
          const angleDeg = this.#anglesDeg[angleGroup * angles + j]!;
          const point = node.solve(wavelengthGroup * wavelengths + i, angleDeg);
          for (let k = 0; k < 16; k++) reflection[k] = reflection[k]! + weight * point.reflection[k]!;
          T.p += weight * point.T.p;
          T.s += weight * point.T.s;
        });
      });
    }
    return { reflection, T };
  }
}

function solveOf(solveCase: SolveCase, slices: number | undefined): Solve {
  if (!solveCase.backside) {
    const solver = new StackSolver(solveCase, slices === undefined ? {} : { slices });
    return (index, angleDeg) => {
      const point = solver.solve(index, angleDeg);
      return { reflection: muellerOf(point.r), T: point.T };
    };
  }
  const solver = new IncoherentSlabSolver(solveCase, slices);
  return (index, angleDeg) => {
    const { reflection, transmission, power } = solver.solve(index, angleDeg);
    const through = (stokes: Stokes) =>
      (power.p * (stokes[0]! + stokes[1]!) + power.s * (stokes[0]! - stokes[1]!)) / 2;
    return {
      reflection,
      T: { p: through(stokesForAzimuth(transmission, 0)), s: through(stokesForAzimuth(transmission, 90)) },
    };
  };
}

function scaledThickness(solveCase: SolveCase, factor: number): SolveCase {
  if (factor === 1) return solveCase;
  const scale = (item: StackItemInput): StackItemInput =>
    'layers' in item
      ? { ...item, layers: item.layers.map(scale) }
      : {
          ...item,
          thicknessNm: item.thicknessNm * factor,
          ...(item.gradedNm === undefined ? {} : { gradedNm: item.gradedNm * factor }),
        };
  const { gradedNm, ...substrate } = solveCase.substrate;
  return {
    ...solveCase,
    layers: solveCase.layers.map(scale),
    substrate: gradedNm === undefined ? substrate : { ...substrate, gradedNm: gradedNm * factor },
  };
}
