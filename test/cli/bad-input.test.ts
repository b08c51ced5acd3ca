import { describe, expect, test } from 'vitest';
import { BAD_STUDIES, BAD_USAGE, BAD_WEATHER, type BadCase } from './bad-cases.ts';
import { BAD_SURVEY_USAGE, BAD_SURVEYS } from './bad-survey.ts';
import { command, inventory, put, simplestStudy, tempFolder } from './support.ts';

/** Control characters other than the line end, and marks that turn the reading direction. */
const UNPRINTABLE = /(?!\n)[\p{Cc}\u202a-\u202e]/u;

const refused =
  ({ files, args = ['compare', 'study.yaml'], code, says }: BadCase) =>
  async () => {
    const cwd = put(tempFolder(), files);
    const before = inventory(cwd);
    const result = await command(cwd, ...args);
    expect(result.err).not.toContain('fault of trackworth');
    expect(result.code).toBe(code);
    for (const words of says) {
      if (typeof words === 'string') expect(result.err).toContain(words);
      else expect(result.err).toMatch(words);
    }
    expect(result.out).toBe('');
    // Readable: no stack, no terminal codes, no endless line.
    expect(result.err).not.toMatch(/\n\s+at |node:/);
    expect(result.err).not.toMatch(UNPRINTABLE);
    expect(Math.max(...result.err.split('\n').map((line) => line.length))).toBeLessThan(400);
    expect(inventory(cwd)).toEqual(before);
  };

describe('a wrong study ends with exit code 3, its place and what to do, and nothing written', () => {
  test.each(BAD_STUDIES)('$title', (bad) => refused(bad)());
});

describe('a wrong weather file ends with exit code 3, its place and what to do, and nothing written', () => {
  test.each(BAD_WEATHER)('$title', (bad) => refused(bad)());
});

describe('wrong readings and skylines end with exit code 3, their place and what to do, and nothing written', () => {
  test.each(BAD_SURVEYS)('$title', (bad) => refused(bad)());
});

describe('wrong usage ends with exit code 2 and a way on', () => {
  test.each([...BAD_USAGE, ...BAD_SURVEY_USAGE])('$title', (bad) => refused(bad)());
});

test('all problems of a study are reported together, in the order of its lines, under one heading', async () => {
  const cwd = put(tempFolder(), {
    'study.yaml':
      'title: x\nsite: { latitude: 95, longitude: 300 }\nweather: { fil: a.epw }\nmounts:\n  - { id: a, kind: roof }\n',
  });
  const { code, err } = await command(cwd, 'compare', 'study.yaml');
  expect(code).toBe(3);
  const lines = err.trimEnd().split('\n');
  expect(lines[0]).toMatch(/^study\.yaml has [4-6] problems:$/);
  const places = lines.slice(1).map((line) => Number(/^ {2}study\.yaml:(\d+):\d+ /.exec(line)?.[1]));
  expect(places.length).toBeGreaterThanOrEqual(4);
  expect(places).toEqual(places.toSorted((a, b) => a - b));
  expect(err).toContain('site.latitude');
  expect(err).toContain('site.longitude');
  expect(err).toContain('Did you mean file?');
});

test('the same wrong value is exit 2 on the command line and exit 3 in a study', async () => {
  const cwd = put(tempFolder(), { 'study.yaml': simplestStudy(undefined, 'site: { latitude: 95 }\n') });
  expect((await command(cwd, 'weather', 'study.yaml', '--latitude', '95')).code).toBe(2);
  expect((await command(cwd, 'weather', 'study.yaml')).code).toBe(3);
});

test('what a terminal would obey is taken out of messages', async () => {
  const { code, err } = await command(tempFolder(), 'compare', 'a\u001b[31m\u202eb.yaml');
  expect(code).toBe(3);
  expect(err).toContain('.yaml');
  expect(err).not.toMatch(UNPRINTABLE);
});
