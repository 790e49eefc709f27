import type { Crossing, FastLayer } from './crossingPlan.ts';
import { visibleNm } from './crossingPlan.ts';
import type { FastMedium } from './fastMedium.ts';
import type { Kernel } from './kernelModule.ts';

/** Bytes of one slot of a record: one quantity of two points side by side. */
const SLOT = 16;
/** Slots per pair of each record; described at the head of the kernel's source files. */
const SLOTS = {
  angle: 1,
  light: 2,
  phase: 1,
  index: 4,
  plain: 6,
  gyro: 30,
  place: 4,
  state: 8,
  chain: 8,
  work: 16,
  doubtful: 1,
  layer: 14,
  series: 8,
  map: 26,
  matrix: 32,
} as const;
const COLUMNS = 24;

/** Points of a tile: its records then fit the second cache, most of them the first. */
export const TILE_PAIRS = 100;
/** Media constants per point may take this much memory; a case of very many media gets shorter mixed tiles. */
const MEDIA_BYTES = 2_000_000;
const PAGE = 65_536;

/** The tile that used a kernel's memory last. */
const owners = new WeakMap<Kernel, Tile>();

/** Addresses of one medium's records. */
type MediumPlace = { medium: FastMedium; index: number; constants: number; slots: number };

/**
 * Up to 2 * TILE_PAIRS points, carried through the kernel's passes together. The caller fills angles and light, calls
 * `solve` and reads the columns.
 */
export class Tile {
  /** Most pairs of a tile whose points differ in wavelength. */
  readonly mixedPairs: number;
  readonly #kernel: Kernel;
  readonly #media: MediumPlace[];
  readonly #at: Record<keyof typeof SLOTS | 'substrate' | 'spare' | 'single' | 'out', number>;
  readonly #end: number;
  #numbers = new Float64Array();
  #columns: Float64Array[] = [];
  #views: (Float64Array[] | undefined)[] = [];
  #pairs = 0;
  /** 1 where every point has constants of its own, 0 where all share those of one wavelength. */
  #mixed: 0 | 1 = 0;
  #coupled = false;
  #chained = false;

