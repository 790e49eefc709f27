import { readingDefinitions } from '../../../../shared/readings.ts';
import { SUBSTRATE } from '../../../../shared/run.ts';
import type { SweepAxis } from '../../../../shared/run.ts';
import { inputAzimuthOf } from '../../../../shared/stack.ts';
import { formatFormula, formatPlain } from '../../../lib/format.ts';
import { blocksIn, layersIn, sweptAs } from './comparedInput.ts';
import type { ComparedInput, InputFact } from './comparedInput.ts';
import { vector } from './layerFacts.ts';
import { mediumDetail, mediumValue, mediumWord } from './mediumWords.ts';

/** Everything but the layers themselves: light, surroundings, blocks, averages, versions of the materials. */
export function filmFacts(input: ComparedInput): InputFact[] {
  return [
    ...lightFacts(input),
    ...surroundingFacts(input),
    ...blockFacts(input),
    ...spreadFacts(input),
    ...versionFacts(input),
    ...input.swept.flatMap(gridFacts),
  ];
}

function lightFacts(input: ComparedInput): InputFact[] {
  const { document, readings } = input;
  const { wavelengthNm, angleDeg, magnetization } = document.workingPoint;
  const facts: InputFact[] = [];
  if (sweptAs(input, 'wavelength').length === 0) {
    facts.push({ key: 'wavelength', value: String(wavelengthNm), phrase: `${formatPlain(wavelengthNm)} nm` });
  }
  if (sweptAs(input, 'angle').length === 0) {
    facts.push({ key: 'angle', value: String(angleDeg), phrase: `${formatPlain(angleDeg)}°` });
  }
  // p and s are both stored; the azimuth of the light decides the readings at it and no others.
  if (readings.some((name) => readingDefinitions[name].family === 'azimuth')) {
    const azimuth = inputAzimuthOf(document.workingPoint);
    facts.push({ key: 'azimuth', value: String(azimuth), phrase: `input azimuth ${formatPlain(azimuth)}°` });
  }
  const m =
    magnetization.mode === 'direction'
      ? `m ${vector(magnetization.m)}`
      : `m ${magnetization.mode === 'drawn' ? 'as drawn' : 'reversed'}`;
  facts.push({ key: 'magnetization', value: m, phrase: m });
  return facts;
}

function surroundingFacts(input: ComparedInput): InputFact[] {
  const { document, materials } = input;
  const { incident, substrate, substrateM, backside } = document;
  const scale = document.substrateVoigtScale ?? 1;
  const swept = sweptAs(input, 'graded').some(({ layerId }) => layerId === SUBSTRATE);
  const graded = swept ? 'swept' : `${formatPlain(document.substrateGradedNm ?? 0)} nm wide`;
  const facts: InputFact[] = [
    {
      key: 'incident',
      value: mediumValue(incident),
      phrase: `light from ${mediumWord(incident, materials)}`,
      detail: `light from ${mediumDetail(incident, materials)}`,
    },
    {
      key: 'substrate',
      value: mediumValue(substrate),
      phrase: `on ${mediumWord(substrate, materials)}`,
      detail: `on ${mediumDetail(substrate, materials)}`,
    },
    {
      key: 'substrate m',
      value: String(substrateM),
      phrase: substrateM ? `m of the substrate ${vector(substrateM)}` : 'substrate without m',
    },
    { key: 'substrate Q', value: String(scale), phrase: `Q of the substrate × ${formatPlain(scale)}` },
    { key: 'substrate interface', value: graded, phrase: `interface above the substrate ${graded}` },
  ];
  facts.push({
    key: 'backside',
    value: backside ? `${backside.thicknessNm} ${mediumValue(backside.exit)}` : 'none',
    phrase: backside
      ? `substrate ${formatPlain(backside.thicknessNm)} nm thick, ${mediumWord(backside.exit, materials)} behind it`
      : 'substrate without a back',
  });
  return facts;
}

function blockFacts(input: ComparedInput): InputFact[] {
  const { document, materials } = input;
  return blocksIn(document.layers).map((block, position) => {
    const words = layersIn(block.layers).map(({ medium }) => mediumWord(medium, materials));
    const name = words.slice(0, 4).join('/');
    const swept = sweptAs(input, 'repeat').some(({ blockId }) => blockId === block.id);
    const phrase = swept ? `repeats of ${name} swept` : `${block.repeat} × ${name}`;
    return {
      key: `block ${position}`,
      value: `${swept ? 'swept' : block.repeat} ${words.join('/')}`,
      phrase,
      absent: 'no repeats',
    };
  });
}

function spreadFacts({ document: { spread } }: ComparedInput): InputFact[] {
  const parts = [
    [spread?.thicknessPercent, '% of thickness'],
    [spread?.divergenceDeg, '° of angle'],
    [spread?.bandwidthNm, ' nm of wavelength'],
  ] as const;
  const said = parts.flatMap(([size, unit]) => (size ? [`${formatPlain(size)}${unit}`] : []));
  const shape = said.length > 0 ? spread?.shape : undefined;
  const phrase = said.length > 0 ? `averaged over ${said.join(', ')}` : 'not averaged';
  return [
    {
      key: 'spread',
      value: `${phrase} ${shape}`,
      phrase,
      ...(shape && { detail: `${phrase} (${shape})` }),
    },
  ];
}

/** Only of materials that several runs use: a material of one run alone is told by its layer. */
function versionFacts({ materials }: ComparedInput): InputFact[] {
  const ids = [...new Set(materials.map(({ id }) => id))];
  return ids.map((id) => {
    const same = materials.filter((material) => material.id === id);
    const versions = [...new Set(same.map(({ version }) => version))].sort((a, b) => a - b);
    const formula = formatFormula(same[0]?.formula ?? id);
    return {
      key: `version ${id}`,
      value: versions.join(),
      phrase: `version${versions.length > 1 ? 's' : ''} ${versions.join(' and ')} of ${formula}`,
    };
  });
}

/** Of a map the second axis has facts of its own, named by what it sweeps. */
function gridFacts(axis: SweepAxis, position: number, { length }: readonly SweepAxis[]): InputFact[] {
  const { from, to, points, spacing } = axis;
  const unit =
    axis.kind === 'angle' || axis.kind === 'direction' ? '°' : unitless.has(axis.kind) ? '' : ' nm';
  const range = `${formatPlain(from)}–${formatPlain(to)}${unit}`;
  const of = length > 1 ? ` of ${axisWords[axis.kind]}` : '';
  const facts: InputFact[] = [
    {
      key: `range ${position}`,
      value: range,
      phrase: length > 1 ? `${axisWords[axis.kind]} ${range}` : range,
    },
    {
      key: `points ${position}`,
      value: String(points),
      phrase: `${points === 1 ? '1 point' : `${points} points`}${of}`,
    },
    {
      key: `spacing ${position}`,
      value: spacing,
      phrase: `${spacing === 'log' ? 'log spacing' : 'even spacing'}${of}`,
    },
  ];
  if (axis.kind === 'direction') {
    facts.push({ key: 'plane', value: axis.plane, phrase: `m turned in ${axis.plane}` });
  }
  return facts;
}

const unitless = new Set<SweepAxis['kind']>(['voigtScale', 'repeat']);

const axisWords: Record<SweepAxis['kind'], string> = {
  wavelength: 'wavelength',
  angle: 'angle',
  thickness: 'thickness',
  direction: 'direction of m',
  voigtScale: 'Q scale',
  repeat: 'repeats',
  graded: 'interface width',
};
