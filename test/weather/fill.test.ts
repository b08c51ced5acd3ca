import { describe, expect, test } from 'vitest';
import type { Finding, HourlyYear } from '../../src/shared/index.ts';
import { sunOverHours } from '../../src/sun/index.ts';
import { fillGaps } from '../../src/weather/gaps.ts';
import { fillByClosure, type RawYear, readWeather, type SunHours } from '../../src/weather/index.ts';
import { bytesOf, inventedYear, writeEpw } from '../support/weather-writers.ts';

const RAW: RawYear = await readWeather({ source: 'orlin.epw', bytes: bytesOf(writeEpw(inventedYear())) });
const SUN: SunHours = sunOverHours(RAW.place, RAW.calendarYear);
const NAMES = ['ghi', 'dni', 'dhi'] as const;
type Name = (typeof NAMES)[number];

/** The year without some of its components. */
const without = (...absent: Name[]): RawYear => ({
  ...RAW,
  ...Object.fromEntries(absent.map((name) => [name, new Float64Array(8760).fill(Number.NaN)])),
  origin: { ...RAW.origin, ...Object.fromEntries(absent.map((name) => [name, 'missing'])) },
});
/** The year with single values changed. */
const withValues = (base: RawYear, name: Name, values: Record<number, number>): RawYear => {
  const column = base[name].slice();
  for (const [h, v] of Object.entries(values)) column[Number(h)] = v;
  return { ...base, [name]: column };
};
const codes = (year: HourlyYear): string[] => year.notes.map((n) => n.code);
const expectComplete = (year: HourlyYear): void => {
  for (const name of NAMES) expect(year[name].every((v) => v >= 0 && Number.isFinite(v))).toBe(true);
};
/** Noon of 5 July, and an hour of that night. */
const NOON = 185 * 24 + 12;
const NIGHT = 185 * 24 + 1;

describe('a complete year', () => {
  test('passes unchanged and without a note, and the input is not touched', () => {
    const before = RAW.ghi.slice();
    const year = fillByClosure(RAW, SUN);
    for (const name of NAMES) expect(year[name]).toEqual(RAW[name]);
    expect(codes(year)).toEqual([]);
    expect('line' in year).toBe(false);
    expect(RAW.ghi).toEqual(before);
  });

  test.each(NAMES)('gets one missing value of %s back by closure', (name) => {
    const year = fillByClosure(withValues(RAW, name, { [NOON]: Number.NaN }), SUN);
    // The components were rounded to whole W/m2, so that closure gives them back to within 1 or 2.
    expect(Math.abs(year[name][NOON] - RAW[name][NOON])).toBeLessThan(2);
    expect(codes(year)).toEqual(['filled-by-closure']);
    expect(year.origin[name]).toBe('given');
  });

  test('has what is missing at night set to 0, and negative readings too, both counted', () => {
    const year = fillByClosure(
      withValues(withValues(RAW, 'ghi', { [NIGHT]: Number.NaN, [NIGHT + 24]: -2.5 }), 'dni', {
        [NIGHT]: Number.NaN,
      }),
      SUN,
    );
    expectComplete(year);
    expect(year.notes.map((n) => [n.code, n.severity])).toEqual([
      ['missing-at-night', 'note'],
      ['negative-irradiance', 'note'],
    ]);
    expect(year.notes.map((n) => n.text)).toEqual([
      'Irradiance is missing in 1 hour without sun and counts as 0.',
      '1 value of irradiance is negative (down to -2.5 W/m2) and counts as 0.',
    ]);
    expect(year.notes[1].text).toContain('-2.5 W/m2');
  });

  test('with two values missing at noon is refused with the line and the hour', () => {
    const raw = withValues(withValues(RAW, 'dni', { [NOON]: Number.NaN }), 'dhi', { [NOON]: Number.NaN });
    expect(() => fillByClosure(raw, SUN)).toThrow(/orlin\.epw:4461 .*5 Jul 12:00/); // 8 lines of header, hour 4452, counted from 1
  });
});

