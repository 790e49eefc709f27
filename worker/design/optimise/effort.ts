import type { OptimiseDesign } from '../../../shared/optimiseDesign.ts';

/** How many films a search may solve. Common practice, no source. */
type Budget = { population: number; generations: number; local: number };

const EFFORTS = {
  quick: { perVariable: 15, least: 40, leastOfTwo: 50, generations: 150, local: 400 },
  normal: { perVariable: 30, least: 60, leastOfTwo: 100, generations: 300, local: 1000 },
  thorough: { perVariable: 60, least: 120, leastOfTwo: 200, generations: 600, local: 2000 },
} as const;

/** A front for two goals needs enough films to be seen as one. */
export function budgetOf({ effort, variables, second }: OptimiseDesign): Budget {
  const { perVariable, least, leastOfTwo, generations, local } = EFFORTS[effort];
  return {
    population: Math.max(second ? leastOfTwo : least, perVariable * variables.length),
    generations,
    local: local * variables.length,
  };
}

/** Films that the global search solves at the most, the drawn one included. */
export function globalTotal(design: OptimiseDesign): number {
  const { population, generations } = budgetOf(design);
  return 1 + population * (generations + 1);
}

/** Films that are solved at the most: the unit of progress. Each goal has two local searches. */
export function optimiseTotal(design: OptimiseDesign): number {
  return globalTotal(design) + 2 * (design.second ? 2 : 1) * budgetOf(design).local;
}
