/** What is priced is ranked by cost, with or without a discount rate. Mounts invented; expected figures are hand arithmetic. */
import fc from 'fast-check';
import { expect, test } from 'vitest';
import { type AdviceMount, advise, rankingBasis } from '../../src/advice/index.ts';
import { mast, mount, roof, type Sketch, study, tracker } from './invented.ts';

const ground = mount({ id: 'ground', cost: 0.095 });
const strongMast = mast({ cost: 0.12, energy: 2200 });
const unpriced = roof({ cost: null, energy: 1500 });

test('one mount without a price leaves the priced ones ranked by cost, not all of them by energy', () => {
  const input = study([ground, strongMast, unpriced]);
  const result = advise(input);
  expect(rankingBasis(input)).toEqual({
    objective: 'lowest cost per kWh',
    rankedBy: 'lowest cost per kWh',
    lacking: 'the capital cost of roof',
  });
  expect([result.choice, result.confidence]).toEqual(['ground', 'likely']);
  expect(result.leads.map(({ over }) => over)).toEqual(['mast']);
  expect(result.leads[0].lead).toBeCloseTo(0.025, 12);
  expect(result.leads[0].why).toContain('roof could not be ranked and might be cheaper');
  expect(result.headline).toBe(
    'CHOOSE ground: fixed rack, 34° tilt, facing 186° (south). Lead: LIKELY over mast. ' +
      'Not ranked, for lack of the capital cost: roof',
  );
  expect(result.reasons).toContain('Not ranked, for lack of the capital cost: roof.');
  expect(result.doubts[0]).toBe(
    'Not ranked, for lack of the capital cost: roof. What has no price might be cheaper than what is chosen.',
  );
  expect([result.headline, ...result.reasons].join('\n')).not.toContain('energy alone');
  expect(result.excluded).toEqual([]);
});

test('a single priced mount is named as such, claims no confidence, and names those without a price', () => {
  const result = advise(study([ground, tracker({ cost: null }), unpriced]));
  expect([result.choice, result.confidence, result.leads]).toEqual(['ground', null, []]);
  expect(result.headline).toContain('It is the only mount that has a cost per kWh, so nothing is ranked');
  expect(result.headline).toContain('Not ranked, for lack of the capital cost: tracker and roof');
});

test('an objective of energy ranks mounts without a price like any other', () => {
  const result = advise(study([ground, strongMast, unpriced], { objective: 'most kWh per kW' }));
  expect([result.choice, result.leads.length]).toEqual(['mast', 2]);
  expect(result.headline).not.toContain('Not ranked');
});

test('mounts without a price change neither choice nor leads but for a clear lead, which they make likely', () => {
  const price = fc.double({ min: 0.05, max: 0.4, noNaN: true });
  const prices = fc.tuple(price, price, price);
  let capped = 0;
  fc.assert(
    fc.property(prices, prices, (a, b) => {
      const priced = [mount({ id: 'ground', cost: a }), tracker({ cost: b })];
      const [plain, more] = [advise(study(priced)), advise(study([...priced, unpriced]))];
      if (plain.confidence === 'clear') capped++;
      expect(more.choice).toBe(plain.choice);
      expect(more.leads.map(({ lead, doubt }) => [lead, doubt])).toEqual(
        plain.leads.map(({ lead, doubt }) => [lead, doubt]),
      );
      expect(more.confidence).toBe(plain.confidence === 'clear' ? 'likely' : plain.confidence);
    }),
  );
  expect(capped).toBeGreaterThan(0);
});

/** A mount of a study without a rate: no cost per kWh of its own, but one at each of three rates. */
const atRates = (
  make: (sketch: Sketch) => AdviceMount,
  id: string,
  costs: readonly [number, number, number],
  over: Partial<Sketch> = {},
): AdviceMount => ({
  ...make({ id, cost: null, ...over }),
  capital_per_kw: 1900,
  cost_incomplete: false,
  lcoe_at_rates: { '4 %': costs[0], '7 %': costs[1], '10 %': costs[2] },
});
const noRate = { realRate: null } as const;
const bareGround = atRates(mount, 'ground', [0.08, 0.1, 0.12]);

