/** What an installed copy of the package can do: packed as npm packs it, unpacked elsewhere, its dependencies lent. */
import { spawnSync } from 'node:child_process';
import { existsSync, mkdirSync, mkdtempSync, readdirSync, readFileSync, rmSync, symlinkSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { dirname, join } from 'node:path';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { inventory, PROGRAM, put, ROOT } from './support.ts';

let site = '';
let packed: string[] = [];
const installed = () => join(site, 'node_modules/trackworth');
const run = (command: string, ...args: string[]) => {
  const { status, stdout, stderr } = spawnSync(command, args, { cwd: site, encoding: 'utf8' });
  return { code: status, out: stdout, err: stderr };
};
const node = (...args: string[]) => run(process.execPath, ...args);

/** Every package of node_modules, scoped ones too, as npm would install them beside this one. */
const lendDependencies = (): void => {
  const { dependencies } = JSON.parse(readFileSync(join(ROOT, 'package.json'), 'utf8'));
  for (const name of Object.keys(dependencies)) {
    mkdirSync(dirname(join(site, 'node_modules', name)), { recursive: true });
    symlinkSync(join(ROOT, 'node_modules', name), join(site, 'node_modules', name));
  }
};

beforeAll(() => {
  if (!existsSync(PROGRAM)) throw new Error('dist is missing: run npm run build');
  site = mkdtempSync(join(tmpdir(), 'trackworth-'));
  const pack = run('npm', 'pack', ROOT, '--ignore-scripts', '--json', '--pack-destination', site);
  const [{ filename, files }] = JSON.parse(pack.out);
  packed = files.map(({ path }: { path: string }) => path);
  mkdirSync(installed(), { recursive: true });
  expect(run('tar', 'xzf', filename, '--strip-components=1', '-C', installed()).code).toBe(0);
  lendDependencies();
});
afterAll(() => rmSync(site, { recursive: true, force: true }));

describe('the packed package', () => {
  test('holds the program, the library, its types and the sample, and nothing that cannot run', () => {
    for (const name of [
      'dist/trackworth.js',
      'dist/index.js',
      'dist/types/src/index.d.ts',
      'sample-data/orlin.yaml',
      'sample-data/orlin.epw',
      'README.md',
      'LICENSE',
    ])
      expect(packed).toContain(name);
    expect(
      packed.filter((name) => /^(src|test|reports|sample-data\/maker|dist\/types\/test)/.test(name)),
    ).toEqual([]);
    expect(packed.filter((name) => name.endsWith('.ts') && !name.endsWith('.d.ts'))).toEqual([]);
  });

  test('compares its sample study, charts and all, wherever it is installed', () => {
    const { code, out, err } = node(
      join(installed(), 'dist/trackworth.js'),
      'compare',
      '--demo',
      '--out',
      'r',
    );
    expect([code, err]).toEqual([0, '']);
    expect(out).toMatch(/^CHOOSE ground/m);
    expect(readdirSync(join(site, 'r/charts')).length).toBeGreaterThanOrEqual(8);
    const here = spawnSync(process.execPath, [PROGRAM, 'compare', '--demo', '--out', join(site, 'r2')]);
    expect(here.status).toBe(0);
    expect(inventory(join(site, 'r'))).toEqual(inventory(join(site, 'r2')));
  });

  test('starts a study', () => {
    expect(node(join(installed(), 'dist/trackworth.js'), 'start', 'mine').code).toBe(0);
    expect(readdirSync(join(site, 'mine'))).toEqual(['orlin.epw', 'study.yaml']);
  });

  test('is a typed library: a user’s code compiles against it, and a wrong use does not', () => {
    put(site, {
      'package.json': '{ "type": "module" }',
      'use.ts': [
        "import { type Comparison, compareMounts, readStudy, readWeather, screenTable, TrackworthError } from 'trackworth';",
        "const study = await readStudy({ file: 'a.yaml', text: '' });",
        'const year = await readWeather({ source: study.weather.file, bytes: new Uint8Array(), place: study.site });',
        'const comparison: Comparison = compareMounts(study, year);',
        'export const screen: string = screenTable(comparison);',
        "export const problems: readonly string[] = new TrackworthError('input', []).problems.map((p) => p.fix);",
        '// @ts-expect-error the screen is text',
        'export const wrong: number = screenTable(comparison);',
        '',
      ].join('\n'),
    });
    const compiler = join(ROOT, 'node_modules/typescript/bin/tsc');
    const options = ['--noEmit', '--strict', '--module', 'nodenext', '--target', 'es2023', '--lib', 'es2023'];
    expect(node(compiler, ...options, 'use.ts')).toEqual({ code: 0, out: '', err: '' });
  });

  test('exports what it declares', () => {
    const { code, out } = node(
      '--input-type=module',
      '-e',
      "console.log(Object.keys(await import('trackworth')).length)",
    );
    expect(code).toBe(0);
    expect(Number(out)).toBeGreaterThan(30);
  });
});
