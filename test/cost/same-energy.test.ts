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
    '45 fixed modules (18 kW, 90 m2) on the ground rack in place of 30 deliver the 21 000 kWh a year of the tracker ' +
      'under the same 10 kW inverter, for 4 700 USD more capital than the tracker.',
  );
  expect(sameEnergy(question({ targetKwh: 21_001 })).modules).toBe(46);
});

test('upkeep and renewals of both are discounted over the life where rate and years are known', () => {
  const reference = { capitalPerKw: 1900, capital: 500, upkeepPerKw: 20, upkeep: null, renewals: [{ what: 'inverter', year: 1, cost: 1100 }] };
  const cost = { capitalPerKw: 2500, capital: null, upkeepPerKw: null, upkeep: 1000, renewals: [{ what: 'drive', year: 2, cost: 2420 }] };
  const tracker = { id: 'tracker', label: 'T2', capital: 30_000, cost };
  const asked = { tracker, reference: { id: 'g', label: 'ground', cost: reference }, finance: { realRate: 0.1, years: 2 } };
  const found = sameEnergy(question(asked));
  // By hand at 10 % over 2 years, 1 a year is worth 1 / 1.1 + 1 / 1.21 = 1.735537.
  // Fixed: 34 700 + 18 x 20 x 1.735537 + 1100 / 1.1 = 36 324.79; tracker: 30 000 + 1735.54 + 2420 / 1.21 = 33 735.54.
  expect(found.present_cost_difference).toBeCloseTo(2589.26, 2);
  expect(found.text).toContain('for 4 700 USD more capital than T2 and 2 589 USD more over 2 years (present cost at 10 %).');
  const dear = sameEnergy(question({ ...asked, tracker: { ...tracker, cost: { ...cost, upkeep: 5000 } } }));
  // 4000 a year more for the tracker: 2589.26 - 4000 x 1.735537 = -4352.89.
  expect(dear.present_cost_difference).toBeCloseTo(-4352.89, 2);
  expect(dear.text).toContain('and 4 353 USD less over 2 years');
  // A blank upkeep is not zero.
  const blank = sameEnergy(question({ ...asked, tracker: { ...tracker, cost: { ...cost, upkeep: null } } }));
  expect(blank.present_cost_difference).toBeNull();
  expect(blank.text).toMatch(/more capital than T2\.$/);
  expect(sameEnergy(question({ ...asked, finance: { realRate: null, years: 2 } })).present_cost_difference).toBeNull();
}); // biome-ignore format: long rows

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
