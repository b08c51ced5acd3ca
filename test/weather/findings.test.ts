import { describe, expect, test } from 'vitest';
import type { Finding, HourlyYear } from '../../src/shared/index.ts';
import { clearSkyLimitWm2 } from '../../src/weather/clear-sky-limit.ts';
import { fillByClosure, readWeather, weatherFindings } from '../../src/weather/index.ts';
import { sunOf } from '../support/real-years.ts';
import { bytesOf, INVENTED_PLACE, inventedYear, writeEpw } from '../support/weather-writers.ts';

const read = async (place = INVENTED_PLACE): Promise<HourlyYear> => {
  const raw = await readWeather({ source: 'orlin.epw', bytes: bytesOf(writeEpw(inventedYear(place))) });
  return fillByClosure(raw, sunOf(raw)(raw.offsetMin));
};
const YEAR = await read();
const SUN = sunOf(YEAR)(0);
const find = (year: HourlyYear) => weatherFindings(year, sunOf(year));
const pick = (year: HourlyYear, code: string): Finding | undefined =>
  find(year).findings.find((f) => f.code === code);
const change = (
  year: HourlyYear,
  name: 'ghi' | 'dni' | 'dhi',
  f: (v: number, h: number) => number,
): HourlyYear => ({
  ...year,
  [name]: year[name].map(f),
});
const NOON = 185 * 24 + 12;
const NIGHT = 185 * 24 + 1;

test('a clean year has notes only: clock, sums, closure, what was read', () => {
  const found = find(YEAR);
  expect(found.findings.map((f) => f.severity)).toEqual(found.findings.map(() => 'note'));
  const codes = found.findings.map((f) => f.code);
  for (const code of ['clock-fits', 'sums', 'closure', 'year-read']) expect(codes).toContain(code);
  expect(found.droppedNightKwhM2).toBe(0);
  expect(pick(YEAR, 'year-read')?.text).toBe(
    '8,760 hours in EPW format, Orlin Bench, XX, Nowhere; printed times stand for the end of the hour.',
  );
});

test('what the study adds is said in words, not as a negative number of minutes', () => {
  const said = (addedMin: number, filedMin = 0) =>
    weatherFindings({ ...YEAR, offsetMin: filedMin + addedMin }, sunOf(YEAR), addedMin).findings.find(
      (f) => f.code === 'year-read',
    )?.text;
  expect(said(-60)).toMatch(
    /end of the hour; as the study has it, hours begin 60 minutes earlier than printed\.$/,
  );
  expect(said(30)).toMatch(/hours begin 30 minutes later than printed\.$/);
  expect(said(0, -30)).toMatch(/end of the hour, hours begin 30 minutes past the full hour\.$/);
  expect(said(0, 60)).toMatch(/end of the hour\.$/);
});

test('sums of year and months are plain sums of the columns', () => {
  const found = find(YEAR);
  const sum = (a: Float64Array, from = 0, to = 8760) => a.slice(from, to).reduce((s, v) => s + v, 0) / 1000;
  expect(found.annual.ghiKwhM2).toBeCloseTo(sum(YEAR.ghi), 9);
  expect(found.annual.dniKwhM2).toBeCloseTo(sum(YEAR.dni), 9);
  expect(found.annual.dhiKwhM2).toBeCloseTo(sum(YEAR.dhi), 9);
  expect(found.ghiMonthlyKwhM2).toHaveLength(12);
  expect(found.ghiMonthlyKwhM2[1]).toBeCloseTo(sum(YEAR.ghi, 31 * 24, 59 * 24), 9);
  expect(found.ghiMonthlyKwhM2.reduce((s, v) => s + v, 0)).toBeCloseTo(found.annual.ghiKwhM2, 9);
});

test('what the reader noted is passed on', () => {
  const note: Finding = { code: 'temperature-gaps', severity: 'warning', text: 'x', fix: '' };
  const found = find({ ...YEAR, notes: [note] });
  expect(found.findings).toContain(note);
  expect(found.findings[0]).toBe(note); // the only warning comes before all notes
});

