import { expect, test } from 'vitest';
import { memoMarkdown, screenTable } from '../../src/report/index.ts';
import { clockWords } from '../../src/report/screen.ts';
import type { Comparison } from '../../src/shared/index.ts';
import {
  EXTRAS,
  HOSTILE,
  invented,
  inventedAlone,
  inventedBare,
  inventedBlocked,
  inventedHostile,
  inventedSouth,
  inventedSurveyed,
  inventedWithoutRate,
  VARIANTS,
} from './invented.ts';

/** Columns of a line, counted apart from the code under test: East Asian blocks take two. */
const columns = (line: string) =>
  [...line.normalize('NFC')].reduce(
    (sum, ch) =>
      sum + (/[\u1100-\u115f\u2e80-\ua4cf\uac00-\ud7a3\uf900-\ufaff\uff00-\uff60]/.test(ch) ? 2 : 1),
    0,
  );

const screen = (make: () => ReturnType<typeof invented>) =>
  screenTable(make(), { reportPath: 'out/memo.md' });

test.each(VARIANTS)('no line is wider than 100 columns: %s', (_, make) => {
  const lines = screen(make).split('\n');
  expect(lines.length).toBeGreaterThan(12);
  expect(lines.filter((line) => columns(line) > 100)).toEqual([]);
  expect(lines.filter((line) => line !== line.trimEnd())).toEqual([]);
});

