import { expect, test } from 'vitest';
import { chartSpecs } from '../../src/charts/index.ts';
import type { Comparison } from '../../src/shared/index.ts';
import { inventedComparison, USUAL } from './fixture.ts';

/** Costs of the fixture: ground 0.109, Shop roof 0.113, tracker 0.124, Dual-axis mast 0.163. */
const usual = (over: Partial<Comparison['advice']> = {}): Comparison => {
  const c = inventedComparison(USUAL);
  return { ...c, advice: { ...c.advice, choice: 'ground', ...over } };
};
const title = (c: Comparison, name: string) => chartSpecs(c).find((chart) => chart.name === name)!.title;
const lead = (over: string, confidence: 'too_close' | 'clear') => ({ over, confidence, lead: 0.004, doubt: 0.005, unit: 'USD per kWh', why: '' }); // biome-ignore format: short

test('the cost title does not claim what the verdict finds too close to call', () => {
  const close = usual({ leads: [lead('roof', 'too_close'), lead('tracker', 'clear')] });
  expect(title(close, 'cost')).toBe('Cost per kWh: ground and Shop roof are too close to call (0.109 and 0.113 USD)'); // biome-ignore format: a sentence
  // Ranked by energy the leads say nothing of cost, and a lead over a dearer mount nothing of the two cheapest.
  expect(title({ ...close, ranked_by: 'most kWh per kW' }, 'cost')).toMatch(/^ground makes the cheapest/);
  expect(title(usual({ leads: [lead('tracker', 'too_close')] }), 'cost')).toMatch(/^ground makes/);
});

test('the cost title names the cheapest of those that keep their limits', () => {
  const excluded = [{ id: 'ground', why: 'its land exceeds the limit' }];
  expect(title(usual({ choice: 'roof', excluded }), 'cost')).toBe('Of the mounts that keep their limits, Shop roof makes the cheapest energy: 0.113 USD per kWh, 8.9\u00A0% below tracker'); // biome-ignore format: a sentence
  const all = USUAL.map(({ id }) => ({ id, why: 'a limit' }));
  expect(title(usual({ choice: null, excluded: all }), 'cost')).toMatch(/^No mount with costs keeps its limits, ground makes/); // biome-ignore format: a sentence
});

test('the cost title tells that costs are incomplete', () => {
  const c = usual();
  c.mounts[2].cost_incomplete = true;
  expect(title(c, 'cost')).toMatch(/^From the costs given, ground makes the cheapest energy/);
});

test('the months title sets the chosen mount, else the reference, against the plane tilted for its worst month', () => {
  const c = usual({ choice: 'roof' });
  const { month, kwh_per_kw_day } = c.mounts[1].worst_month;
  const plane = c.tilted_for_month.find((t) => t.month === month)!;
  expect(month).toBe('Dec');
  expect(title(c, 'months')).toBe(`Shop roof delivers least in December, ${kwh_per_kw_day.toFixed(2)} kWh per kW a day; a fixed plane tilted for that month would give ${plane.kwh_per_kw_day.toFixed(2)}`); // biome-ignore format: a sentence
  expect(title(usual({ choice: null }), 'months')).toMatch(/^ground delivers least in December/);
});

test('a mount put aside by a limit is not praised for its worst month', () => {
  const finding = (excluded: Comparison['advice']['excluded']) =>
    chartSpecs(usual({ excluded })).find((chart) => chart.name === 'months')!.finding;
  expect(finding([])).toContain('Of all mounts, Dual-axis mast has the best worst month');
  expect(finding([{ id: 'mast', why: 'height' }])).not.toContain('mast');
  expect(finding([{ id: 'mast', why: 'height' }])).toContain('Of the mounts that keep their limits, ');
});

test('polar night is told in words', () => {
  const c = usual();
  const dark = (values: number[]) => values.map((v, m) => (m === 11 ? 0 : v));
  const polar: Comparison = {
    ...c,
    weather: { ...c.weather, ghi_monthly_kwh_m2: dark(c.weather.ghi_monthly_kwh_m2) },
    tilted_for_month: c.tilted_for_month.map((t, m) => (m === 11 ? { ...t, kwh_per_kw_day: 0 } : t)),
    mounts: c.mounts.map((m) => ({
      ...m,
      energy_monthly_kwh_per_kw: dark(m.energy_monthly_kwh_per_kw),
      worst_month: { month: 'Dec', kwh_per_kw_day: 0 },
    })),
  };
  const months = chartSpecs(polar).find((chart) => chart.name === 'months')!;
  expect(months.title).toBe('No mount delivers in December: the sun stays down');
  expect(months.finding).not.toMatch(/worst month|0\.0/);
  // Light in the file, none delivered: not the sun's doing.
  expect(title({ ...polar, weather: c.weather }, 'months')).toBe('No mount delivers in December: no light reaches the modules'); // biome-ignore format: a sentence
});

test('a mount keeps its own name at the start of a title', () => {
  const c = inventedComparison(USUAL.map((m) => (m.id === 'ground' ? { ...m, label: 'fixed_rows' } : m)));
  expect(title(c, 'cost')).toMatch(/^fixed_rows makes/);
  expect(title(c, 'months')).toMatch(/^fixed_rows delivers/);
});
