/** Each rule of the advice on a small invented study; the expected lead and doubt are hand arithmetic. */
import { expect, test } from 'vitest';
import { advise, confidenceOf, rankingBasis, rowsDiffer } from '../../src/advice/index.ts';
import { mast, mount, roof, study, tracker } from './invented.ts';

const BROKEN = {
  name: 'height',
  bound: 'most',
  status: 'broken',
  detail: 'exceeds 3 m by 0.9 m',
  value: 3.9,
  asked: 3,
  excess_m: 0.9,
} as const;
const UNCHECKED = {
  name: 'height',
  bound: 'most',
  status: 'not_checked',
  detail: 'not checked: slant is blank',
  value: null,
  asked: null,
  excess_m: null,
} as const;
const ground = mount({ id: 'ground', cost: 0.109 });

test('a lead is clear above twice the doubt, likely above the doubt, and too close up to it', () => {
  const rows = [
    [2.01, 1, 'clear'],
    [2, 1, 'likely'],
    [1.01, 1, 'likely'],
    [1, 1, 'too_close'],
    [0, 0, 'too_close'],
    [0.1, 0, 'clear'],
  ] as const;
  for (const [lead, doubt, expected] of rows) expect(confidenceOf(lead, doubt)).toBe(expected);
});

test('lead and doubt are the difference in cost per kWh and half its range over three skies', () => {
  // differences 0.015, 0.019, 0.013: half the range is 0.003, the lead 5 doubts
  const result = advise(study([ground, tracker({ cost: [0.124, 0.128, 0.122] })]));
  expect(result.choice).toBe('ground');
  expect(result.confidence).toBe('clear');
  expect(result.leads).toHaveLength(1);
  const [lead] = result.leads;
  expect(lead).toMatchObject({ over: 'tracker', confidence: 'clear', unit: 'USD per kWh' });
  expect(lead.lead).toBeCloseTo(0.015, 12);
  expect(lead.doubt).toBeCloseTo(0.003, 12);
  expect(lead.why).toBe(
    'the lead is 0.0150 USD per kWh, more than twice the doubt of sky models (0.00300); GCR 0.45 against 0.40',
  );
});

test('reading errors of the angles widen the doubt in quadrature, and the why says whose', () => {
  // The sky models leave 0.003 open as above; 4 % of 0.1 on the roof is 0.004: together 0.005, and the lead of 0.008 is 1.6 of it.
  const readRoof = (reading_error: number) =>
    mount({
      id: 'roof',
      kind: 'roof-plane',
      gcr: null,
      rows: 'no rows',
      cost: [0.1, 0.1, 0.1],
      reading_error,
    });
  const dearer = mount({ id: 'ground', cost: [0.108, 0.112, 0.106] });
  const leadOf = (error: number) => advise(study([readRoof(error), dearer])).leads[0];
  expect(leadOf(0).doubt).toBeCloseTo(0.003, 12);
  expect(leadOf(0).confidence).toBe('clear');
  const read = leadOf(0.04);
  expect(read.doubt).toBeCloseTo(0.005, 12);
  expect(read.confidence).toBe('likely');
  expect(read.why).toContain('1.6 times the doubt of sky models and of the reading errors of roof (0.00500)');
});

test('a smaller lead over the same doubt is likely, then too close', () => {
  const likely = advise(study([ground, tracker({ cost: [0.1135, 0.1175, 0.1115] })])); // 0.0045 over 0.003
  expect([likely.choice, likely.confidence]).toEqual(['ground', 'likely']);
  const close = advise(study([ground, tracker({ cost: [0.111, 0.115, 0.109] })])); // 0.002 under 0.003
  expect([close.choice, close.confidence]).toEqual(['ground', 'too_close']);
  expect(close.headline).toBe(
    'TOO CLOSE TO CALL: ground and tracker. ground is ahead of tracker by 0.00200 USD per kWh, within the doubt of sky models (0.00300)',
  );
});

