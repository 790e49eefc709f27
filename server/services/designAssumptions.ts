import type { CapDesign } from '../../shared/capDesign.ts';
import type { DesignInput } from '../../shared/design.ts';
import type { DesignPoint, Tolerance } from '../../shared/designPoint.ts';
import { materialKeyOf } from '../../shared/designPoint.ts';
import type { Goal, OptimiseDesign } from '../../shared/optimiseDesign.ts';
import type { ReadingName, UsedMaterial } from '../../shared/run.ts';
import type { StackDocument } from '../../shared/stack.ts';
import type { ToleranceDesign } from '../../shared/toleranceDesign.ts';
import { MOST_SINGLE_LAYERS, expandBlocks } from '../../worker/design/expandBlocks.ts';
import { mediaWithErrors } from './designMedia.ts';
import {
  candidateInWords,
  demandWords,
  goalWords,
  layerName,
  mediumName,
  signalWords,
} from './designNames.ts';
import { FOR_PLANNING, filmAssumptions, magnetizationInWords } from './runAssumptions.ts';

/** Sentences that say what the answer to a design question rests on, so that it can be read alone years later. */
export function designAssumptions(design: DesignInput, materials: UsedMaterial[]): string[] {
  const { document, points } = design;
  const wavelengths = new Set(points.map(({ workingPoint }) => workingPoint.wavelengthNm));
  return [
    ...questionOf(design, materials),
    ...points.map(pointInWords),
    ...filmAssumptions(document, readingsOf(design), materials, wavelengths.size > 1),
    FOR_PLANNING,
  ];
}

function pointInWords({ label, workingPoint }: DesignPoint): string {
  const { wavelengthNm, angleDeg, input, magnetization } = workingPoint;
  return `Working point ${label}: vacuum wavelength ${wavelengthNm} nm, angle of incidence ${angleDeg} deg, light polarized along ${input}. ${magnetizationInWords(magnetization)}`;
}

/** The readings whose meaning must be told. */
function readingsOf(design: DesignInput): ReadingName[] {
  return ['rotationP', 'contrastP', ...(design.kind === 'tolerance' ? [] : (['ceilingShare'] as const))];
}

function questionOf(design: DesignInput, materials: UsedMaterial[]): string[] {
  switch (design.kind) {
    case 'cap':
      return capQuestion(design, materials);
    case 'optimise':
      return optimiseQuestion(design, materials);
    case 'tolerance':
      return toleranceQuestion(design, materials);
  }
}

function capQuestion(design: CapDesign, materials: UsedMaterial[]): string[] {
  const { candidates, range, replaces, document, signal, leastYield } = design;
  const replaced = replaces.map((id) => layerName(id, document, materials)).join(' and ');
  return [
    `Cap from ${range.fromNm} to ${range.toNm} nm in ${range.points} points, chosen for the size of the ${signalWords[signal]}.`,
    replaced === ''
      ? 'The candidates are put on top of the film as drawn, which is the bare film that costs are counted from.'
      : `The candidates take the place of ${replaced}; the bare film that costs are counted from is the film without.`,
    ...candidates.map(
      (candidate) => `Candidate ${candidate.label}: ${candidateInWords(candidate, materials)}.`,
    ),
    demandsInWords(design),
    ...errorsInWords(design, materials),
    `A thickness is robust where at least ${100 * leastYield} % of the films meet all demands and protect. The best robust thickness leaves the most of the bare signal at the lower edge of its band, at the working point where that is least; where none is robust, the one that the most films meet.`,
    'A window narrower than the step of the curve can be missed.',
  ];
}

function optimiseQuestion(design: OptimiseDesign, materials: UsedMaterial[]): string[] {
  const { document, variables, goal, second, effort, seed, points } = design;
  const inWords = ({ quantity, layerId, leastReflectance }: Goal) => {
    const of = layerId === undefined ? '' : ` (${layerName(layerId, document, materials)})`;
    const least =
      leastReflectance === undefined ? '' : `, films that reflect less than ${leastReflectance} left out`;
    return `${goalWords[quantity].words}${of}${least}`;
  };
  const bounds = variables.map(
    ({ layerId, fromNm, toNm }) => `${layerName(layerId, document, materials)} from ${fromNm} to ${toNm} nm`,
  );
  return [
    `Sought: ${inWords(goal)}${second ? `; second goal: ${inWords(second)}` : ''}.`,
    `Thicknesses that may change: ${bounds.join(', ')}. The others stay as drawn.`,
    ...(points.length > 1 ? ['Of several working points the worst one counts.'] : []),
    ...(second ? ['With two goals the outcome is the set of films of which none is better in both.'] : []),
    `Search: a global one, then a local one, effort ${effort}, seed ${seed}. It does not prove that there is no better film.`,
  ];
}

function toleranceQuestion(design: ToleranceDesign, materials: UsedMaterial[]): string[] {
  return [
    'How far the readings move when the film is not what was drawn.',
    demandsInWords(design),
    ...errorsInWords(design, materials),
    'Derivatives are differences of full solves: of a thickness per nm, of n, k, Re Q and Im Q per 1.',
  ];
}

function demandsInWords({ demands, points }: CapDesign | ToleranceDesign): string {
  const made = demandWords(demands);
  if (made.length === 0) return 'No demand is made of the readings.';
  const where = points.length > 1 ? ' at every working point' : '';
  return `Demands${where}: ${made.join('; ')}. A reading that does not exist meets none.`;
}

function errorsInWords(design: CapDesign | ToleranceDesign, materials: UsedMaterial[]): string[] {
  const { ratePercent, randomPercent, indexPercent, voigtPercent, samples, seed } = design.tolerance;
  const constants = [
    ...(indexPercent > 0 ? [`n and k ${indexPercent} % each`] : []),
    ...(voigtPercent > 0 ? [`Q ${voigtPercent} %`] : []),
  ];
  return [
    `Errors are normal and every stated value is one standard deviation: rate error ${ratePercent} %, one for each material and shared by all its layers; random error ${randomPercent} %, one for each layer. A layer is its nominal thickness times 1 + both; below 0 it counts as absent.`,
    constants.length === 0
      ? 'Constants are taken to be right.'
      : `Constants of each material are off by a factor: ${constants.join(', ')}.`,
    ...otherErrors(design, design.tolerance, materials),
    ...sharedErrors(design.document),
    `Bands and shares come from ${samples} films drawn with seed ${seed}; a band holds 68.27 % of them.`,
  ];
}

/** Said of a film with too many layers for an error of each. */
export function sharedErrors(document: StackDocument): string[] {
  if (expandBlocks(document).isExpanded) return [];
  return [
    `The film has more than ${MOST_SINGLE_LAYERS} layers: all repetitions of a block share their errors.`,
  ];
}

function otherErrors(design: DesignInput, { materials: own }: Tolerance, used: UsedMaterial[]): string[] {
  const media = new Map(mediaWithErrors(design).map((medium) => [materialKeyOf(medium), medium]));
  return own.map(({ material, ratePercent, randomPercent, indexPercent, voigtPercent }) => {
    const medium = media.get(material);
    const values = Object.entries({
      'rate error': ratePercent,
      'random error': randomPercent,
      'n and k': indexPercent,
      Q: voigtPercent,
    }).flatMap(([what, percent]) => (percent === undefined ? [] : [`${what} ${percent} %`]));
    return `Errors of ${medium ? mediumName(medium, used) : material} by themselves: ${values.join(', ') || 'none'}.`;
  });
}
