import { beforeAll, expect, test } from 'vitest';
import { deliver, OPEN_RACK, planeViews } from '../../src/energy/index.ts';
import { pointFixed } from '../../src/mounts/index.ts';
import { MONTH_DAYS } from '../../src/shared/index.ts';
import { type SkyHours, skyOverHours } from '../../src/sky/index.ts';
import { readyYear } from '../../src/study/ready-year.ts';
import { tiltedForMonth } from '../../src/study/tilted-for-month.ts';
import type { SunHours } from '../../src/sun/index.ts';
import { sampleYear } from '../support/sample.ts';

let sun: SunHours;
let sky: SkyHours;
beforeAll(async () => {
  const ready = readyYear(await sampleYear(), { addMinutes: 0, acceptClock: false });
  sun = ready.sun;
  sky = skyOverHours(sun, ready.year, 0.2, 'perez');
});

const chain = {
  ambient: { temperatureC: null, windMs: null },
  heatLoss: OPEN_RACK,
  windFactor: 1,
  heatPerK: -0.0035,
  losses: { dirt: null, moduleSpread: null, cables: null, conversion: null },
  ceilingKwPerKw: null,
  snow: null,
  drive: null,
};

test.each([null, 0.45])(
  'each month has the best of all whole-degree tilts to 0.2 per cent, GCR %s',
  (gcr) => {
    const found = tiltedForMonth(sun, sky, { chain, gcr }, 186);
    const best = new Array<number>(12).fill(0);
    for (let tilt = 0; tilt <= 90; tilt++) {
      const monthly = deliver(
        sky,
        planeViews(sun, pointFixed(sun, tilt, 186, gcr)),
        chain,
      ).energyMonthlyKwhPerKw;
      monthly.forEach((kwh, m) => { best[m] = Math.max(best[m], kwh / MONTH_DAYS[m]); }); // biome-ignore format: one line
    }
    let worst = 0;
    expect(found).toHaveLength(12);
    for (const [m, month] of found.entries())
      worst = Math.max(worst, Math.abs(month.kwh_per_kw_day / best[m] - 1));
    console.info(`plane for each month, GCR ${gcr}: worst error ${(worst * 100).toFixed(3)} %`);
    expect(worst).toBeLessThan(0.002);
  },
);
