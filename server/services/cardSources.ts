import type { MaterialSource } from '../../shared/materialSource.ts';
import type { UsedMaterial } from '../../shared/run.ts';
import type { StackDocument, StackMedium } from '../../shared/stack.ts';
import { drawnLayers } from '../../worker/design/expandBlocks.ts';

/** Where every constant of a card comes from: a sentence for each material, and one for each set of typed-in constants. */
export function cardSources(document: StackDocument, materials: readonly UsedMaterial[]): string[] {
  const media = [document.substrate, ...drawnLayers(document.layers).map(({ medium }) => medium)];
  const typed = media.filter(({ material }) => material === undefined).map(typedConstants);
  return [...materials.map(librarySource), ...new Set(typed)];
}

function librarySource(used: UsedMaterial): string {
  const { id, version, name, formula, indexSource, voigtSource, anisotropySource, origin = [] } = used;
  const constants = [
    ['n and k', indexSource],
    ['Q', voigtSource],
    ['anisotropy', anisotropySource ?? null],
  ] as const;
  const given = constants.flatMap(([what, source]) => (source ? [`${what}: ${citation(source)}`] : []));
  return [`${formula}, ${name} (${id}, version ${version}). ${given.join(' ')}`, ...origin].join(' ');
}

/** Constants that stand in the stack itself, exactly as they were given. */
function typedConstants({ label, ...constants }: StackMedium): string {
  const given = Object.entries(constants).map(([key, value]) => `${key} ${JSON.stringify(value)}`);
  return `${label ?? 'Unnamed medium'}: typed in, without a source (${given.join(', ')}).`;
}

/** The citation, and what keeps the number from being taken as measured. */
function citation({ citation: text, doi, confidence, caution }: MaterialSource): string {
  const said = [
    text.replace(/\.$/, ''),
    ...(doi === null || text.includes(doi) ? [] : [`doi:${doi}`]),
    ...(confidence === 'measured' ? [] : [`${confidence}, verify before use`]),
  ];
  return `${said.join('; ')}.${caution === null ? '' : ` ${caution}`}`;
}
