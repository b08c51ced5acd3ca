import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import type { HourLabel } from '../../src/shared/index.ts';
import { readWeather } from '../../src/weather/index.ts';
import { Problems } from '../../src/weather/problems.ts';
import { unitConverter } from '../../src/weather/table-units.ts';
import {
  bytesOf,
  INVENTED_PLACE,
  inventedYear,
  TABLE_COLUMNS,
  writeTable,
} from '../support/weather-writers.ts';

const YEAR = inventedYear();
const readTable = (lines: readonly string[], more: object = {}) =>
  readWeather({
    source: 'orlin.csv',
    bytes: bytesOf(lines),
    table: TABLE_COLUMNS,
    place: INVENTED_PLACE,
    ...more,
  });

type Quantity = Parameters<typeof unitConverter>[0];
const convert = (quantity: Quantity, unit: string | null): ((v: number) => number) => {
  const problems = new Problems('t');
  const converter = unitConverter(quantity, { name: 'x', unit }, problems);
  problems.throwIfAny();
  return converter;
};

describe('units of a table', () => {
  // Hand arithmetic from the definitions: 1 Wh = 3600 J, 0 K = -273.15 C, 1 mile = 1609.344 m, 1 nautical mile = 1852 m.
  test.each<[Quantity, string | null, number, number]>([
    ['ghi', null, 812, 812],
    ['ghi', 'W/m2', 812, 812],
    ['ghi', 'W/m²', 812, 812],
    ['ghi', 'W m-2', 812, 812],
    ['dni', 'kW/m2', 0.812, 812],
    ['dhi', 'Wh/m2', 812, 812],
    ['dhi', 'kWh/m^2', 0.812, 812],
    ['ghi', 'kJ/m2', 3600, 1000],
    ['ghi', 'kJ/(m2 h)', 3600, 1000],
    ['ghi', 'MJ/m2', 3.6, 1000],
    ['ghi', 'MJ/m2/h', 3.6, 1000],
    ['temperature', null, 21, 21],
    ['temperature', '°C', 21, 21],
    ['temperature', 'degF', 212, 100],
    ['temperature', 'F', -40, -40],
    ['temperature', 'K', 273.15, 0],
    ['wind', null, 5, 5],
    ['wind', 'mph', 10, 4.4704],
    ['wind', 'km/h', 36, 10],
    ['wind', 'kn', 36, 18.52],
    ['wind', 'knots', 36, 18.52],
  ])('%s in %s: %d becomes %d', (quantity, unit, written, meant) => {
    expect(convert(quantity, unit)(written)).toBeCloseTo(meant, 9);
  });

  test('a unit of another quantity is refused with the units that fit', () => {
    for (const [quantity, unit] of [
      ['ghi', 'mph'],
      ['wind', 'W/m2'],
      ['temperature', 'm/s'],
      ['ghi', ''],
    ] as const)
      expect(() => convert(quantity, unit)).toThrow(/expected one of the units/);
  });

  test('the same year in kJ/m2 reads like the one in W/m2', async () => {
    const unit = (name: string) => ({ name, unit: 'kJ/m2' });
    const table = { ...TABLE_COLUMNS, ghi: unit('global'), dni: unit('beam'), dhi: unit('diffuse') };
    const got = await readTable(writeTable(YEAR, { factor: 3.6, delimiter: ';', decimalComma: true }), {
      table,
    });
    const worst = YEAR.ghi.reduce((w, v, h) => Math.max(w, Math.abs(v - got.ghi[h])), 0);
    expect(worst).toBeLessThan(1e-9);
  });

  test('conversions keep order and invert: property over every unit', () => {
    const ways: [Quantity, string][] = [
      ['ghi', 'kW/m2'], ['ghi', 'kJ/m2'], ['ghi', 'MJ/m2'], ['temperature', 'degF'], ['temperature', 'K'],
      ['wind', 'mph'], ['wind', 'km/h'], ['wind', 'kn'],
    ]; // biome-ignore format: one list
    fc.assert(
      fc.property(
        fc.constantFrom(...ways),
        fc.integer({ min: -500, max: 500 }),
        fc.integer({ min: 1, max: 100 }),
        ([q, u], a, d) => {
          const f = convert(q, u);
          expect(f(a + d)).toBeGreaterThan(f(a));
          // Affine: equal steps stay equal.
          expect(f(a + 2 * d) - f(a + d)).toBeCloseTo(f(a + d) - f(a), 6);
        },
      ),
    );
  });
});

