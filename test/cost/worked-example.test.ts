/**
 * The worked example of levelised cost: fixed and tracker over 25 years at 6 % real, ageing 0.5 % a year
 * geometric. Source: hand arithmetic with the annuity and geometric-series closed forms, repeated by an
 * independent script (project check values, section 8). Tolerance 1e-6 of money per kWh: the printed digits.
 */
import { expect, test } from 'vitest';
import {
  breakEven,
  type CostSpec,
  capitalRecoveryFactor,
  costOfEnergy,
  type FinanceSpec,
  presentEnergy,
  presentRunningCost,
} from '../../src/cost/index.ts';

const finance: FinanceSpec = { realRate: 0.06, years: 25, ageing: 0.005, currency: 'USD' };
const inverter = { what: 'inverter', year: 13, cost: 1500 };
const drive = { what: 'drive', year: 12, cost: 800 };
const whole = (capital: number, upkeep: number, renewals: CostSpec['renewals']): CostSpec => ({
  capitalPerKw: null,
  capital,
  upkeepPerKw: null,
  upkeep,
  renewals,
});
const fixed = { cost: whole(10_000, 150, [inverter]), dcKw: 1, energyKwh: 8000 };
const tracker = { cost: whole(12_000, 200, [inverter, drive]), dcKw: 1, energyKwh: 9440 };
const lcoe = (m: typeof fixed, capital = m.cost.capital) =>
  costOfEnergy({ ...m.cost, capital }, finance, m.dcKw, m.energyKwh).lcoePerKwh ?? Number.NaN;

test('capital recovery factors agree with the table of the check values to ten decimals', () => {
  const rows = [
    [0.06, 25, 0.0782267182],
    [0.07, 20, 0.0943929257],
    [0.05, 30, 0.0650514351],
    [0, 25, 0.04],
  ];
  for (const [rate, years, crf] of rows) expect(capitalRecoveryFactor(rate, years)).toBeCloseTo(crf, 10);
  expect(rows).toHaveLength(4);
});

test('present energy, upkeep and renewals agree with the hand calculation', () => {
  expect(presentEnergy(8000, 0.005, 0.06, 25)).toBeCloseTo(97_777.7097, 4);
  expect(presentEnergy(9440, 0.005, 0.06, 25)).toBeCloseTo(115_377.697, 3);
  expect(1 / capitalRecoveryFactor(0.06, 25)).toBeCloseTo(12.783356, 6);
  expect(presentRunningCost({ upkeepPerYear: 150, renewals: [] }, 0.06, 25)).toBeCloseTo(1917.5034, 4);
  expect(presentRunningCost({ upkeepPerYear: 0, renewals: [inverter] }, 0.06, 25)).toBeCloseTo(703.2585, 4);
  expect(presentRunningCost({ upkeepPerYear: 0, renewals: [drive] }, 0.06, 25)).toBeCloseTo(397.575, 3);
});

test('the cost per kWh of both arrays agrees with the hand calculation', () => {
  expect(lcoe(fixed)).toBeCloseTo(0.12907606, 8);
  expect(lcoe(tracker)).toBeCloseTo(0.13570652, 8);
  const simple = (10_000 * capitalRecoveryFactor(0.06, 25) + 150) / 8000;
  expect(simple).toBeCloseTo(0.1165334, 7);
  const { lcoePerKwh } = costOfEnergy(whole(10_000, 150, []), { ...finance, ageing: 0 }, 1, 8000);
  expect(lcoePerKwh).toBeCloseTo(simple, 12); // without ageing and renewals the two forms are one
});

test('break-even premium, gain and the cost of the extra kWh agree with the hand calculation', () => {
  const found = breakEven(tracker, fixed, finance);
  expect(found.premiumPerKw).toBeCloseTo(1234.9939, 4);
  expect(found.gain).toBeCloseTo(0.24061489, 8);
  expect(found.extraCostPerKwh).toBeCloseTo(0.17254, 5);
  expect(found.incomplete).toBe(false);
});

test('a tracker bought at the break-even capital costs as much per kWh as the reference', () => {
  expect(lcoe(tracker, 11_234.9939)).toBeCloseTo(0.12907606, 8);
});
