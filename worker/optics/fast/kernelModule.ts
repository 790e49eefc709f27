/**
 * The compiled kernel (kernel/*.as) as TypeScript sees it. Arguments named like a record are byte addresses in
 * `memory`; the records themselves are described at the head of each source file of the kernel.
 */
export type Kernel = {
  readonly memory: WebAssembly.Memory;
  firstFreeByte(): number;
  placePoints(pairs: number, angles: number, light: number, lightStride: number, place: number): void;
  preparePlain(pairs: number, index: number, light: number, plain: number): void;
  prepareGyrotropic(
    pairs: number,
    index: number,
    light: number,
    mx: number,
    my: number,
    mz: number,
    gyro: number,
  ): void;
  startPlain(pairs: number, plain: number, stride: number, place: number, state: number): void;
  startGyrotropic(
    pairs: number,
    gyro: number,
    stride: number,
    place: number,
    state: number,
    doubtful: number,
  ): void;
  startChain(pairs: number, chain: number): void;
  traceThin(
    pairs: number,
    plain: number,
    stride: number,
    place: number,
    phase: number,
    phaseStride: number,
    thicknessNm: number,
    degree: number,
    layer: number,
  ): void;
  traceThick(
    pairs: number,
    plain: number,
    stride: number,
    place: number,
    phase: number,
    phaseStride: number,
    thicknessNm: number,
    layer: number,
  ): void;
  crossDiagonal(pairs: number, layer: number, state: number): void;
  crossPlain(pairs: number, layer: number, state: number, scaled: number): void;
  chainPlain(pairs: number, layer: number, state: number, scaled: number, work: number): void;
  chainBack(pairs: number, work: number, workStride: number, hasFactor: number, chain: number): void;
  traceGyrotropic(
    pairs: number,
    gyro: number,
    stride: number,
    place: number,
    phase: number,
    phaseStride: number,
    thicknessNm: number,
    degree: number,
    doublings: number,
    even: number,
    series: number,
  ): void;
  mapGyrotropic(
    pairs: number,
    gyro: number,
    stride: number,
    place: number,
    series: number,
    map: number,
  ): void;
  crossGyrotropic(
    pairs: number,
    gyro: number,
    stride: number,
    map: number,
    state: number,
    work: number,
  ): void;
  settleGyrotropic(
    pairs: number,
    gyro: number,
    stride: number,
    map: number,
    work: number,
    state: number,
  ): void;
  matrixPlain(pairs: number, layer: number, matrix: number): void;
  matrixGyrotropic(pairs: number, gyro: number, stride: number, map: number, matrix: number): void;
  stackPlain(pairs: number, layer: number, matrix: number): void;
  stackPlainBelow(pairs: number, layer: number, matrix: number): void;
  multiply(pairs: number, upper: number, lower: number, product: number): void;
  crossMatrix(pairs: number, matrix: number, state: number, work: number): void;
  settle(pairs: number, work: number, state: number): void;
  leave(
    pairs: number,
    light: number,
    lightStride: number,
    place: number,
    state: number,
    out: number,
    column: number,
  ): void;
  readAngles(pairs: number, out: number, column: number): void;
  transmit(
    pairs: number,
    light: number,
    lightStride: number,
    place: number,
    state: number,
    chain: number,
    substrate: number,
    index: number,
    indexStride: number,
    out: number,
    column: number,
  ): void;
};

const kernels = new WeakMap<WebAssembly.Module, Kernel>();

/**
 * The kernel of this thread: one instance serves all solvers, since each memory reserves gigabytes of address space.
 * Whoever uses the memory must expect others to have used it since (`Tile.claim`).
 */
export function kernelOf(module: WebAssembly.Module): Kernel {
  const known = kernels.get(module);
  if (known) return known;
  const abort = () => {
    throw new Error('the kernel stopped: this is a fault in it');
  };
  // The exports are those of kernel/kernel.as, compiled together with this project.
  const kernel = new WebAssembly.Instance(module, { env: { abort } }).exports as unknown as Kernel;
  kernels.set(module, kernel);
  return kernel;
}
