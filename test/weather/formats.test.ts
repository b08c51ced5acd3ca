import { gzipSync } from 'node:zlib';
import { expect, test } from 'vitest';
import type { HourLabel } from '../../src/shared/index.ts';
import { type RawYear, readWeather } from '../../src/weather/index.ts';
import {
  bytesOf,
  INVENTED_PLACE,
  inventedYear,
  TABLE_COLUMNS,
  type WrittenYear,
  writeEpw,
  writeTable,
  writeTmy2,
  writeTmy3,
} from '../support/weather-writers.ts';

const YEAR = inventedYear();
const read = (lines: readonly string[], more: object = {}): Promise<RawYear> =>
  readWeather({ source: 'orlin', bytes: bytesOf(lines), ...more });
const TABLE = { table: TABLE_COLUMNS, place: INVENTED_PLACE };

/** Every column of a year as read against the year as written; the formats hold these decimals exactly. */
const expectSame = (got: RawYear, want: WrittenYear, albedo: boolean): void => {
  const column = (a: Float64Array | null, b: number[], digits: number): void => {
    expect(a).toHaveLength(8760);
    const worst = b.reduce((w, v, h) => Math.max(w, Math.abs(v - (a as Float64Array)[h])), 0);
    expect(worst).toBeLessThan(10 ** -digits);
  };
  column(got.ghi, want.ghi, 9);
  column(got.dni, want.dni, 9);
  column(got.dhi, want.dhi, 9);
  column(got.temperatureC, want.temperature, 9);
  column(got.windMs, want.wind, 9);
  if (albedo) column(got.albedo, want.albedo, 9);
  else expect(got.albedo).toBeNull();
  expect(got.origin).toEqual({ ghi: 'given', dni: 'given', dhi: 'given' });
  expect(got.place.latitudeDeg).toBeCloseTo(want.place.latitudeDeg, 9);
  expect(got.place.longitudeDeg).toBeCloseTo(want.place.longitudeDeg, 9);
  expect(got.place.elevationM).toBe(want.place.elevationM);
  expect(got.place.utcOffsetH).toBe(want.place.utcOffsetH);
};

test('the invented year has days, seasons and no value twice everywhere', () => {
  expect(Math.max(...YEAR.ghi)).toBeGreaterThan(900);
  expect(YEAR.ghi.filter((v) => v > 0).length).toBeGreaterThan(4000);
  expect(Math.min(...YEAR.temperature)).toBeLessThan(-5); // negative temperatures are written differently in TMY2
  expect(new Set(YEAR.wind).size).toBeGreaterThan(30);
});

test('an EPW file gives back the year that was written', async () => {
  const got = await read(writeEpw(YEAR));
  expectSame(got, YEAR, true);
  expect(got.format).toBe('EPW');
  expect(got.station).toBe('Orlin Bench, XX, Nowhere');
  expect([got.label, got.offsetMin]).toEqual(['end', 0]);
  expect(got.calendarYear[0]).toBe(1995);
  expect(got.calendarYear[58]).toBe(2001); // 28 February
  expect(got.calendarYear[59]).toBe(1989); // 1 March
  expect(got.notes).toEqual([]);
  expect(got.line[0]).toBe(9);
});

test('a TMY2 file gives back the year that was written, its years read as 19xx', async () => {
  const years = YEAR.years.map((y) => 1961 + (y % 30));
  const got = await read(writeTmy2({ ...YEAR, years }));
  expectSame(got, YEAR, false);
  expect(got.format).toBe('TMY2');
  expect(got.station).toBe('ORLIN BENCH, XX');
  expect([...got.calendarYear].filter((_, d) => d % 31 === 0)[0]).toBe(years[0]);
  expect(got.calendarYear[364]).toBe(years[11]);
});

test.each([
  { delimiter: ',' as const, quoted: false, padded: true },
  { delimiter: ',' as const, quoted: false, padded: false },
  { delimiter: ',' as const, quoted: true, padded: true },
  { delimiter: '\t' as const, quoted: false, padded: true },
  { delimiter: '\t' as const, quoted: true, padded: false },
  { midnight: '0:00 same day' as const, padded: false },
  { midnight: '0:00 next day' as const, padded: false },
])('a TMY3 file gives back the year that was written: %o', async (style) => {
  const got = await read(writeTmy3(YEAR, style));
  expectSame(got, YEAR, true);
  expect(got.format).toBe('TMY3');
  expect(got.station).toBe('ORLIN BENCH, UPPER, XX');
  expect(got.calendarYear[40]).toBe(2001);
  expect(got.notes.map((n) => n.code)).toEqual('midnight' in style ? ['midnight-label'] : []);
});

