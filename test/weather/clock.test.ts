import { describe, expect, test } from 'vitest';
import type { HourlyYear } from '../../src/shared/index.ts';
import { likelyShiftMin } from '../../src/weather/clock-findings.ts';
import {
  fillByClosure,
  readWeather,
  type WeatherFindings,
  weatherFindings,
} from '../../src/weather/index.ts';
import { describeWithWeather, realYear, realYearNames, sunOf } from '../support/real-years.ts';
import { bytesOf, inventedYear, TABLE_COLUMNS, writeEpw, writeTable } from '../support/weather-writers.ts';

const find = (year: HourlyYear): WeatherFindings => weatherFindings(year, sunOf(year));
const blocked = (found: WeatherFindings) => found.findings.filter((f) => f.severity === 'block');
/** Every hour labelled `hours` later than in truth, as a wrong zone or daylight saving does. */
const relabelled = (year: HourlyYear, hours: number): HourlyYear => {
  const turn = (a: Float64Array) => a.map((_, h) => a[(h - hours + 8760) % 8760]);
  return { ...year, ghi: turn(year.ghi), dni: turn(year.dni), dhi: turn(year.dhi) };
};
const globalOnly = (year: HourlyYear): HourlyYear => ({
  ...year,
  dni: new Float64Array(8760),
  dhi: new Float64Array(8760),
  origin: { ghi: 'given', dni: 'missing', dhi: 'missing' },
});
const shifts = (years: readonly HourlyYear[]): (number | null)[] => years.map((y) => find(y).timeShiftMin);

