import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import { expect, test } from 'vitest';
import { run } from '../../src/cli/program.ts';
import { reportTrouble } from '../../src/cli/trouble.ts';
import { command, ROOT, tempFolder } from './support.ts';

const COMMANDS = ['compare', 'start', 'weather', 'plane', 'bearing', 'schema'];

test.each([[], ...COMMANDS.map((name) => [name])])(
  'help of %j opens with examples and ends well',
  async (...args) => {
    const { code, out, err } = await command(tempFolder(), ...args, '--help');
    expect([code, err]).toEqual([0, '']);
    expect(out).toMatch(/^Examples:\n {2}trackworth /);
    expect(out).toContain('Usage: trackworth');
  },
);

test('help names every command that there is and no other', async () => {
  const { out } = await command(tempFolder(), '--help');
  const listed = [...out.split('Commands:')[1].matchAll(/^ {2}([a-z]+)/gm)].map(([, name]) => name);
  expect(listed).toEqual(COMMANDS);
});

test('without a command the help goes to the messages and the exit code is 2', async () => {
  const { code, out, err } = await command(tempFolder());
  expect([code, out]).toEqual([2, '']);
  expect(err).toMatch(/^Examples:/);
});

test('--version prints the version of the package', async () => {
  const { version } = JSON.parse(readFileSync(join(ROOT, 'package.json'), 'utf8'));
  expect(await command(tempFolder(), '--version')).toEqual({ code: 0, out: `${version}\n`, err: '' });
});

test('an error that nobody foresaw is exit 1, named as a fault of trackworth, with its stack only on request', async () => {
  let err = '';
  const io = (debug: boolean) => ({ cwd: '', debug, out: () => {}, err: (text: string) => (err += text) });
  expect(reportTrouble(new RangeError('boom'), io(false))).toBe(1);
  expect(err).toMatch(/^This is a fault of trackworth, not of your files: boom\n/);
  expect(err).toContain('TRACKWORTH_DEBUG=1');
  expect(err).not.toContain('    at ');
  err = '';
  expect(reportTrouble(new RangeError('boom'), io(true))).toBe(1);
  expect(err).toContain('RangeError: boom\n    at ');
});

test('a fault inside a command is caught at its edge', async () => {
  const io = {
    cwd: tempFolder(),
    debug: false,
    out: () => {
      throw new Error('the screen is gone');
    },
    err: () => {},
  };
  expect(await run(['schema'], io)).toBe(1);
});