test.each([
  { delimiter: ',' },
  { delimiter: ';' },
  { delimiter: '\t' },
  { delimiter: ' ' },
  { delimiter: '   ' },
  { delimiter: ';', decimalComma: true },
  { delimiter: '\t', decimalComma: true },
])('a plain table gives back the year that was written: %o', async (style) => {
  const got = await read(writeTable(YEAR, style), TABLE);
  expectSame(got, YEAR, false);
  expect(got.format).toBe('table');
  expect(got.offsetMin).toBe(0);
  expect(new Set(got.calendarYear)).toEqual(new Set([2021]));
});

test('quoted cells, comments above the header and unused columns do no harm to a table', async () => {
  const lines = writeTable(YEAR, { delimiter: ',' }).map((line, i) => {
    const cells = line.split(',');
    return [
      ...cells.map((c) => `"${i > 0 && c.includes('.') ? c.replace('.', ',') : c}"`),
      i === 0 ? 'remark' : '"a, b"',
    ].join(',');
  });
  expectSame(await read(['# invented', '', ...lines], TABLE), YEAR, false);
});

test('line ends of every sort, a byte order mark and gzip make no difference', async () => {
  const lines = writeEpw(YEAR);
  const mixed = lines.map((line, i) => line + ['\r\n', '\n', '\r'][i % 3]).join('');
  const encode = (text: string) => new TextEncoder().encode(text);
  const files = [
    bytesOf(lines, '\r\n'),
    bytesOf(lines, '\r'),
    encode(mixed),
    encode(`\ufeff${lines.join('\n')}`),
    new Uint8Array(gzipSync(bytesOf(lines))),
  ];
  for (const bytes of files) expectSame(await readWeather({ source: 'orlin.epw', bytes }), YEAR, true);
  expect(files).toHaveLength(5);
});

test('a name in Windows-1252 is read, with a note', async () => {
  const latin = Uint8Array.from(writeEpw(YEAR).join('\n').replace('Orlin Bench', 'Orl\u00e9n'), (c) =>
    c.charCodeAt(0),
  );
  const got = await readWeather({ source: 'orlen.epw', bytes: latin });
  expect(got.station).toContain('Orlén');
  expect(got.notes.map((n) => n.code)).toEqual(['encoding']);
});

test('without the columns that old EPW files lack, the rest is read and reflectance is absent', async () => {
  const lines = writeEpw(YEAR).map((line, i) => (i < 8 ? line : line.split(',').slice(0, 32).join(',')));
  expectSame(await read(lines), YEAR, false);
});

test('half and quarter hour zones are read', async () => {
  const place = { latitudeDeg: 27.7, longitudeDeg: 85.3, elevationM: 1337, utcOffsetH: 5.75 };
  const got = await read(writeEpw(inventedYear(place)));
  expect(got.place).toEqual(place);
});

test('what the study says of the place overrules the file, part by part', async () => {
  const place = { latitudeDeg: 40, longitudeDeg: null, utcOffsetH: -6.5 };
  const got = await read(writeEpw(YEAR), { place });
  expect(got.place).toEqual({ ...INVENTED_PLACE, latitudeDeg: 40, utcOffsetH: -6.5 });
});

test.each<[HourLabel, number]>([
  ['end', 0],
  ['middle', 30],
  ['start', 60],
])(
  'in EPW, TMY2 and TMY3 the label `%s` lets every hour begin %i minutes later than by its end',
  async (label, offset) => {
    for (const lines of [writeEpw(YEAR), writeTmy2(YEAR), writeTmy3(YEAR)]) {
      const got = await read(lines, { label });
      expect([got.label, got.offsetMin]).toEqual([label, offset]);
      expect([...got.ghi]).toEqual(YEAR.ghi);
    }
  },
);

test('columns named in the study are put aside for a file that is no table, with a note', async () => {
  const got = await read(writeEpw(YEAR), { table: TABLE_COLUMNS });
  expect(got.format).toBe('EPW');
  expect(got.notes.map((n) => n.code)).toEqual(['table-ignored']);
});

test('a minute field that is neither 0 nor 60 is noted and moves nothing', async () => {
  const lines = writeEpw(YEAR).map((line, i) => (i < 8 ? line : line.replace(/,60,/, ',30,')));
  const got = await read(lines);
  expect(got.offsetMin).toBe(0);
  expect(got.notes.map((n) => n.code)).toEqual(['minute-field']);
});