describeWithWeather('the clock of real years', () => {
  const names = realYearNames();

  test('fits the sun in every file as it is: no alarm, neither with all components nor from GHI alone', async () => {
    const rows: string[] = [];
    for (const name of names) {
      const year = await realYear(name);
      const [all, alone] = [find(year), find(globalOnly(year))];
      rows.push(
        `${name.padEnd(26)} ${String(all.timeShiftMin).padStart(4)} ${String(alone.timeShiftMin).padStart(4)}`,
      );
      for (const found of [all, alone]) {
        expect(found.findings.filter((f) => f.severity !== 'note').map((f) => f.code)).toEqual([]);
        expect(found.sure).toBe(true);
        expect(Math.abs(found.timeShiftMin as number)).toBeLessThan(10);
      }
    }
    console.log(`minutes to add, as filed: all components, GHI alone\n${rows.join('\n')}`);
    expect(rows.length).toBeGreaterThanOrEqual(16);
  }, 60_000);

  test('an hour too late or too early is found in every file within 20 minutes, and blocks', async () => {
    const rows: string[] = [];
    for (const name of names) {
      const year = await realYear(name);
      const cells: string[] = [];
      for (const [hours, alone] of [
        [1, false],
        [-1, false],
        [1, true],
        [-1, true],
      ] as const) {
        const moved = relabelled(alone ? globalOnly(year) : year, hours);
        const found = find(moved);
        cells.push(String(found.timeShiftMin).padStart(5));
        expect(found.sure).toBe(true);
        expect(Math.abs((found.timeShiftMin as number) + 60 * hours)).toBeLessThan(20);
        expect(blocked(found).map((f) => f.code)).toEqual(['clock-shift']);
        expect(blocked(found)[0].fix).toContain(`add_minutes: ${-60 * hours} }`);
      }
      rows.push(`${name.padEnd(26)} ${cells.join(' ')}`);
    }
    console.log(
      `minutes to add, labelled an hour late, early (all components), late, early (GHI alone)\n${rows.join('\n')}`,
    );
    expect(rows.length).toBeGreaterThanOrEqual(16);
  }, 120_000);

  test('half an hour either way is found in every file, and blocks', async () => {
    let worst = 0;
    for (const name of names) {
      const year = await realYear(name);
      for (const offsetMin of [30, -30])
        for (const base of [year, globalOnly(year)]) {
          // The hours are said to begin half an hour later (earlier) than they do.
          const found = find({ ...base, offsetMin });
          const error = Math.abs((found.timeShiftMin as number) + offsetMin);
          worst = Math.max(worst, error);
          expect(found.sure).toBe(true);
          expect(error).toBeLessThan(10);
          expect(blocked(found)).toHaveLength(1);
        }
    }
    console.log(`half-hour shifts: worst error ${worst} minutes`);
  }, 120_000);

  test('a file labelled an hour wrong is clean again once the minutes are added', async () => {
    let seen = 0;
    for (const name of names)
      for (const hours of [1, -1]) {
        const year = relabelled(await realYear(name), hours);
        const mended = find({ ...year, offsetMin: -60 * hours });
        expect(blocked(mended)).toEqual([]);
        expect(Math.abs(mended.timeShiftMin as number)).toBeLessThan(10);
        seen++;
      }
    expect(seen).toBeGreaterThanOrEqual(32);
  }, 60_000);

  test('components that were split from GHI by a wrong clock close perfectly, and the edges tell all the same', async () => {
    for (const name of ['AZ-Phoenix.tmy2.gz', 'WA-Seattle.tmy2.gz', '725650.tmy3.gz']) {
      const late = relabelled(await realYear(name), 1);
      const { cosZenith } = sunOf(late)(0);
      const dhi = late.ghi.map((v, h) => (cosZenith[h] > 0.1 ? 0.3 * v : v));
      const dni = late.ghi.map((v, h) => (cosZenith[h] > 0.1 ? (0.7 * v) / cosZenith[h] : 0));
      const found = find({ ...late, dni, dhi });
      expect(found.closure?.rmsWm2).toBeLessThan(0.001);
      expect(blocked(found).map((f) => f.code)).toEqual(['clock-shift']);
      expect(Math.abs((found.timeShiftMin as number) + 60)).toBeLessThan(20);
    }
  });

  test('the hemisphere exchanged is found in every file, from all components and from GHI alone, and blocks', async () => {
    let seen = 0;
    for (const name of names) {
      const year = await realYear(name);
      const place = { ...year.place, latitudeDeg: -year.place.latitudeDeg };
      for (const base of [year, globalOnly(year)]) {
        const [found, ...others] = blocked(find({ ...base, place }));
        expect([name, found?.code, others]).toEqual([name, 'day-too-long', []]);
        expect(found.fix).toContain(`latitude ${place.latitudeDeg.toFixed(2)}`);
        expect(found.fix).toContain('site: { latitude: ');
        expect(found.fix).toContain('weather: { accept_clock: true }');
        seen++;
      }
    }
    expect(seen).toBeGreaterThanOrEqual(32);
  }, 60_000);

  test('times left in UTC, many hours off, are found too', async () => {
    const phoenix = await realYear('AZ-Phoenix.tmy2.gz');
    const found = find(relabelled(phoenix, 7));
    expect(found.timeShiftMin).toBe(-420);
    expect(blocked(found)[0].fix).toContain('add_minutes: -420');
  });

  test('daylight saving time from April to October is told from a plain shift', async () => {
    for (const name of ['CO-Boulder.tmy2.gz', 'WA-Seattle.tmy2.gz', '722190.tmy3.gz']) {
      const year = await realYear(name);
      const summer = relabelled(year, 1);
      const saving = (a: Float64Array, b: Float64Array) =>
        a.map((v, h) => (h > 95 * 24 && h < 301 * 24 ? b[h] : v));
      for (const base of [
        {
          ...year,
          ghi: saving(year.ghi, summer.ghi),
          dni: saving(year.dni, summer.dni),
          dhi: saving(year.dhi, summer.dhi),
        },
      ])
        for (const filed of [base, globalOnly(base)]) {
          const found = find(filed);
          expect(blocked(found).map((f) => f.code)).toEqual(['clock-shift']);
          expect(blocked(found)[0].text).toContain('daylight saving');
        }
    }
  });

  test('what weather and hills do to a day raises no alarm: fog, storms, ridges, haze, a cloudy year', async () => {
    let seen = 0;
    for (const name of [
      'AZ-Phoenix.tmy2.gz',
      'WA-Seattle.tmy2.gz',
      'AK-Fairbanks.tmy2.gz',
      'FL-Miami.tmy2.gz',
      '725650.tmy3.gz',
    ]) {
      const year = await realYear(name);
      const sun = sunOf(year)(0);
      const rising = (h: number) => sun.cosZenith[(h + 1) % 8760] > sun.cosZenith[(h + 8759) % 8760];
      /** Light where `when` holds is `ghi`, of its former value. */
      const altered = (when: (h: number) => boolean, ghi: (h: number) => number) => ({
        ...year,
        ghi: year.ghi.map((v, h) => (when(h) ? ghi(h) : v)),
      });
      const low = (degrees: number) => (h: number) => sun.cosZenith[h] < Math.sin((degrees * Math.PI) / 180);
      const diffuse = (h: number) => 0.8 * year.dhi[h];
      const years = {
        'morning fog': altered(
          (h) => rising(h) && low(35)(h),
          (h) => 0.3 * year.ghi[h],
        ),
        'afternoon storms': altered(
          (h) => !rising(h),
          (h) => 0.5 * year.ghi[h],
        ),
        'a ridge of 12 degrees in the east': altered((h) => rising(h) && low(12)(h), diffuse),
        'a ridge of 20 degrees in the west': altered((h) => !rising(h) && low(20)(h), diffuse),
        'ridges on both sides': altered(low(15), diffuse),
        'a dark ridge of 8 degrees in the west': altered(
          (h) => !rising(h) && low(8)(h),
          () => 0,
        ),
        'a year under cloud': altered(() => true, diffuse),
        'a thermopile 3 W/m2 above zero': altered(
          () => true,
          (h) => year.ghi[h] + 3,
        ),
      };
      for (const [what, changed] of Object.entries(years)) {
        const found = find(globalOnly(changed));
        expect([what, blocked(found).map((f) => f.text)]).toEqual([what, []]);
        seen++;
      }
    }
    expect(seen).toBe(40);
  }, 60_000);

  test('an hour too late is still found behind a ridge on either side', async () => {
    const year = await realYear('AZ-Phoenix.tmy2.gz');
    const sun = sunOf(year)(0);
    const rising = (h: number) => sun.cosZenith[(h + 1) % 8760] > sun.cosZenith[(h + 8759) % 8760];
    for (const side of [true, false]) {
      const ghi = year.ghi.map((v, h) =>
        sun.cosZenith[h] < 0.17 && rising(h) === side ? 0.8 * year.dhi[h] : v,
      );
      for (const hours of [1, -1]) {
        const found = find(relabelled(globalOnly({ ...year, ghi }), hours));
        expect(blocked(found)).toHaveLength(1);
        expect(Math.sign(found.timeShiftMin as number)).toBe(-hours);
      }
    }
  });

  test('the two sorts of evidence agree: closure and edges within 8 minutes on every file', async () => {
    const both = await Promise.all(names.map((name) => realYear(name)));
    const [closure, edges] = [shifts(both), shifts(both.map(globalOnly))];
    for (const [i, name] of names.entries())
      expect([name, Math.abs((closure[i] as number) - (edges[i] as number)) < 8]).toEqual([name, true]);
  }, 60_000);
});

