import fc from 'fast-check';
import { expect, test } from 'vitest';
import { type AdviceMount, advise, DOUBT_SKIES } from '../../src/advice/index.ts';
import { mount, study, tracker } from './invented.ts';

const price = fc.double({ min: 0.05, max: 0.4, noNaN: true });
const energy = fc.double({ min: 800, max: 2600, noNaN: true });
const prices = fc.tuple(price, price, price);
const energies = fc.tuple(energy, energy, energy);
/** A ground rack first, as the reference, then one to three trackers. */
const mounts = fc
  .array(fc.record({ cost: prices, energy: energies, incomplete: fc.boolean(), downtime: fc.boolean() }), {
    minLength: 2,
    maxLength: 4,
  })
  .map((list) =>
    list.map(({ cost, energy: kwh, incomplete, downtime }, i) =>
      (i === 0 ? mount : tracker)({
        id: `m${i}`,
        cost,
        energy: kwh,
        cost_incomplete: incomplete,
        downtime_blank: i > 0 && downtime,
      }),
    ),
  );
const inMoney = (m: AdviceMount, k: number): AdviceMount => ({
  ...m,
  lcoe_per_kwh: (m.lcoe_per_kwh ?? Number.NaN) * k,
  by_sky: Object.fromEntries(
    Object.entries(m.by_sky).map(([sky, x]) => [
      sky,
      { ...x, lcoe_per_kwh: (x.lcoe_per_kwh ?? Number.NaN) * k },
    ]),
  ) as AdviceMount['by_sky'],
});

test('another currency changes neither the choice nor the confidence', () => {
  fc.assert(
    // powers of two keep the arithmetic exact, so that a lead at the very edge of the doubt stays there
    fc.property(mounts, fc.integer({ min: -8, max: 8 }), (list, power) => {
      const [a, b] = [advise(study(list)), advise(study(list.map((m) => inMoney(m, 2 ** power))))];
      expect([b.choice, b.confidence]).toEqual([a.choice, a.confidence]);
    }),
  );
});

test('a mount that is worse under every sky than another never changes the choice', () => {
  fc.assert(
    fc.property(mounts, fc.double({ min: 1.01, max: 3, noNaN: true }), (list, k) => {
      const dominated = { ...inMoney(list[0], k), id: 'dominated' };
      expect(advise(study([...list, dominated])).choice).toBe(advise(study(list)).choice);
    }),
  );
});

test('the doubt between two mounts is the same whichever is chosen, and is half the range by hand', () => {
  fc.assert(
    fc.property(prices, prices, (a, b) => {
      const [x, y] = [mount({ id: 'x', cost: a }), mount({ id: 'y', cost: b })];
      const { leads } = advise(study([x, y]));
      const swapped = advise(study([y, x])).leads;
      const differences = DOUBT_SKIES.map((_, i) => a[i] - b[i]).sort((p, q) => p - q);
      expect(leads[0].doubt).toBeCloseTo((differences[2] - differences[0]) / 2, 12);
      expect(swapped[0].doubt).toBeCloseTo(leads[0].doubt, 12);
    }),
  );
});

test('the isotropic sky never moves choice, lead or doubt', () => {
  fc.assert(
    fc.property(mounts, price, (list, cost) => {
      const moved = list.map((m) => ({
        ...m,
        by_sky: { ...m.by_sky, isotropic: { ...m.by_sky.isotropic, lcoe_per_kwh: cost } },
      }));
      expect(advise(study(moved)).leads).toEqual(advise(study(list)).leads);
    }),
  );
});

test('the chosen mount has the lowest cost, every lead is positive or nil, and no cap leaves a lead clear', () => {
  let leadsSeen = 0;
  fc.assert(
    fc.property(mounts, (list) => {
      const result = advise(study(list));
      const chosen = list.find((m) => m.id === result.choice) as AdviceMount;
      expect(chosen.lcoe_per_kwh).toBe(Math.min(...list.map((m) => m.lcoe_per_kwh ?? Number.NaN)));
      expect(result.leads).toHaveLength(list.length - 1);
      for (const lead of result.leads) {
        leadsSeen++;
        expect(lead.lead).toBeGreaterThanOrEqual(0);
        const other = list.find((m) => m.id === lead.over) as AdviceMount;
        if (chosen.cost_incomplete || other.cost_incomplete || chosen.downtime_blank)
          expect(lead.confidence).not.toBe('clear');
      }
    }),
  );
  expect(leadsSeen).toBeGreaterThan(100);
});

test('a blocked study never chooses, and the input is left as it was', () => {
  const block = { code: 'closure', severity: 'block', text: 'It does not close.', fix: '' } as const;
  fc.assert(
    fc.property(mounts, (list) => {
      const input = study(list, { findings: [block] });
      const before = structuredClone(input);
      const result = advise(input);
      expect([result.choice, result.confidence, result.leads, result.switch_points]).toEqual([
        null,
        null,
        [],
        [],
      ]);
      expect(input).toEqual(before);
    }),
  );
});