describe('closure', () => {
  test('of a year that was made to close leaves only the rounding', () => {
    const closure = find(YEAR).closure;
    // GHI was rounded to whole W/m2 from rounded DNI and DHI: uniform error, rms 1/sqrt(12) = 0.29.
    expect(closure?.rmsWm2).toBeLessThan(0.3);
    expect(Math.abs(closure?.biasWm2 ?? 9)).toBeLessThan(0.02);
    expect(closure?.hours).toBe(SUN.sunlit.filter((s) => s > 0).length);
  });

  test('shows 40 W/m2 too much by day as that bias, and warns', () => {
    const year = change(YEAR, 'ghi', (v, h) => (SUN.sunlit[h] > 0 ? v + 40 : v));
    expect(find(year).closure?.biasWm2).toBeCloseTo(40, 1);
    expect(pick(year, 'closure')?.severity).toBe('warning');
    expect(pick(year, 'closure')?.text).toContain('bias +40.0 W/m2');
  });

  test('is not claimed where a component is derived or missing', () => {
    for (const origin of ['derived', 'missing'] as const) {
      const year = { ...YEAR, origin: { ...YEAR.origin, dni: origin } };
      expect(find(year).closure).toBeNull();
      expect(pick(year, 'closure')).toBeUndefined();
      expect(pick(year, 'clock-by-edges')).toBeDefined();
    }
  });
});