describe('times of a table', () => {
  const minutesBefore: Record<HourLabel, number> = { end: 60, middle: 30, start: 0 };

  test.each<[HourLabel, number, number]>([
    ['end', 60, 0], // 01:00 is hour 0
    ['start', 0, 0], // 00:00 is hour 0
    ['middle', 30, 0],
    ['start', 60, 60], // 01:00 as a start: the year lies an hour later, hour 0 comes last
  ])(
    'label %s with the first row %i minutes after midnight puts every row at its hour',
    async (label, printedAfterMin) => {
      const got = await readTable(writeTable(YEAR, { printedAfterMin }), { label });
      const late = (printedAfterMin - minutesBefore[label]) / 60;
      const column = YEAR.ghi.map((_, h) => YEAR.ghi[(h - late + 8760) % 8760]);
      expect([got.label, got.offsetMin]).toEqual([label, 0]);
      expect([...got.ghi]).toEqual(column);
    },
  );

  test('a first row at 00:00 read as the end of its hour belongs to the last hour of the year', async () => {
    const got = await readTable(writeTable(YEAR, { printedAfterMin: 0 }));
    expect(got.ghi[8759]).toBe(YEAR.ghi[0]);
    expect([...got.ghi.slice(0, 8759)]).toEqual(YEAR.ghi.slice(1));
    expect(got.offsetMin).toBe(0);
    expect(got.calendarYear[364]).toBe(2021);
  });

  test('a half hour is carried by the offset without turning the year round', async () => {
    for (const [printedAfterMin, offsetMin] of [
      [0, -30],
      [60, 30],
    ]) {
      const got = await readTable(writeTable(YEAR, { printedAfterMin }), { label: 'middle' });
      expect(got.offsetMin).toBe(offsetMin);
      expect([...got.ghi]).toEqual(YEAR.ghi);
    }
  });

  test.each([
    ['$3.$2.$1', 'day.month.year'],
    ['$3/$2/$1', 'day/month/year'],
    ['$2/$3/$1', 'month/day/year'],
  ])('dates written %s are read as %s, which a note says', async (form, order) => {
    for (const delimiter of [',', ';', ' ']) {
      const lines = writeTable(YEAR, { delimiter }).map((line) =>
        line.replace(/^(\d{4})-(\d\d)-(\d\d)/, form),
      );
      const got = await readTable(lines);
      expect([...got.ghi]).toEqual(YEAR.ghi);
      expect(got.calendarYear[200]).toBe(2021);
      expect(got.notes.filter((n) => n.code === 'date-order').map((n) => [n.severity, n.text])).toEqual([
        ['note', `Dates were read as ${order}.`],
      ]);
    }
  });

  test('dates without leading zeros, and 24:00 beside dots, are understood', async () => {
    const lines = writeTable(YEAR).map((line) => {
      const found = /^(\d{4})-(\d\d)-(\d\d) (\d\d):00(.*)$/.exec(line);
      if (!found) return line;
      const [, year, month, day, hour, rest] = found;
      const noon = Date.UTC(Number(year), Number(month) - 1, Number(day));
      const when = new Date(hour === '00' ? noon - 86_400_000 : noon);
      const date = `${when.getUTCDate()}.${when.getUTCMonth() + 1}.${when.getUTCFullYear()}`;
      return `${date} ${hour === '00' ? 24 : Number(hour)}:00${rest}`;
    });
    expect(lines.filter((line) => line.includes(' 24:00'))).toHaveLength(365);
    expect([...(await readTable(lines)).ghi]).toEqual(YEAR.ghi);
  });

  test('24:00, slashes, the letter T and seconds are understood', async () => {
    const lines = writeTable(YEAR).map((line, i) => {
      if (i === 0) return line;
      const [when, ...rest] = line.split(',');
      const [date, time] = when.split(' ');
      if (time !== '00:00') return [`${date.replaceAll('-', '/')}T${time}:00`, ...rest].join(',');
      const before = new Date(Date.parse(`${date}T00:00Z`) - 86_400_000).toISOString().slice(0, 10);
      return [`${before} 24:00`, ...rest].join(',');
    });
    expect([...(await readTable(lines)).ghi]).toEqual(YEAR.ghi);
  });

  test('whatever the label and the minute, column element h begins 60 h + offset minutes after New Year', async () => {
    await fc.assert(
      fc.asyncProperty(
        fc.constantFrom<HourLabel>('end', 'middle', 'start'),
        fc.integer({ min: -90, max: 150 }),
        async (label, printedAfterMin) => {
          const got = await readTable(writeTable(YEAR, { printedAfterMin }), { label });
          // What was written as row 0 begins so many minutes after New Year by its label:
          const begins = printedAfterMin - minutesBefore[label];
          expect(Math.abs(got.offsetMin)).toBeLessThanOrEqual(30);
          const hour = (begins - got.offsetMin) / 60;
          expect(Number.isInteger(hour)).toBe(true);
          expect([...got.ghi]).toEqual(YEAR.ghi.map((_, h) => YEAR.ghi[(h - hour + 8760) % 8760]));
        },
      ),
      { numRuns: 12 },
    );
  });

  test('blank cells and signs for missing come back as missing light and bridged temperature, counted', async () => {
    const holes: Record<number, [number, string]> = {
      12: [1, ''],
      13: [2, '-999'],
      14: [4, '9999'],
      15: [4, ' '],
      16: [5, '-99'],
    };
    const lines = writeTable(YEAR).map((line, i) =>
      holes[i]
        ? line
            .split(',')
            .with(...holes[i])
            .join(',')
        : line,
    );
    const got = await readTable(lines);
    expect(Number.isNaN(got.ghi[11]) && Number.isNaN(got.dni[12])).toBe(true);
    const [before, after] = [YEAR.temperature[12], YEAR.temperature[15]];
    expect(got.temperatureC?.[13]).toBeCloseTo(before + (after - before) / 3, 12);
    expect(got.temperatureC?.[14]).toBeCloseTo(before + (2 * (after - before)) / 3, 12);
    expect(got.notes.map((n) => [n.code, n.severity])).toEqual([
      ['missing-codes', 'note'],
      ['temperature-gaps', 'note'],
      ['wind-gaps', 'note'],
    ]);
    expect(got.notes[0].text).toContain('3 cells');
    expect(got.notes[1].text).toContain('2 hours');
  });
});
