import type { ReadingName, SweepAxis, UsedMaterial } from '../../shared/run.ts';
import type {
  StackDocument,
  StackItem,
  StackLayer,
  StackMedium,
  WorkingMagnetization,
} from '../../shared/stack.ts';
import { describeAxis } from './runNames.ts';

/** Sentences that say what the numbers of a run rest on, so that they can be read alone years later. */
export function runAssumptions(
  document: StackDocument,
  axis: SweepAxis,
  readings: ReadingName[],
  materials: UsedMaterial[],
): string[] {
  return [
    ...settings(document, axis),
    magnetization(document.workingPoint.magnetization),
    'Convention: time factor exp(-iωt), so N = n + ik with k ≥ 0; z points into the film, x lies in the plane of incidence; a rotation is positive counter-clockwise for an observer who looks into the reflected beam.',
    ...meanings(readings),
    ...geometry(document),
    ...constants(document, axis, materials),
    'Constants of thin films differ from tabulated ones: use the numbers for planning.',
  ];
}

function settings(document: StackDocument, axis: SweepAxis): string[] {
  const { wavelengthNm, angleDeg } = document.workingPoint;
  const swept = `Swept: ${describeAxis(axis, document)}.`;
  switch (axis.kind) {
    case 'wavelength':
      return [swept, `Angle of incidence ${angleDeg} deg.`];
    case 'angle':
      return [swept, `Vacuum wavelength ${wavelengthNm} nm.`];
    default:
      return [swept, `Vacuum wavelength ${wavelengthNm} nm, angle of incidence ${angleDeg} deg.`];
  }
}

function magnetization(given: WorkingMagnetization): string {
  switch (given.mode) {
    case 'drawn':
      return 'Magnetization: as drawn in each layer.';
    case 'reversed':
      return 'Magnetization: the opposite of what is drawn, except in layers marked fixed.';
    case 'direction':
      return `Magnetization: m = (${given.m.join(', ')}) in every magnetic layer that is not marked fixed.`;
  }
}

function meanings(readings: ReadingName[]): string[] {
  const asks = (pattern: RegExp) => readings.some((name) => pattern.test(name));
  return [
    ...(asks(/^(rotation|ellipticity)/)
      ? [
          'Kerr rotation and ellipticity are the change that magnetization makes, against the same stack with m = 0 everywhere; they are exact, not linear in the Voigt constant.',
        ]
      : []),
    ...(asks(/^contrast/)
      ? [
          'The transverse contrast compares the stack with the one in which every magnetization is reversed: (R(m) - R(-m)) / (R(m) + R(-m)).',
        ]
      : []),
  ];
}

/** What is ideal about light and film, and what is not. */
function geometry(document: StackDocument): string[] {
  const { spread, backside } = document;
  const averaged = [
    [spread?.thicknessPercent ?? 0, '% of every thickness'],
    [spread?.divergenceDeg ?? 0, 'deg of the angle of incidence'],
    [spread?.bandwidthNm ?? 0, 'nm of the wavelength'],
  ] as const;
  const deviations = averaged.filter(([deviation]) => deviation > 0).map(([value, of]) => `${value} ${of}`);
  const beam =
    deviations.length === 0
      ? 'Light is a plane, monochromatic wave from a lossless medium.'
      : `Intensities are averages over a ${spread!.shape} distribution with standard deviations of ${deviations.join(', ')}; light comes from a lossless medium.`;
  const graded =
    (document.substrateGradedNm ?? 0) > 0 || anyLayer(document.layers, (layer) => (layer.gradedNm ?? 0) > 0);
  const substrate = backside
    ? `the substrate is a slab of ${backside.thicknessNm} nm whose inner reflections add in intensity`
    : 'the substrate is infinitely thick';
  return [
    beam,
    `The film planes are infinite and flat; interfaces are sharp${graded ? ' except those given a width, where the composition runs evenly from one medium to the other (Bruggeman)' : ', without roughness or intermixing'}.`,
    `All layers are homogeneous and interfere coherently; ${substrate}. The relative permeability is 1.`,
    ...(anyLayer(document.layers, ({ oxide }) => oxide !== undefined)
      ? [
          'An oxide replaces the upper part of its layer and is thicker than what it consumed by the stated factor.',
        ]
      : []),
    ...(anyLayer(document.layers, ({ dead }) => dead !== undefined)
      ? ['Dead parts of a layer have its index and no magnetization; they belong to its thickness.']
      : []),
  ];
}

function anyLayer(items: StackItem[], holds: (layer: StackLayer) => boolean): boolean {
  return items.some((item) => ('layers' in item ? anyLayer(item.layers, holds) : holds(item)));
}

function constants(document: StackDocument, axis: SweepAxis, materials: UsedMaterial[]): string[] {
  const sentences = materials.flatMap((material) => [
    ...(material.assumedConstant
      ? [
          `A constant of ${material.name} (${material.id}) is known at one wavelength only and was used at others as if it did not change.`,
        ]
      : []),
    ...(material.voigtSource?.confidence === 'from memory'
      ? [`The Voigt constant of ${material.name} (${material.id}) is from memory: verify it before use.`]
      : []),
  ]);
  if (axis.kind === 'wavelength' && hasTypedConstants(document)) {
    sentences.push('Constants typed into the stack do not change with wavelength.');
  }
  return sentences;
}

function hasTypedConstants(document: StackDocument): boolean {
  // Vacuum and air do not change either, and nobody needs to be told.
  const typed = (medium: StackMedium) => medium.material === undefined && medium.index !== 1;
  return (
    typed(document.incident) ||
    typed(document.substrate) ||
    anyLayer(document.layers, ({ medium }) => typed(medium))
  );
}
