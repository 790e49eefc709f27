import type { ReadingName, SweepAxes, SweepAxis, UsedMaterial } from '../../shared/run.ts';
import type { Confidence } from '../../shared/materialSource.ts';
import type {
  StackDocument,
  StackItem,
  StackLayer,
  StackMedium,
  WorkingMagnetization,
} from '../../shared/stack.ts';
import { describeAxis } from './runNames.ts';
import { axesOf } from '../../shared/runAxes.ts';
import { inputAzimuthOf } from '../../shared/stack.ts';

export const FOR_PLANNING =
  'Constants of thin films differ from tabulated ones: use the numbers for planning.';

/** Sentences that say what the numbers of a run rest on, so that they can be read alone years later. */
export function runAssumptions(
  document: StackDocument,
  axes: SweepAxes,
  readings: ReadingName[],
  materials: UsedMaterial[],
): string[] {
  return [
    ...settings(document, axes, materials),
    magnetizationInWords(document.workingPoint.magnetization),
    ...axisMeanings(axes),
    ...filmAssumptions(document, readings, materials, sweeps(axes, 'wavelength')),
    FOR_PLANNING,
  ];
}

/**
 * What the numbers of a film rest on, whatever is asked of it.
 *
 * @param atManyWavelengths whether it is solved at more than one
 * @param saysConfidence left out where each source says itself that it is not measured
 */
export function filmAssumptions(
  document: StackDocument,
  readings: ReadingName[],
  materials: UsedMaterial[],
  atManyWavelengths: boolean,
  saysConfidence = true,
): string[] {
  return [
    'Convention: time factor exp(-iωt), so N = n + ik with k ≥ 0; z points into the film, x lies in the plane of incidence; a rotation is positive counter-clockwise for an observer who looks into the reflected beam.',
    ...meanings(readings, document),
    ...geometry(document),
    ...constants(document, atManyWavelengths, materials, saysConfidence),
    ...thermalLaws(document.layers),
  ];
}

function settings(document: StackDocument, axes: SweepAxes, materials: UsedMaterial[]): string[] {
  const { wavelengthNm, angleDeg } = document.workingPoint;
  const fixed = [
    ...(sweeps(axes, 'wavelength') ? [] : [`vacuum wavelength ${wavelengthNm} nm`]),
    ...(sweeps(axes, 'angle') ? [] : [`angle of incidence ${angleDeg} deg`]),
  ].join(', ');
  const roles = { axis: 'Swept', second: 'Second axis', family: 'Family' };
  return [
    ...axesOf(axes).map(({ field, axis }) => `${roles[field]}: ${describeAxis(axis, document, materials)}.`),
    ...(fixed === '' ? [] : [`${fixed.charAt(0).toUpperCase()}${fixed.slice(1)}.`]),
  ];
}

function sweeps(axes: SweepAxes, kind: SweepAxis['kind']): boolean {
  return axesOf(axes).some(({ axis }) => axis.kind === kind);
}

/** What the less usual axes do to the stack. */
function axisMeanings(axes: SweepAxes): string[] {
  return axesOf(axes).flatMap(({ axis }) => {
    switch (axis.kind) {
      case 'direction':
        return [directionMeaning(axis)];
      case 'voigtScale':
        return [
          `The swept factor multiplies the Voigt constant of ${axis.layerId === undefined ? 'every magnetic layer' : 'that layer'}.`,
        ];
      case 'graded':
        return ['The swept width lies half in either layer at the interface.'];
      default:
        return [];
    }
  });
}

function directionMeaning({ plane, layerId }: SweepAxis & { kind: 'direction' }): string {
  const turns = { xz: '+z toward +x', yz: '+z toward +y', xy: '+x toward +y' }[plane];
  const whose = layerId === undefined ? 'every magnetic layer that is not marked fixed' : 'that layer';
  return `m of ${whose} keeps its length and turns from ${turns}, whatever direction the working point gives it.`;
}

