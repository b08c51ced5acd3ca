import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import {
  type ChainSpec,
  type Delivered,
  deliver,
  energyUnderInverter,
  lightBySource,
  lightThrough,
  OPEN_RACK,
  planeViews,
} from '../../src/energy/index.ts';
import { pointFixed, pointSingleAxis } from '../../src/mounts/index.ts';
import { yearlySum } from '../../src/shared/index.ts';
import { skyOverHours } from '../../src/sky/index.ts';
import { inventedSky } from '../shared/invented-sky.ts';

const site = inventedSky(40, 9);
const sky = skyOverHours(site.sun, site.radiation, 0.2, 'perez');
const flat = planeViews(site.sun, pointFixed(site.sun, 0, 180, null));
const lone = planeViews(site.sun, pointFixed(site.sun, 33, 180, null));
const inRows = planeViews(site.sun, pointFixed(site.sun, 33, 180, 0.5));
const tracker = planeViews(
  site.sun,
  pointSingleAxis(site.sun, {
    kind: 'single-axis',
    axisAzimuthDeg: 180,
    axisTiltDeg: 0,
    swingDeg: 60,
    rows: { gcr: 0.4, lowSun: 'backtrack' },
  }),
);

const nothing: ChainSpec = {
  ambient: { temperatureC: null, windMs: null },
  heatLoss: OPEN_RACK,
  windFactor: 1,
  heatPerK: -0.004,
  losses: { dirt: null, moduleSpread: null, cables: null, conversion: null },
  ceilingKwPerKw: null,
  snow: null,
  drive: null,
};
const warm = { temperatureC: site.temperatureC, windMs: site.windMs };
const product = (d: Delivered) => d.stages.reduce((p, s) => p * s.efficiency, d.irradiationKwhM2);

const share = (max: number) => fc.option(fc.double({ min: 0, max, noNaN: true }), { nil: null });
const anySpec: fc.Arbitrary<ChainSpec> = fc.record({
  ambient: fc.constantFrom(nothing.ambient, warm, { ...warm, windMs: null }),
  heatLoss: fc.constant(OPEN_RACK),
  windFactor: fc.double({ min: 0.5, max: 1, noNaN: true }),
  heatPerK: fc.double({ min: -0.005, max: 0, noNaN: true }),
  losses: fc.record({
    dirt: share(0.2),
    moduleSpread: share(0.1),
    cables: share(0.1),
    conversion: share(0.1),
  }),
  snow: fc.option(fc.array(fc.double({ min: 0, max: 0.9, noNaN: true }), { minLength: 12, maxLength: 12 }), {
    nil: null,
  }),
  ceilingKwPerKw: fc.option(fc.double({ min: 0.2, max: 1.2, noNaN: true }), { nil: null }),
  drive: fc.option(
    fc.record({
      working: share(1),
      stuck: fc.constant('flat' as const),
      visits: fc.constant(null),
      ownUse: share(0.05),
    }),
    { nil: null },
  ),
});
const anyViews = fc.constantFrom(flat, lone, inRows, tracker);

