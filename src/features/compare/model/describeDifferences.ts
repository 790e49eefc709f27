import { SUBSTRATE } from '../../../../shared/run.ts';
import type { SweepAxis } from '../../../../shared/run.ts';
import { alignLayers, namedLayers } from './alignLayers.ts';
import { layersIn } from './comparedInput.ts';
import type { ComparedInput, InputFact } from './comparedInput.ts';
import { filmFacts } from './filmFacts.ts';
import { layerFacts } from './layerFacts.ts';
import { layerWord } from './mediumWords.ts';

/**
 * What differs between the inputs of several runs, and nothing else: for each run short phrases such as `Pt cap 2 nm` or
 * `version 2 of Co`, none where all inputs are the same. What a run sweeps counts as no value of its own, and so does
 * what no stored reading depends on (notes, ids, the polarization that the page shows first).
 */
export function describeDifferences(inputs: readonly ComparedInput[]): string[][] {
  const facts = factsOf(inputs);
  const keys = [...new Set(facts.flatMap((one) => [...one.keys()]))];
  const differing = keys.filter((key) => differs(key, facts));
  const covered = new Set(differing.flatMap((key) => find(key, facts)?.covers ?? []));
  return facts.map((own) =>
    differing.flatMap((key) => {
      const fact = own.get(key);
      // The thickness of a layer names its material: that alone is said, with what tells two materials apart.
      if (covered.has(key)) return [];
      if (!fact) return find(key, facts)?.absent ?? [];
      return wordsFor(fact, facts);
    }),
  );
}

/** What a swept layer is called; undefined where an axis is of nothing in particular. */
export function sweptWord(
  axis: SweepAxis,
  { document, materials }: Pick<ComparedInput, 'document' | 'materials'>,
): string | undefined {
  if (!('layerId' in axis) || axis.layerId === undefined) return undefined;
  if (axis.layerId === SUBSTRATE) return 'the substrate';
  const layers = layersIn(document.layers);
  const layer = layers.find(({ id }) => id === axis.layerId);
  return layer && layerWord(layer, layers, materials);
}

type Facts = ReadonlyMap<string, InputFact>;

function factsOf(inputs: readonly ComparedInput[]): Facts[] {
  const films = inputs.map(namedLayers);
  const slots = alignLayers(films);
  return inputs.map((input, run) => {
    const layers = (films[run] ?? []).flatMap(({ layer, word }, position) =>
      layerFacts(layer, {
        key: slots[run]?.[position] ?? '',
        word,
        swept: input.swept,
        document: input.document,
        used: input.materials,
      }),
    );
    const targets = input.swept.flatMap((axis) =>
      targetFact(axis, input, films[run] ?? [], slots[run] ?? []),
    );
    const order = orderFact(films[run] ?? [], slots[run] ?? [], slots);
    return new Map([...layers, order, ...filmFacts(input), ...targets].map((fact) => [fact.key, fact]));
  });
}

/** In which order the layers stand that all films have. */
function orderFact(
  film: readonly { word: string }[],
  own: readonly string[],
  all: readonly (readonly string[])[],
): InputFact {
  const common = own.filter((slot) => all.every((slots) => slots.includes(slot)));
  const words = common.map((slot) => film[own.indexOf(slot)]?.word ?? '');
  return { key: 'order', value: common.join(), phrase: `${words.join(' / ')} from the light` };
}

/** Whose Q or m an axis sweeps. A swept thickness or interface is told by the layer itself. */
function targetFact(
  axis: SweepAxis,
  input: ComparedInput,
  film: readonly { layer: { id: string } }[],
  slots: readonly string[],
): InputFact[] {
  if (axis.kind !== 'voigtScale' && axis.kind !== 'direction') return [];
  const position = film.findIndex(({ layer }) => layer.id === axis.layerId);
  const what = axis.kind === 'direction' ? 'm' : 'Q';
  return [
    {
      key: `target ${axis.kind}`,
      value: slots[position] ?? axis.layerId ?? 'all',
      phrase: `${what} of ${sweptWord(axis, input) ?? 'every magnet'} swept`,
    },
  ];
}

function find(key: string, facts: readonly Facts[]): InputFact | undefined {
  return facts.find((one) => one.has(key))?.get(key);
}

function differs(key: string, facts: readonly Facts[]): boolean {
  const missing = facts.some((one) => !one.has(key)) && find(key, facts)?.absent !== undefined;
  return missing || new Set(facts.flatMap((one) => one.get(key)?.value ?? [])).size > 1;
}

/** The phrase, or more where another run would be told by the same phrase though it differs. */
function wordsFor(fact: InputFact, facts: readonly Facts[]): string {
  const { key, value, phrase, detail, covers } = fact;
  const others = facts.flatMap((one) => one.get(key) ?? []);
  const alike = others.some((other) => other.phrase === phrase && other.value !== value);
  if (alike) return detail ?? phrase;
  // A layer that differs in thickness and in constants of the same name.
  const inner = covers === undefined ? undefined : facts.find((one) => one.get(key) === fact)?.get(covers);
  if (inner && differs(inner.key, facts)) {
    const said = wordsFor(inner, facts);
    return phrase.replace(inner.phrase, said);
  }
  return phrase;
}
