import fc from 'fast-check';
import { expect, test } from 'vitest';
import {
  breakEven,
  type CostedMount,
  type CostSpec,
  capitalRecoveryFactor,
  costOfEnergy,
  type FinanceSpec,
  presentEnergy,
} from '../../src/cost/index.ts';

const spec = fc.record({
  capitalPerKw: fc.double({ min: 100, max: 9000, noNaN: true }),
  capital: fc.double({ min: 0, max: 9000, noNaN: true }),
  upkeepPerKw: fc.double({ min: 0, max: 90, noNaN: true }),
  upkeep: fc.double({ min: 0, max: 400, noNaN: true }),
  renewals: fc.array(
    fc.record({
      what: fc.constant('part'),
      year: fc.integer({ min: 1, max: 20 }),
      cost: fc.double({ min: 0, max: 3000, noNaN: true }),
    }),
    { maxLength: 3 },
  ),
});
const mount: fc.Arbitrary<CostedMount & { cost: CostSpec }> = fc.record({
  cost: spec,
  dcKw: fc.double({ min: 0.5, max: 500, noNaN: true }),
  energyKwh: fc.double({ min: 500, max: 1e6, noNaN: true }),
});
const finance: fc.Arbitrary<FinanceSpec> = fc.record({
  realRate: fc.double({ min: 0, max: 0.15, noNaN: true }),
  years: fc.integer({ min: 20, max: 40 }),
  ageing: fc.double({ min: 0, max: 0.02, noNaN: true }),
  currency: fc.constant('USD'),
});
const lcoe = (m: CostedMount, f: FinanceSpec) =>
  costOfEnergy(m.cost, f, m.dcKw, m.energyKwh).lcoePerKwh ?? Number.NaN;
const scaled = (cost: CostSpec, k: number): CostSpec => ({
  capitalPerKw: (cost.capitalPerKw ?? 0) * k,
  capital: (cost.capital ?? 0) * k,
  upkeepPerKw: (cost.upkeepPerKw ?? 0) * k,
  upkeep: (cost.upkeep ?? 0) * k,
  renewals: cost.renewals.map((r) => ({ ...r, cost: r.cost * k })),
});

test('cost per kWh is linear in money', () => {
  fc.assert(
    fc.property(mount, finance, fc.double({ min: 0.01, max: 100, noNaN: true }), (m, f, k) => {
      expect(lcoe({ ...m, cost: scaled(m.cost, k) }, f) / (k * lcoe(m, f))).toBeCloseTo(1, 9);
    }),
  );
});

test('cost per kWh falls in proportion as energy rises', () => {
  fc.assert(
    fc.property(mount, finance, (m, f) => {
      expect(lcoe({ ...m, energyKwh: 2 * m.energyKwh }, f) / lcoe(m, f)).toBeCloseTo(0.5, 9);
    }),
  );
});

test('a figure per kW and the same figure for the whole array give the same cost', () => {
  fc.assert(
    fc.property(mount, finance, (m, f) => {
      const { capitalPerKw, capital, upkeepPerKw, upkeep } = m.cost;
      const moved: CostSpec = {
        ...m.cost,
        capitalPerKw: null,
        capital: (capitalPerKw ?? 0) * m.dcKw + (capital ?? 0),
        upkeepPerKw: null,
        upkeep: (upkeepPerKw ?? 0) * m.dcKw + (upkeep ?? 0),
      };
      expect(lcoe({ ...m, cost: moved }, f) / lcoe(m, f)).toBeCloseTo(1, 12);
    }),
  );
});

test('cost per kWh never falls as the rate rises where all the money is paid at the start', () => {
  fc.assert(
    fc.property(mount, finance, fc.double({ min: 0.0001, max: 0.1, noNaN: true }), (m, f, more) => {
      const cost = { ...m.cost, upkeepPerKw: 0, upkeep: 0, renewals: [] };
      const dearer = { ...f, realRate: (f.realRate ?? 0) + more };
      expect(lcoe({ ...m, cost }, dearer)).toBeGreaterThan(lcoe({ ...m, cost }, f));
    }),
  );
});

test('a rate that vanishes leads smoothly to the case without interest', () => {
  // series in the rate, by hand: 1 / N + (N + 1) / (2 N) i; the next term is 2.1 i^2
  for (const rate of [1e-6, 1e-9, 1e-12, 1e-16])
    expect(Math.abs(capitalRecoveryFactor(rate, 25) - 0.04 - 0.52 * rate)).toBeLessThan(
      3 * rate * rate + 1e-16,
    );
  const f: FinanceSpec = { realRate: 0, years: 10, ageing: null, currency: null };
  const onlyCapital: CostSpec = {
    capitalPerKw: 1000,
    capital: null,
    upkeepPerKw: null,
    upkeep: null,
    renewals: [],
  };
  expect(costOfEnergy(onlyCapital, f, 2, 2500).lcoePerKwh).toBeCloseTo(2000 / 25_000, 12); // capital over all energy
});

test('present energy is the closed geometric sum', () => {
  fc.assert(
    fc.property(finance, ({ realRate, years, ageing }) => {
      const [i, n, d] = [realRate ?? 0, years ?? 0, ageing ?? 0];
      fc.pre(i + d > 1e-4);
      const closed = (100 * (1 - ((1 - d) / (1 + i)) ** n)) / (i + d);
      expect(presentEnergy(100, d, i, n) / closed).toBeCloseTo(1, 9);
    }),
  );
});

test('at the break-even premium both costs per kWh are equal, at the break-even gain too', () => {
  let compared = 0;
  fc.assert(
    fc.property(mount, mount, finance, (trk, ref, f) => {
      const { premiumPerKw, gain } = breakEven(trk, ref, f);
      const refCapital = costOfEnergy(ref.cost, f, ref.dcKw, ref.energyKwh).capitalPerKw ?? Number.NaN;
      const cost = { ...trk.cost, capital: null, capitalPerKw: refCapital + (premiumPerKw ?? Number.NaN) };
      expect(lcoe({ ...trk, cost }, f) / lcoe(ref, f)).toBeCloseTo(1, 8);
      const energyKwh = (ref.energyKwh / ref.dcKw) * trk.dcKw * (1 + (gain ?? Number.NaN));
      expect(lcoe({ ...trk, energyKwh }, f) / lcoe(ref, f)).toBeCloseTo(1, 8);
      compared++;
    }),
  );
  expect(compared).toBe(100);
});

test('a tracker is the cheaper one exactly when its premium is below the break-even premium', () => {
  fc.assert(
    fc.property(mount, mount, finance, (trk, ref, f) => {
      const capital = (m: CostedMount) =>
        costOfEnergy(m.cost, f, m.dcKw, m.energyKwh).capitalPerKw ?? Number.NaN;
      const room = (breakEven(trk, ref, f).premiumPerKw ?? Number.NaN) - (capital(trk) - capital(ref));
      fc.pre(Math.abs(room) > 1e-6);
      expect(lcoe(trk, f) < lcoe(ref, f)).toBe(room > 0);
    }),
  );
});
