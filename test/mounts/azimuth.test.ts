import fc from 'fast-check';
import { expect, test } from 'vitest';
import { axisTiltOnSlope, pointMount, type ResolvedGeometry } from '../../src/mounts/index.ts';
import { acosDeg, cosDeg, sinDeg } from '../../src/shared/index.ts';
import { sunOverHours } from '../../src/sun/index.ts';

const place = { latitudeDeg: 37, longitudeDeg: -3, elevationM: 0, utcOffsetH: 0 };
const sun = sunOverHours(place, new Int16Array(365).fill(2021), 0);

/** A plane's tilt and azimuth must give the cosine of incidence that its pointing says. Vector geometry. */
const worstMismatch = (mount: ResolvedGeometry): number => {
  const p = pointMount(sun, mount);
  let worst = 0;
  for (let s = 0; s < sun.up.length; s += 37) {
    const [tilt, azimuth] = [acosDeg(p.cosTilt[s]), p.azimuthDegAt(s)];
    const cosine =
      sinDeg(tilt) * (sinDeg(azimuth) * sun.east[s] + cosDeg(azimuth) * sun.north[s]) +
      cosDeg(tilt) * sun.up[s];
    worst = Math.max(worst, Math.abs(cosine - p.cosIncidence[s]));
  }
  return worst;
};

test('azimuth and tilt of a single-axis tracker give its angle of incidence, whatever its axis, swing, rows and ground', () => {
  fc.assert(
    fc.property(
      fc.record({
        axis: fc.double({ min: 0, max: 360, noNaN: true }),
        tilt: fc.double({ min: 0, max: 60, noNaN: true }),
      }),
      fc.double({ min: 20, max: 90, noNaN: true }),
      fc.option(fc.record({ gcr: fc.double({ min: 0.1, max: 0.8, noNaN: true }), back: fc.boolean() })),
      fc.boolean(),
      ({ axis, tilt }, swingDeg, rows, sloping) => {
        const ground = { slopeDeg: tilt / 3, fallsTowardDeg: 360 - axis };
        const mount: ResolvedGeometry = {
          kind: 'single-axis',
          axisAzimuthDeg: axis,
          axisTiltDeg: tilt,
          swingDeg,
          rows: rows && { gcr: rows.gcr, lowSun: rows.back ? 'backtrack' : 'shade' },
          ...(sloping && {
            axisTiltDeg: axisTiltOnSlope(ground.slopeDeg, ground.fallsTowardDeg, axis),
            ground,
          }),
        };
        // The angle from its cosine is good to the square root of rounding near 0 degrees.
        expect(worstMismatch(mount)).toBeLessThan(1e-6);
      },
    ),
    { numRuns: 60 },
  );
});

test('so do those of fixed planes and masts', () => {
  expect(worstMismatch({ kind: 'roof-plane', tiltDeg: 14, azimuthDeg: 166 })).toBeLessThan(1e-9);
  expect(worstMismatch({ kind: 'dual-axis', rows: null })).toBeLessThan(1e-6);
  const limits = { turns: { fromDeg: 100, toDeg: 250 }, elevation: { lowestDeg: 20, highestDeg: 60 } };
  expect(worstMismatch({ kind: 'dual-axis', rows: null, ...limits })).toBeLessThan(1e-9);
  expect(worstMismatch({ kind: 'turntable', planeTiltDeg: 35, rows: null })).toBeLessThan(1e-9);
  const north = { turns: { fromDeg: 300, toDeg: 60 } };
  expect(worstMismatch({ kind: 'turntable', planeTiltDeg: 35, rows: null, ...north })).toBeLessThan(1e-9);
});