describe('a year without', () => {
  test('GHI has it derived: DHI + DNI cos z', () => {
    const year = fillByClosure(without('ghi'), SUN);
    const worst = year.ghi.reduce((w, v, h) => Math.max(w, Math.abs(v - RAW.ghi[h])), 0);
    expect(worst).toBeLessThanOrEqual(0.51); // GHI had been rounded to whole W/m2
    expect(year.origin).toEqual({ ghi: 'derived', dni: 'given', dhi: 'given' });
  });

  test('DHI has it derived, not below 0', () => {
    const year = fillByClosure(withValues(without('dhi'), 'ghi', { [NOON]: 100 }), SUN);
    expect(year.dhi[NOON]).toBe(0);
    const worst = year.dhi.reduce((w, v, h) => (h === NOON ? w : Math.max(w, Math.abs(v - RAW.dhi[h]))), 0);
    expect(worst).toBeLessThan(1.1); // half a W/m2 each from the rounding of GHI and of DNI
    expect(year.origin.dhi).toBe('derived');
  });

  test('DNI has it derived above 3 degrees of height, at most the sunlight outside the air, and 0 below', () => {
    const year = fillByClosure(withValues(without('dni'), 'ghi', { [NOON]: 5000 }), SUN);
    expect(year.dni[NOON]).toBe(SUN.extraterrestrialWm2[NOON]);
    let [low, high] = [0, 0];
    for (let h = 0; h < 8760; h++) {
      if (SUN.sunlit[h] === 0 || h === NOON) continue;
      if (SUN.cosZenith[h] < Math.cos((87 * Math.PI) / 180)) {
        low++;
        expect(year.dni[h]).toBe(0);
      } else if (SUN.cosZenith[h] > 0.3) {
        high++;
        expect(Math.abs(year.dni[h] - RAW.dni[h])).toBeLessThan(1.1 / 0.3 + 0.5); // rounding over cos z
      }
    }
    expect(low).toBeGreaterThan(100);
    expect(high).toBeGreaterThan(2500);
    expect(year.origin.dni).toBe('derived');
  });

  test('DNI and DHI is global-only: both stay 0 and missing, with a warning', () => {
    const year = fillByClosure(without('dni', 'dhi'), SUN);
    expect(year.dni.every((v) => v === 0) && year.dhi.every((v) => v === 0)).toBe(true);
    expect(year.origin).toEqual({ ghi: 'given', dni: 'missing', dhi: 'missing' });
    expect(year.notes.map((n) => [n.code, n.severity])).toEqual([['global-only', 'warning']]);
  });

  test('two of three, one of them GHI, and that with a hole at noon is refused, as is a hole in GHI alone', () => {
    for (const raw of [without('dni'), without('dni', 'dhi')])
      expect(() => fillByClosure(withValues(raw, 'ghi', { [NOON]: Number.NaN }), SUN)).toThrow(
        /missing|daylight/,
      );
  });

  test('any use is refused in words: beam alone, diffuse alone, nothing', () => {
    expect(() => fillByClosure(without('ghi', 'dhi'), SUN)).toThrow('found DNI alone');
    expect(() => fillByClosure(without('ghi', 'dni'), SUN)).toThrow('found DHI alone');
    expect(() => fillByClosure(without('ghi', 'dni', 'dhi'), SUN)).toThrow('found no irradiance at all');
  });
});

test('nights marked missing by a clock an hour off are filled with a warning, so that the clock can be judged', () => {
  const late = (a: Float64Array) =>
    a.map((_, h) => (a[(h + 8759) % 8760] > 0 ? a[(h + 8759) % 8760] : Number.NaN));
  const year = fillByClosure({ ...RAW, ghi: late(RAW.ghi), dni: late(RAW.ghi), dhi: late(RAW.ghi) }, SUN);
  expectComplete(year);
  expect(year.notes.map((n) => [n.code, n.severity])).toContainEqual(['missing-at-the-edge', 'warning']);
});

test('a zero beside missing beam and diffuse at the edge of the day counts as night; light beside them does not', () => {
  const h = SUN.sunlit.findIndex((s) => s > 0); // the first hour of sun in the year
  const blank = withValues(withValues(RAW, 'dni', { [h]: Number.NaN }), 'dhi', { [h]: Number.NaN });
  expect(codes(fillByClosure(withValues(blank, 'ghi', { [h]: 0 }), SUN))).toEqual(['missing-at-the-edge']);
  expect(() => fillByClosure(withValues(blank, 'ghi', { [h]: 40 }), SUN)).toThrow(/daylight/);
});

describe('gaps of temperature and wind', () => {
  const column = (holes: (h: number) => boolean) =>
    Float64Array.from({ length: 8760 }, (_, h) => (holes(h) ? Number.NaN : h));
  const filled = (holes: (h: number) => boolean) => {
    const notes: Finding[] = [];
    return { got: fillGaps(column(holes), 'temperature', 'temperature', notes), notes };
  };

  test('a gap of six hours becomes a straight line and a note', () => {
    const { got, notes } = filled((h) => h >= 100 && h < 106);
    for (let h = 95; h < 110; h++) expect(got?.[h]).toBeCloseTo(h, 9);
    expect(notes.map((n) => [n.code, n.severity])).toEqual([['temperature-gaps', 'note']]);
  });

  test('a gap over the end of the year is bridged round it', () => {
    const { got } = filled((h) => h === 8759 || h === 0);
    expect(got?.[8759]).toBeCloseTo(8758 + (1 - 8758) / 3, 9);
    expect(got?.[0]).toBeCloseTo(8758 + (2 * (1 - 8758)) / 3, 9);
  });

  test('a long gap, or more than one hour in a hundred, is a warning', () => {
    expect(filled((h) => h >= 100 && h < 107).notes[0].severity).toBe('warning');
    expect(filled((h) => h % 90 === 0).notes[0].severity).toBe('warning');
  });

  test('long gaps over a tenth of the year take the column away; nothing at all is only noted', () => {
    const long = filled((h) => h >= 1000 && h < 1900);
    expect(long.got).toBeNull();
    expect(long.notes.map((n) => [n.code, n.severity])).toEqual([['no-temperature', 'warning']]);
    const none = filled(() => true);
    expect(none.got).toBeNull();
    expect(none.notes.map((n) => [n.code, n.severity])).toEqual([['no-temperature', 'note']]);
  });
});

test('the missing codes of EPW become missing, not weather', async () => {
  const codesOf = { 6: '99.9', 13: '9999', 21: '999' };
  const lines = writeEpw(inventedYear()).map((line, i) => {
    const cells = line.split(',');
    if (i === 20) for (const [c, v] of Object.entries(codesOf)) cells[Number(c)] = v;
    return cells.join(',');
  });
  const raw = await readWeather({ source: 'orlin.epw', bytes: bytesOf(lines) });
  expect(raw.ghi[12]).toBeNaN();
  expect(raw.temperatureC?.[12]).toBeLessThan(30);
  expect(raw.windMs?.[12]).toBeLessThan(10);
  expect(raw.notes.map((n) => n.code)).toEqual(['temperature-gaps', 'wind-gaps']);
});
