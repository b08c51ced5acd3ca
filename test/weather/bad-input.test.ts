import { gzipSync } from 'node:zlib';
import { expect, test } from 'vitest';
import { TrackworthError } from '../../src/shared/index.ts';
import { readWeather, type WeatherInput } from '../../src/weather/index.ts';
import {
  bytesOf,
  INVENTED_PLACE,
  inventedYear,
  TABLE_COLUMNS,
  writeEpw,
  writeTable,
  writeTmy2,
  writeTmy3,
} from '../support/weather-writers.ts';

const YEAR = inventedYear();
const EPW = writeEpw(YEAR);
const TMY2 = writeTmy2(YEAR);
const TMY3 = writeTmy3(YEAR);
const TABLE = writeTable(YEAR);
const STUDY = { table: TABLE_COLUMNS, place: INVENTED_PLACE };

/** The error that reading ends in; fails where it does not, or where it is not an input error. */
const errorOf = async (bytes: Uint8Array, more: Partial<WeatherInput> = {}): Promise<TrackworthError> => {
  const error = await readWeather({ source: 'orlin.dat', bytes, ...more }).then(
    () => null,
    (e: unknown) => e,
  );
  expect(error).toBeInstanceOf(TrackworthError);
  const trouble = error as TrackworthError;
  expect([trouble.kind, trouble.exitCode]).toEqual(['input', 3]);
  for (const p of trouble.problems) expect(p.file).toBe('orlin.dat');
  return trouble;
};
const errorIn = (lines: readonly string[], more: Partial<WeatherInput> = {}) => errorOf(bytesOf(lines), more);
const codes = (error: TrackworthError): string[] => error.problems.map((p) => p.code);

/** A copy with one line changed. */
const change = (lines: readonly string[], index: number, edit: (line: string) => string): string[] =>
  lines.map((line, i) => (i === index ? edit(line) : line));
const setCell = (lines: readonly string[], index: number, cell: number, text: string): string[] =>
  change(lines, index, (line) => line.split(',').with(cell, text).join(','));

test('an empty file, and one of blank lines, is called empty', async () => {
  for (const text of ['', '\n \r\n']) {
    const error = await errorOf(new TextEncoder().encode(text));
    expect(codes(error)).toEqual(['empty-file']);
  }
});

test('a binary file is called binary', async () => {
  const error = await errorOf(Uint8Array.from({ length: 4000 }, (_, i) => (i * 37) % 256));
  expect(codes(error)).toEqual(['binary-file']);
});

test('a gzip file that is cut short or damaged is called corrupt', async () => {
  const whole = new Uint8Array(gzipSync(bytesOf(EPW)));
  const damaged = whole.slice();
  damaged.fill(85, 3000, 3400);
  for (const bytes of [whole.slice(0, 20_000), damaged, whole.slice(0, 2)])
    expect(codes(await errorOf(bytes))).toEqual(['corrupt-gzip']);
});

test('a small gzip file that unpacks to something huge is refused before it fills the memory', async () => {
  const error = await errorOf(new Uint8Array(gzipSync(new Uint8Array(70e6).fill(32))));
  expect(codes(error)).toEqual(['too-large']);
});

test('a file of no known format says how it begins and how to have a table read', async () => {
  const error = await errorIn(TABLE);
  expect(codes(error)).toEqual(['unknown-format']);
  expect(error.message).toContain('begins with "when,global,beam');
  expect(error.message).toContain('none of EPW, TMY2, TMY3');
  expect(error.message).toContain('weather.table');
});

test.each([
  ['EPW', EPW, 8],
  ['TMY2', TMY2, 1],
  ['TMY3', TMY3, 2],
  ['table', TABLE, 1],
] as const)(
  'a %s year that stops early says how many rows there are and which is the last',
  async (_, lines, header) => {
    const error = await errorIn(lines.slice(0, header + 5000), STUDY);
    expect(codes(error)).toEqual(['truncated-year']);
    expect(error.problems[0].line).toBe(header + 5000);
    // Row 5000 is hour 4999: day 208 (28 July), the hour from 07:00.
    expect(error.message).toContain(
      'expected 8,760 hourly rows, found 5,000, of which the last is the hour from 28 Jul 07:00',
    );
  },
);

test('a header without rows is told apart from a year that stops early', async () => {
  for (const lines of [EPW.slice(0, 8), TMY2.slice(0, 1), TMY3.slice(0, 2), TABLE.slice(0, 1)])
    expect(codes(await errorIn(lines, STUDY))).toEqual(['no-data']);
});

