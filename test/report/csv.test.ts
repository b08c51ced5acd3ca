import { parse } from 'csv-parse/sync';
import fc from 'fast-check';
import { expect, test } from 'vitest';
import { csvText } from '../../src/report/csv.ts';
import { monthlyCsv, mountsCsv } from '../../src/report/index.ts';
import {
  HOSTILE,
  invented,
  inventedBare,
  inventedHostile,
  inventedWithoutRate,
  VARIANTS,
} from './invented.ts';

const read = (text: string): Record<string, string>[] => parse(text, { columns: true });

const close = (cell: string, x: number) =>
  expect(Math.abs(Number(cell) - x)).toBeLessThanOrEqual(Math.abs(x) * 5.0001e-10);

test.each(VARIANTS)('mounts.csv reads back as the numbers of the results: %s', (_, make) => {
  const c = make();
  const rows = read(mountsCsv(c));
  expect(rows).toHaveLength(c.mounts.length);
  for (const [i, m] of c.mounts.entries()) {
    close(rows[i].energy_kwh_per_kw, m.energy_kwh_per_kw);
    close(rows[i].gain_over_reference_fraction, m.gain_over_reference);
    close(rows[i].gain_isotropic_fraction, m.gain_by_sky.isotropic);
    close(rows[i].irradiation_kwh_m2, m.irradiation_kwh_m2);
    for (const [name, value] of [
      ['tilt_deg', m.tilt_deg],
      ['capital_currency_per_kw', m.capital_per_kw],
      ['lcoe_currency_per_kwh', m.lcoe_per_kwh],
      ['break_even_gain_fraction', m.break_even_gain],
      ['highest_edge_m', m.wind.highest_edge_m],
      ['land_m2', m.land_m2],
      ['azimuth_error_deg', m.azimuth_error_deg],
      ['orientation_factor_low_fraction', m.orientation_factor_band?.low ?? null],
      ['orientation_factor_high_fraction', m.orientation_factor_band?.high ?? null],
      ['shading_fraction', c.skyline ? m.shading_fraction : null],
      ['shading_worst_point_fraction', c.skyline ? m.shading_worst_point : null],
      ['tsrf_fraction', m.tsrf],
      ['tsrf_worst_point_fraction', m.tsrf_worst_point],
    ] as const) {
      if (value === null) expect(rows[i][name]).toBe('');
      else close(rows[i][name], value);
    }
  }
});

test.each(VARIANTS)(
  'monthly.csv has a row a mount and month whose energies add up to the year: %s',
  (_, make) => {
    const c = make();
    const rows = read(monthlyCsv(c));
    expect(rows).toHaveLength(12 * c.mounts.length);
    for (const m of c.mounts) {
      const own = rows.filter((row) => row.mount_id === m.id);
      expect(own.map((row) => row.month_number)).toEqual(Array.from({ length: 12 }, (_, i) => String(i + 1)));
      const year = own.reduce((sum, row) => sum + Number(row.energy_kwh_per_kw), 0);
      expect(Math.abs(year - m.energy_kwh_per_kw)).toBeLessThan(1e-5);
      close(own[1].energy_kwh_per_kw_day, m.energy_monthly_kwh_per_kw[1] / 28);
      expect(own[11].shading_fraction).toBe('');
      if (c.skyline) close(own[1].shading_fraction, m.shading_monthly[1]!);
      close(own[11].tilted_for_month_kwh_per_kw_day, c.tilted_for_month[11].kwh_per_kw_day);
    }
  },
);

test('without a rate there is a column a rate, with one there is none', () => {
  const [row] = read(mountsCsv(inventedWithoutRate()));
  expect(row.lcoe_at_4_percent_currency_per_kwh).toBe('0.0912');
  expect(row.lcoe_at_10_percent_currency_per_kwh).toBe('0.1377');
  expect(row.lcoe_currency_per_kwh).toBe('');
  expect(mountsCsv(invented())).not.toContain('lcoe_at_');
  expect(read(mountsCsv(inventedBare()))[0].currency).toBe('');
});

test('text that a spreadsheet would run gets an apostrophe, negative numbers do not', () => {
  const text = csvText([{ a: '=1+1', b: '+x', c: '-x', d: '@x', e: '\t=x', f: '＝1', g: -0.5, h: 'a=b', i: ' =x' }]);
  expect(read(text)[0]).toEqual({ a: "'=1+1", b: "'+x", c: "'-x", d: "'@x", e: "'\t=x", f: "'＝1", g: '-0.5', h: 'a=b', i: "' =x" });
}); // biome-ignore format: one record

test('hostile labels come back whole behind their apostrophe', () => {
  const c = inventedHostile();
  const mounts = c.mounts.map((m) => ({ ...m, label: HOSTILE }));
  expect(read(mountsCsv({ ...c, mounts }))[0].label).toBe(`'${HOSTILE}`);
});

test('any text comes back as it went in, save the apostrophe', () => {
  fc.assert(
    fc.property(
      fc.array(fc.string({ unit: fc.constantFrom('a', '"', ',', '\n', '\r', ' ', 'é', ';') }), {
        minLength: 1,
      }),
      (texts) => {
        const back = read(csvText(texts.map((text, i) => ({ i, text, end: 'x' }))));
        expect(back.map(({ text }) => text.replace(/^'/, ''))).toEqual(texts);
      },
    ),
  );
});

test('a number that is not finite is refused', () => {
  expect(() => csvText([{ a: Number.NaN }])).toThrow(/NaN/);
});
