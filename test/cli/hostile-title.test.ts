import { mkdtempSync, readFileSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { parse } from 'csv-parse/sync';
import { beforeAll, describe, expect, test } from 'vitest';
import { command, inventory, MOUNTS, type Outcome, put, SAMPLE_WEATHER } from './support.ts';

const TITLE =
  "=cmd|' /C calc'!A0 </script><img src=x onerror=alert(1)> | a\n# b\n[x](javascript:1) `c` \u001b[31m\u202e";
const LABEL = '=1+1 | <b>"bold"</b>\n,;\t@x';

describe('a title and a label full of signs are accepted and stay text', () => {
  let folder = '';
  let result: Outcome;
  const read = (name: string) => readFileSync(join(folder, 'r', name), 'utf8');

  beforeAll(async () => {
    folder = mkdtempSync(join(tmpdir(), 'trackworth-'));
    const study = {
      title: TITLE,
      weather: { file: SAMPLE_WEATHER },
      mounts: [
        { id: 'ground', kind: 'fixed-tilt', label: LABEL },
        { id: 'tracker', kind: 'single-axis' },
      ],
    };
    put(folder, { 'study.json': JSON.stringify(study) });
    result = await command(folder, 'compare', 'study.json', '--out', 'r');
    return () => rmSync(folder, { recursive: true });
  });

  test('the comparison runs', () => {
    expect([result.code, result.err]).toEqual([0, '']);
    expect(Object.keys(inventory(join(folder, 'r'))).length).toBeGreaterThan(10);
  });

  test('the screen obeys none of it: no control character, one line each', () => {
    expect(result.out).not.toMatch(/(?!\n)[\p{Cc}\u202a-\u202e]/u);
    expect(result.out).not.toMatch(/^# b/m);
    expect(Math.max(...result.out.split('\n').map((line) => line.length))).toBeLessThanOrEqual(100);
  });

  test('the memo shows them as text: no tag, no link, no heading, no table cell of theirs', () => {
    const memo = read('memo.md');
    expect(memo).not.toMatch(/(?<!\\)<(script|\/script|img|b|\/b)/);
    expect(memo).not.toMatch(/(?<!\\)\]\(javascript/);
    expect(memo).not.toMatch(/^# b/m);
    expect(memo).not.toMatch(/(?!\n)[\p{Cc}\u202a-\u202e]/u);
    // Every table row has as many unescaped bars as its heading's rule.
    let bars = 0;
    let rows = 0;
    for (const line of memo.split('\n')) {
      if (!line.startsWith('|')) bars = 0;
      else {
        const here = line.match(/(?<!\\)\|/g)?.length ?? 0;
        if (bars > 0) expect(here).toBe(bars);
        bars = here;
        rows++;
      }
    }
    expect(rows).toBeGreaterThan(20);
  });

  test('no cell of a table begins like a formula', () => {
    for (const name of ['data/mounts.csv', 'data/monthly.csv']) {
      const rows: string[][] = parse(read(name));
      expect(rows.length).toBeGreaterThan(2);
      for (const cell of rows.flat())
        if (!/^[-+]?[\d.]+(e[-+]?\d+)?$/i.test(cell)) expect(cell).not.toMatch(/^[=+\-@\t\r]/);
    }
  });

  test('the results file keeps them to the letter', () => {
    const results = JSON.parse(read('results.json'));
    expect(results.title).toBe(TITLE);
  });

  test('no chart has an element or a handler of theirs', () => {
    const charts = Object.keys(inventory(join(folder, 'r'))).filter((name) => name.endsWith('.svg'));
    expect(charts.length).toBeGreaterThanOrEqual(4);
    for (const name of charts) {
      const tags = [...read(name).matchAll(/<\/?([a-zA-Z]+)/g)].map(([, tag]) => tag.toLowerCase());
      expect(tags).not.toContain('script');
      expect(tags).not.toContain('img');
      expect(tags).not.toContain('b');
      expect(read(name)).not.toMatch(/<[^>]*\son[a-z]+=/);
    }
  });
});

test('a title that is nothing but signs gives a folder of a plain name', async () => {
  const folder = mkdtempSync(join(tmpdir(), 'trackworth-'));
  put(folder, {
    's.yaml': `title: "../.."\nweather: { file: ${JSON.stringify(SAMPLE_WEATHER)} }\n${MOUNTS}`,
  });
  const { code, out } = await command(folder, 'compare', 's.yaml', '--no-charts');
  expect(code).toBe(0);
  expect(out).toContain('study-report/memo.md');
  rmSync(folder, { recursive: true });
});