describe('the clock of an invented clear year', () => {
  const read = async (latitudeDeg: number, longitudeDeg = -103.25) => {
    const place = { latitudeDeg, longitudeDeg, elevationM: 200, utcOffsetH: -7 };
    const raw = await readWeather({ source: 'orlin.epw', bytes: bytesOf(writeEpw(inventedYear(place))) });
    return fillByClosure(raw, sunOf(raw)(raw.offsetMin));
  };

  test('fits from the equator to the polar circles, and an hour is found at all of them, in both hemispheres', async () => {
    for (const latitude of [-66, -55, -40, -20, 0, 20, 40, 55, 66]) {
      const year = await read(latitude);
      expect(blocked(find(year))).toEqual([]);
      for (const base of [year, globalOnly(year)])
        for (const hours of [1, -1]) {
          const found = find(relabelled(base, hours));
          expect(Math.abs((found.timeShiftMin as number) + 60 * hours)).toBeLessThan(20);
          expect(blocked(found)).toHaveLength(1);
        }
    }
  }, 60_000);

  test('labels read wrongly show as their minutes: hour-ending read as hour-start asks for 60 minutes less', async () => {
    const bytes = bytesOf(writeEpw(inventedYear()));
    for (const [label, shift] of [
      ['start', -60],
      ['middle', -30],
    ] as const) {
      const raw = await readWeather({ source: 'orlin.epw', bytes, label });
      const found = find(fillByClosure(raw, sunOf(raw)(raw.offsetMin)));
      expect(Math.abs((found.timeShiftMin as number) - shift)).toBeLessThanOrEqual(2);
    }
  });

  test('a label that would mend the clock is named beside the minutes, in its own direction only', async () => {
    const year = await read(41);
    const fix = (format: HourlyYear['format'], label: HourlyYear['label'], offsetMin: number): string =>
      blocked(find({ ...year, format, label, offsetMin }))[0].fix;
    // The hours truly begin at offset 0; said to begin an hour early they need 60 minutes, as start for end gives.
    expect(fix('table', 'end', -60)).toContain(
      'add_minutes: 60 } in the study (or weather: { label: start }, if the printed times mark the start of the hour)',
    );
    expect(fix('table', 'end', -30)).toContain('label: middle }');
    expect(fix('table', 'middle', -30)).toContain('label: start }');
    expect(fix('table', 'start', 60)).toContain('label: end }');
    expect(fix('EPW', 'start', 60)).toContain('label: end }');
    // No label lies beyond these, and a manual's own label is not open to doubt.
    expect(fix('table', 'end', 60)).not.toContain('label');
    expect(fix('table', 'start', -60)).not.toContain('label');
    expect(fix('EPW', 'end', -60)).not.toContain('label');
  });

  test('a table labelled at the start and read by the default is mended by the label that is named', async () => {
    const place = { latitudeDeg: 41, longitudeDeg: -103.25, elevationM: 200, utcOffsetH: -7 };
    const bytes = bytesOf(writeTable(inventedYear(place), { printedAfterMin: 0 }));
    const readAs = async (label: 'start' | null) => {
      const raw = await readWeather({ source: 'orlin.csv', bytes, table: TABLE_COLUMNS, place, label });
      return find(fillByClosure(raw, sunOf(raw)(raw.offsetMin)));
    };
    expect(blocked(await readAs(null))[0].fix).toContain('weather: { label: start }');
    expect(blocked(await readAs('start'))).toEqual([]);
  });

  test('a clock that fits by the minutes of the study says so', async () => {
    const year = await read(41);
    const said = (addedMin: number): string | undefined =>
      weatherFindings(year, sunOf(year), addedMin).findings.find((f) => f.code === 'clock-fits')?.text;
    expect(said(0)).toMatch(/^The clock fits the sun /);
    expect(said(60)).toMatch(/^With the 60 minutes that the study adds the clock fits the sun /);
    expect(said(-60)).toMatch(/^With the 60 minutes that the study takes off the clock fits the sun /);
  });

  test('minutes that the study has added already are counted in the advice', async () => {
    const year = await read(41);
    const found = weatherFindings({ ...year, offsetMin: 90 }, sunOf(year), 90);
    expect(found.timeShiftMin).toBe(-90);
    expect(blocked(found)[0].fix).toContain('add_minutes: 0 }');
  });

  test('the sun of another place does not fit at all: the wrong hemisphere is named', async () => {
    const year = await read(45);
    const wrong = { ...year, place: { ...year.place, latitudeDeg: -45 } };
    expect(blocked(find(wrong)).map((f) => f.code)).toEqual(['day-too-long']);
  });
});

test('an estimate within ten minutes of a whole or half hour is taken for it', () => {
  expect([57, 64, -52, 24, 38, 45, -45, 21, 105].map(likelyShiftMin)).toEqual([
    60, 60, -60, 30, 30, 45, -45, 30, 105,
  ]);
});
