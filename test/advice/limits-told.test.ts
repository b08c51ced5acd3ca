/** Limits are told beside prices and beside a lone survivor. Mounts invented. */
import { expect, test } from 'vitest';
import { type AdviceMount, advise } from '../../src/advice/index.ts';
import { mount, study, tracker } from './invented.ts';

type Limit = AdviceMount['limits'][number];
const tall: Limit = {
  name: 'height',
  bound: 'most',
  status: 'broken',
  detail: 'exceeds 3 m by 0.9 m',
  value: 3.9,
  asked: 3,
  excess_m: 0.9,
};
const programme = (name: string, status: Limit['status']): Limit => ({
  name,
  bound: 'least',
  status,
  detail: '70 % where at least 80 % is asked',
  value: 0.7,
  asked: 0.8,
  excess_m: null,
});
const quoted = { break_even_premium_per_kw: 70, premium_per_kw: 400, break_even_gain: 0.28 };

test('the price at which an excluded tracker would win is told with the limit that stands against it', () => {
  const ground = mount({ id: 'ground', cost: 0.1 });
  const points = (limits: Limit[]) =>
    advise(study([ground, tracker({ cost: 0.12, ...quoted, limits })])).switch_points[0];
  expect(points([tall])).toMatch(/\(now 0 %\); its height limit stands against it all the same\.$/);
  expect(points([tall, { ...tall, name: 'slant' }])).toContain(
    'its height and slant limits stand against it',
  );
  expect(points([{ ...tall, status: 'kept' }])).toMatch(/\(now 0 %\)\.$/);
});

test('a tracker that alone is left is not said to keep what no tracker is held against', () => {
  const fixed = mount({
    id: 'ground',
    cost: 0.1,
    limits: [programme('TOF', 'broken'), programme('TSRF', 'broken')],
  });
  const result = advise(study([fixed, tracker({ cost: 0.12 })]));
  expect(result.choice).toBe('tracker');
  expect(result.headline).toContain(
    'It is the only mount that keeps its limits (TOF and TSRF do not apply to a tracker), so nothing is ranked',
  );
  expect(result.doubts).toContain(
    'Programme: TOF and TSRF do not apply to a tracker, so tracker was not held against it.',
  );
});

test('a fixed mount that alone is left was held against the programme, and a study without one speaks of none', () => {
  const kept = mount({ id: 'ground', cost: 0.1, limits: [programme('TOF', 'kept')] });
  const fixedLeft = advise(study([kept, tracker({ cost: 0.12, limits: [tall] })]));
  expect(fixedLeft.headline).toMatch(/the only mount that keeps its limits, so nothing is ranked$/);
  expect(fixedLeft.doubts.join('\n')).toContain('TOF does not apply to a tracker');
  const trackerLeft = advise(study([mount({ id: 'ground', limits: [tall] }), tracker({ cost: 0.12 })]));
  expect(trackerLeft.headline).toMatch(/the only mount that keeps its limits, so nothing is ranked$/);
  expect(trackerLeft.doubts.join('\n')).not.toContain('TOF');
});
