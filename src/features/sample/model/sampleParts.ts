import type { StackDocument, StackItem, StackLayer, StackMedium } from '../../../../shared/stack.ts';

/** A change of the film; typing on at one place under the same name is one step of undo. */
export type EditFilm = (change: (document: StackDocument) => StackDocument, name: string | null) => void;

/** Every layer once, with its position as people count. */
export function numberedLayers(
  items: readonly StackItem[],
  prefix = '',
): { layer: StackLayer; position: string }[] {
  return items.flatMap((item, index) => {
    const position = `${prefix}${index + 1}`;
    return 'layers' in item ? numberedLayers(item.layers, `${position}.`) : [{ layer: item, position }];
  });
}

type SampleKey = 'gradedNm' | 'dead' | 'oxide' | 'medium';

/** The film with one layer's settings changed; undefined takes a setting away. */
export function withSample(
  document: StackDocument,
  id: string,
  patch: { [Key in SampleKey]?: StackLayer[Key] | undefined },
): StackDocument {
  const changeItem = (item: StackItem): StackItem => {
    if ('layers' in item) return { ...item, layers: item.layers.map(changeItem) };
    if (item.id !== id) return item;
    const { gradedNm, dead, oxide, medium, ...rest } = { ...item, ...patch };
    return {
      ...rest,
      medium: medium ?? item.medium,
      ...(gradedNm ? { gradedNm } : {}),
      ...(dead && dead.topNm + dead.bottomNm > 0 ? { dead } : {}),
      ...(oxide ? { oxide } : {}),
    };
  };
  return { ...document, layers: document.layers.map(changeItem) };
}

/** What of a film departs from the ideal one, in a few words each. */
export function sampleSummary(document: StackDocument, nameOf: (medium: StackMedium) => string): string[] {
  const texts: string[] = [];
  for (const { layer } of numberedLayers(document.layers)) {
    const name = nameOf(layer.medium);
    if (layer.oxide) texts.push(`${name} oxidised`);
    if (layer.gradedNm) texts.push(`${name} graded ${plain(layer.gradedNm)} nm`);
    if (layer.dead) texts.push(`${name} dead ${plain(layer.dead.topNm + layer.dead.bottomNm)} nm`);
    if (layer.medium.mixture) texts.push(`mixture ${name}`);
  }
  if (document.substrateGradedNm) texts.push(`substrate graded ${plain(document.substrateGradedNm)} nm`);
  if (document.backside) texts.push('backside');
  const { thicknessPercent, divergenceDeg, bandwidthNm } = document.spread ?? {};
  if (thicknessPercent) texts.push(`thickness ± ${plain(thicknessPercent)} %`);
  if (divergenceDeg) texts.push(`divergence ${plain(divergenceDeg)}°`);
  if (bandwidthNm) texts.push(`bandwidth ${plain(bandwidthNm)} nm`);
  return texts;
}

/** How much oxide grows out of the metal, in a sentence. */
export function oxideText(layer: StackLayer, metal: string, oxideName: string): string {
  const { consumedNm = 0, expansion = 1 } = layer.oxide ?? {};
  const left = layer.thicknessNm - consumedNm;
  return (
    `${plain(consumedNm)} nm of ${metal} become ${plain(consumedNm * expansion)} nm of ${oxideName}; ` +
    `${plain(left)} nm of ${metal} are left.`
  );
}

export function plain(value: number): string {
  return String(Number(value.toPrecision(6)));
}

type Mixture = NonNullable<StackMedium['mixture']>;
type Part = Mixture['parts'][0];

/** A medium as a part of a mixture: its constants without their name. */
function partOf({ material, version, assumeConstant, index, voigt }: StackMedium): Part {
  if (material !== undefined) {
    return {
      material,
      ...(version === undefined ? {} : { version }),
      ...(assumeConstant === undefined ? {} : { assumeConstant }),
    };
  }
  return { index: index ?? 1.5, ...(voigt === undefined ? {} : { voigt }) };
}

/** A mixture that begins as the medium itself, half and half with the other. */
export function mixedWith(medium: StackMedium, other: StackMedium): StackMedium {
  return { mixture: { model: 'bruggeman', fraction: 0.5, parts: [partOf(medium), partOf(other)] } };
}

/** A mixture with one of its parts exchanged. */
export function withPart(mixture: Mixture, index: 0 | 1, medium: StackMedium): Mixture {
  const [first, second] = mixture.parts;
  return { ...mixture, parts: index === 0 ? [partOf(medium), second] : [first, partOf(medium)] };
}

/** The part as a medium of its own. */
export function mediumOfPart({ m: _m, voigtScale: _voigtScale, ...part }: Part): StackMedium {
  return part;
}

type Spread = NonNullable<StackDocument['spread']>;

/** The film with its spread changed; one in which nothing spreads is left out. */
export function withSpread(document: StackDocument, change: Partial<Spread>): StackDocument {
  const { spread: before, ...rest } = document;
  const { shape = 'normal', thicknessPercent, divergenceDeg, bandwidthNm } = { ...before, ...change };
  const parts = {
    ...(thicknessPercent ? { thicknessPercent } : {}),
    ...(divergenceDeg ? { divergenceDeg } : {}),
    ...(bandwidthNm ? { bandwidthNm } : {}),
  };
  if (Object.keys(parts).length === 0 && change.shape === undefined) return rest;
  return { ...rest, spread: { shape, ...parts } };
}
