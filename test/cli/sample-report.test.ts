import { existsSync } from 'node:fs';
import { join } from 'node:path';
import { expect, test } from 'vitest';
import { command, inventory, ROOT, tempFolder } from './support.ts';

const COMMITTED = join(ROOT, 'reports/sample');

test('reports/sample is what trackworth writes today, byte for byte (npm run demo rebuilds it)', async () => {
  expect(existsSync(COMMITTED), 'reports/sample is missing: run npm run demo').toBe(true);
  const cwd = tempFolder();
  expect((await command(cwd, 'compare', '--demo', '--out', 'fresh')).code).toBe(0);
  const fresh = inventory(join(cwd, 'fresh'));
  const committed = inventory(COMMITTED);
  expect(Object.keys(fresh).length).toBeGreaterThan(10);
  const names = new Set([...Object.keys(fresh), ...Object.keys(committed)]);
  expect([...names].filter((name) => fresh[name] !== committed[name])).toEqual([]);
});
