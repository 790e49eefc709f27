import type { DesignInput } from '../../../../shared/design.ts';
import { capQuantityNames } from './quantities.ts';
import type { CapQuantityName } from './quantities.ts';

/** What a reader has chosen to see of a result; the page keeps it in its address. */
export type DesignView = {
  pointId: string;
  quantity: CapQuantityName;
  /** Film of a Pareto set, by its place in the order of the first goal; null for the best of the first goal. */
  member: number | null;
};

/** The view that an address (or a pinned one) names, with what it leaves out as usual. */
export function readDesignView(search: URLSearchParams, { points }: DesignInput): DesignView {
  const member = search.get('member');
  return {
    pointId: points.find(({ id }) => id === search.get('point'))?.id ?? points[0]!.id,
    quantity: capQuantityNames.find((name) => name === search.get('show')) ?? 'signal',
    member: member !== null && /^\d+$/.test(member) ? Number(member) : null,
  };
}

/** The address after a change of the view; other parameters stay. */
export function withDesignView(search: URLSearchParams, change: Partial<DesignView>): URLSearchParams {
  const next = new URLSearchParams(search);
  if (change.pointId !== undefined) next.set('point', change.pointId);
  if (change.quantity !== undefined) next.set('show', change.quantity);
  if (change.member !== undefined) {
    if (change.member === null) next.delete('member');
    else next.set('member', String(change.member));
  }
  return next;
}
