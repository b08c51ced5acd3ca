/** Figures invented: a fixed array that makes 1500 kWh per kW until its inverter's ceiling. Expectations by hand. */
import fc from 'fast-check';
import { expect, test } from 'vitest';
import { type SameEnergyQuestion, sameEnergy } from '../../src/cost/index.ts';

/** 1500 kWh per kW up to `kneeKw`, 300 per kW beyond it. */
const clipped = (kneeKw: number) => (kw: number) =>
  1500 * Math.min(kw, kneeKw) + 300 * Math.max(0, kw - kneeKw);
const question = (over: Partial<SameEnergyQuestion>): SameEnergyQuestion => ({
  tracker: { id: 'tracker', label: 'the tracker', capital: 30_000 },
  reference: {
    id: 'ground',
    label: 'the ground rack',
    cost: { capitalPerKw: 1900, capital: 500, upkeepPerKw: null, upkeep: null, renewals: [] },
  },
  targetKwh: 21_000,
  energyOfDcKw: clipped(13),
  startDcKw: 12,
  moduleKw: 0.4,
  moduleAreaM2: 2,
  inverterKw: 10,
  currency: 'USD',
  ...over,
});

test('whole modules are rounded up to the first that reaches the target', () => {
  const found = sameEnergy(question({}));
  // 13 kW give 19 500; the other 1500 take 5 kW: 18 kW, 45 modules exactly
  expect(found).toMatchObject({ reachable: true, modules: 45, module_area_m2: 90, target_kwh: 21_000 });
  expect(found.dc_kw).toBeCloseTo(18, 9);
  expect(found.energy_kwh).toBeCloseTo(21_000, 6);
  expect(found.capital).toBeCloseTo(500 + 1900 * 18, 6);
  expect(found.capital_difference).toBeCloseTo(4700, 6);
  expect(found.text).toBe(
    '45 modules on the ground rack in place of 30 deliver the 21 000 kWh a year of the tracker ' +
      '(under the same 10 kW inverter): 4 700 USD more capital.',
  );
  expect(sameEnergy(question({ targetKwh: 21_001 })).modules).toBe(46);
});

test('without a module the rating is exact', () => {
  const found = sameEnergy(question({ moduleKw: null }));
  expect(found.modules).toBeNull();
  expect(found.module_area_m2).toBeNull();
  expect(found.dc_kw).toBeCloseTo(18, 4);
});

test('beyond 2.5 DC per AC the target is not reachable and the most it can give is told', () => {
  const found = sameEnergy(question({ targetKwh: 24_000 })); // 25 kW give 19 500 + 12 x 300 = 23 100; 62 modules are 24.8 kW
  expect(found).toMatchObject({ reachable: false, modules: 62, capital: null, capital_difference: null });
  expect(found.energy_kwh).toBeCloseTo(23_040, 6);
  expect(found.text).toMatch(
    /^not reachable under this inverter: .* at most 23 040 kWh of the 24 000 of the tracker/,
  );
});

test('without an inverter the search has no end and the sentence says that its ceiling was not counted', () => {
  const found = sameEnergy(
    question({ inverterKw: null, energyOfDcKw: (kw) => 1500 * kw, targetKwh: 90_000 }),
  );
  expect(found.dc_kw).toBeCloseTo(60, 9);
  expect(found.modules).toBe(150);
  expect(found.text).toContain('ceiling was not counted');
});

test('a blank capital on either side leaves the difference unknown', () => {
  const noRef = sameEnergy(question({ reference: { id: 'g', label: 'g', cost: null } }));
  const noTrk = sameEnergy(question({ tracker: { id: 't', label: 't', capital: null } }));
  expect([noRef.capital, noRef.capital_difference, noTrk.capital_difference]).toEqual([null, null, null]);
  expect(noTrk.capital).not.toBeNull();
});

test('the answer reaches the target and one module fewer does not', () => {
  fc.assert(
    fc.property(
      fc.double({ min: 9, max: 25, noNaN: true }),
      fc.double({ min: 0.2, max: 0.7, noNaN: true }),
      fc.double({ min: 1000, max: 24_000, noNaN: true }),
      (knee, moduleKw, targetKwh) => {
        const energyOfDcKw = clipped(knee);
        const found = sameEnergy(question({ energyOfDcKw, moduleKw, targetKwh }));
        const n = found.modules ?? Number.NaN;
        expect(n * moduleKw).toBeLessThanOrEqual(25 + 1e-6);
        if (found.reachable) {
          expect(energyOfDcKw(n * moduleKw)).toBeGreaterThanOrEqual(targetKwh);
          expect(n === 1 || energyOfDcKw((n - 1) * moduleKw) < targetKwh).toBe(true);
        } else {
          expect(energyOfDcKw(n * moduleKw)).toBeLessThan(targetKwh);
          expect((n + 1) * moduleKw).toBeGreaterThan(25 - 1e-6);
        }
      },
    ),
  );
});

test('whole modules that fill the search exactly are not lost to rounding', () => {
  // 2.5 x 0.12 kW / 0.1 kW is 2.9999999999999996 in floating point
  const found = sameEnergy(question({ inverterKw: 0.12, startDcKw: 0.2, moduleKw: 0.1, targetKwh: 440 }));
  expect(found).toMatchObject({ reachable: true, modules: 3 });
});
