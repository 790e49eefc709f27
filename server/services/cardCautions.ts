import { readFileSync } from 'node:fs';
import path from 'node:path';
import { z } from 'zod';
import { projectRoot } from '../projectRoot.ts';

const hazardsSchema = z.strictObject({
  statement: z.string(),
  hazards: z.array(
    z.strictObject({
      /** An element, or a whole formula. */
      of: z.string(),
      /** Whether the element counts in every material, in those without a nonmetal, or `of` is the formula itself. */
      as: z.enum(['any', 'metal', 'formula']),
      sentence: z.string(),
    }),
  ),
});

const PLANNING = 'Predictions are for planning; constants of thin films differ from tabulated ones.';
const REMEDY = 'See its safety data sheet and the local procedure.';
const LASER =
  "Where the light is a laser: its class and eye safety follow IEC 60825-1 and the local laser safety officer's rules; this program does not assess a beam path.";

/** With one of these a metal no longer burns. */
const NONMETALS = new Set(['O', 'N', 'F', 'S', 'Cl']);

/**
 * What a person with the card in hand must watch for, in sentences.
 *
 * @param formulas of everything in the film; what is not written as a formula is passed over
 * @param bench how the film will be measured; a laser counts as meant where anything is said
 */
export function cardCautions(formulas: readonly string[], bench: string): string[] {
  const { hazards } = readHazards();
  const contents = formulas.map((formula) => ({ formula, elements: elementsOf(formula) }));
  const met = hazards.filter(({ of, as }) =>
    contents.some(({ formula, elements }) => {
      if (as === 'formula') return formula === of;
      return elements.has(of) && (as === 'any' || ![...NONMETALS].some((one) => elements.has(one)));
    }),
  );
  return [PLANNING, ...met.map(({ sentence }) => `${sentence} ${REMEDY}`), ...(bench === '' ? [] : [LASER])];
}

function readHazards(): z.infer<typeof hazardsSchema> {
  return hazardsSchema.parse(
    JSON.parse(readFileSync(path.join(projectRoot, 'data', 'hazards.json'), 'utf8')),
  );
}

/** Elements of a formula such as Ni80Fe20 or GaAs; empty for a word that is none. */
function elementsOf(formula: string): Set<string> {
  if (!/^(?:[A-Z][a-z]?[\d.]*)+$/.test(formula)) return new Set();
  return new Set(formula.match(/[A-Z][a-z]?/g));
}
