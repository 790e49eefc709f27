import { toComplex } from '../../../shared/complex.ts';
import type { SolveCase, StackItemInput } from '../../../shared/solve.ts';
import { isBlock } from '../../../shared/solve.ts';
import { StackSolver } from '../stackSolver.ts';
import type { SolvedPoint } from '../stackSolver.ts';
import type { BatchResult } from './batchResult.ts';
import { COLUMN } from './batchResult.ts';
import type { Crossing, FastItem, FastLayer } from './crossingPlan.ts';
import { planCrossings } from './crossingPlan.ts';
import { FastMedium } from './fastMedium.ts';
import { kernelOf } from './kernelModule.ts';
import { Tile, TILE_PAIRS } from './tile.ts';

/** Points to solve: wavelength by position in the case, angle in deg, and a thickness of one layer where it varies. */
export type Batch = {
  wavelengthIndex: Int32Array;
  anglesDeg: Float64Array;
  /** `path` as for `setThickness`; nm per point. */
  thickness?: { path: number[]; nm: Float64Array };
};

/** Runs of one wavelength at least this long share its constants; shorter ones carry them per point. */
const SHORTEST_RUN = 12;

/**
 * The fast path: whole batches of points of one case, two at a time in 128-bit vectors, for stacks whose media have a
 * scalar eps_d with or without Q and m. It agrees with StackSolver, to which it hands what it cannot do safely: a
 * magnetic substrate near its critical angle, gyrations as large as the permittivity, magnetic layers of hundreds of
 * wavelengths.
 */
export class FastSolver {
  readonly wavelengthsNm: Float64Array;
  readonly #solveCase: SolveCase;
  readonly #incidentIndex: Float64Array;
  readonly #media: FastMedium[] = [];
  readonly #substrate: number;
  readonly #items: FastItem[];
  readonly #byPath = new Map<string, FastLayer>();
  readonly #tile: Tile;
  #plan: Crossing[] | null = null;
  #planned = false;
  /** Wavelength whose constants the tile holds, or -1. */
  #loaded = -1;
  #general: StackSolver | null = null;

  /** True when every medium of the case has a scalar eps_d. */
  static canSolve(solveCase: SolveCase): boolean {
    const canTake = (item: StackItemInput): boolean =>
      isBlock(item) ? item.layers.every(canTake) : FastMedium.canTake(item);
    return (
      FastMedium.canTake(solveCase.incident) &&
      FastMedium.canTake(solveCase.substrate) &&
      solveCase.layers.every(canTake)
    );
  }

