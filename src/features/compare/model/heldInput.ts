import { applyAxis } from '../../../../shared/applyAxis.ts';
import type { Run, SweepAxis } from '../../../../shared/run.ts';
import type { StackDocument } from '../../../../shared/stack.ts';
import { layersIn } from './comparedInput.ts';
import type { ComparedInput } from './comparedInput.ts';

/** A run's input as one curve or map of it was computed: with the values at which the other axes are held. */
export function heldInput(
  run: Run,
  swept: readonly SweepAxis[],
  held: readonly { axis: SweepAxis; value: number }[],
): ComparedInput {
  const document = held.reduce((film, { axis, value }) => withValue(film, axis, value), run.document);
  return { document, swept, materials: run.materials, readings: run.readings };
}

function withValue(document: StackDocument, axis: SweepAxis, value: number): StackDocument {
  // Without the rounding of the grid, which is no difference between inputs.
  const exact = Number(value.toPrecision(7));
  if (axis.kind !== 'voigtScale' || axis.layerId !== undefined) return applyAxis(document, axis, exact);
  // Q of what is not magnetic is scaled too and changes nothing, so that nothing is said of it.
  const magnets = layersIn(document.layers).filter(({ m }) => m !== undefined);
  const scaled = magnets.reduce(
    (film, { id, voigtScale = 1 }) => applyAxis(film, { ...axis, layerId: id }, voigtScale * exact),
    document,
  );
  if (document.substrateM === undefined) return scaled;
  return { ...scaled, substrateVoigtScale: (document.substrateVoigtScale ?? 1) * exact };
}