test.each(VARIANTS)(
  'nothing unknown prints as null, NaN or undefined, and no control character passes: %s',
  (_, make) => {
    expect(screen(make)).not.toMatch(/null|NaN|undefined|Infinity|\[object|[^\P{Cc}\n]|\u202e/u);
  },
);

test('extreme figures and names do not break the width', () => {
  const c = invented();
  const mounts = c.mounts.map((m, i) => ({
    ...m,
    label: '横浜'.repeat(30) + i,
    capital_per_kw: 1e13,
    lcoe_per_kwh: 123456789,
    cost_incomplete: i === 1,
  }));
  const text = screenTable(
    { ...c, title: '屋根'.repeat(80), currency: 'X'.repeat(50), mounts },
    { reportPath: 'r/'.repeat(90) },
  );
  expect(text.split('\n').filter((line) => columns(line) > 100)).toEqual([]);
});

test('the answer stands above the table, with place, array and weather above it', () => {
  const lines = screen(invented).split('\n');
  expect(lines[0]).toBe(
    'Orlin Bench  40.10 N 104.92 W   12.04 kW DC, 10 kW AC   typical year orlin.epw, clock fits the sun',
  );
  expect(lines[2]).toContain('CHOOSE Ground rack');
  expect(lines.findIndex((line) => line.includes('delivered'))).toBeGreaterThan(2);
  expect(screen(inventedSouth)).toContain('33.20 S 20.55 E');
});

test('a row holds the figures of its mount and names the reference of the gain', () => {
  const text = screen(invented);
  const c = invented();
  expect(text).toMatch(/against .*\n.*Ground rack/);
  for (const mount of c.mounts) {
    const row = text.split('\n').find((line) => line.startsWith(`  ${mount.label} `)) ?? '';
    const numbers = row
      .replace(/(?<=\d) (?=\d{3})/g, '')
      .match(/-?\d+(?:\.\d+)?/g)!
      .map(Number);
    const expected = [
      mount.energy_kwh_per_kw,
      ...(mount.id === 'ground' ? [] : [mount.gain_over_reference * 100]),
      mount.worst_month.kwh_per_kw_day,
      mount.capital_per_kw!,
      mount.lcoe_per_kwh!,
    ];
    const half = [0.5, ...(mount.id === 'ground' ? [] : [0.05]), 0.005, 0.5, 0.0005];
    for (const [i, value] of expected.entries())
      expect(Math.abs(numbers[i] - value)).toBeLessThanOrEqual(half[i] + 1e-9);
  }
});

test('limits are in words, and a broken one shouts', () => {
  const text = screen(invented);
  expect(text).toContain('height not checked');
  expect(text).toContain('roof projection within');
  expect(text).toContain('height EXCEEDS by 0.90 m');
  expect(text).toContain('licensed engineer');
});

test('a programme is missed below its minimum, kept within it, or too near to tell', () => {
  const flat = screen(inventedSurveyed).replace(/\s+/g, ' ');
  expect(flat).toContain('TOF BELOW by 3.8 points, TSRF too near to tell');
  expect(flat).toContain('TOF within, TSRF within');
  expect(flat).not.toMatch(/(?:TOF|TSRF) EXCEEDS/);
});

test('shading has a line where there is a skyline, and none under an open horizon', () => {
  expect(screen(inventedSurveyed)).toContain(
    "skyline takes, of a year's light: Ground rack 2.1 %, Barn roof 3.4 %, Tracker 6.2 %, Mast 7.1 %",
  );
  expect(screen(invented)).not.toContain('skyline');
});

test('without costs the cost columns go and the lack is named; without limits no wind figure is shown', () => {
  const text = screen(inventedBare);
  expect(text).not.toMatch(/capital {2}|\/kWh$|limits/m);
  expect(text).toContain('the study lacks finance.real_rate, finance.years and the capital of');
  expect(text).toContain('1 kW DC (no array given), no inverter given');
  expect(text).toContain('clock cannot be checked');
  expect(text).not.toContain('licensed engineer');
  expect(text).toContain('and 4 more, in the memo');
});

test('without a rate the cost per kWh is shown at 4, 7 and 10 %, and what is incomplete is marked', () => {
  const text = screen(inventedWithoutRate);
  expect(text).toMatch(/at 4 % +at 7 % +at 10 %/);
  expect(text).toMatch(/Tracker .*0\.091\* +0\.113\* +0\.138\*/);
  expect(text).toMatch(/Ground rack .*0\.091 +0\.113 +0\.138$/m);
  expect(text).toContain('* from the costs that are given');
});

test('a mark is explained only where a figure bears it', () => {
  const whole = invented();
  const [first, ...others] = whole.mounts;
  const unpriced = {
    ...first,
    capital: null,
    capital_per_kw: null,
    lcoe_per_kwh: null,
    cost_incomplete: true,
  };
  const text = screen(() => ({ ...whole, mounts: [unpriced, ...others] }));
  expect(text).toContain('—');
  expect(text).not.toContain('* from the costs that are given');
});

test('a blocked study says so above its table, notes stay out', () => {
  const text = screen(inventedBlocked);
  expect(text.indexOf('BLOCKED')).toBeGreaterThan(0);
  expect(text.indexOf('BLOCKED')).toBeLessThan(text.indexOf('delivered'));
  expect(text.indexOf('BLOCKED')).toBeLessThan(text.indexOf('Warning'));
  expect(text).not.toContain('Afternoons');
  expect(text).toContain('clock 59 min behind the sun');
});

test('the clock words tell slow from fast', () => {
  // time_shift_min is what must be added: a file to which an hour must be added runs behind.
  expect(clockWords(60)).toBe('clock 60 min behind the sun');
  expect(clockWords(-60)).toBe('clock 60 min ahead of the sun');
  expect(clockWords(-7)).toBe('clock fits the sun');
});

test('the plane of the worst month is named, with its tilt and its yield', () => {
  expect(screen(invented)).toContain('a fixed plane tilted for December (66°) would give 3.80 in that month');
  expect(screen(inventedSouth)).toContain('a fixed plane tilted for June (5°)');
});

test('where the sun stays down in the worst month, that is said in words', () => {
  const polar = (): Comparison => {
    const c = invented();
    const noNovember = (values: number[]) => values.map((v, m) => (m === 10 || m === 11 ? 0 : v));
    return {
      ...c,
      weather: { ...c.weather, ghi_monthly_kwh_m2: noNovember(c.weather.ghi_monthly_kwh_m2) },
      tilted_for_month: c.tilted_for_month.map((t, m) => (m > 9 ? { ...t, kwh_per_kw_day: 0 } : t)),
      mounts: c.mounts.map((m) => ({
        ...m,
        energy_monthly_kwh_per_kw: noNovember(m.energy_monthly_kwh_per_kw),
        worst_month: { month: 'Nov', kwh_per_kw_day: 0 },
      })),
    };
  };
  expect(screen(polar)).toContain('no mount delivers in November and December: the sun stays down');
  expect(screen(polar)).not.toContain('a fixed plane tilted for');
  const memo = memoMarkdown(polar(), EXTRAS);
  expect(memo).toContain('No mount delivers in November and December: the sun stays down.');
  expect(screen(invented)).not.toContain('no mount delivers');
});

test('a name that begins a sentence is written as the study writes it', () => {
  const c = invented();
  const mounts = c.mounts.map((m) => (m.id === 'tracker' ? { ...m, label: 'fixed_rows' } : m));
  const text = screenTable({
    ...c,
    mounts,
    advice: { ...c.advice, switch_points: ['fixed racks cost less.'] },
  });
  expect(text).toContain('\nfixed_rows delivers');
  expect(text).toContain('\nFixed racks cost less.');
});

test('every tracker has its answer to "more modules instead"', () => {
  const text = screen(invented);
  expect(text).toMatch(/Instead of Tracker\n {2}same energy {3}32 modules/);
  expect(text).toMatch(/Instead of Mast\n {2}same energy {3}36 modules/);
  expect(screen(inventedAlone)).not.toContain('Instead of');
  expect(screen(inventedAlone)).not.toContain('against');
});

test('the report path is shown only where a report was written, and the next command can be pasted', () => {
  expect(screen(invented)).toContain('Report          out/memo.md');
  expect(screenTable(invented())).not.toContain('Report');
  expect(screen(invented)).toContain('trackworth weather orlin.epw');
  const c = invented();
  const spaced = { ...c, weather: { ...c.weather, source: "a b's.epw" } };
  expect(screenTable(spaced)).toContain(`trackworth weather 'a b'\\''s.epw'`);
});

test('each gain is told with its reference, its range over the skies and what it costs', () => {
  const text = screen(invented);
  expect(text).toMatch(
    /Tracker delivers 13\.1 % more per kW than Ground rack \(12\.6 to 13\.1 % over the sky models\) and\s+costs\s+27\.9 % more per kW over 25 years\./,
  );
  expect(text).toContain(
    'Barn roof delivers 7.3 % less per kW than Ground rack (7.0 to 7.3 % over the sky models).',
  );
  expect(text).toContain('Tracker wins if its premium over Ground rack falls below 67 USD/kW (quoted 400).');
});

test('what the headline tells is not told again below it', () => {
  const c = inventedBlocked();
  const block = c.weather.findings.find(({ severity }) => severity === 'block')!;
  const told = { ...c, advice: { ...c.advice, headline: `NO RECOMMENDATION: ${block.text} ${block.fix}` } };
  expect(screenTable(told)).not.toContain('BLOCKED');
  expect(screenTable(told).replace(/\s+/g, ' ')).toContain(block.text);
});

test('mounts with one label are told apart by their ids', () => {
  const c = invented();
  const text = screenTable({ ...c, mounts: c.mounts.map((m) => ({ ...m, label: 'rack' })) });
  for (const { id } of c.mounts) expect(text).toContain(`rack (${id})`);
});

test('a hostile title stays on one line and loses its escape sequences', () => {
  const [first] = screen(inventedHostile).split('\n');
  expect(HOSTILE).toContain('\n');
  expect(first).toMatch(/^=HYPERLINK.*… {2}40\.10 N 104\.92 W /);
});