  /**
   * @param solveCase a case that has passed `solveCaseSchema` and `checkSolveRequest`, and `canSolve`; its own angles
   *   are not used
   * @param kernelModule the compiled kernel (worker/kernel/loadKernel.ts)
   */
  constructor(solveCase: SolveCase, kernelModule: WebAssembly.Module) {
    this.#solveCase = solveCase;
    this.wavelengthsNm = Float64Array.from([solveCase.wavelengthNm].flat());
    const { index = 1 } = solveCase.incident;
    const samples = typeof index === 'object' && 'samples' in index ? index.samples : [index];
    this.#incidentIndex = Float64Array.from(samples, (sample) => toComplex(sample)[0]);
    const numbers = new Map<string, number>();
    const numberOf = (input: Parameters<typeof FastMedium.canTake>[0]): number => {
      const key = JSON.stringify(input);
      const known = numbers.get(key);
      if (known !== undefined) return known;
      this.#media.push(new FastMedium(input, this.wavelengthsNm, this.#incidentIndex));
      numbers.set(key, this.#media.length - 1);
      return this.#media.length - 1;
    };
    this.#substrate = numberOf(solveCase.substrate);
    this.#items = this.#compile(solveCase.layers, '', numberOf);
    this.#tile = new Tile(kernelOf(kernelModule), this.#media);
  }

  #compile(
    items: StackItemInput[],
    path: string,
    numberOf: (input: Parameters<typeof FastMedium.canTake>[0]) => number,
  ): FastItem[] {
    const compiled = items.map((item, position): FastItem => {
      const here = `${path}/${position}`;
      if (isBlock(item)) return { repeat: item.repeat, items: this.#compile(item.layers, here, numberOf) };
      const { thicknessNm, ...input } = item;
      const mediumNumber = numberOf(input);
      const layer = { medium: this.#media[mediumNumber]!, mediumNumber, thicknessNm, swept: false };
      this.#byPath.set(here, layer);
      return layer;
    });
    return compiled.reverse();
  }

  #layerAt(path: number[]): FastLayer {
    const layer = this.#byPath.get(`/${path.join('/')}`);
    if (!layer) throw new RangeError(`no layer at layers[${path.join('].layers[')}]`);
    return layer;
  }

  /**
   * Changes one written layer for the batches that follow.
   *
   * @param path positions into nested `layers` arrays, as `findLayerPath` gives them
   * @throws RangeError when there is no layer at that path
   */
  setThickness(path: number[], thicknessNm: number): void {
    this.#layerAt(path).thicknessNm = thicknessNm;
    this.#planned = false;
    this.#general?.setThickness(path, thicknessNm);
  }

  /**
   * Solves all points of a batch in any order of wavelengths and angles. Long runs of one wavelength are the quickest.
   *
   * @param out receives point i of the batch at position start + i
   * @param start of the batch in `out`
   * @throws RangeError when arrays differ in length or `out` is too small
   */
  solveBatch(batch: Batch, out: BatchResult, start = 0): void {
    const { wavelengthIndex, anglesDeg, thickness } = batch;
    const count = anglesDeg.length;
    if (wavelengthIndex.length !== count || (thickness && thickness.nm.length !== count)) {
      throw new RangeError(
        `a batch of ${count} angles has ${wavelengthIndex.length} wavelengths${thickness ? ` and ${thickness.nm.length} thicknesses` : ''}`,
      );
    }
    if (out.capacity < start + count) {
      throw new RangeError(`${count} points from ${start} do not fit a result of ${out.capacity}`);
    }
    if (count === 0) return;
    if (!this.#tile.claim()) this.#loaded = -1;
    if (!thickness) {
      this.#solveAll(batch, null, out, start);
      return;
    }
    const swept = this.#layerAt(thickness.path);
    const written = swept.thicknessNm;
    swept.swept = true;
    this.setThickness(
      thickness.path,
      thickness.nm.reduce((most, nm) => Math.max(most, nm), 0),
    );
    try {
      this.#solveAll(batch, swept, out, start);
    } finally {
      swept.swept = false;
      this.setThickness(thickness.path, written);
    }
  }

  #solveAll(batch: Batch, swept: FastLayer | null, out: BatchResult, start: number): void {
    if (!this.#planned) this.#plan = planCrossings(this.#items);
    this.#planned = true;
    let from = 0;
    while (from < batch.anglesDeg.length) {
      from += this.#plan
        ? this.#solveTile(batch, from, swept, this.#plan, out, start)
        : this.#solveGeneral(batch, from, out, start);
    }
  }

  /** @returns how many points were solved */
  #solveTile(
    batch: Batch,
    from: number,
    swept: FastLayer | null,
    plan: Crossing[],
    out: BatchResult,
    start: number,
  ): number {
    const tile = this.#tile;
    const { wavelengthIndex, anglesDeg, thickness } = batch;
    const first = wavelengthIndex[from]!;
    const most = Math.min(2 * TILE_PAIRS, anglesDeg.length - from);
    let count = 1;
    while (count < most && wavelengthIndex[from + count] === first) count++;
    const isRun = count >= Math.min(SHORTEST_RUN, most);
    if (!isRun) count = Math.min(most, 2 * tile.mixedPairs);
    tile.setAngles(anglesDeg, from, count);
    if (isRun) {
      if (this.#loaded !== first) tile.setLight(first, this.#k0(first), this.#incidentAt(first));
      this.#loaded = first;
    } else {
      for (let i = 0; i < count + (count % 2); i++) {
        const index = wavelengthIndex[from + Math.min(i, count - 1)]!;
        tile.setPointLight(i, index, this.#k0(index), this.#incidentAt(index));
      }
      tile.prepareMixed();
      this.#loaded = -1;
    }
    if (swept && thickness) {
      for (let i = 0; i < count + (count % 2); i++) {
        const point = from + Math.min(i, count - 1);
        const k0 = this.#k0(wavelengthIndex[point]!);
        tile.setPointThickness(i, swept.medium, k0, thickness.nm[point]!);
      }
    }
    tile.solve(this.#substrate, plan, out.withTransmission);
    this.#take(batch, from, count, out, start);
    return count;
  }

  #take(batch: Batch, from: number, count: number, out: BatchResult, start: number): void {
    const tile = this.#tile;
    const solved = tile.columns(count);
    for (let column = 0; column < out.columns.length; column++) {
      out.columns[column]!.set(solved[column]!, start + from);
    }
    const substrate = this.#media[this.#substrate]!;
    if (substrate.gyrotropic && out.withTransmission) {
      for (let column = COLUMN.t; column < COLUMN.t + 8; column++) {
        out.columns[column]!.fill(NaN, start + from, start + from + count);
      }
    }
    const p = solved[COLUMN.reflectanceP]!;
    const s = solved[COLUMN.reflectanceS]!;
    for (let i = 0; i < count; i++) {
      const finite = p[i]! < Infinity && s[i]! < Infinity;
      if (!finite || (substrate.gyrotropic && tile.isDoubtful(i))) {
        this.#solveGeneral(batch, from + i, out, start);
      }
    }
  }

  #k0(wavelengthIndex: number): number {
    return (2 * Math.PI) / this.wavelengthsNm[wavelengthIndex]!;
  }

  #incidentAt(wavelengthIndex: number): number {
    const incident = this.#incidentIndex;
    return incident.length === 1 ? incident[0]! : incident[wavelengthIndex]!;
  }

  /** One point by the general solver. */
  #solveGeneral(
    { wavelengthIndex, anglesDeg, thickness }: Batch,
    point: number,
    out: BatchResult,
    start: number,
  ): number {
    this.#general ??= this.#createGeneral();
    if (thickness) this.#general.setThickness(thickness.path, thickness.nm[point]!);
    const solved = this.#general.solve(wavelengthIndex[point]!, anglesDeg[point]!);
    writePoint(out.columns, start + point, solved, out.withTransmission);
    return 1;
  }