export function magnetizationInWords(given: WorkingMagnetization): string {
  switch (given.mode) {
    case 'drawn':
      return 'Magnetization: as drawn in each layer.';
    case 'reversed':
      return 'Magnetization: the opposite of what is drawn, except in layers marked fixed.';
    case 'direction':
      return `Magnetization: m = (${given.m.join(', ')}) in every magnetic layer that is not marked fixed.`;
  }
}

function meanings(readings: ReadingName[], document: StackDocument): string[] {
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
    ...(asks(/^(odd|even)/)
      ? [
          'Odd and even parts of a Kerr angle: half the difference of its values at m and -m, and half the sum of the changes that m and -m make against m = 0.',
        ]
      : []),
    ...(asks(/^faraday/)
      ? ['Faraday rotation and ellipticity are the change that magnetization makes to the transmitted beam.']
      : []),
    ...(asks(/eiling/)
      ? [
          'The ceiling of |r_sp| holds to first order in the Voigt constant and does not exist where a magnetic medium does not absorb or intensities are averaged; the share is |r_sp| over what the magnetic media can give in any stack, the ceiling of this stack follows from what its layers absorb.',
        ]
      : []),
    ...(asks(/^(polar|longitudinal)Part/)
      ? ['Polar- and longitudinal-like parts are |r_sp + r_ps|/2 and |r_sp - r_ps|/2.']
      : []),
    ...(asks(/^circular/)
      ? ['The contrast of circular light is (R+ - R-) / (R+ + R-), with S3 > 0 for plus.']
      : []),
    ...(asks(/AtAzimuth$/)
      ? [
          `Readings at the input azimuth are for linear light at ${inputAzimuthOf(document.workingPoint)} deg from p toward s, as the change that magnetization makes.`,
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

function constants(
  document: StackDocument,
  atManyWavelengths: boolean,
  materials: UsedMaterial[],
  saysConfidence: boolean,
): string[] {
  const sentences = materials.flatMap((material) => [
    ...(material.assumedConstant
      ? [
          `A constant of ${material.name} (${material.id}) is known at one wavelength only and was used at others as if it did not change.`,
        ]
      : []),
    ...(saysConfidence ? confidencesOf(material) : []),
    ...(material.mixture ? [`${material.name} (${material.id}) is a mixture: ${material.mixture}.`] : []),
    ...(material.anisotropySource
      ? [`${material.name} (${material.id}) is not isotropic: its crystal axes stand as its version says.`]
      : []),
  ]);
  if (atManyWavelengths && hasTypedConstants(document)) {
    sentences.push('Constants typed into the stack do not change with wavelength.');
  }
  return sentences;
}

function confidencesOf(material: UsedMaterial): string[] {
  const name = `${material.name} (${material.id})`;
  return [
    ...(['fitted', 'invented for the demo'] as const).flatMap((confidence) =>
      constantsOf(material, confidence).map((what) => `${what} of ${name} is ${confidence}, not measured.`),
    ),
    ...(material.voigtSource?.confidence === 'from memory'
      ? [`The Voigt constant of ${name} is from memory: verify it before use.`]
      : []),
  ];
}

function constantsOf({ indexSource, voigtSource }: UsedMaterial, confidence: Confidence): string[] {
  return [
    ...(indexSource.confidence === confidence ? ['The index'] : []),
    ...(voigtSource?.confidence === confidence ? ['The Voigt constant'] : []),
  ];
}

/** Layers whose Q stands for another temperature than the one at which it is known. */
function thermalLaws(items: StackItem[]): string[] {
  return items.flatMap((item) => {
    if ('layers' in item) return thermalLaws(item.layers);
    const { thermal, medium, note, id } = item;
    if (!thermal) return [];
    const { temperatureK, referenceK, curieK, a, b, citation } = thermal;
    const name = note ?? medium.label ?? medium.material ?? id;
    return [
      `Layer ${name}: Q is that of ${temperatureK} K, scaled from ${referenceK} K by m(T) = (1 - (T/Tc)^${a})^${b} with Tc = ${curieK} K (${citation}).`,
    ];
  });
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
