import { expect, test } from 'vitest';
import { readSkylineFile } from '../../src/survey/index.ts';
import { problemsOf } from './refusals.ts';

const POINTS = [
  { azimuthDeg: 90, elevationDeg: 5 },
  { azimuthDeg: 120.5, elevationDeg: 12.25 },
];

test('a skyline file is read in any of its usual dresses', async () => {
  const dresses = [
    'bearing,elevation\n90,5\n120.5,12.25\n',
    '\uFEFFbearing,elevation\r\n90,5\r\n\r\n120.5,12.25',
    'Elevation; Bearing\n5; 90\n12.25; 120.5\n',
    'bearing\televation\n90\t5\n"120.5"\t12.25\n',
    'bearing;elevation\n90;5\n120,5;12,25\n',
    '\uFEFF\r\nelevation\tbearing\r\n5,0\t90\r\n12,25\t120,5\r\n',
  ];
  for (const text of dresses) expect(await readSkylineFile('hill.csv', text), text).toEqual(POINTS);
});

test('every problem of a file is told with its line', async () => {
  const text = 'bearing,elevation\n90,5\n400,5\nsouth,5\n\n100,95\n110,\n120,5,6\n130,"7,5"\n90,6\n';
  const problems = await problemsOf(() => readSkylineFile('hill.csv', text));
  expect(problems.map(({ line, code, file }) => [line, code, file])).toEqual([
    [3, 'wrong-bearing', 'hill.csv'],
    [4, 'not-a-number', 'hill.csv'],
    [6, 'wrong-elevation', 'hill.csv'],
    [7, 'not-a-number', 'hill.csv'],
    [8, 'column-count', 'hill.csv'],
    [9, 'not-a-number', 'hill.csv'],
    [10, 'two-elevations', 'hill.csv'],
  ]);
});

test('a comma beside a decimal point, or one that may divide columns, is not taken for a decimal comma', async () => {
  const mixed = await problemsOf(() =>
    readSkylineFile('hill.csv', 'bearing;elevation\n90;5.5\n120,5;12\n1,200;3\n'),
  );
  expect(mixed.map((p) => [p.code, p.line])).toEqual([
    ['not-a-number', 3],
    ['not-a-number', 4],
  ]);
  const commas = await problemsOf(() => readSkylineFile('hill.csv', 'bearing,elevation\n90,5,7,5\n'));
  expect(commas.map((p) => [p.code, p.line])).toContainEqual(['column-count', 2]);
  expect(commas.find((p) => p.code === 'column-count')?.fix).toContain('semicolons');
});

test('a file without header, without rows, with one point, empty or badly quoted is refused', async () => {
  const cases: [string, string, number | undefined][] = [
    ['90,5\n120,6\n', 'wrong-header', 1],
    ['bearing,elevation,note\n90,5,tree\n', 'wrong-header', 1],
    ['bearing,elevation\n', 'too-few-points', 1],
    ['bearing,elevation\n90,5\n', 'too-few-points', 2],
    ['', 'empty-file', undefined],
    ['bearing,elevation\n90,"5\n120,6\n', 'quoting', 3],
  ];
  for (const [text, code, line] of cases) {
    const problems = await problemsOf(() => readSkylineFile('hill.csv', text));
    expect(
      problems.map((p) => [p.code, p.line]),
      text,
    ).toEqual([[code, line]]);
    expect(problems[0].file).toBe('hill.csv');
  }
});