test('a missing hour, a repeated one and two that changed places are found with their lines, all in one go', async () => {
  for (const [lines, header, study] of [
    [EPW, 8, {}],
    [TMY2, 1, {}],
    [TMY3, 2, {}],
    [TABLE, 1, STUDY],
  ] as const) {
    const rows = lines.slice(header);
    const bad = [
      ...lines.slice(0, header),
      ...rows.slice(0, 100),
      ...rows.slice(103, 200),
      rows[199],
      ...rows.slice(200, 300),
      rows[301],
      rows[300],
      ...rows.slice(302),
    ];
    const error = await errorIn(bad, study);
    expect(codes(error)).toEqual(['missing-hours', 'duplicate-hour', 'missing-hours', 'hour-out-of-order']);
    expect(error.problems.map((p) => p.line)).toEqual([
      header + 101,
      header + 198,
      header + 299,
      header + 300,
    ]);
    expect(error.problems[0].found).toContain('3 hours are missing');
    expect(error.problems[0].expected).toBe('the hour from 5 Jan 04:00');
  }
});

test('a row with too few or too many columns is named with both numbers', async () => {
  const cut = (line: string) => line.slice(0, line.lastIndexOf(','));
  const epw = await errorIn(change(change(EPW, 20, cut), 30, (line) => `${line},7`));
  expect(epw.problems.map((p) => [p.code, p.line, p.expected, p.found])).toEqual([
    ['column-count', 21, '35 columns', '34'],
    ['column-count', 31, '35 columns', '36'],
  ]);
  expect(codes(await errorIn(change(TMY3, 20, cut)))).toEqual(['column-count']);
  expect(codes(await errorIn(change(TABLE, 20, cut), STUDY))).toEqual(['column-count']);
  const tmy2 = await errorIn(change(TMY2, 20, (line) => line.slice(0, 140)));
  expect(tmy2.problems.map((p) => [p.code, p.line, p.found])).toEqual([['column-count', 21, '140']]);
  const quoted = writeTmy3(YEAR, { quoted: true });
  expect((await errorIn(change(quoted, 20, cut))).problems.map((p) => [p.code, p.line])).toEqual([
    ['column-count', 21],
  ]);
});

test.each(['abc', 'NaN', 'Infinity', '0x1F', '1e', '1.2.3', '12 W'])(
  '`%s` in place of a number is named with line and column',
  async (text) => {
    const epw = await errorIn(setCell(setCell(EPW, 40, 13, text), 60, 6, text));
    expect(epw.problems.map((p) => [p.code, p.line, p.field, p.found])).toEqual([
      ['not-a-number', 41, 'global horizontal radiation', JSON.stringify(text)],
      ['not-a-number', 61, 'dry bulb temperature', JSON.stringify(text)],
    ]);
    expect((await errorIn(setCell(TMY3, 40, 3, text))).problems.map((p) => [p.line, p.field])).toEqual([
      [41, 'ghi'],
    ]);
    expect(
      (await errorIn(setCell(TABLE, 40, 1, text), STUDY)).problems.map((p) => [p.line, p.field]),
    ).toEqual([[41, 'global']]);
  },
);

test('text in a TMY2 field is named with line and character', async () => {
  const error = await errorIn(change(TMY2, 40, (line) => `${line.slice(0, 17)}12x4${line.slice(21)}`));
  expect(error.problems.map((p) => [p.code, p.line, p.column, p.found])).toEqual([
    ['not-a-number', 41, 18, '"12x4"'],
  ]);
});

test('dates that are no dates are named, and cause no other complaint', async () => {
  const bad = [
    errorIn(setCell(EPW, 40, 1, '13')),
    errorIn(setCell(EPW, 40, 3, '25')),
    errorIn(change(TMY2, 40, (line) => ` 9513${line.slice(5)}`)),
    errorIn(setCell(TMY3, 40, 0, '1995-01-02')),
    errorIn(setCell(TMY3, 40, 1, '7:30')),
  ];
  for (const error of await Promise.all(bad)) expect(codes(error)).toEqual(['bad-date']);
  for (const text of ['2021-02-30 15:00', '2021-01-02 15:00Z', '2.1.2021 15:00', ''])
    expect(codes(await errorIn(setCell(TABLE, 40, 0, text), STUDY))).toEqual(['bad-time']);
});