describe('the chain', () => {
  test('multiplies: irradiation times every stage is the energy, to the last digits', () => {
    fc.assert(
      fc.property(anyViews, anySpec, (views, spec) => {
        const d = deliver(sky, views, spec, [flat]);
        expect(Math.abs(product(d) / d.energyKwhPerKw - 1)).toBeLessThan(1e-12);
        expect(d.stages.at(-1)!.kwhPerKwAfter / d.energyKwhPerKw).toBeCloseTo(1, 12);
        expect(d.energyMonthlyKwhPerKw.reduce((a, b) => a + b) / d.energyKwhPerKw).toBeCloseTo(1, 12);
        expect(d.irradiationMonthlyKwhM2.reduce((a, b) => a + b) / d.irradiationKwhM2).toBeCloseTo(1, 12);
      }),
      { numRuns: 60 },
    );
  });

  test('never gains where it must not: every stage but heat and downtime keeps at most all', () => {
    fc.assert(
      fc.property(anyViews, anySpec, (views, spec) => {
        for (const stage of deliver(sky, views, spec, [flat]).stages) {
          expect(stage.efficiency).toBeGreaterThan(0);
          // Cold modules beat their rating; a tracker stuck flat may beat one that turns out of its rows' shade.
          if (stage.name !== 'heat' && stage.name !== 'downtime')
            expect(stage.efficiency).toBeLessThanOrEqual(1 + 1e-12);
        }
      }),
      { numRuns: 60 },
    );
  });

  test('counts only what is given: a blank takes no stage, and delivers what nothing would', () => {
    fc.assert(
      fc.property(anySpec, (spec) => {
        const names = deliver(sky, lone, spec, [flat]).stages.map((s) => s.name);
        expect(names.includes('heat')).toBe(spec.ambient.temperatureC !== null);
        expect(names.includes('dirt')).toBe(spec.losses.dirt !== null);
        expect(names.includes('snow')).toBe(spec.snow !== null);
        expect(names.includes('module spread')).toBe(spec.losses.moduleSpread !== null);
        expect(names.includes('cables')).toBe(spec.losses.cables !== null);
        expect(names.includes('conversion')).toBe(spec.losses.conversion !== null);
        expect(names.includes('inverter ceiling')).toBe(spec.ceilingKwPerKw !== null);
        expect(names.includes('drive')).toBe((spec.drive?.ownUse ?? null) !== null);
        expect(names.includes('downtime')).toBe((spec.drive?.working ?? null) !== null);
        expect(names.includes('rows')).toBe(false);
      }),
      { numRuns: 40 },
    );
    const zeros = { dirt: 0, moduleSpread: 0, cables: 0, conversion: 0 };
    const given = deliver(sky, lone, { ...nothing, losses: zeros });
    const blank = deliver(sky, lone, nothing);
    expect(given.energyKwhPerKw).toBe(blank.energyKwhPerKw);
    expect(given.stages.length).toBe(blank.stages.length + 4);
    const blankDrive = deliver(
      sky,
      lone,
      { ...nothing, drive: { working: null, stuck: null, visits: null, ownUse: null } },
      [flat],
    );
    expect(blankDrive).toEqual(blank);
  });

  test('takes constant shares alike in any order, and hand arithmetic agrees', () => {
    const losses = { dirt: 0.02, moduleSpread: 0.01, cables: 0.015, conversion: 0.035 };
    const d = deliver(sky, lone, { ...nothing, losses });
    const bare = deliver(sky, lone, nothing).energyKwhPerKw;
    expect(d.energyKwhPerKw / bare).toBeCloseTo(0.98 * 0.99 * 0.985 * 0.965, 12);
  });
});

test('snow takes each month its share, after dirt and before the rest, so that a ceiling sees it', () => {
  const snow = [0.5, 0.25, 0, 0, 0, 0, 0, 0, 0, 0, 0, 1];
  const spec = { ...nothing, ambient: warm, losses: { ...nothing.losses, dirt: 0.02, conversion: 0.03 } };
  const [clear, under] = [deliver(sky, lone, spec), deliver(sky, lone, { ...spec, snow })];
  for (let m = 0; m < 12; m++)
    expect(under.energyMonthlyKwhPerKw[m]).toBeCloseTo(clear.energyMonthlyKwhPerKw[m] * (1 - snow[m]), 9);
  expect(under.irradiationKwhM2).toBe(clear.irradiationKwhM2);
  expect(under.stages.map((s) => s.name)).toEqual(['incidence', 'heat', 'dirt', 'snow', 'conversion']);
  expect(under.stages.find((s) => s.name === 'snow')!.efficiency).toBeCloseTo(
    under.energyKwhPerKw / clear.energyKwhPerKw,
    12,
  );
  const zero = deliver(sky, lone, { ...spec, snow: new Array<number>(12).fill(0) });
  expect(zero.energyMonthlyKwhPerKw).toEqual(clear.energyMonthlyKwhPerKw);
  const capped = { ...spec, snow, ceilingKwPerKw: 0.4 };
  const d = deliver(sky, lone, capped);
  expect(energyUnderInverter(d.uncappedKwPerKw, 1, 0.4)).toBeCloseTo(d.energyKwhPerKw, 9);
});

