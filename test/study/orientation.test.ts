import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { orientationMap, planeIrradiation, skyOverHours } from '../../src/sky/index.ts';
import { factorBand, programmeLimits } from '../../src/study/orientation.ts';
import { inventedSky } from '../shared/invented-sky.ts';

const year = inventedSky(40, 2);
const sky = skyOverHours(year.sun, year.radiation, 0.2, 'perez');
const maximum = orientationMap(year.sun, sky, 40).best.irradiationKwhM2;
const factor = (tiltDeg: number, azimuthDeg: number) =>
  planeIrradiation(year.sun, sky, tiltDeg, azimuthDeg) / maximum;
const band = (
  tiltDeg: number,
  azimuthDeg: number,
  tiltErrorDeg: number | null,
  azimuthErrorDeg: number | null,
) => factorBand(year.sun, sky, { tiltDeg, azimuthDeg, tiltErrorDeg, azimuthErrorDeg }, maximum);

describe('the band that reading errors allow', () => {
  test('is unknown without reading errors, and a point with errors of zero', () => {
    expect(band(14, 166, null, null)).toBeNull();
    const zero = band(14, 166, 0, 0);
    expect(zero?.high).toBeCloseTo(zero?.low ?? 0, 12);
    expect(zero?.low).toBeCloseTo(factor(14, 166), 12);
  });

  test('holds the plane itself, grows with the errors and stays within 0..1', () => {
    const angle = (min: number, max: number) => fc.double({ min, max, noNaN: true });
    fc.assert(
      fc.property(angle(5, 60), angle(90, 270), angle(0.1, 5), angle(0.1, 10), (tilt, azimuth, te, ae) => {
        const [small, large] = [band(tilt, azimuth, te, ae), band(tilt, azimuth, 2 * te, 2 * ae)];
        if (!small || !large) throw new Error('errors were given');
        const own = factor(tilt, azimuth);
        expect(small.low).toBeLessThanOrEqual(own + 1e-12);
        expect(small.high).toBeGreaterThanOrEqual(Math.min(1, own) - 1e-12);
        expect(large.low).toBeLessThanOrEqual(small.low + 1e-12);
        expect(large.high).toBeGreaterThanOrEqual(small.high - 1e-12);
        expect(large.high).toBeLessThanOrEqual(1);
      }),
      { numRuns: 20 },
    );
  });

  test('is narrow near the optimum and wide on a steep roof that faces east', () => {
    const width = (b: { low: number; high: number } | null) => (b ? b.high - b.low : 0);
    expect(width(band(45, 90, 2, 5))).toBeGreaterThan(3 * width(band(35, 190, 2, 5)));
  });
});

describe('a programme', () => {
  const of = (factorNow: number, b: { low: number; high: number } | null, shading: number | null) =>
    programmeLimits({ minimumTof: 0.75, minimumTsrf: 0.75 }, factorNow, b, shading).map(
      (l) => `${l.name} ${l.status}`,
    );

  test('is kept, broken, or too near to tell within the reading errors', () => {
    expect(of(0.9, { low: 0.88, high: 0.92 }, 0.1)).toEqual(['TOF kept', 'TSRF kept']); // 0.9 x 0.9 = 0.81
    expect(of(0.9, { low: 0.88, high: 0.92 }, 0.2)).toEqual(['TOF kept', 'TSRF broken']); // 0.72, at most 0.736
    expect(of(0.76, { low: 0.74, high: 0.78 }, 0)).toEqual([
      'TOF within_reading_error',
      'TSRF within_reading_error',
    ]);
    expect(of(0.7, null, 0)).toEqual(['TOF broken', 'TSRF broken']);
    expect(of(0.75, null, 0)).toEqual(['TOF kept', 'TSRF kept']);
  });

  test('is not certified for TSRF where nobody measured the shade, but may be ruled out', () => {
    expect(of(0.9, null, null)).toEqual(['TOF kept', 'TSRF not_checked']);
    expect(of(0.7, null, null)).toEqual(['TOF broken', 'TSRF broken']);
  });

  test('that asks nothing sets no limit', () => {
    expect(programmeLimits({ minimumTof: null, minimumTsrf: null }, 0.5, null, 0.5)).toEqual([]);
  });
});
