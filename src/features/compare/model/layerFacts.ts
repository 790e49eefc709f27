import type { UsedMaterial } from '../../../../shared/run.ts';
import type { StackDocument, StackLayer } from '../../../../shared/stack.ts';
import { formatPlain } from '../../../lib/format.ts';
import { sweptAs } from './comparedInput.ts';
import type { ComparedInput, InputFact } from './comparedInput.ts';
import { mediumDetail, mediumValue, mediumWord } from './mediumWords.ts';

export type LayerContext = {
  /** Names the layer in all compared runs. */
  key: string;
  word: string;
  swept: ComparedInput['swept'];
  document: StackDocument;
  used: readonly UsedMaterial[];
};

/** What a layer contributes to the input of a run; what the axis sweeps has no value of its own. */
export function layerFacts(layer: StackLayer, context: LayerContext): InputFact[] {
  const { key, word, used } = context;
  const swept = sweptAs(context, 'thickness').some(({ layerId }) => layerId === layer.id);
  const thickness = swept ? 'swept' : `${formatPlain(layer.thicknessNm)} nm`;
  const medium: InputFact = {
    key: `${key} medium`,
    value: mediumValue(layer.medium),
    phrase: word,
    detail: word.replace(mediumWord(layer.medium, used), mediumDetail(layer.medium, used)),
  };
  return [
    medium,
    {
      key: `${key} thickness`,
      value: thickness,
      phrase: `${word} ${thickness}`,
      absent: `no ${word}`,
      covers: medium.key,
    },
    ...magneticFacts(layer, context),
    ...faceFacts(layer, context),
  ];
}

function magneticFacts(layer: StackLayer, { key, word, swept, document }: LayerContext): InputFact[] {
  const { mode } = document.workingPoint.magnetization;
  const turns = sweptAs({ swept }, 'direction');
  const turned = turns.some(({ layerId }) => (layerId === undefined ? !layer.fixed : layerId === layer.id));
  const replaced = turned || (mode === 'direction' && !layer.fixed);
  const facts: InputFact[] = [];
  if (layer.m === undefined) {
    facts.push({ key: `${key} m`, value: 'none', phrase: `${word} without m` });
  } else if (!replaced) {
    facts.push({ key: `${key} m`, value: layer.m.join(), phrase: `m of ${word} ${vector(layer.m)}` });
  }
  if (layer.m && (mode !== 'drawn' || turns.length > 0)) {
    const fixed = layer.fixed === true;
    facts.push({
      key: `${key} fixed`,
      value: String(fixed),
      phrase: `m of ${word} ${fixed ? 'fixed' : 'free'}`,
    });
  }
  const scale = layer.voigtScale ?? 1;
  facts.push({ key: `${key} Q`, value: String(scale), phrase: `Q of ${word} × ${formatPlain(scale)}` });
  const { thermal } = layer;
  facts.push({
    key: `${key} temperature`,
    value: JSON.stringify(thermal ?? null),
    phrase: thermal
      ? `${word} at ${formatPlain(thermal.temperatureK)} K`
      : `${word} at no stated temperature`,
    ...(thermal && {
      detail: `${word} at ${formatPlain(thermal.temperatureK)} K, Curie temperature ${formatPlain(thermal.curieK)} K`,
    }),
  });
  return facts;
}

function faceFacts(layer: StackLayer, { key, word, swept, used }: LayerContext): InputFact[] {
  const { dead, oxide } = layer;
  const widens = sweptAs({ swept }, 'graded').some(({ layerId }) => layerId === layer.id);
  const graded = widens ? null : (layer.gradedNm ?? 0);
  return [
    {
      key: `${key} interface`,
      value: String(graded),
      phrase:
        graded === null
          ? `interface above ${word} swept`
          : graded === 0
            ? `sharp interface above ${word}`
            : `interface above ${word} ${formatPlain(graded)} nm wide`,
    },
    {
      key: `${key} dead`,
      value: JSON.stringify(dead ?? null),
      phrase: dead
        ? `dead parts of ${word} ${formatPlain(dead.topNm)} and ${formatPlain(dead.bottomNm)} nm`
        : `no dead part of ${word}`,
    },
    {
      key: `${key} oxide`,
      value: oxide ? mediumValue(oxide.medium) + oxide.consumedNm + ' ' + oxide.expansion : 'none',
      phrase: oxide
        ? `${formatPlain(oxide.consumedNm)} nm of ${word} turned into ${mediumWord(oxide.medium, used)}`
        : `no oxide on ${word}`,
      ...(oxide && {
        detail: `${formatPlain(oxide.consumedNm)} nm of ${word} turned into ${mediumDetail(oxide.medium, used)}, ${formatPlain(oxide.expansion)} times as thick`,
      }),
    },
  ];
}

/** `along +z` for a unit vector on an axis, the components else. */
export function vector(m: readonly [number, number, number]): string {
  const axes = ['x', 'y', 'z'] as const;
  const along = axes.find((_name, index) => Math.abs(m[index] ?? 0) === 1);
  if (along && m.filter((part) => part !== 0).length === 1) {
    return `along ${(m.find((part) => part !== 0) ?? 0) > 0 ? '+' : '−'}${along}`;
  }
  return `(${m.map(formatPlain).join(', ')})`;
}