test('the headline names the mount, its angles and each lead, and the confidence is the least sure of them', () => {
  const result = advise(study([ground, tracker({ cost: 0.124 }), roof({ cost: [0.113, 0.117, 0.111] })]));
  expect(result.headline).toBe(
    'CHOOSE ground: fixed rack, 34° tilt, facing 186° (south). Lead: CLEAR over tracker, LIKELY over roof',
  );
  expect(result.confidence).toBe('likely');
  expect(result.leads.map((lead) => lead.over)).toEqual(['roof', 'tracker']);
});

test('a mount that breaks a hard limit is put aside with the limit, however cheap it is', () => {
  const result = advise(study([ground, mast({ cost: 0.05, limits: [BROKEN] })]));
  expect(result.choice).toBe('ground');
  expect(result.excluded).toEqual([{ id: 'mast', why: 'height exceeds 3 m by 0.9 m' }]);
  expect(result.leads).toEqual([]);
  expect(result.confidence).toBeNull();
  expect(result.headline).toContain('the only mount that keeps its limits');
});

test('a limit that was not checked, or is too near to tell, excludes nothing and is a doubt', () => {
  for (const limit of [
    UNCHECKED,
    { ...BROKEN, status: 'within_reading_error' as const, detail: 'too near to tell' },
  ]) {
    const result = advise(study([ground, tracker({ cost: 0.09, limits: [limit] })]));
    expect(result.choice).toBe('tracker');
    expect(result.excluded).toEqual([]);
    expect(result.doubts.join('\n')).toContain(`Limit of tracker: height ${limit.detail}.`);
  }
});

test('where no mount keeps its limits nothing is chosen, and the headline says so', () => {
  const result = advise(study([mount({ id: 'ground', limits: [BROKEN] }), mast({ limits: [BROKEN] })]));
  expect([result.choice, result.confidence]).toEqual([null, null]);
  expect(result.headline).toMatch(/^NO MOUNT KEEPS ITS LIMITS: ground \(height exceeds 3 m by 0.9 m\), mast/);
  expect(result.excluded).toHaveLength(2);
});

test('a blocking finding withholds the choice and tells which line mends it', () => {
  const clock = {
    code: 'clock-shift',
    severity: 'block',
    text: 'The clock is 60 minutes out.',
    fix: 'Write weather: { add_minutes: 60 }.',
  } as const;
  const result = advise(study([ground, tracker({ cost: 0.2 })], { findings: [clock] }));
  expect([result.choice, result.confidence, result.leads]).toEqual([null, null, []]);
  expect(result.headline).toBe(
    'NO RECOMMENDATION: The clock is 60 minutes out. Write weather: { add_minutes: 60 }.',
  );
  expect(result.reasons.length).toBeGreaterThan(0);
});

test('a warning does not withhold the choice and is repeated among the doubts', () => {
  const gaps = {
    code: 'gaps',
    severity: 'warning',
    text: '14 hours are missing.',
    fix: 'Look at them.',
  } as const;
  const result = advise(study([ground, tracker({ cost: 0.2 })], { findings: [gaps] }));
  expect(result.confidence).toBe('clear');
  expect(result.doubts).toContain('14 hours are missing. Look at them.');
});

test('between ground mounts where only one side has rows, a clear lead is called likely and says rows differ', () => {
  const bare = mount({ id: 'ground', cost: 0.1, gcr: null, rows: 'no rows' });
  const result = advise(study([bare, tracker({ cost: 0.2 })]));
  expect(result.confidence).toBe('likely');
  expect(result.leads[0].why).toContain('rows differ: ground has no rows, tracker rows at GCR 0.40');
  expect(result.doubts.join('\n')).toContain('Rows differ: tracker has rows at GCR 0.40');
});

