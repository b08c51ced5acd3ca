/** The sentences carry the numbers that they rest on. Figures invented. */
import { expect, test } from 'vitest';
import { advise, cautionsFor } from '../../src/advice/index.ts';
import { DEFERRAL } from '../../src/wind/index.ts';
import { mast, mount, roof, study, tracker } from './invented.ts';

const ground = mount({ id: 'ground', cost: 0.109 });
const quoted = { break_even_premium_per_kw: 70, premium_per_kw: 400, break_even_gain: 0.28 };
const losing = tracker({ cost: 0.124, energy: [1792, 1744, 1840], worst: 2.5, ...quoted });

test('each gain names its reference, its range over the skies, and what it costs', () => {
  expect(advise(study([ground, losing])).reasons).toContain(
    'tracker delivers 12 % more per kW than ground, the reference (9 to 15 % over the Perez, Hay-Davies and Reindl ' +
      'skies), and costs 28 % more per kW over 25 years.',
  );
  const weaker = advise(study([ground, roof({ energy: [1480, 1472, 1488] })])).reasons;
  expect(weaker).toContain(
    'roof delivers 7.5 % less per kW than ground, the reference (-8 to -7 % over the Perez, Hay-Davies and Reindl skies).',
  );
});

test('the reasons quote the ranking, the worst months and the plane tilted for them', () => {
  const tiltedForMonth = [
    { month: 'Nov', kwh_per_kw_day: 3.6 },
    { month: 'Dec', kwh_per_kw_day: 3.3 },
  ];
  const { reasons } = advise(study([ground, losing], { tiltedForMonth }));
  expect(reasons[0]).toBe('By cost per kWh: ground 0.1090, tracker 0.1240 USD per kWh.');
  expect(reasons).toContain(
    'Worst month, kWh per kW a day: ground 2.90 (Dec), tracker 2.50 (Dec). A fixed plane tilted for the month would ' +
      'give 3.30 in Dec.',
  );
});

test('the break-even premium stands against the quoted one, below zero too', () => {
  expect(advise(study([ground, losing])).reasons).toContain(
    'tracker equals ground in cost per kWh at a premium of 70 USD per kW (quoted premium 400).',
  );
  const hopeless = tracker({ cost: 0.2, ...quoted, break_even_premium_per_kw: -30, premium_per_kw: null });
  expect(advise(study([ground, hopeless])).reasons).toContain(
    'tracker equals ground in cost per kWh only if its capital is 30 USD per kW lower (no quote is given).',
  );
});

test('the same-energy result is quoted whole', () => {
  const same = {
    tracker_id: 'tracker',
    reference_id: 'ground',
    reachable: true,
    target_kwh: 1,
    modules: 1,
    dc_kw: 1,
    energy_kwh: 1,
    module_area_m2: null,
    capital: null,
    capital_difference: null,
    present_cost_difference: null,
    text: '33 modules do it.',
  };
  expect(advise(study([ground, losing], { sameEnergy: [same] })).reasons).toContain(
    'Same energy as tracker: 33 modules do it.',
  );
});

test('a losing tracker wins below its premium or above its gain, a winning one the other way about', () => {
  expect(advise(study([ground, losing])).switch_points).toContain(
    'On cost per kWh tracker wins over ground if its premium falls below 70 USD per kW (quoted 400) or its gain passes ' +
      '28 % (now 12 %).',
  );
  const winning = tracker({
    ...losing,
    cost: 0.1,
    energy: 1792,
    break_even_premium_per_kw: 500,
    break_even_gain: 0.09,
  });
  expect(advise(study([ground, winning])).switch_points).toContain(
    'On cost per kWh tracker loses to ground if its premium passes 500 USD per kW (quoted 400) or its gain falls below ' +
      '9 % (now 12 %).',
  );
});

test('the margin of the chosen mount is told in money and in energy', () => {
  // 0.124 / 0.109 - 1 = 13.8 %, 1 - 0.109 / 0.124 = 12.1 %
  expect(advise(study([ground, losing])).switch_points).toContain(
    'ground falls level with tracker if all it costs turns out 13.8 % dearer or it delivers 12.1 % less than counted.',
  );
});

test('the doubts give the sky models one by one, the isotropic sky as a lower bound only', () => {
  const { doubts } = advise(study([ground, losing]));
  expect(doubts[0]).toBe(
    'Sky models: the gain of tracker over ground is 12 % by Perez, 9 % by Hay-Davies, 15 % by Reindl; the isotropic ' +
      'sky gives 8.6 %, a lower bound only.',
  );
});

test('what flatters trackers or is unknown stands among the doubts', () => {
  const input = study([ground, losing, mast({ cost: 0.2 })], {
    inverterGiven: false,
    globalOnly: true,
    skyModel: 'isotropic',
    notCounted: [{ what: 'losses.dirt', effect: '' }],
  });
  const doubts = advise(input).doubts.join('\n');
  for (const part of [
    'ceiling was not counted, which usually flatters trackers',
    'split from global light',
    'uses the isotropic sky',
    'lone mast',
    'Not counted, because blank: losses.dirt.',
    'typical year is not a bad year',
  ])
    expect(doubts).toContain(part);
  const plain = advise(study([ground, losing])).doubts.join('\n');
  for (const part of ['ceiling', 'split from', 'isotropic sky, which', 'lone mast', 'Not counted'])
    expect(plain).not.toContain(part);
});

test('the cautions cover falls, electricity, lifting, wind and structure, and moving parts where something moves', () => {
  const heads = (kinds: Parameters<typeof cautionsFor>[0]) =>
    cautionsFor(kinds).map((text) => text.split(':')[0]);
  expect(heads(['roof-plane'])).toEqual([
    'Falls',
    'Electricity',
    'Lifting',
    DEFERRAL.split(':')[0],
    'Structure',
    'Yield',
  ]);
  expect(heads(['fixed-tilt', 'dual-axis'])).toEqual(
    expect.arrayContaining(['Moving parts', 'Stow', 'Earthing']),
  );
  for (const text of cautionsFor(['single-axis']).filter((t) => /^(Wind|Structure)/.test(t)))
    expect(text).toContain('licensed engineer');
});

test('a study without a currency still says that a number is money', () => {
  expect(advise(study([ground, losing], { currency: null })).leads[0].unit).toBe('money per kWh');
});
