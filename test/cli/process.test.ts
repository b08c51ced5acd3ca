/** What only a process of its own can show. `npm test` builds the program first. */
import { spawnSync } from 'node:child_process';
import { existsSync, readFileSync, statSync } from 'node:fs';
import { join } from 'node:path';
import { describe, expect, test } from 'vitest';
import { command, inventory, PROGRAM, program, put, simplestStudy, tempFolder } from './support.ts';

const shell = (cwd: string, line: string) => {
  const script = `set -o pipefail; trackworth() { "${process.execPath}" "${PROGRAM}" "$@"; }; ${line}`;
  const { status, stdout, stderr } = spawnSync('bash', ['-c', script], { cwd, encoding: 'utf8' });
  return { code: status, out: stdout, err: stderr };
};

describe('the built program', () => {
  test('is runnable as it stands', () => {
    expect(readFileSync(PROGRAM, 'utf8')).toMatch(/^#!\/usr\/bin\/env node\n/);
    expect(statSync(PROGRAM).mode & 0o111).toBe(0o111);
  });

  test.each([
    [0, ['schema']],
    [0, ['--help']],
    [2, ['nonsense']],
    [3, ['compare', 'gone.yaml']],
    [4, ['compare', 'study.yaml', '--out', 'study.yaml']],
  ])('ends with exit code %i after %j', (code, args) => {
    const cwd = put(tempFolder(), { 'study.yaml': simplestStudy() });
    const before = inventory(cwd);
    const result = program(cwd, ...args);
    expect(result.code).toBe(code);
    expect(code === 0 ? result.err : result.out).toBe('');
    expect(inventory(cwd)).toEqual(before);
  });

  test('writes large JSON whole into a pipe, and writes nothing else there', () => {
    const cwd = put(tempFolder(), { 'study.yaml': simplestStudy() });
    const { code, out } = shell(cwd, 'trackworth compare study.yaml --json | (sleep 0.3; cat)');
    expect(code).toBe(0);
    // A pipe holds 64 KiB: what comes after that is lost where a program leaves too early.
    expect(out.length).toBeGreaterThan(100_000);
    expect(JSON.parse(out).schema).toBe('trackworth-comparison-1');
  });

  test('does not mind a reader that leaves early', () => {
    const cwd = put(tempFolder(), { 'study.yaml': simplestStudy() });
    const { code, out, err } = shell(cwd, 'trackworth compare study.yaml --json | head -n 1');
    expect([code, out, err]).toEqual([0, '{\n', '']);
  });

  test.skipIf(!existsSync('/dev/full'))('says with exit code 4 that the disk behind > is full', () => {
    const { code, err } = shell(tempFolder(), 'trackworth schema > /dev/full');
    expect(code).toBe(4);
    expect(err).toBe('The output could not be written: ENOSPC\n');
  });

  test('prints the same with and without a terminal’s colours asked for', () => {
    const cwd = put(tempFolder(), { 'study.yaml': simplestStudy() });
    const plain = shell(cwd, 'NO_COLOR=1 trackworth compare study.yaml --no-charts');
    const forced = shell(cwd, 'FORCE_COLOR=1 trackworth compare study.yaml --no-charts');
    expect(plain.code).toBe(0);
    expect(forced).toEqual(plain);
    expect(plain.out).not.toContain('\u001b');
  });

  test('writes the same bytes in other time zones, languages and folders', () => {
    const cwd = put(tempFolder(), { 'study.yaml': simplestStudy(), 'far/away/here': '' });
    const here = shell(cwd, 'trackworth compare study.yaml --out a');
    const there = shell(
      join(cwd, 'far/away'),
      'TZ=Pacific/Chatham LANG=tr_TR.UTF-8 LC_ALL=tr_TR.UTF-8 trackworth compare ../../study.yaml --out b',
    );
    expect([here.code, there.code]).toEqual([0, 0]);
    expect(inventory(join(cwd, 'far/away/b'))).toEqual(inventory(join(cwd, 'a')));
  });

  test('writes the same report as the sources do', async () => {
    const cwd = put(tempFolder(), { 'study.yaml': simplestStudy() });
    expect(program(cwd, 'compare', 'study.yaml', '--out', 'built').code).toBe(0);
    expect((await command(cwd, 'compare', 'study.yaml', '--out', 'source')).code).toBe(0);
    expect(inventory(join(cwd, 'built'))).toEqual(inventory(join(cwd, 'source')));
  });
});