describe('impossible values', () => {
  test.each([
    ['ghi', 2000, 'ghi-too-high'],
    ['dni', 1500, 'dni-too-high'],
    ['dhi', 1400, 'dhi-too-high'],
  ] as const)('%s of %d W/m2 at noon is counted and the worst hour named', (name, value, code) => {
    const finding = pick(
      change(YEAR, name, (v, h) => (h === NOON ? value : v)),
      code,
    );
    expect(finding?.severity).toBe('note');
    expect(finding?.text).toMatch(
      new RegExp(`^1 of \\d+ hours of daylight have .*worst 5 Jul 12:00: ${value} of at most`),
    );
  });

  test.each([
    ['dni', 2500, 'dni-too-high'],
    ['ghi', 2500, 'ghi-too-high'],
  ] as const)(
    '%s of %d W/m2 in five hours is a note, in six a warning with first hour and count',
    (name, value, code) => {
      // From the noon of 5 July, one a day.
      const days = (n: number) =>
        pick(
          change(YEAR, name, (v, h) => (h >= NOON && h < NOON + n * 24 && h % 24 === 12 ? value : v)),
          code,
        );
      expect(days(5)?.severity).toBe('note');
      expect(days(6)?.severity).toBe('warning');
      expect(days(6)?.text).toMatch(/^6 of \d+ hours of daylight have .*\(first 5 Jul 12:00, worst /);
    },
  );

  test('DNI up to 2 % above the sunlight outside the air is taken for calibration', () => {
    const outside = SUN.extraterrestrialWm2[NOON];
    const at = (factor: number) =>
      pick(
        change(YEAR, 'dni', (v, h) => (h === NOON ? outside * factor : v)),
        'dni-too-high',
      );
    expect(at(1.019)).toBeUndefined();
    expect(at(1.03)).toBeDefined();
  });

  test('DHI above GHI is counted', () => {
    const finding = pick(
      change(YEAR, 'dhi', (_, h) => (h === NOON ? YEAR.ghi[NOON] * 1.06 : YEAR.dhi[h])),
      'dhi-above-ghi',
    );
    expect(finding?.text).toContain('DHI above GHI');
  });

  test('a wrong unit, half as much again, is a warning', () => {
    const year = change(YEAR, 'dni', (v) => v * 1.5);
    expect(pick(year, 'dni-too-high')?.severity).toBe('warning');
  });
});

test('light at night is summed, dropped and counted', () => {
  const year = change(YEAR, 'ghi', (v, h) => (h === NIGHT || h === NIGHT + 24 ? 150 : v));
  expect(find(year).droppedNightKwhM2).toBeCloseTo(0.3, 9);
  expect(pick(year, 'light-at-night')).toEqual({
    code: 'light-at-night',
    severity: 'note',
    text: '2 hours without sun hold light, 0.300 kWh/m2 in all, which is dropped.',
    fix: '',
  });
  const offset = change(YEAR, 'ghi', (v) => v + 4);
  expect(pick(offset, 'light-at-night')?.severity).toBe('warning');
});

test('a yearly sum that no place has is a warning, too much or too little', () => {
  for (const [factor, word] of [
    [1.6, 'much'],
    [0.2, 'little'],
  ] as const) {
    const finding = pick(
      change(YEAR, 'ghi', (v) => v * factor),
      'implausible-sum',
    );
    expect(finding?.severity).toBe('warning');
    expect(finding?.text).toContain(`No place on earth has so ${word}`);
  }
});

describe('the place', () => {
  const at = (part: object): HourlyYear => ({ ...YEAR, place: { ...YEAR.place, ...part } });

  test('a longitude of the wrong sign is told by the offset from UTC, with both numbers', () => {
    const finding = pick(at({ longitudeDeg: 103.25 }), 'zone-against-longitude');
    expect(finding?.severity).toBe('warning');
    expect(finding?.text).toBe('Longitude 103.25 degrees goes with UTC+6.9, but the clock is UTC-7.0.');
  });

  test('zones that are in use raise no alarm: Madrid, Kiribati, Nepal, Apia, Buenos Aires, Seoul, Urumqi', () => {
    // Longitude and zone from the IANA time zone database (zone1970.tab and zone rules).
    for (const [longitudeDeg, utcOffsetH] of [
      [-3.7, 1],
      [-157.33, 14],
      [85.32, 5.75],
      [-171.73, 13],
      [-58.4, -3],
      [126.97, 9],
    ])
      expect(pick(at({ longitudeDeg, utcOffsetH }), 'zone-against-longitude')).toBeUndefined();
    expect(pick(at({ longitudeDeg: 87.6, utcOffsetH: 8 }), 'zone-against-longitude')).toBeUndefined(); // Urumqi: 2.2 h
  });

  test('warm months against the hemisphere are told, but not in the tropics or without temperature', () => {
    expect(pick(at({ latitudeDeg: -41.5 }), 'seasons-against-latitude')?.text).toMatch(
      /K warmer than December .*-41\.50 lies south/,
    );
    expect(pick(at({ latitudeDeg: -20 }), 'seasons-against-latitude')).toBeUndefined();
    expect(
      pick({ ...at({ latitudeDeg: -41.5 }), temperatureC: null }, 'seasons-against-latitude'),
    ).toBeUndefined();
    expect(pick(YEAR, 'seasons-against-latitude')).toBeUndefined();
  });

  test('a southern year in its own place raises no alarm', async () => {
    const south = await read({ latitudeDeg: -33.5, longitudeDeg: 149.2, elevationM: 700, utcOffsetH: 10 });
    expect(find(south).findings.filter((f) => f.severity !== 'note')).toEqual([]);
  });
});

test('the clear-sky limit is the formula widened by a tenth at sea level, and higher on a mountain', () => {
  // Hand arithmetic, cos z = 0.5: 1098 x 0.5 x exp(-0.114) = 549 x 0.892258 = 489.850; x 1.1 = 538.835.
  expect(clearSkyLimitWm2(0.5, 0)).toBeCloseTo(538.835, 2);
  expect(clearSkyLimitWm2(0, 0)).toBe(0);
  expect(clearSkyLimitWm2(0.1, 3000)).toBeGreaterThan(clearSkyLimitWm2(0.1, 0));
});
