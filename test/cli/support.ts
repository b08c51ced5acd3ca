/** Running commands without leaving the process, and the real thing where the process matters. */
import { spawnSync } from 'node:child_process';
import { createHash } from 'node:crypto';
import {
  existsSync,
  mkdirSync,
  mkdtempSync,
  readdirSync,
  readFileSync,
  rmSync,
  statSync,
  writeFileSync,
} from 'node:fs';
import { tmpdir } from 'node:os';
import { dirname, join, relative, resolve } from 'node:path';
import { onTestFinished, vi } from 'vitest';
import { run } from '../../src/cli/program.ts';

// Commands draw charts and start processes, which a busy machine does slowly.
vi.setConfig({ testTimeout: 60_000, hookTimeout: 60_000 });

export const ROOT = resolve(import.meta.dirname, '../..');
export const SAMPLE_WEATHER = join(ROOT, 'sample-data/orlin.epw');
export const PROGRAM = join(ROOT, 'dist/trackworth.js');

export interface Outcome {
  readonly code: number;
  readonly out: string;
  readonly err: string;
}

/** A folder of its own for one test, removed after it. */
export const tempFolder = (): string => {
  const folder = mkdtempSync(join(tmpdir(), 'trackworth-'));
  onTestFinished(() => rmSync(folder, { recursive: true, force: true }));
  return folder;
};

/** Writes files below a folder. */
export const put = (folder: string, files: Readonly<Record<string, string | Uint8Array>>): string => {
  for (const [name, content] of Object.entries(files)) {
    mkdirSync(dirname(join(folder, name)), { recursive: true });
    writeFileSync(join(folder, name), content);
  }
  return folder;
};

/** One command line in a folder, in this process. */
export const command = async (cwd: string, ...args: string[]): Promise<Outcome> => {
  let [out, err] = ['', ''];
  const code = await run(args, {
    cwd,
    debug: false,
    out: (text) => {
      out += text;
    },
    err: (text) => {
      err += text;
    },
  });
  return { code, out, err };
};

/** The built program in a process of its own; `npm test` builds it first. */
export const program = (cwd: string, ...args: string[]): Outcome => {
  if (!existsSync(PROGRAM)) throw new Error('dist/trackworth.js is missing: run npm run build');
  const { status, stdout, stderr } = spawnSync(process.execPath, [PROGRAM, ...args], {
    cwd,
    encoding: 'utf8',
    maxBuffer: 64 * 1024 * 1024,
  });
  return { code: status ?? -1, out: stdout, err: stderr };
};

/** Every file below a folder with a checksum of its content, and every folder. */
export const inventory = (folder: string): Record<string, string> => {
  const found: Record<string, string> = {};
  const visit = (path: string): void => {
    for (const name of readdirSync(path).sort()) {
      const inner = join(path, name);
      const key = relative(folder, inner);
      if (statSync(inner).isDirectory()) {
        found[`${key}/`] = 'folder';
        visit(inner);
      } else found[key] = createHash('sha256').update(readFileSync(inner)).digest('hex');
    }
  };
  visit(folder);
  return found;
};

export const MOUNTS = `mounts:
  - { id: ground, kind: fixed-tilt, rows: { gcr: 0.45 } }
  - { id: tracker, kind: single-axis, rows: { gcr: 0.40 } }
`;

/** The simplest study there is, on a weather file of one's choice. */
export const simplestStudy = (weather = SAMPLE_WEATHER, more = ''): string =>
  `title: Orlin Bench\nweather: { file: ${JSON.stringify(weather)} }\narray: { dc: 12 kW, inverter: 10 kW }\n${more}${MOUNTS}`;