describe('the inverter’s ceiling', () => {
  const spec: ChainSpec = { ...nothing, ambient: warm, losses: { ...nothing.losses, conversion: 0.04 } };

  test('clips hour by hour', () => {
    const open = deliver(sky, tracker, spec);
    for (const ceiling of [0.3, 0.6, 0.8]) {
      let expected = 0;
      for (const p of open.uncappedKwPerKw) expected += Math.min(p, ceiling);
      const d = deliver(sky, tracker, { ...spec, ceilingKwPerKw: ceiling });
      expect(d.energyKwhPerKw / expected).toBeCloseTo(1, 12);
      expect(d.energyKwhPerKw).toBeLessThan(open.energyKwhPerKw);
      expect(d.uncappedKwPerKw).toEqual(open.uncappedKwPerKw);
    }
    expect(deliver(sky, tracker, { ...spec, ceilingKwPerKw: 2 }).energyKwhPerKw).toBe(open.energyKwhPerKw);
  });

  test('is the same from one kW’s hours as from the chain', () => {
    fc.assert(
      fc.property(
        anyViews,
        fc.double({ min: 0.1, max: 100, noNaN: true }),
        fc.double({ min: 0.3, max: 3, noNaN: true }),
        (views, dcKw, dcPerAc) => {
          const inverterKw = dcKw / dcPerAc;
          const d = deliver(sky, views, { ...spec, ceilingKwPerKw: inverterKw / dcKw });
          const whole = energyUnderInverter(d.uncappedKwPerKw, dcKw, inverterKw);
          expect(Math.abs(whole / (d.energyKwhPerKw * dcKw) - 1)).toBeLessThan(1e-12);
        },
      ),
      { numRuns: 40 },
    );
    const { uncappedKwPerKw, energyKwhPerKw } = deliver(sky, lone, spec);
    expect(energyUnderInverter(uncappedKwPerKw, 7, null)).toBeCloseTo(7 * energyKwhPerKw, 9);
  });

  test('costs a tracker that works longer at the top more than a fixed plane', () => {
    const clipped = (views: typeof lone) => {
      const d = deliver(sky, views, { ...spec, ceilingKwPerKw: 0.6 });
      return d.stages.find((s) => s.name === 'inverter ceiling')!.efficiency;
    };
    expect(clipped(tracker)).toBeLessThan(clipped(lone));
  });
});

describe('a tracker that is down', () => {
  const run = (working: number | null) =>
    deliver(
      sky,
      tracker,
      {
        ...nothing,
        ambient: warm,
        ceilingKwPerKw: 0.7,
        drive: { working, stuck: 'flat', visits: null, ownUse: null },
      },
      [flat],
    );

  test('all year delivers what a flat plane does, and one that always works loses nothing', () => {
    const stuck = deliver(sky, flat, { ...nothing, ambient: warm, ceilingKwPerKw: 0.7 });
    expect(run(0).energyKwhPerKw / stuck.energyKwhPerKw).toBeCloseTo(1, 12);
    expect(run(1).energyKwhPerKw / run(null).energyKwhPerKw).toBeCloseTo(1, 12);
    expect(run(1).irradiationKwhM2).toBe(run(0).irradiationKwhM2);
  });

  test('part of the year delivers in between, in proportion', () => {
    const [none, all] = [run(0).energyKwhPerKw, run(1).energyKwhPerKw];
    expect(all).toBeGreaterThan(none);
    expect(run(0.93).energyKwhPerKw).toBeCloseTo(0.93 * all + 0.07 * none, 9);
  });
});