  constructor(kernel: Kernel, media: FastMedium[]) {
    this.#kernel = kernel;
    const bytesPerPair = media.length * SLOT * (SLOTS.index + SLOTS.gyro);
    this.mixedPairs = Math.max(1, Math.min(TILE_PAIRS, Math.floor(MEDIA_BYTES / bytesPerPair)));
    let next = kernel.firstFreeByte();
    const take = (slots: number, pairs = TILE_PAIRS) => {
      const start = next;
      next += slots * pairs * SLOT;
      return start;
    };
    this.#at = {
      ...(Object.fromEntries(Object.entries(SLOTS).map(([name, slots]) => [name, take(slots)])) as Record<
        keyof typeof SLOTS,
        number
      >),
      substrate: take(SLOTS.state),
      spare: take(SLOTS.matrix),
      single: take(SLOTS.matrix),
      out: take(COLUMNS),
    };
    this.#media = media.map((medium) => ({
      medium,
      index: take(SLOTS.index, this.mixedPairs),
      constants: take(medium.gyrotropic ? SLOTS.gyro : SLOTS.plain, this.mixedPairs),
      slots: medium.gyrotropic ? SLOTS.gyro : SLOTS.plain,
    }));
    this.#end = next;
  }

  /**
   * Takes the kernel's memory for the calls that follow, until another tile claims it.
   *
   * @returns whether it is as this tile left it
   */
  claim(): boolean {
    const { memory } = this.#kernel;
    const untouched = owners.get(this.#kernel) === this;
    owners.set(this.#kernel, this);
    const missing = this.#end - memory.buffer.byteLength;
    if (missing > 0) memory.grow(Math.ceil(missing / PAGE));
    // Memory that grows, for this tile or another, takes all views of it along.
    if (this.#numbers.buffer !== memory.buffer) {
      this.#numbers = new Float64Array(memory.buffer);
      this.#views = [];
      this.#columns = Array.from(
        { length: COLUMNS },
        (_, column) => new Float64Array(memory.buffer, this.#column(column), 2 * TILE_PAIRS),
      );
    }
    return untouched;
  }

  #column(column: number): number {
    return this.#at.out + column * TILE_PAIRS * SLOT;
  }

  /** The first `count` values of every column of the results. Views of a length are made once. */
  columns(count: number): Float64Array[] {
    return (this.#views[count] ??= this.#columns.map((column) => column.subarray(0, count)));
  }

  /** Angles in degrees from `from`; an odd last point is doubled. */
  setAngles(anglesDeg: Float64Array, from: number, count: number): void {
    const start = this.#at.angle / 8;
    for (let i = 0; i < count; i++) this.#numbers[start + i] = anglesDeg[from + i]!;
    if (count % 2 === 1) this.#numbers[start + count] = anglesDeg[from + count - 1]!;
    this.#pairs = Math.ceil(count / 2);
  }

  /** All points at one wavelength. */
  setLight(wavelengthIndex: number, k0: number, incidentIndex: number): void {
    this.#mixed = 0;
    for (let lane = 0; lane < 2; lane++) this.#setLane(lane, wavelengthIndex, k0, incidentIndex);
    this.#prepare(1);
  }

  /** One point's own wavelength; after the last, `prepareMixed`. */
  setPointLight(point: number, wavelengthIndex: number, k0: number, incidentIndex: number): void {
    this.#mixed = 1;
    this.#setLane(point, wavelengthIndex, k0, incidentIndex);
  }

  prepareMixed(): void {
    this.#prepare(this.#pairs);
  }

  /** Thickness of the swept layer at one point, nm. */
  setPointThickness(point: number, medium: FastMedium, k0: number, thicknessNm: number): void {
    const seen = medium.gyrotropic ? visibleNm(medium, thicknessNm) : thicknessNm;
    this.#numbers[this.#at.phase / 8 + point] = k0 * seen;
  }

  #setLane(point: number, wavelengthIndex: number, k0: number, incidentIndex: number): void {
    const numbers = this.#numbers;
    const lane = point & 1;
    const pair = point >> 1;
    const light = this.#at.light / 8 + pair * SLOTS.light * 2 + lane;
    numbers[light] = k0;
    numbers[light + 2] = incidentIndex;
    for (const { medium, index } of this.#media) {
      const to = index / 8 + pair * SLOTS.index * 2 + lane;
      const from = medium.offset(wavelengthIndex);
      numbers[to] = medium.samples[from]!;
      numbers[to + 2] = medium.samples[from + 1]!;
      numbers[to + 4] = medium.samples[from + 2]!;
      numbers[to + 6] = medium.samples[from + 3]!;
    }
  }

  #prepare(pairs: number): void {
    const { light } = this.#at;
    for (const { medium, index, constants } of this.#media) {
      if (medium.gyrotropic) this.#kernel.prepareGyrotropic(pairs, index, light, ...medium.m, constants);
      else this.#kernel.preparePlain(pairs, index, light, constants);
    }
  }

  /**
   * From the substrate to the light.
   *
   * @param substrate number of the medium
   * @param plan of the layers, from below
   * @param withTransmission also columns 14 and up
   */
  solve(substrate: number, plan: Crossing[], withTransmission: boolean): void {
    const kernel = this.#kernel;
    const pairs = this.#pairs;
    const { angle, light, place, state, chain, doubtful, out } = this.#at;
    const column = TILE_PAIRS * SLOT;
    const lightStride = this.#mixed * SLOTS.light * SLOT;
    kernel.placePoints(pairs, angle, light, lightStride, place);
    const { medium, index, constants } = this.#media[substrate]!;
    const stride = this.#stride(substrate);
    if (medium.gyrotropic) kernel.startGyrotropic(pairs, constants, stride, place, state, doubtful);
    else kernel.startPlain(pairs, constants, stride, place, state);
    this.#coupled = medium.gyrotropic;
    this.#chained = withTransmission;
    if (withTransmission) {
      kernel.startChain(pairs, chain);
      this.#copy(state, this.#at.substrate, SLOTS.state);
    }
    for (const step of plan) this.#cross(step);
    kernel.leave(pairs, light, lightStride, place, state, out, column);
    kernel.readAngles(pairs, out, column);
    if (!withTransmission) return;
    kernel.transmit(
      pairs,
      light,
      lightStride,
      place,
      state,
      chain,
      this.#at.substrate,
      index,
      this.#mixed * SLOTS.index * SLOT,
      out,
      column,
    );
  }

  /** A point on a gyrotropic substrate that the kernel does not vouch for. */
  isDoubtful(point: number): boolean {
    return Number.isNaN(this.#numbers[this.#at.doubtful / 8 + point]);
  }

  #stride(mediumNumber: number): number {
    return this.#mixed * this.#media[mediumNumber]!.slots * SLOT;
  }

  #copy(from: number, to: number, slots: number): void {
    const start = from / 8;
    this.#numbers.copyWithin(to / 8, start, start + this.#pairs * slots * 2);
  }

  #cross(step: Crossing): void {
    if (step.kind === 'plain') this.#crossPlain(step.layer, step.degree);
    else if (step.kind === 'gyrotropic') this.#crossGyrotropic(step);
    else this.#crossPower(step);
  }

  /** Address, stride and factor of k0 d: per point for the swept layer, else k0 of the light times the thickness. */
  #phase(layer: FastLayer): [address: number, stride: number, factor: number] {
    const { medium, thicknessNm } = layer;
    if (layer.swept) return [this.#at.phase, SLOT, 1];
    const depth = medium.gyrotropic ? visibleNm(medium, thicknessNm) : thicknessNm;
    return [this.#at.light, this.#mixed * SLOTS.light * SLOT, depth];
  }

  #tracePlain(layer: FastLayer, degree: number): void {
    const kernel = this.#kernel;
    const { place, layer: record } = this.#at;
    const { constants } = this.#media[layer.mediumNumber]!;
    const stride = this.#stride(layer.mediumNumber);
    const [phase, phaseStride, factor] = this.#phase(layer);
    if (degree > 0) {
      kernel.traceThin(this.#pairs, constants, stride, place, phase, phaseStride, factor, degree, record);
    } else {
      kernel.traceThick(this.#pairs, constants, stride, place, phase, phaseStride, factor, record);
    }
  }

  #crossPlain(layer: FastLayer, degree: number): void {
    const kernel = this.#kernel;
    const pairs = this.#pairs;
    const { state, work, chain, layer: record } = this.#at;
    const scaled = degree === 0 ? 1 : 0;
    this.#tracePlain(layer, degree);
    if (this.#chained) {
      kernel.chainPlain(pairs, record, state, scaled, work);
      kernel.chainBack(pairs, work, 10 * SLOT, scaled, chain);
    }
    if (this.#coupled) kernel.crossPlain(pairs, record, state, scaled);
    else kernel.crossDiagonal(pairs, record, state);
  }

  #traceGyrotropic({ layer, steps, degree, doublings }: Crossing & { kind: 'gyrotropic' }): void {
    const kernel = this.#kernel;
    const { place, series, map } = this.#at;
    const { constants } = this.#media[layer.mediumNumber]!;
    const stride = this.#stride(layer.mediumNumber);
    const [phase, phaseStride, factor] = this.#phase(layer);
    const even = layer.medium.even ? 1 : 0;
    kernel.traceGyrotropic(
      this.#pairs,
      constants,
      stride,
      place,
      phase,
      phaseStride,
      factor / steps / 2 ** doublings,
      degree,
      doublings,
      even,
      series,
    );
    kernel.mapGyrotropic(this.#pairs, constants, stride, place, series, map);
  }

  #crossGyrotropic(step: Crossing & { kind: 'gyrotropic' }): void {
    const kernel = this.#kernel;
    const { state, work, map } = this.#at;
    const { constants } = this.#media[step.layer.mediumNumber]!;
    const stride = this.#stride(step.layer.mediumNumber);
    this.#traceGyrotropic(step);
    for (let i = 0; i < step.steps; i++) {
      kernel.crossGyrotropic(this.#pairs, constants, stride, map, state, work);
      this.#chainWork();
      kernel.settleGyrotropic(this.#pairs, constants, stride, map, work, state);
    }
    this.#coupled = true;
  }

  #chainWork(): void {
    if (!this.#chained) return;
    const { work, chain } = this.#at;
    this.#kernel.chainBack(this.#pairs, work, SLOTS.work * SLOT, 0, chain);
  }

  #crossPower({ block, squarings, repeats }: Crossing & { kind: 'power' }): void {
    let [matrix, spare] = this.#buildBlock(block);
    // All powers of one matrix commute: the odd rests are crossed as the squares come up.
    let left = repeats;
    for (let i = 0; i < squarings; i++) {
      if (left % 2 === 1) this.#crossMatrix(matrix);
      left = Math.floor(left / 2);
      this.#kernel.multiply(this.#pairs, matrix, matrix, spare);
      [matrix, spare] = [spare, matrix];
    }
    for (let i = 0; i < left; i++) this.#crossMatrix(matrix);
    this.#coupled ||= block.some((step) => step.kind === 'gyrotropic');
  }

  /**
   * The matrix of one repetition, begun at its lowest gyrotropic layer: plain layers join from either side at half the
   * cost of a matrix product.
   *
   * @returns where it is, and the free place
   */
  #buildBlock(block: Crossing[]): [matrix: number, spare: number] {
    const kernel = this.#kernel;
    const pairs = this.#pairs;
    const { layer, single } = this.#at;
    let { matrix, spare } = this.#at;
    const core = Math.max(
      0,
      block.findIndex((step) => step.kind === 'gyrotropic'),
    );
    this.#blockMatrix(block[core]!, matrix);
    for (const step of block.slice(0, core).reverse()) {
      this.#traceInBlock(step);
      kernel.stackPlainBelow(pairs, layer, matrix);
    }
    for (const step of block.slice(core + 1)) {
      if (step.kind === 'plain') {
        this.#traceInBlock(step);
        kernel.stackPlain(pairs, layer, matrix);
      } else {
        this.#blockMatrix(step, single);
        kernel.multiply(pairs, single, matrix, spare);
        [matrix, spare] = [spare, matrix];
      }
    }
    return [matrix, spare];
  }

  #traceInBlock(step: Crossing): void {
    if (step.kind === 'plain') this.#tracePlain(step.layer, step.degree);
    else if (step.kind === 'gyrotropic') this.#traceGyrotropic(step);
    else throw new Error('a block inside a block is planned layer by layer');
  }

  #blockMatrix(step: Crossing, matrix: number): void {
    const { layer, map } = this.#at;
    this.#traceInBlock(step);
    if (step.kind !== 'gyrotropic') {
      this.#kernel.matrixPlain(this.#pairs, layer, matrix);
      return;
    }
    const { mediumNumber } = step.layer;
    const { constants } = this.#media[mediumNumber]!;
    this.#kernel.matrixGyrotropic(this.#pairs, constants, this.#stride(mediumNumber), map, matrix);
  }

  #crossMatrix(matrix: number): void {
    const { state, work } = this.#at;
    this.#kernel.crossMatrix(this.#pairs, matrix, state, work);
    this.#chainWork();
    this.#kernel.settle(this.#pairs, work, state);
  }
}
