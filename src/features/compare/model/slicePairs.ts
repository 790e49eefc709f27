import type { ComparedRun, ComparedSlice } from './comparedRun.ts';
import type { Relation } from './curveDifference.ts';
import type { HeldQuantity } from './heldQuantities.ts';
import { sameValue } from './interpolate.ts';

/** A slice held against one of the reference run. */
export type SlicePair = { base: ComparedSlice; other: ComparedSlice };

/**
 * Which slices are held against which: of a quantity whose members are all drawn those with the same value, of one
 * held at a value whatever stands for it. A slice of a run that does not sweep the quantity goes with every member.
 */
export function slicePairs(
  runs: readonly ComparedRun[],
  reference: ComparedRun,
  held: readonly HeldQuantity[],
): SlicePair[] {
  const all = held.filter(({ value }) => value === 'all').map(({ key }) => key);
  const match = (base: ComparedSlice, other: ComparedSlice) =>
    all.every((key) => {
      const [a, b] = [base.at.get(key), other.at.get(key)];
      return a === undefined || b === undefined || sameValue(a, b);
    });
  return runs
    .filter((one) => one !== reference)
    .flatMap((one) => one.slices)
    .flatMap((other) =>
      reference.slices.filter((base) => match(base, other)).map((base) => ({ base, other })),
    );
}

/** Slices that are held against nothing, since the reference has none with the same value. */
export function unpaired(
  runs: readonly ComparedRun[],
  reference: ComparedRun,
  pairs: readonly SlicePair[],
): ComparedSlice[] {
  return runs
    .filter((one) => one !== reference)
    .flatMap((one) => one.slices)
    .filter((slice) => pairs.every(({ other }) => other !== slice));
}

/** `B − A`, `B − A, 2 nm` of members with the same value, `B 2 nm / A` of a member against a plain curve. */
export function pairName({ base, other }: SlicePair, relation: Relation): string {
  const sign = relation === 'ratio' ? '/' : '−';
  const name = ({ of: { letter }, member }: ComparedSlice) => `${letter} ${member}`.trim();
  if (base.member !== other.member) return `${name(other)} ${sign} ${name(base)}`;
  return `${other.of.letter} ${sign} ${base.of.letter}${base.member && `, ${base.member}`}`;
}
