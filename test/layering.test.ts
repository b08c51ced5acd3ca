import { readdirSync, readFileSync, statSync } from 'node:fs';
import { dirname, join, relative, resolve, sep } from 'node:path';
import { expect, test } from 'vitest';

/** Lowest first: a folder may import only from folders to its left, through their index.ts. */
const ORDER = [
  'shared', 'weather', 'survey', 'sun', 'sky', 'wind', 'mounts', 'energy', 'cost',
  'offgrid', 'uncertainty', 'advice', 'charts', 'report', 'inputs', 'study', 'index', 'cli',
]; // biome-ignore format: one flow, read left to right
const SRC = resolve(import.meta.dirname, '../src');
const IMPORT = /(?:from|import)\s*\(?\s*'([^']+)'/g;
/** What only src/cli may touch: disk, clock, console, network, process. */
const OUTSIDE = /\bDate\.now\(|\bnew Date\(\)|\bconsole\.|\bprocess\.|\bperformance\.|\bfetch\(|from 'node:/;

const filesBelow = (dir: string): string[] =>
  readdirSync(dir).flatMap((name) => {
    const path = join(dir, name);
    return statSync(path).isDirectory() ? filesBelow(path) : path.endsWith('.ts') ? [path] : [];
  });
const folderOf = (path: string) => relative(SRC, path).split(sep)[0].replace(/\.ts$/, '');
const files = filesBelow(SRC);

test('every source file belongs to a folder of the flow', () => {
  expect(files.length).toBeGreaterThan(20);
  expect(files.filter((f) => !ORDER.includes(folderOf(f))).map((f) => relative(SRC, f))).toEqual([]);
});

test('a folder imports only from folders below it, through their index.ts', () => {
  const faults: string[] = [];
  let seen = 0;
  for (const file of files) {
    for (const [, target] of readFileSync(file, 'utf8').matchAll(IMPORT)) {
      if (!target.startsWith('.')) continue;
      seen++;
      const to = resolve(dirname(file), target);
      const [here, there] = [folderOf(file), folderOf(to)];
      if (here === there) continue;
      const front = to === join(SRC, there, 'index.ts') || to === join(SRC, `${there}.ts`);
      if (ORDER.indexOf(there) >= ORDER.indexOf(here))
        faults.push(`${relative(SRC, file)} imports upward: ${target}`);
      else if (!front) faults.push(`${relative(SRC, file)} goes round the front door: ${target}`);
    }
  }
  expect(seen).toBeGreaterThan(40);
  expect(faults).toEqual([]);
});

test('only src/cli touches disk, clock, console and process', () => {
  const faults = files.filter((f) => folderOf(f) !== 'cli' && OUTSIDE.test(readFileSync(f, 'utf8')));
  expect(faults.map((f) => relative(SRC, f))).toEqual([]);
});
