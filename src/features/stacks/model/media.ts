import { toComplex } from '../../../../shared/complex.ts';
import type { MaterialClass, MaterialSummary } from '../../../../shared/material.ts';
import type { StackDocument, StackMedium } from '../../../../shared/stack.ts';
import { formatFormula, formatPlain, formatRange } from '../../../lib/format.ts';
import { listLayers } from './items.ts';

/** What the drawing and its cautions need of a material. */
export type DrawnMaterial = Pick<
  MaterialSummary,
  'version' | 'formula' | 'class' | 'rangeNm' | 'voigtRangeNm' | 'voigtConfidence' | 'anisotropy'
>;

/**
 * Materials: by id the group's library in its newest versions, or those that a run was computed with; by
 * `versionKey` those used in an older version.
 */
export type Materials = ReadonlyMap<string, DrawnMaterial>;

export function versionKey(id: string, version: number): string {
  return `${id}@${version}`;
}

export function materialOf(
  { material, version }: Pick<StackMedium, 'material' | 'version'>,
  materials: Materials,
): DrawnMaterial | null {
  if (material === undefined) return null;
  const asUsed = version === undefined ? undefined : materials.get(versionKey(material, version));
  return asUsed ?? materials.get(material) ?? null;
}

/** What the drawing prints in a layer: the formula, else the name given to typed-in constants, else the constants. */
export function mediumName(medium: StackMedium, materials: Materials): string {
  if (medium.material !== undefined) {
    const material = materialOf(medium, materials);
    return material ? formatFormula(material.formula) : medium.material;
  }
  if (medium.label) return medium.label;
  if (medium.mixture) {
    const { parts, fraction } = medium.mixture;
    const percent = Math.round(100 * fraction);
    return `${parts.map((part) => mediumName(part, materials)).join('/')} ${100 - percent}:${percent}`;
  }
  if (medium.epsilon !== undefined) return 'free tensor';
  if (medium.index === undefined || isSampled(medium.index)) return 'table';
  const [n, k] = toComplex(medium.index);
  if (k === 0) return n === 1 ? 'vacuum' : `n ${formatPlain(n)}`;
  return `${formatPlain(n)} + ${formatPlain(k)}i`;
}

export function isSampled<Value>(value: Value | { samples: Value[] }): value is { samples: Value[] } {
  return typeof value === 'object' && value !== null && 'samples' in value;
}

/** The class that colours the layer; of typed-in constants by what they are like. */
export function mediumClass(medium: StackMedium, materials: Materials): MaterialClass {
  const material = materialOf(medium, materials);
  if (material) return material.class;
  if (medium.mixture) {
    const [first, second] = medium.mixture.parts;
    return isMagnetic(medium, materials)
      ? 'magnet'
      : mediumClass(medium.mixture.fraction > 0.5 ? second : first, materials);
  }
  if (medium.voigt !== undefined || medium.epsilon !== undefined) return 'magnet';
  if (medium.index === undefined || isSampled(medium.index)) return 'refractory';
  const [n, k] = toComplex(medium.index);
  if (k > 1) return n < 1 ? 'noble' : 'refractory';
  return k > 0.001 || n > 3 ? 'semiconductor' : 'dielectric';
}

/** Whether an m of this medium does anything. A free tensor has no m: it carries its own magnetization. */
export function isMagnetic(medium: StackMedium, materials: Materials): boolean {
  if (medium.mixture) return medium.mixture.parts.some((part) => isMagnetic(part, materials));
  if (medium.material === undefined) return medium.voigt !== undefined || medium.quadratic !== undefined;
  const material = materialOf(medium, materials);
  if (material === null || material.anisotropy === 'tensor') return false;
  return material.voigtRangeNm !== null || material.anisotropy === 'cubic';
}

/** Whether the medium is a free tensor, typed in or of the library. */
export function isFreeTensor(medium: StackMedium, materials: Materials): boolean {
  return medium.epsilon !== undefined || materialOf(medium, materials)?.anisotropy === 'tensor';
}

/** Whether the medium has axes that can be turned. */
export function hasAxes(medium: StackMedium, materials: Materials): boolean {
  if (medium.material !== undefined) return (materialOf(medium, materials)?.anisotropy ?? null) !== null;
  return medium.epsilon !== undefined || medium.extraordinary !== undefined || medium.quadratic !== undefined;
}

export type MediumNote = {
  tone: 'problem' | 'caution';
  /** `extended` where a constant of one wavelength is used at others, which the plot says too. */
  kind: 'range' | 'extended' | 'memory';
  text: string;
  offer: 'assumeConstant' | null;
};

/**
 * What a reader must know of a medium at these wavelengths: constants that end before them, a constant known at
 * one wavelength only, and constants given from memory.
 *
 * @param rangeNm lowest and highest wavelength that is asked
 * @param magnetized whether the medium has an m other than 0: only then its Q is used
 */
export function mediumNotes(
  medium: StackMedium,
  materials: Materials,
  rangeNm: readonly [number, number],
  magnetized: boolean,
): MediumNote[] {
  const material = materialOf(medium, materials);
  if (material === null) return [];
  const notes: MediumNote[] = [];
  const asked = formatRange(rangeNm, 'nm');
  const assumed = medium.assumeConstant === true;
  const check = (what: string, known: [number, number]) => {
    if (rangeNm[0] >= known[0] && rangeNm[1] <= known[1]) return;
    const one = known[0] === known[1];
    const extent = one ? `at ${formatRange(known, 'nm')} only` : `for ${formatRange(known, 'nm')}`;
    if (one && assumed) {
      notes.push({
        tone: 'caution',
        kind: 'extended',
        text: `${what} of ${formatFormula(material.formula)} is known ${extent} and used at ${asked} too.`,
        offer: null,
      });
      return;
    }
    notes.push({
      tone: 'problem',
      kind: 'range',
      text: `${what} of ${formatFormula(material.formula)} is known ${extent}, not at ${asked}.`,
      offer: one ? 'assumeConstant' : null,
    });
  };
  check(material.anisotropy === 'tensor' ? 'ε' : 'n, k', material.rangeNm);
  if (magnetized && material.voigtRangeNm) check('Q', material.voigtRangeNm);
  if (magnetized && material.voigtConfidence === 'from memory') {
    notes.push({
      tone: 'caution',
      kind: 'memory',
      text: `Q of ${formatFormula(material.formula)} is from memory: verify before use.`,
      offer: null,
    });
  }
  return notes;
}

/** What to know of all media of a film, each said once. */
export function filmCautions(
  document: StackDocument,
  materials: Materials,
  rangeNm: readonly [number, number],
): MediumNote[] {
  const media = [
    { medium: document.incident, m: undefined },
    ...listLayers(document.layers),
    { medium: document.substrate, m: document.substrateM },
  ];
  const cautions = media.flatMap(({ medium, m }) =>
    mediumNotes(medium, materials, rangeNm, m?.some((part) => part !== 0) ?? false).filter(
      ({ tone }) => tone === 'caution',
    ),
  );
  return cautions.filter(({ text }, index) => cautions.findIndex((other) => other.text === text) === index);
}
