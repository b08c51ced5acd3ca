import { mountCost } from './mount-cost.ts';
import { presentEnergy, presentRunningCost } from './present-value.ts';
import type { CostSpec, FinanceSpec } from './spec.ts';

/** One mount with its array: what it costs and what it delivers in the first year. */
export interface CostedMount {
  readonly cost: CostSpec | null;
  readonly dcKw: number;
  /** AC kWh of the whole array. */
  readonly energyKwh: number;
}

export interface BreakEven {
  /** Tracker's capital per kW at which both costs per kWh are equal, less the reference's; may be negative. */
  readonly premiumPerKw: number | null;
  /** Gain in delivered energy per kW (fraction) above which the tracker's cost per kWh is the lower one. */
  readonly gain: number | null;
  /** Tracker's present cost less the reference's, over the present energy it adds, both per kW; null where it adds none. */
  readonly extraCostPerKwh: number | null;
  /** True where upkeep or capital is blank on either side: the figures are from what is known. */
  readonly incomplete: boolean;
}

/** Everything per kW of DC rating, so that arrays of different size compare. */
const perKw = ({ cost, dcKw, energyKwh }: CostedMount, rate: number, years: number, ageing: number) => {
  const { capitalPerKw, upkeepPerYear, renewals } = mountCost(cost, dcKw);
  return {
    capital: capitalPerKw,
    running: presentRunningCost({ upkeepPerYear: upkeepPerYear ?? 0, renewals }, rate, years) / dcKw,
    energy: presentEnergy(energyKwh, ageing, rate, years) / dcKw,
  };
};

/**
 * What a tracker may cost, and what it must gain, to equal the reference in cost per kWh. With present running
 * cost R, capital C and present energy E per kW: C* = LCOE_ref E_trk - R_trk and gain* = (C + R)_trk / (C + R)_ref
 * - 1; the tracker wins exactly when its gain is above gain*. Null without years, without a rate or without the
 * reference's capital; the gain also needs the tracker's capital. Follows from LCOE = (C + R) / E.
 */
export const breakEven = (tracker: CostedMount, reference: CostedMount, finance: FinanceSpec): BreakEven => {
  const { realRate, years } = finance;
  const incomplete = [tracker, reference].some(({ cost, dcKw }) => mountCost(cost, dcKw).blanks.length > 0);
  const nothing = { premiumPerKw: null, gain: null, extraCostPerKwh: null, incomplete };
  if (realRate === null || years === null) return nothing;
  const trk = perKw(tracker, realRate, years, finance.ageing ?? 0);
  const ref = perKw(reference, realRate, years, finance.ageing ?? 0);
  if (ref.capital === null || !(ref.energy > 0)) return nothing;
  const refCost = ref.capital + ref.running;
  const trkCost = trk.capital === null ? null : trk.capital + trk.running;
  return {
    premiumPerKw: (refCost / ref.energy) * trk.energy - trk.running - ref.capital,
    gain: trkCost === null || refCost === 0 ? null : trkCost / refCost - 1,
    extraCostPerKwh:
      trkCost === null || trk.energy <= ref.energy ? null : (trkCost - refCost) / (trk.energy - ref.energy),
    incomplete,
  };
};