test('a leap year of 8,784 rows is refused, saying why', async () => {
  const leap = (lines: readonly string[], header: number, rename: (line: string) => string): string[] => {
    const at = header + 59 * 24;
    const extra = lines.slice(at, at + 24).map(rename); // 1 March, renamed
    return [...lines.slice(0, at), ...extra, ...lines.slice(at)];
  };
  const errors = [
    await errorIn(leap(EPW, 8, (line) => line.split(',').with(1, '2').with(2, '29').join(','))),
    await errorIn(leap(TMY2, 1, (line) => `${line.slice(0, 3)}0229${line.slice(7)}`)),
    await errorIn(leap(TMY3, 2, (line) => line.replace('03/01/', '02/29/'))),
    await errorIn(
      leap(TABLE, 1, (line) => line.replace(/2021-03-0[12]/, '2020-02-29')),
      STUDY,
    ),
  ];
  for (const error of errors) {
    expect(codes(error)).toEqual(['leap-year']);
    expect(error.message).toContain('8,784 rows');
    expect(error.message).toContain('Leap years are not read yet');
  }
});

test('two years, and half-hourly rows, are refused with one sentence', async () => {
  expect(codes(await errorIn([...TABLE, ...TABLE.slice(1)], STUDY))).toEqual(['too-many-rows']);
  const halves = TABLE.flatMap((line, i) => (i === 0 ? [line] : [line, line.replace(':00', ':30')]));
  expect(codes(await errorIn(halves, STUDY))).toEqual(['not-hourly']);
  const fourAnHour = change(EPW, 7, (line) => line.replace('PERIODS,1,1', 'PERIODS,1,4'));
  expect(codes(await errorIn(fourAnHour))).toEqual(['not-hourly']);
  const uneven = setCell(TABLE, 40, 0, '2021-01-02 16:10');
  expect(codes(await errorIn(uneven, STUDY))).toEqual(['uneven-time']);
});

test('an EPW file without its last header line is refused', async () => {
  expect(codes(await errorIn(EPW.filter((line) => !line.startsWith('DATA PERIODS'))))).toEqual([
    'no-data-periods',
  ]);
});

test('a TMY3 file without DNI is refused with the column that it lacks', async () => {
  const lines = change(TMY3, 1, (line) => line.replace('DNI (W/m^2)', 'Beam'));
  const error = await errorIn(lines);
  expect(error.problems.map((p) => [p.code, p.line, p.field])).toEqual([['missing-column', 2, 'dni']]);
});

test('columns that a table lacks are named together, the nearest first', async () => {
  const table = {
    ...TABLE_COLUMNS,
    ghi: { name: 'globl', unit: null },
    wind: { name: 'wnd', unit: 'furlong' },
  };
  const error = await errorIn(TABLE, { ...STUDY, table });
  expect(error.problems.map((p) => [p.code, p.field])).toEqual([
    ['unknown-unit', 'weather.table.wind'], // it stands in the study, on no line of this file
    ['no-such-column', 'weather.table.ghi'],
    ['no-such-column', 'weather.table.wind'],
  ]);
  expect(error.problems[1].found).toMatch(/^the columns "global", /);
  expect(error.problems[0].expected).toContain('m/s, km/h, mph, kn');
});

test('a column name that a table has twice is refused', async () => {
  const twice = change(TABLE, 0, (line) => line.replace('beam', 'global'));
  const table = { ...TABLE_COLUMNS, dni: null };
  expect(codes(await errorIn(twice, { ...STUDY, table }))).toEqual(['ambiguous-column']);
});

test('latitude 95 and other impossible parts of a place are named with what may stand there', async () => {
  const epw = await errorIn(change(EPW, 0, () => 'LOCATION,a,b,c,d,e,95,-200,-7,x'));
  expect(epw.problems.map((p) => [p.code, p.line, p.field])).toEqual([
    ['impossible-place', 1, 'site.latitude'],
    ['impossible-place', 1, 'site.longitude'],
    ['impossible-place', 1, 'site.elevation'],
  ]);
  expect(epw.problems[0].expected).toContain('-90 to 90');
  const study = await errorIn(EPW, { place: { utcOffsetH: 15 } });
  expect(study.problems.map((p) => [p.code, p.line, p.field])).toEqual([
    ['impossible-place', undefined, 'site.utc_offset'],
  ]);
});

