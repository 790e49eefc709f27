// What the compiled module offers; kernelModule.ts names the same functions for TypeScript. Each is one pass over the
// pairs of a tile. The module keeps no state: memory below `firstFreeByte` holds its tables, all else is the caller's.
export { crossDiagonal, crossPlain, chainBack, chainPlain, traceThick, traceThin } from './plain.as';
export { crossGyrotropic, mapGyrotropic, settleGyrotropic, traceGyrotropic } from './gyrotropicLayer.as';
export { prepareGyrotropic, startGyrotropic } from './gyrotropicMedium.as';
export { crossMatrix, matrixGyrotropic, matrixPlain, multiply, settle, stackPlain, stackPlainBelow } from './block.as';
export { leave, placePoints, preparePlain, readAngles, startChain, startPlain, transmit } from './surface.as';

export function firstFreeByte(): usize {
  return (__heap_base + 15) & ~15;
}
