import { toComplex } from '../../../../shared/complex.ts';
import type { UsedMaterial } from '../../../../shared/run.ts';
import type { StackLayer, StackMedium } from '../../../../shared/stack.ts';
import { formatFormula, formatPlain, formatTypedComplex } from '../../../lib/format.ts';

type Media = readonly UsedMaterial[];

/** A medium in a word: its formula, the name given to typed-in constants, or the constants. */
export function mediumWord(medium: StackMedium, used: Media): string {
  if (medium.material !== undefined) {
    const material = used.find(({ id }) => id === medium.material);
    return material ? formatFormula(material.formula) : medium.material;
  }
  return medium.label ?? constantsWord(medium, used);
}

/** What tells media apart that have the same word: which source of the library, or which constants. */
export function mediumDetail(medium: StackMedium, used: Media): string {
  const word = mediumWord(medium, used);
  const material = used.find(({ id }) => id === medium.material);
  if (material) return `${word} (${material.name})`;
  const constants = constantsWord(medium, used);
  const voigt = medium.voigt;
  const q = voigt === undefined || isSampled(voigt) ? '' : `, Q ${formatTypedComplex(toComplex(voigt))}`;
  return `${word} (${constants}${q})`;
}

/** A medium without what does not change its numbers and without versions, which are told by themselves. */
export function mediumValue(medium: StackMedium): string {
  return JSON.stringify(medium, (key, value: unknown) =>
    key === 'label' || key === 'version' || key === 'assumeConstant' ? undefined : value,
  );
}

/** A layer in words: `Pt cap`, or `Pt` with its number from the light where there are several such layers. */
export function layerWord(layer: StackLayer, layers: readonly StackLayer[], used: Media): string {
  const own = plainWord(layer, layers, used);
  const alike = layers.filter((other) => plainWord(other, layers, used) === own);
  return alike.length > 1 ? `${own}, layer ${layers.indexOf(layer) + 1},` : own;
}

function plainWord(layer: StackLayer, layers: readonly StackLayer[], used: Media): string {
  const word = mediumWord(layer.medium, used);
  const role = layer.note?.trim() || (isCap(layer, layers) ? 'cap' : '');
  return role === '' || word.includes(role) ? word : role.includes(word) ? role : `${word} ${role}`;
}

/** What covers a film: its first layer, where that is not the magnet itself. */
function isCap(layer: StackLayer, layers: readonly StackLayer[]): boolean {
  return layers.length > 1 && layers[0] === layer && layer.m === undefined;
}

function constantsWord(medium: StackMedium, used: Media): string {
  if (medium.mixture) {
    const { parts, fraction } = medium.mixture;
    const percent = Number((100 * fraction).toPrecision(4));
    const [first, second] = parts.map((part) => mediumWord(part, used));
    return `${first}/${second} ${formatPlain(100 - percent)}:${formatPlain(percent)}`;
  }
  if (medium.epsilon !== undefined) return 'free tensor';
  if (medium.index === undefined || isSampled(medium.index)) return 'table';
  const [n, k] = toComplex(medium.index);
  if (k === 0) return n === 1 ? 'vacuum' : `n ${formatPlain(n)}`;
  return formatTypedComplex([n, k]);
}

function isSampled<Value>(value: Value | { samples: Value[] }): value is { samples: Value[] } {
  return typeof value === 'object' && value !== null && 'samples' in value;
}
