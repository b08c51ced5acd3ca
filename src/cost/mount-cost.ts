import type { CostSpec, Renewal } from './spec.ts';

/** Which parts of a mount's cost the study leaves blank; keys as in the study file. */
export type CostBlank = 'cost.capital' | 'cost.upkeep';

/** What one mount costs, whole array. Null is blank, never zero. */
export interface MountCost {
  readonly capital: number | null;
  readonly capitalPerKw: number | null;
  readonly upkeepPerYear: number | null;
  readonly renewals: readonly Renewal[];
  readonly blanks: readonly CostBlank[];
}

const total = (perKw: number | null, whole: number | null, dcKw: number): number | null =>
  perKw === null && whole === null ? null : (perKw ?? 0) * dcKw + (whole ?? 0);

/**
 * Adds up a mount's costs for an array of `dcKw` (DC rating, kW). A part is blank where neither its figure per
 * kW nor its figure for the whole array is given; one of the two is enough, and the other is then none.
 */
export const mountCost = (cost: CostSpec | null, dcKw: number): MountCost => {
  const capital = cost && total(cost.capitalPerKw, cost.capital, dcKw);
  const upkeepPerYear = cost && total(cost.upkeepPerKw, cost.upkeep, dcKw);
  const blanks: CostBlank[] = [];
  if (capital === null) blanks.push('cost.capital');
  if (upkeepPerYear === null) blanks.push('cost.upkeep');
  return {
    capital,
    capitalPerKw: capital === null ? null : capital / dcKw,
    upkeepPerYear,
    renewals: cost?.renewals ?? [],
    blanks,
  };
};