  /** A general solver with the thicknesses that have been set since. */
  #createGeneral(): StackSolver {
    const general = new StackSolver(this.#solveCase);
    for (const [path, layer] of this.#byPath) {
      general.setThickness(path.slice(1).split('/').map(Number), layer.thicknessNm);
    }
    return general;
  }
}

function writePoint(columns: Float64Array[], point: number, solved: SolvedPoint, all: boolean): void {
  const { r, R, kerr, T, t } = solved;
  const put = (column: number, value: number) => {
    columns[column]![point] = value;
  };
  r.forEach((value, i) => put(COLUMN.r + i, value));
  put(COLUMN.reflectanceP, R.p);
  put(COLUMN.reflectanceS, R.s);
  put(COLUMN.rotationP, kerr.p?.rotationDeg ?? NaN);
  put(COLUMN.ellipticityP, kerr.p?.ellipticityDeg ?? NaN);
  put(COLUMN.rotationS, kerr.s?.rotationDeg ?? NaN);
  put(COLUMN.ellipticityS, kerr.s?.ellipticityDeg ?? NaN);
  if (!all) return;
  put(COLUMN.transmittanceP, T.p);
  put(COLUMN.transmittanceS, T.s);
  for (let i = 0; i < 8; i++) put(COLUMN.t + i, t ? t[i]! : NaN);
}
