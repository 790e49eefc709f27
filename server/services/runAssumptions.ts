import type { ReadingName, SweepAxis, UsedMaterial } from '../../shared/run.ts';
import type { StackDocument, StackItem, StackMedium, WorkingMagnetization } from '../../shared/stack.ts';
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
    'Light is a plane, monochromatic wave from a lossless medium; the film planes are infinite, flat and sharp, without roughness or intermixing.',
    'All layers are homogeneous and interfere coherently; the substrate is infinitely thick. The relative permeability is 1.',
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
    case 'thickness':
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
  const any = (items: StackItem[]): boolean =>
    items.some((item) => ('layers' in item ? any(item.layers) : typed(item.medium)));
  return typed(document.incident) || typed(document.substrate) || any(document.layers);
}