test('without a rate the order that holds at 4, 7 and 10 % is the ranking, likely at most, and energy decides nothing', () => {
  const input = study(
    [bareGround, atRates(tracker, 'tracker', [0.1, 0.125, 0.15], { energy: 1900 })],
    noRate,
  );
  expect(rankingBasis(input)).toEqual({
    objective: 'lowest cost per kWh',
    rankedBy: 'lowest cost per kWh',
    lacking: 'finance.real_rate',
  });
  const result = advise(input);
  expect([result.choice, result.confidence]).toEqual(['ground', 'likely']);
  const [lead] = result.leads;
  expect(lead).toMatchObject({ over: 'tracker', unit: 'USD per kWh at 7 %' });
  expect(lead.lead).toBeCloseTo(0.025, 12);
  expect(lead.why).toContain('no discount rate is given; the order holds at 4, 7 and 10 %');
  expect(result.reasons.slice(0, 3)).toEqual([
    'By cost per kWh: ground 0.1000, tracker 0.1250 USD per kWh at 7 %.',
    'No discount rate is given (finance.real_rate): costs are ranked as they stand at 7 %.',
    'Without a rate, the lowest USD per kWh is that of ground at 4 % (0.08000), ground at 7 % (0.1000) and ground at ' +
      '10 % (0.1200).',
  ]);
  // 0.125 / 0.1 - 1 = 25 %, 1 - 0.1 / 0.125 = 20 %
  expect(result.switch_points).toEqual([
    'ground falls level with tracker if all it costs turns out 25 % dearer or it delivers 20 % less than counted, at ' +
      'a rate of 7 %.',
  ]);
});

test('without a rate the doubt follows the energy under each sky, for the money stays the same', () => {
  // at 7 %: ground 0.1 under every sky; tracker 0.12, 0.12 * 2000 / 1920 = 0.125, 0.12 * 2000 / 2500 = 0.096: half of 0.029
  const input = study(
    [bareGround, atRates(tracker, 'tracker', [0.1, 0.12, 0.14], { energy: [2000, 1920, 2500] })],
    noRate,
  );
  const [lead] = advise(input).leads;
  expect(lead.doubt).toBeCloseTo(0.0145, 12);
  expect(lead.lead).toBeCloseTo(0.02, 12);
  expect(lead.confidence).toBe('likely');
  expect(lead.why).toContain('1.4 times the doubt of sky models (0.0145)');
});

test('where the winner hangs on the rate the choice stands at 7 %, too close to call, and names who wins at which', () => {
  const rival = atRates(tracker, 'tracker', [0.07, 0.12, 0.15], { energy: 1900 });
  const result = advise(study([bareGround, rival], noRate));
  expect([result.choice, result.confidence]).toEqual(['ground', 'too_close']);
  expect(result.leads[0].why).toContain(
    'no discount rate is given, and the cheaper one is tracker at 4 % and ground at 7 and 10 %',
  );
  expect(result.headline).toBe(
    'TOO CLOSE TO CALL: ground and tracker. It turns on the discount rate, which is not given: the cheaper one is ' +
      'tracker at 4 % and ground at 7 and 10 %',
  );
  expect(result.switch_points).toContain(
    'The answer turns on the discount rate: the lowest cost per kWh is that of tracker at 4 % and ground at 7 and 10 %.',
  );
  expect(result.reasons).toContain(
    'Without a rate, the lowest USD per kWh is that of tracker at 4 % (0.07000), ground at 7 % (0.1000) and ground at ' +
      '10 % (0.1200).',
  );
});

test('the cheapest at each rate is sought only among mounts that may be chosen', () => {
  const cheapMast = {
    ...atRates(mast, 'mast', [0.01, 0.01, 0.01]),
    limits: [
      {
        name: 'height',
        bound: 'most',
        status: 'broken',
        detail: 'exceeds 3 m by 0.9 m',
        value: 3.9,
        asked: 3,
        excess_m: 0.9,
      },
    ],
  } as AdviceMount;
  const result = advise(
    study([bareGround, atRates(tracker, 'tracker', [0.1, 0.125, 0.15]), cheapMast, unpriced], noRate),
  );
  expect([result.choice, result.confidence]).toEqual(['ground', 'likely']);
  expect(result.reasons.join('\n')).toContain(
    'Without a rate, the lowest USD per kWh among ground and tracker is that of ground at 4 % (0.08000)',
  );
  expect(result.headline).toContain('Not ranked, for lack of the capital cost: roof');
});

test('without a rate the choice is always the cheapest at 7 %, and never clear', () => {
  const costs = fc.tuple(
    ...([0.08, 0.1, 0.12] as const).map((x) => fc.double({ min: x, max: 2 * x, noNaN: true })),
  );
  let turned = 0;
  fc.assert(
    fc.property(fc.array(costs, { minLength: 2, maxLength: 4 }), (list) => {
      const mounts = list.map((c, i) =>
        atRates(i === 0 ? mount : tracker, `m${i}`, [c[0], c[1], c[2]], { energy: 1600 + 100 * i }),
      );
      const result = advise(study(mounts, noRate));
      const chosen = list[mounts.findIndex((m) => m.id === result.choice)];
      expect(chosen[1]).toBe(Math.min(...list.map((c) => c[1])));
      expect(['likely', 'too_close']).toContain(result.confidence);
      const beaten = list.some((c) => c[0] < chosen[0] * (1 - 1e-6) || c[2] < chosen[2] * (1 - 1e-6));
      if (beaten) {
        turned++;
        expect(result.confidence).toBe('too_close');
      }
    }),
  );
  expect(turned).toBeGreaterThan(0);
});
