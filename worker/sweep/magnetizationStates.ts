import { comparedStates, readingDefinitions } from '../../shared/readings.ts';
import type { ReadingName, SweepAxes } from '../../shared/run.ts';
import type { StackDocument } from '../../shared/stack.ts';
import { isGeneralSomewhere, turnsLightUnmagnetized } from './generalStack.ts';

/** Which states of the stack have to be solved at each point for the readings asked. */
export type StatesNeeded = {
  /**
   * `always`: the stack may turn the light of the reading without any magnetization. `weak beam`: it cannot, so the
   * change equals the angle itself and m = 0 matters only where there may be no beam at all (reading null).
   */
  zero: 'never' | 'weak beam' | 'always';
  reversed: boolean;
};

/** Solving a state that no reading uses would double the time of a sweep. */
export function statesNeeded(
  sweep: SweepAxes & { document: StackDocument },
  readings: ReadingName[],
): StatesNeeded {
  const compared = readings.map(comparedStates);
  // Light that is neither p nor s is turned by every surface.
  const asksAzimuth = readings.some((name) => readingDefinitions[name].family === 'azimuth');
  const turns = asksAzimuth || isGeneralSomewhere(sweep) || turnsLightUnmagnetized(sweep.document);
  return {
    zero: !compared.some(({ zero }) => zero) ? 'never' : turns ? 'always' : 'weak beam',
    reversed: compared.some(({ reversed }) => reversed),
  };
}

export function countStates(states: StatesNeeded): number {
  return 1 + (states.zero === 'always' ? 1 : 0) + (states.reversed ? 1 : 0);
}