test('a table whose place nobody states is refused, part by part', async () => {
  const error = await errorIn(TABLE, { table: TABLE_COLUMNS, place: { elevationM: 12 } });
  expect(error.problems.map((p) => [p.code, p.field])).toEqual([
    ['missing-place', 'site.latitude'],
    ['missing-place', 'site.longitude'],
    ['missing-place', 'site.utc_offset'],
  ]);
});

test('troubles of different sorts are reported together: a wrong place, a bad number and a lost hour', async () => {
  const bad = setCell(
    change(EPW, 0, () => 'LOCATION,a,b,c,d,e,95,10,0,0'),
    50,
    13,
    'x',
  ).filter((_, i) => i !== 90);
  expect(codes(await errorIn(bad)).sort()).toEqual(['impossible-place', 'missing-hours', 'not-a-number']);
});

test('of a trouble that repeats in a column three lines are told and the others counted, in every format', async () => {
  const wholeBody = (lines: readonly string[], header: number, edit: (line: string) => string) =>
    lines.map((line, i) => (i < header ? line : edit(line)));
  const bad = (cell: number) => (line: string) => line.split(',').with(cell, '?').join(',');
  const cases = [
    ['EPW', wholeBody(EPW, 8, bad(13)), 8, 'not-a-number'],
    ['TMY2', wholeBody(TMY2, 1, (line) => `${line.slice(0, 17)}12x4${line.slice(21)}`), 1, 'not-a-number'],
    ['TMY3', wholeBody(TMY3, 2, bad(0)), 2, 'bad-date'],
    ['table', wholeBody(TABLE, 1, bad(0)), 1, 'bad-time'],
    ['table', wholeBody(TABLE, 1, (line) => `${line},7`), 1, 'column-count'],
  ] as const;
  for (const [format, lines, header, code] of cases) {
    const error = await errorIn(lines, STUDY);
    expect(codes(error), format).toEqual([code, code, code, code]);
    expect(error.problems.map((p) => p.line)).toEqual([1, 2, 3, 4].map((row) => header + row));
    // 8,760 rows less the three that are told.
    expect(error.problems[3].found).toBe(`8,757 more lines like these, ${header + 4} to ${header + 8760}`);
    expect(error.message.split('\n')).toHaveLength(4);
  }
});

test('four of a kind are told one by one, and five as three and two', async () => {
  const withBad = (n: number) =>
    errorIn(EPW.map((line, i) => (i >= 100 && i < 100 + n ? line.split(',').with(13, '?').join(',') : line)));
  expect((await withBad(4)).problems.map((p) => p.found)).toEqual(Array(4).fill('"?"'));
  expect((await withBad(5)).problems.map((p) => p.found)).toEqual([
    '"?"',
    '"?"',
    '"?"',
    '2 more lines like these, 104 to 105',
  ]);
});

test('of many sorts of trouble the message spells out ten and counts the rest, which the list carries', async () => {
  const bad = EPW.map((line, i) =>
    i >= 100 && i < 124
      ? [6, 13, 14, 15].reduce((cells, cell) => cells.with(cell, '?'), line.split(',')).join(',')
      : line,
  );
  const error = await errorIn(bad);
  expect(error.problems).toHaveLength(16); // four columns: three lines and the count of the others each
  expect(error.message.split('\n')).toHaveLength(11);
  // Told are the first ten in the file's order: lines 101 and 102 of all four columns and two of line 103. Of 96, 86 are left.
  expect(error.message).toMatch(/\nand 86 more$/);
});

test('a table that turns day and month round is refused with both lines', async () => {
  const slashed = TABLE.map((line) => line.replace(/^(\d{4})-(\d\d)-(\d\d)/, '$2/$3/$1'));
  const error = await errorIn(
    change(slashed, 500, (line) => line.replace('01/21/2021', '21/01/2021')),
    STUDY,
  );
  // 13 January, the first day that tells, begins below line 1 + 12 x 24 with the row of 00:00.
  expect(error.problems.map((p) => [p.code, p.line])).toEqual([
    ['mixed-dates', 501],
    ['bad-time', 501],
  ]);
  expect(error.problems[0].found).toBe('the day first here and last in line 289');
});

test('a stray quotation mark is named with its line', async () => {
  const error = await errorIn(change(TMY3, 50, (line) => line.replace(',1,', ',"1,')));
  expect(codes(error)).toContain('quoting');
});
