import { chmodSync, mkdirSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import { describe, expect, test } from 'vitest';
import { command, inventory, put, SAMPLE_WEATHER, tempFolder } from './support.ts';

test('start writes a study and its weather, and the command that it names next runs', async () => {
  const cwd = tempFolder();
  const started = await command(cwd, 'start', 'new/my site');
  expect([started.code, started.err]).toEqual([0, '']);
  expect(Object.keys(inventory(join(cwd, 'new/my site')))).toEqual(['orlin.epw', 'study.yaml']);
  expect(readFileSync(join(cwd, 'new/my site/orlin.epw'))).toEqual(readFileSync(SAMPLE_WEATHER));
  const next = /^Next +trackworth compare '([^']+)'$/m.exec(started.out)?.[1];
  expect(next).toBe('new/my site/study.yaml');
  const compared = await command(cwd, 'compare', next as string, '--no-charts');
  expect([compared.code, compared.err]).toEqual([0, '']);
  expect(compared.out).toMatch(/^CHOOSE /m);
  expect(started.out).toContain('invented');
});

test('start fills an existing folder beside what is there', async () => {
  const cwd = put(tempFolder(), { 'notes.txt': 'mine' });
  expect((await command(cwd, 'start', '.')).code).toBe(0);
  expect(Object.keys(inventory(cwd))).toEqual(['notes.txt', 'orlin.epw', 'study.yaml']);
});

describe('start never writes over a file: exit 4, nothing changed', () => {
  test.each([
    ['both there', { 'a/study.yaml': 'mine', 'a/orlin.epw': 'mine' }, 'study.yaml and orlin.epw'],
    ['the study there', { 'a/study.yaml': 'mine' }, 'study.yaml there already'],
    ['the weather there', { 'a/orlin.epw': 'mine' }, 'orlin.epw there already'],
    ['a file of that name', { a: 'mine' }, 'found'],
  ])('%s', async (_, files, says) => {
    const cwd = put(tempFolder(), files);
    const before = inventory(cwd);
    const { code, out, err } = await command(cwd, 'start', 'a');
    expect([code, out]).toEqual([4, '']);
    expect(err).toContain(says);
    expect(err).not.toContain('fault of trackworth');
    expect(inventory(cwd)).toEqual(before);
  });

  test('a place where no folder can be made', async () => {
    const { code, err } = await command(tempFolder(), 'start', '/proc/trackworth/site');
    expect(code).toBe(4);
    expect(err).toContain('/proc/trackworth/site');
  });

  test.skipIf(process.getuid?.() === 0)(
    'a folder that may not be written (skipped for root, whom nothing stops)',
    async () => {
      const cwd = tempFolder();
      mkdirSync(join(cwd, 'locked'));
      chmodSync(join(cwd, 'locked'), 0o555);
      expect((await command(cwd, 'start', 'locked/a')).code).toBe(4);
    },
  );
});
