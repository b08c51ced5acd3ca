/**
 * Runs the README: files marked `<!-- file: NAME -->` are written, blocks marked `<!-- run -->` are run and their
 * output compared. A line `...` stands for any lines. TRACKWORTH_UPDATE_README=1 writes the real output into the
 * README instead: read the difference before you commit it.
 */
import { spawnSync } from 'node:child_process';
import { mkdirSync, mkdtempSync, readFileSync, rmSync, symlinkSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { delimiter, join } from 'node:path';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { command, PROGRAM, put, ROOT } from './support.ts';

const README = join(ROOT, 'README.md');
const MARKED = /<!-- (run|file: (\S+)) -->\n```\w+\n([\s\S]*?)```/g;
const ELIDED = '...';

interface Step {
  readonly command: string;
  readonly expected: string;
}

const stepsOf = (block: string): Step[] =>
  block
    .split(/^\$ /m)
    .slice(1)
    .map((part) => {
      const end = part.indexOf('\n');
      return { command: part.slice(0, end), expected: part.slice(end + 1) };
    });

const text = readFileSync(README, 'utf8');
const blocks = [...text.matchAll(MARKED)].map(([, , file, body]) => ({ file, body }));
const steps = blocks.filter(({ file }) => file === undefined).flatMap(({ body }) => stepsOf(body));

let folder = '';
beforeAll(() => {
  folder = mkdtempSync(join(tmpdir(), 'tw-'));
  put(folder, { 'bin/trackworth': `#!/bin/sh\nexec "${process.execPath}" "${PROGRAM}" "$@"\n` });
  spawnSync('chmod', ['+x', join(folder, 'bin/trackworth')]);
  mkdirSync(join(folder, 'node_modules'));
  symlinkSync(ROOT, join(folder, 'node_modules/trackworth'));
});
afterAll(() => rmSync(folder, { recursive: true, force: true }));

/** The demo's command line, but into a folder of the test: reports/sample has a test of its own. */
const runDemo = async (): Promise<string> => {
  const { scripts } = JSON.parse(readFileSync(join(ROOT, 'package.json'), 'utf8'));
  const args = /node dist\/trackworth\.js (.*) --out (\S+)$/.exec(scripts.demo);
  if (!args) throw new Error(`the demo script is another one: ${scripts.demo}`);
  const out = join(folder, 'demo');
  const result = await command(ROOT, ...args[1].split(' '), '--out', out);
  return (result.out + result.err).replace(/^Report .*$/m, `Report          ${args[2]}/memo.md`);
};

const runInShell = (line: string): string => {
  const { stdout } = spawnSync('bash', ['-c', `exec 2>&1; ${line}`], {
    cwd: folder,
    encoding: 'utf8',
    env: { ...process.env, PATH: `${join(folder, 'bin')}${delimiter}${process.env.PATH}` },
  });
  return stdout;
};

const runStep = (line: string): Promise<string> | string =>
  line === 'npm run --silent demo' ? runDemo() : runInShell(line);

const expectOutput = (found: string, expected: string): void => {
  const parts = expected.split(`${ELIDED}\n`);
  if (parts.length === 1) expect(found).toBe(expected);
  let from = 0;
  for (const part of parts) {
    const at = found.indexOf(part, from);
    expect(at, `${part}\nis not (or not in this order) in\n${found}`).toBeGreaterThanOrEqual(0);
    from = at + part.length;
  }
};

describe('the README', () => {
  test('has its commands, files and failure', () => {
    expect(steps.length).toBeGreaterThanOrEqual(6);
    expect(blocks.filter(({ file }) => file).length).toBeGreaterThanOrEqual(3);
  });

  test('does what it says, in its order, and prints what it shows', async () => {
    let updated = text;
    for (const { file, body } of blocks) {
      if (file !== undefined) put(folder, { [file]: body });
      else
        for (const step of stepsOf(body)) {
          const found = await runStep(step.command);
          if (!process.env.TRACKWORTH_UPDATE_README) expectOutput(found, step.expected);
          else if (!step.expected.includes(`${ELIDED}\n`))
            updated = updated.replace(
              `$ ${step.command}\n${step.expected}`,
              () => `$ ${step.command}\n${found}`,
            );
        }
    }
    if (updated !== text) writeFileSync(README, updated);
  });

  test('names only files that exist', () => {
    const links = [...text.matchAll(/\]\((?!https?:)([^)#]+)\)/g)].map(([, path]) => path);
    expect(links.length).toBeGreaterThan(10);
    const missing = links.filter((path) => spawnSync('test', ['-e', join(ROOT, path)]).status !== 0);
    expect(missing).toEqual([]);
  });

  test('explains every key of a study', async () => {
    const schema = JSON.parse((await command(ROOT, 'schema')).out);
    const keys = Object.keys(schema.properties).filter((key) => !key.startsWith('$'));
    expect(keys.length).toBeGreaterThanOrEqual(10);
    expect(keys.filter((key) => !text.includes(`\`${key}\``))).toEqual([]);
  });
});
