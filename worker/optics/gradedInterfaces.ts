import type { MediumInput, MixtureInput } from '../../shared/medium.ts';
import type { GradedLayer, WrittenLayer } from './layers.ts';
import { Medium } from './medium.ts';

/**
 * Graded interfaces as thin layers: between two media the composition runs evenly over the stated width, half of it
 * taken from either layer, in slices of Bruggeman mixtures at their mid composition.
 *
 * @param sequence layers from the light to the substrate, the substrate last with thickness Infinity
 * @param slices per interface
 * @returns the same sequence with slices between; the substrate still last
 */
export function gradeSequence(
  sequence: GradedLayer[],
  incident: MediumInput,
  slices: number,
): WrittenLayer[] {
  const mixtures = new Map<string, Medium>();
  const mixture = (upper: MediumInput, lower: MediumInput, fraction: number): Medium => {
    const input: MediumInput = {
      mixture: { model: 'bruggeman', fraction, parts: [partOf(upper), partOf(lower)] },
    };
    const key = JSON.stringify(input);
    const medium = mixtures.get(key) ?? new Medium(input);
    mixtures.set(key, medium);
    return medium;
  };
  return sequence.flatMap((layer, position) => {
    const above = sequence[position - 1]?.medium.input ?? incident;
    const below = sequence[position + 1]?.gradedNm ?? 0;
    const { path, medium, gradedNm } = layer;
    const zone: WrittenLayer[] =
      gradedNm === 0
        ? []
        : Array.from({ length: slices }, (_, i) => ({
            path,
            medium: mixture(above, medium.input, (i + 0.5) / slices),
            thicknessNm: gradedNm / slices,
          }));
    return [...zone, { path, medium, thicknessNm: layer.thicknessNm - (gradedNm + below) / 2 }];
  });
}

function partOf(medium: MediumInput): MixtureInput['parts'][0] {
  const { index, voigt, voigtScale, m } = medium;
  return {
    index,
    ...(voigt === undefined ? {} : { voigt }),
    ...(voigtScale === undefined ? {} : { voigtScale }),
    ...(m === undefined ? {} : { m }),
  };
}
