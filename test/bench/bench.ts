/**
 * How long the parts of a comparison take. `npm run bench` builds first and runs this. It prints and never asserts.
 * The core is timed warm, on one year in memory; whole commands are timed as new processes. Other work on the
 * machine only ever adds time: the least of many runs says most.
 */
import { spawnSync } from 'node:child_process';
import { existsSync, mkdtempSync, readFileSync, rmSync } from 'node:fs';
import { cpus, tmpdir } from 'node:os';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { Bench } from 'tinybench';
import { type ChainSpec, deliver, OPEN_RACK, planeViews } from '../../src/energy/index.ts';
import {
  axisTiltOnSlope,
  type Pointing,
  pointDualAxis,
  pointFixed,
  pointSingleAxis,
  pointTurntable,
  type RowSpec,
} from '../../src/mounts/index.ts';
import type { HourlyYear } from '../../src/shared/index.ts';
import { orientationMap, skyOverHours } from '../../src/sky/index.ts';
import { type SunHours, sunOverHours } from '../../src/sun/index.ts';
import { fillByClosure, readWeather } from '../../src/weather/index.ts';

const here = (path: string) => fileURLToPath(new URL(`../../${path}`, import.meta.url));
const folder = process.env.TRACKWORTH_WEATHER_DIR;
const weatherFile = folder ? join(folder, 'CO-Boulder.tmy2.gz') : here('sample-data/orlin.epw');

const readYear = async (path: string): Promise<HourlyYear> => {
  const raw = await readWeather({ source: path, bytes: new Uint8Array(readFileSync(path)) });
  return fillByClosure(raw, sunOverHours(raw.place, raw.calendarYear, raw.offsetMin));
};

const year = await readYear(weatherFile);
const sunOfYear = () => sunOverHours(year.place, year.calendarYear, year.offsetMin);
const sun = sunOfYear();
const sky = skyOverHours(sun, year, 0.2, 'perez');
const { best } = orientationMap(sun, sky, year.place.latitudeDeg);

const axis = (axisTiltDeg: number, rows: RowSpec | null) => (s: SunHours) =>
  pointSingleAxis(s, { kind: 'single-axis', axisAzimuthDeg: 180, axisTiltDeg, swingDeg: 60, rows });
const fiveMounts: Record<string, (s: SunHours) => Pointing> = {
  'flush roof': (s) => pointFixed(s, 14, 166, null),
  'best fixed plane in rows': (s) => pointFixed(s, best.tiltDeg, best.azimuthDeg, 0.45),
  'single axis, backtracking': axis(0, { gcr: 0.4, lowSun: 'backtrack' }),
  'tilted axis, alone': axis(20, null),
  'lone mast': (s) => pointDualAxis(s, { kind: 'dual-axis', rows: null }),
};
const field = (s: SunHours) => pointDualAxis(s, { kind: 'dual-axis', rows: { gcr: 0.2, lowSun: 'shade' } });
const rows: RowSpec = { gcr: 0.2, lowSun: 'shade' };
const others: Record<string, (s: SunHours) => Pointing> = {
  'sloping ground, backtracking': (s) =>
    pointSingleAxis(s, {
      kind: 'single-axis',
      axisAzimuthDeg: 180,
      axisTiltDeg: axisTiltOnSlope(8, 230, 180),
      swingDeg: 60,
      rows: { gcr: 0.4, lowSun: 'backtrack' },
      ground: { slopeDeg: 8, fallsTowardDeg: 230 },
    }),
  'mast with limits, in a field': (s) =>
    pointDualAxis(s, {
      kind: 'dual-axis',
      rows,
      turns: { fromDeg: 90, toDeg: 270 },
      elevation: { lowestDeg: 15, highestDeg: 80 },
    }),
  'turntable, alone': (s) => pointTurntable(s, { kind: 'turntable', planeTiltDeg: 50, rows: null }),
};
const chain: ChainSpec = {
  ambient: year,
  heatLoss: OPEN_RACK,
  windFactor: 0.8,
  heatPerK: -0.0035,
  losses: { dirt: 0.02, moduleSpread: 0.01, cables: 0.015, conversion: 0.035 },
  ceilingKwPerKw: 10 / 12,
  snow: null,
  drive: null,
};
const mountYear = (point: (s: SunHours) => Pointing, s = sun, light = sky) =>
  deliver(light, planeViews(s, point(s)), chain);

const core = new Bench({ time: 800, warmupTime: 300 });
core.add('sun', sunOfYear).add('sky, Perez', () => skyOverHours(sun, year, 0.2, 'perez'));
for (const [name, point] of Object.entries(fiveMounts)) core.add(name, () => mountYear(point));
for (const [name, point] of Object.entries(others)) core.add(name, () => mountYear(point));
core
  .add('field of masts', () => mountYear(field))
  .add('sun, sky and five mounts', () => {
    const s = sunOfYear();
    const light = skyOverHours(s, year, 0.2, 'perez');
    for (const point of Object.values(fiveMounts)) mountYear(point, s, light);
  })
  .add('orientation map, 91 x 72', () => orientationMap(sun, sky, year.place.latitudeDeg));

console.log(`${year.station}; Node ${process.version} on ${cpus().length} x ${cpus()[0]?.model}`);
await core.run();
console.table(
  core.tasks.map((task) => {
    const { result } = task;
    if (!('latency' in result)) return { part: task.name, note: 'no result' };
    const ms = (x: number) => Number(x.toFixed(2));
    return {
      part: task.name,
      'ms a site-year, least': ms(result.latency.min),
      median: ms(result.latency.p50),
      runs: result.latency.samplesCount,
    };
  }),
);

/** Wall time of new processes, ms: the least and the median of `count`. */
const timeCommand = (args: readonly string[], count = 7) => {
  const times = Array.from({ length: count }, () => {
    const start = performance.now();
    const { status, stderr } = spawnSync(process.execPath, args, { encoding: 'utf8', cwd: here('.') });
    if (status !== 0) throw new Error(`${args.join(' ')} ended with ${status}: ${stderr}`);
    return performance.now() - start;
  }).sort((a, b) => a - b);
  return { 'ms, least': Math.round(times[0]), median: Math.round(times[Math.floor(count / 2)]) };
};

const command = here('dist/trackworth.js');
if (!existsSync(command))
  console.log('dist/trackworth.js is not there: run npm run build for the times of whole commands');
else {
  const out = mkdtempSync(join(tmpdir(), 'trackworth-bench-'));
  const study = here('sample-data/orlin.yaml');
  try {
    console.table({
      'node alone': timeCommand(['-e', '0']),
      'trackworth --version': timeCommand([command, '--version']),
      'compare --json, no charts': timeCommand([command, 'compare', study, '--json']),
      'compare with its report': timeCommand([command, 'compare', study, '--out', join(out, 'report')]),
    });
  } catch (error) {
    console.log(`whole commands were not timed: ${(error as Error).message.split('\n')[0]}`);
  } finally {
    rmSync(out, { recursive: true, force: true });
  }
}