describe('a tracker that parks', () => {
  const marks = fc.array(fc.boolean(), { minLength: 24, maxLength: 24 });
  const hoursOf = (day: boolean[]) => Uint8Array.from({ length: 8760 }, (_, h) => Number(day[h % 24]));

  test('multiplies whatever the chain, and its months and its hours close', () => {
    fc.assert(
      fc.property(anySpec, marks, (spec, day) => {
        const parked = { stowed: hoursOf(day), views: flat };
        const d = deliver(sky, tracker, spec, [flat, lone], parked);
        const without = deliver(sky, tracker, { ...spec, drive: null });
        expect(Math.abs(product(d) / d.energyKwhPerKw - 1)).toBeLessThan(1e-9);
        expect(d.energyMonthlyKwhPerKw.reduce((a, b) => a + b) / d.energyKwhPerKw).toBeCloseTo(1, 12);
        const after = d.stages.find((s) => s.name === 'stow')!.kwhPerKwAfter;
        const lost = d.lostToStowMonthlyKwhPerKw!.reduce((a, b) => a + b);
        expect(after).toBeCloseTo(without.energyKwhPerKw - lost, 9);
        // The hours before the ceiling are those of the plane as it stood.
        expect(energyUnderInverter(d.uncappedKwPerKw, 1, spec.ceilingKwPerKw)).toBeCloseTo(after, 9);
      }),
      { numRuns: 40 },
    );
  });

  test('in no hour changes nothing, and in every hour is the parked plane', () => {
    const spec = { ...nothing, ambient: warm, ceilingKwPerKw: 0.7 };
    const park = (at: number) =>
      deliver(sky, tracker, spec, [], { stowed: new Uint8Array(8760).fill(at), views: flat });
    const never = deliver(sky, tracker, spec);
    expect(park(0).energyMonthlyKwhPerKw).toEqual(never.energyMonthlyKwhPerKw);
    expect(never.lostToStowMonthlyKwhPerKw).toBeNull();
    expect(park(1).energyKwhPerKw / deliver(sky, flat, spec).energyKwhPerKw).toBeCloseTo(1, 12);
    expect(park(1).irradiationKwhM2).toBe(never.irradiationKwhM2);
  });
});

test('a dead tracker that may stand in several ways delivers their mean, each through the chain by itself', () => {
  const spec = { ...nothing, ambient: warm, ceilingKwPerKw: 0.5 };
  const drive = { working: 0.8, stuck: 'average' as const, visits: null, ownUse: null };
  const d = deliver(sky, tracker, { ...spec, drive }, [flat, lone, inRows]);
  const alone = [flat, lone, inRows].map((views) => deliver(sky, views, spec).energyKwhPerKw);
  expect(d.deadKwhPerKw).toBeCloseTo((alone[0] + alone[1] + alone[2]) / 3, 9);
  const working = deliver(sky, tracker, spec).energyKwhPerKw;
  expect(d.keptWhileDead).toBeCloseTo(d.deadKwhPerKw! / working, 12);
  expect(d.energyKwhPerKw).toBeCloseTo(0.8 * working + 0.2 * d.deadKwhPerKw!, 9);
});

test('rows never add energy, the closer they stand the less there is', () => {
  fc.assert(
    fc.property(
      fc.double({ min: 0, max: 80, noNaN: true }),
      fc.double({ min: 90, max: 270, noNaN: true }),
      fc.double({ min: 0.1, max: 0.8, noNaN: true }),
      (tilt, azimuth, gcr) => {
        const spec = { ...nothing, ambient: warm };
        const energy = (g: number | null) => {
          const d = deliver(sky, planeViews(site.sun, pointFixed(site.sun, tilt, azimuth, g)), spec);
          // Shade is taken after the irradiation, which is that of the open plane.
          expect(d.irradiationKwhM2).toBeGreaterThan(0);
          return d.energyKwhPerKw;
        };
        const [alone, wide, close] = [energy(null), energy(gcr), energy(gcr + 0.1)];
        // Shaded modules are cooler, which gives back a little of what the shade took.
        expect(wide).toBeLessThanOrEqual(alone * (1 + 1e-9));
        expect(close).toBeLessThanOrEqual(wide * (1 + 1e-9));
      },
    ),
    { numRuns: 25 },
  );
});

test('beam, sky and ground add up to the open light', () => {
  for (const model of ['perez', 'hay-davies', 'reindl', 'isotropic'] as const) {
    const light = skyOverHours(site.sun, site.radiation, 0.2, model);
    for (const views of [flat, lone, inRows, tracker]) {
      const parts = lightBySource(light, views.open);
      const total = yearlySum(lightThrough(light, views.open)) / 1000;
      expect((parts.beam + parts.sky + parts.ground) / total).toBeCloseTo(1, 12);
    }
  }
});

test('views of a fixed plane are those of its tilt in every sunlit hour', () => {
  const view = (1 + Math.cos((33 * Math.PI) / 180)) / 2;
  for (let h = 0; h < 8760; h++) {
    if (site.sun.sunlit[h] === 0) continue;
    expect(Math.abs(lone.open.sky[h] - view)).toBeLessThan(1e-12);
    expect(Math.abs(lone.open.ground[h] - (1 - view))).toBeLessThan(1e-12);
  }
  expect(lone.rows).toBe(lone.open);
  expect(inRows.rows).not.toBe(inRows.open);
});
