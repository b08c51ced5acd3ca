import { existsSync, mkdirSync, readdirSync, readFileSync, symlinkSync } from 'node:fs';
import { join } from 'node:path';
import { describe, expect, test } from 'vitest';
import { checkReportFolder, writeReportFolder } from '../../src/cli/report-folder.ts';
import { reportFolderName } from '../../src/cli/report-name.ts';
import { REPORT_MARKER } from '../../src/report/index.ts';
import { command, inventory, put, simplestStudy, tempFolder } from './support.ts';

const compare = (cwd: string, ...more: string[]) =>
  command(cwd, 'compare', 'study.yaml', '--no-charts', ...more);
const withStudy = () => put(tempFolder(), { 'study.yaml': simplestStudy() });

describe('the name of the folder', () => {
  test.each([
    ['Orlin Bench', 'orlin-bench-report'],
    ['../../etc/passwd', 'etc-passwd-report'],
    ['..', 'study-report'],
    ['', 'study-report'],
    ['   \n\t', 'study-report'],
    ['</script>', 'script-report'],
    ['=1+1|x\ny', '1-1-x-y-report'],
    ['C:\\Windows\\CON', 'c-windows-con-report'],
    ['CON', 'con-report'],
    ['nul.txt', 'nul-txt-report'],
    ['.hidden', 'hidden-report'],
    ['-rf', 'rf-report'],
    ['Größe 東京', 'größe-東京-report'],
    ['a\u0000b', 'a-b-report'],
  ])('of %j is %j', (title, name) => {
    expect(reportFolderName(title)).toBe(name);
  });

  test('is short enough for every file system, in whatever script, and never ends inside a letter', () => {
    for (const letter of ['x', 'ß', '東', '𝒜']) {
      const name = reportFolderName(letter.repeat(500));
      expect(Buffer.byteLength(name)).toBeLessThanOrEqual(255);
      expect(name).not.toMatch(/\p{Cs}/u);
    }
  });
});

test('a report goes to the folder named after the title, and the screen says where', async () => {
  const cwd = withStudy();
  const { code, out, err } = await compare(cwd);
  expect([code, err]).toEqual([0, '']);
  expect(out).toMatch(/^Report +orlin-bench-report\/memo\.md$/m);
  expect(Object.keys(inventory(join(cwd, 'orlin-bench-report')))).toEqual([
    REPORT_MARKER, 'data/', 'data/monthly.csv', 'data/mounts.csv', 'memo.md', 'results.json',
  ]); // biome-ignore format: one list
  expect(readdirSync(cwd).sort()).toEqual(['orlin-bench-report', 'study.yaml']);
});

test('with charts it holds an SVG and a specification of each, and the memo links to every SVG', async () => {
  const cwd = withStudy();
  expect((await command(cwd, 'compare', 'study.yaml')).code).toBe(0);
  const report = join(cwd, 'orlin-bench-report');
  const charts = readdirSync(join(report, 'charts'));
  const drawn = charts.filter((name) => name.endsWith('.svg'));
  expect(drawn.length).toBeGreaterThanOrEqual(4);
  expect(charts.sort()).toEqual(drawn.flatMap((name) => [name, name.replace('.svg', '.vl.json')]).sort());
  const memo = readFileSync(join(report, 'memo.md'), 'utf8');
  for (const name of drawn) {
    expect(memo).toContain(`charts/${name}`);
    expect(readFileSync(join(report, 'charts', name), 'utf8')).toMatch(/^<svg.*<\/svg>\s*$/s);
    const spec = JSON.parse(readFileSync(join(report, 'charts', name.replace('.svg', '.vl.json')), 'utf8'));
    expect(spec.$schema).toContain('vega-lite');
  }
});

test('a second run gives the same bytes', async () => {
  const cwd = withStudy();
  const first = await command(cwd, 'compare', 'study.yaml');
  const files = inventory(cwd);
  const second = await command(cwd, 'compare', 'study.yaml');
  expect(second).toEqual(first);
  expect(inventory(cwd)).toEqual(files);
});

test('the memo carries the checksums of study and weather', async () => {
  const cwd = withStudy();
  await compare(cwd);
  const memo = readFileSync(join(cwd, 'orlin-bench-report/memo.md'), 'utf8');
  expect(memo).toContain(inventory(cwd)['study.yaml']);
});