test('a roof plane has no rows to differ, and a lone mast is named instead', () => {
  const result = advise(study([ground, roof({ cost: 0.2 }), mast({ cost: 0.3 })]));
  expect(result.confidence).toBe('clear');
  expect(result.leads.find((lead) => lead.over === 'mast')?.why).toContain(
    'mast is a lone mast without rows',
  );
  const pairs = [
    [ground, roof({}), false],
    [ground, mast({}), false],
    [ground, tracker({}), false],
    [ground, tracker({ gcr: null }), true],
    [mount({ id: 'g', gcr: null }), mast({ gcr: 0.2 }), true],
    [mount({ id: 'g', gcr: null }), tracker({ gcr: null }), false],
  ] as const;
  for (const [a, b, differ] of pairs) expect([rowsDiffer(a, b), rowsDiffer(b, a)]).toEqual([differ, differ]);
});

test('incomplete costs on either side never make a clear lead', () => {
  const chosenBlank = advise(
    study([mount({ id: 'ground', cost: 0.1, cost_incomplete: true }), tracker({ cost: 0.2 })]),
  );
  const otherBlank = advise(study([ground, tracker({ cost: 0.2, cost_incomplete: true })]));
  for (const result of [chosenBlank, otherBlank]) {
    expect([result.choice, result.confidence]).toEqual(['ground', 'likely']);
    expect(result.leads[0].why).toMatch(/the costs of (ground|tracker) are incomplete/);
  }
});

test('a tracker whose downtime is blank is never a clear choice, and still loses clearly', () => {
  const wins = advise(study([ground, tracker({ cost: 0.05, downtime_blank: true })]));
  expect([wins.choice, wins.confidence]).toEqual(['tracker', 'likely']);
  expect(wins.leads[0].why).toContain('downtime of tracker is blank, and blank is not zero');
  const loses = advise(study([ground, tracker({ cost: 0.2, downtime_blank: true })]));
  expect([loses.choice, loses.confidence]).toEqual(['ground', 'clear']);
  expect(loses.doubts).toContain('Downtime of tracker is blank and not counted, which flatters it.');
});

test('only where no mount has a cost is the ranking by energy, says what is lacking, and is never clear', () => {
  const input = study([mount({ id: 'ground', cost: null }), tracker({ cost: null, energy: 1900 })]);
  expect(rankingBasis(input)).toEqual({
    objective: 'lowest cost per kWh',
    rankedBy: 'most kWh per kW',
    lacking: 'the capital cost of ground and tracker',
  });
  const result = advise(input);
  expect([result.choice, result.confidence]).toEqual(['tracker', 'likely']);
  expect(result.headline).toContain('on energy alone, costs not weighed');
  expect(result.leads[0]).toMatchObject({ unit: 'kWh per kW', lead: 300 });
  expect(result.reasons.join('\n')).toContain(
    'to weigh costs the study lacks the capital cost of ground and tracker',
  );
});

test('an objective of energy or of the worst month is followed, and may be clear', () => {
  const mounts = [ground, tracker({ cost: 0.2, energy: 1900, worst: 2.5 })];
  const energy = advise(study(mounts, { objective: 'most kWh per kW' }));
  expect([energy.choice, energy.confidence]).toEqual(['tracker', 'clear']);
  const worst = advise(study(mounts, { objective: 'best worst month' }));
  expect([worst.choice, worst.confidence]).toEqual(['ground', 'clear']);
  expect(worst.leads[0].lead).toBeCloseTo(0.4, 12);
});

test('equal mounts are too close to call and the reference stands first', () => {
  const result = advise(study([tracker({ cost: 0.109 }), ground], { referenceId: 'ground' }));
  expect([result.choice, result.confidence]).toEqual(['ground', 'too_close']);
  expect(result.headline).toContain('ground and tracker are equal in cost per kWh');
});

test('a study of one mount ranks nothing and claims no confidence', () => {
  const result = advise(study([ground]));
  expect([result.choice, result.confidence]).toEqual(['ground', null]);
  expect(result.headline).toContain('the only mount compared');
});
