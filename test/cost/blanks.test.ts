/** Blank is not zero. Figures invented; expectations by hand. */
import { expect, test } from 'vitest';
import {
  breakEven,
  type CostSpec,
  costOfEnergy,
  type FinanceSpec,
  inWords,
  mountCost,
} from '../../src/cost/index.ts';

const BLANK: CostSpec = { capitalPerKw: null, capital: null, upkeepPerKw: null, upkeep: null, renewals: [] };
const finance: FinanceSpec = { realRate: 0.05, years: 20, ageing: 0.005, currency: 'EUR' };

test('capital and upkeep add the part per kW and the part for the whole array', () => {
  const cost = { ...BLANK, capitalPerKw: 1700, capital: 400, upkeepPerKw: 15, upkeep: 30 };
  expect(mountCost(cost, 10)).toEqual({
    capital: 17_400,
    capitalPerKw: 1740,
    upkeepPerYear: 180,
    renewals: [],
    blanks: [],
  });
});

test('blank upkeep gives a cost per kWh from what is known and says that it is incomplete', () => {
  const found = costOfEnergy({ ...BLANK, capitalPerKw: 1000 }, finance, 2, 3000);
  expect(found.upkeepPerYear).toBeNull();
  expect(found.lcoePerKwh).toBeGreaterThan(0);
  expect(found.incomplete).toBe(true);
  expect(found.blanks).toEqual(['cost.upkeep']);
});

test('upkeep written as zero is complete and costs the same as blank upkeep', () => {
  const zero = costOfEnergy({ ...BLANK, capitalPerKw: 1000, upkeep: 0 }, finance, 2, 3000);
  const blank = costOfEnergy({ ...BLANK, capitalPerKw: 1000 }, finance, 2, 3000);
  expect(zero.incomplete).toBe(false);
  expect(zero.lcoePerKwh).toBe(blank.lcoePerKwh);
});

test('blank capital, or no cost at all, gives no cost per kWh', () => {
  for (const cost of [{ ...BLANK, upkeep: 100 }, null]) {
    const found = costOfEnergy(cost, finance, 2, 3000);
    expect([found.capital, found.capitalPerKw, found.lcoePerKwh]).toEqual([null, null, null]);
    expect(found.blanks).toContain('cost.capital');
    expect(found.incomplete).toBe(true);
  }
});

test('without a rate the cost per kWh is given at 4, 7 and 10 % and nowhere else', () => {
  const cost = { ...BLANK, capitalPerKw: 1000, upkeep: 20 };
  const found = costOfEnergy(cost, { ...finance, realRate: null }, 2, 3000);
  expect(found.lcoePerKwh).toBeNull();
  expect(Object.keys(found.lcoeAtRates)).toEqual(['4 %', '7 %', '10 %']);
  expect(found.lcoeAtRates['7 %']).toBe(
    costOfEnergy(cost, { ...finance, realRate: 0.07 }, 2, 3000).lcoePerKwh,
  );
  expect(costOfEnergy(cost, finance, 2, 3000).lcoeAtRates).toEqual({});
});

test('without years, or without energy, there is no cost per kWh at any rate', () => {
  const cost = { ...BLANK, capitalPerKw: 1000, upkeep: 20 };
  const found = costOfEnergy(cost, { ...finance, years: null, realRate: null }, 2, 3000);
  expect(found.lcoeAtRates).toEqual({});
  expect(found.blanks).toEqual(['finance.years', 'finance.real_rate']);
  expect(costOfEnergy(cost, finance, 2, 0).lcoePerKwh).toBeNull();
});

test('blank ageing counts as none and is listed', () => {
  const cost = { ...BLANK, capitalPerKw: 1000, upkeep: 20 };
  const found = costOfEnergy(cost, { ...finance, ageing: null }, 2, 3000);
  expect(found.blanks).toEqual(['finance.ageing']);
  expect(found.lcoePerKwh).toBe(costOfEnergy(cost, { ...finance, ageing: 0 }, 2, 3000).lcoePerKwh);
});

test('a break-even premium needs no quote for the tracker, a break-even gain does', () => {
  const reference = { cost: { ...BLANK, capitalPerKw: 1000, upkeep: 0 }, dcKw: 1, energyKwh: 1000 };
  const found = breakEven({ cost: null, dcKw: 1, energyKwh: 1200 }, reference, finance);
  expect(found.premiumPerKw).toBeCloseTo(200, 9); // 20 % more energy, no running costs: 20 % more capital
  expect([found.gain, found.extraCostPerKwh, found.incomplete]).toEqual([null, null, true]);
});

test('without the reference capital, a rate or years there is no break-even', () => {
  const priced = { cost: { ...BLANK, capitalPerKw: 1000, upkeep: 0 }, dcKw: 1, energyKwh: 1000 };
  const nothing = { premiumPerKw: null, gain: null, extraCostPerKwh: null };
  expect(breakEven(priced, { ...priced, cost: null }, finance)).toEqual({ ...nothing, incomplete: true });
  for (const f of [
    { ...finance, realRate: null },
    { ...finance, years: null },
  ])
    expect(breakEven(priced, priced, f)).toEqual({ ...nothing, incomplete: false });
});

test('numbers in sentences keep three digits or all whole ones, with spaced thousands', () => {
  const rows: [number, string][] = [
    [1550, '1 550'],
    [1234567.8, '1 234 568'],
    [14.19, '14.2'],
    [0.1094, '0.109'],
    [-1550.4, '-1 550'],
    [999.6, '1 000'],
    [0, '0'],
    [-0.00000001, '0'],
    [10, '10'],
    [0.17, '0.170'],
  ];
  for (const [x, words] of rows) expect(inWords(x)).toBe(words);
});

test('a renewal in the last year is paid and one after the life is not', () => {
  const cost = { ...BLANK, capitalPerKw: 1000, upkeep: 0 };
  const at = (year: number) =>
    costOfEnergy({ ...cost, renewals: [{ what: 'drive', year, cost: 500 }] }, finance, 2, 3000).lcoePerKwh;
  const none = costOfEnergy(cost, finance, 2, 3000).lcoePerKwh;
  expect(at(20)).toBeGreaterThan(none ?? Number.NaN);
  expect(at(21)).toBe(none);
});
