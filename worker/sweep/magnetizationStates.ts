import type { ReadingName } from '../../shared/run.ts';
import type { StackDocument, StackItem, StackMedium } from '../../shared/stack.ts';
import { isGeneral } from './generalStack.ts';

/** Which states of the stack have to be solved at each point for the readings asked. */
export type StatesNeeded = {
  /**
   * `always`: the stack may turn p or s light without any magnetization. `weak reflection`: it cannot, so the change
   * equals the angle itself and m = 0 matters only where it may reflect nothing at all (reading null).
   */
  zero: 'never' | 'weak reflection' | 'always';
  reversed: boolean;
};

const kerrReadings = new Set<ReadingName>(['rotationP', 'ellipticityP', 'rotationS', 'ellipticityS']);
const contrastReadings = new Set<ReadingName>(['contrastP', 'contrastS']);

/** Solving a state that no reading uses would double the time of a sweep. */
export function statesNeeded(document: StackDocument, readings: ReadingName[]): StatesNeeded {
  const turns = isGeneral(document) || turnsLightUnmagnetized(document);
  const asksKerr = readings.some((name) => kerrReadings.has(name));
  return {
    zero: !asksKerr ? 'never' : turns ? 'always' : 'weak reflection',
    reversed: readings.some((name) => contrastReadings.has(name)),
  };
}

/** Media that may mix p and s at m = 0. Second order in m is not among them: it vanishes with m. */
function turnsLightUnmagnetized(document: StackDocument): boolean {
  const turns = (medium: StackMedium) => medium.epsilon !== undefined || medium.extraordinary !== undefined;
  const anyTurns = (items: StackItem[]): boolean =>
    items.some((item) => ('layers' in item ? anyTurns(item.layers) : turns(item.medium)));
  return turns(document.incident) || turns(document.substrate) || anyTurns(document.layers);
}

export function countStates(states: StatesNeeded): number {
  return 1 + (states.zero === 'always' ? 1 : 0) + (states.reversed ? 1 : 0);
}