test('--out names the folder, which may lie in folders yet to be made', async () => {
  const cwd = withStudy();
  const { code, out } = await compare(cwd, '--out', 'reports/one/site');
  expect(code).toBe(0);
  expect(out).toContain('reports/one/site/memo.md');
  expect(existsSync(join(cwd, 'reports/one/site/results.json'))).toBe(true);
});

test('an empty folder is used, and an earlier report is replaced whole', async () => {
  const cwd = withStudy();
  mkdirSync(join(cwd, 'r'));
  expect((await compare(cwd, '--out', 'r')).code).toBe(0);
  put(cwd, { 'r/data/stale.csv': 'old', 'r/memo.md': 'old' });
  expect((await compare(cwd, '--out', 'r')).code).toBe(0);
  expect(existsSync(join(cwd, 'r/data/stale.csv'))).toBe(false);
  expect(readFileSync(join(cwd, 'r/memo.md'), 'utf8')).not.toBe('old');
  expect(readdirSync(cwd).sort()).toEqual(['r', 'study.yaml']);
});

describe('an output that cannot be written is exit 4, and nothing changes', () => {
  test.each([
    ['a folder with files of someone else', { 'out/mine.txt': 'x' }, 'out', 'something else'],
    [
      'a folder whose marker is someone else’s',
      { [`out/${REPORT_MARKER}`]: 'other program' },
      'out',
      'something else',
    ],
    ['a file', { out: 'x' }, 'out', 'a file'],
    ['a path below a file', { out: 'x' }, 'out/deep/report', 'leads through a file'],
    ['a place where no folder can be made', {}, '/proc/trackworth/report', 'found'],
    ['a device', {}, '/dev/null', 'a file'],
    ['a name that is too long', {}, 'x'.repeat(300), 'too long'],
    [
      'the folder that the study lies in',
      { [`out/${REPORT_MARKER}`]: 'trackworth report folder\n' },
      'out',
      'in use',
    ],
  ] as const)('%s', async (title, files, out, says) => {
    const cwd = put(withStudy(), files as Record<string, string>);
    if (title.includes('study lies in')) put(cwd, { 'out/study.yaml': simplestStudy() });
    const before = inventory(cwd);
    const study = title.includes('study lies in') ? 'out/study.yaml' : 'study.yaml';
    const result = await command(cwd, 'compare', study, '--no-charts', '--out', out);
    expect(result.code).toBe(4);
    expect(result.err).toContain(says);
    expect(result.err).not.toContain('fault of trackworth');
    expect(result.out).toBe('');
    expect(inventory(cwd)).toEqual(before);
  });

  test('a report that fails while it is written leaves the earlier one, and nothing half done', () => {
    const cwd = tempFolder();
    const target = checkReportFolder(join(cwd, 'r'), 'r', []);
    writeReportFolder(
      target,
      new Map([
        [REPORT_MARKER, 'trackworth report folder\n'],
        ['memo.md', 'first'],
      ]),
    );
    const before = inventory(cwd);
    // memo.md cannot be a file and a folder at once: the write fails in the middle.
    const broken = new Map([
      ['memo.md', 'second'],
      ['memo.md/inside', 'x'],
    ]);
    expect(() => writeReportFolder(target, broken)).toThrow(/found/);
    expect(inventory(cwd)).toEqual(before);
    const elsewhere = checkReportFolder(join(cwd, 'new/deep/r'), 'new/deep/r', []);
    expect(() => writeReportFolder(elsewhere, broken)).toThrow(/found/);
    expect(inventory(cwd)).toEqual(before);
  });
});

test('a report is not replaced under the feet of a user who stands in it', async () => {
  const cwd = withStudy();
  expect((await compare(cwd, '--out', 'r')).code).toBe(0);
  const before = inventory(cwd);
  const inside = await command(join(cwd, 'r'), 'compare', '../study.yaml', '--no-charts', '--out', '.');
  expect(inside.code).toBe(4);
  expect(inside.err).toContain('in use');
  expect(inventory(cwd)).toEqual(before);
});

test('a report behind a link is replaced where it lies, and the link stays', async () => {
  const cwd = withStudy();
  expect((await compare(cwd, '--out', 'far/r')).code).toBe(0);
  symlinkSync(join(cwd, 'far/r'), join(cwd, 'near'));
  put(cwd, { 'far/r/stale': 'x' });
  expect((await compare(cwd, '--out', 'near')).code).toBe(0);
  expect(existsSync(join(cwd, 'far/r/stale'))).toBe(false);
  expect(readdirSync(join(cwd, 'near'))).toContain('memo.md');
});
