import { expect, test } from 'vitest';
import {
  axisTiltOnSlope,
  type DualAxis,
  nearestPlane,
  planesStoppedAt,
  pointAtTurn,
  pointDualAxis,
  pointSingleAxis,
  reachOf,
  type SingleAxis,
  turnAt,
  turnsStoppedAt,
} from '../../src/mounts/index.ts';
import { acosDeg, asinDeg, wrap180 } from '../../src/shared/index.ts';
import { sunAzimuthDeg } from '../../src/sun/index.ts';
import { inventedSky } from '../shared/invented-sky.ts';

const { sun } = inventedSky(40, 9);
const ground = { slopeDeg: 12, fallsTowardDeg: 230 };
const onSlope = (swingDeg: number, gcr = 0.5): SingleAxis => ({
  kind: 'single-axis',
  axisAzimuthDeg: 180,
  axisTiltDeg: axisTiltOnSlope(12, 230, 180),
  swingDeg,
  rows: { gcr, lowSun: 'shade' },
  ground,
});

test('on sloping ground a tracker that stands still has the shade and the view of one that turns, where it turns so', () => {
  let [compared, worst, shaded] = [0, 0, 0];
  for (const swingDeg of [0, 30]) {
    const mount = onSlope(swingDeg);
    const moving = pointSingleAxis(sun, mount);
    const still = pointAtTurn(sun, mount, swingDeg);
    for (let s = 0; s < sun.up.length; s++) {
      // At the end of its swing the moving one stands as the still one does.
      if (Math.abs(turnAt(sun, mount, s) - swingDeg) > 1e-9) continue;
      compared++;
      const pairs = [
        [moving.cosIncidence[s], still.cosIncidence[s]],
        [moving.cosTilt[s], still.cosTilt[s]],
        [moving.neighbours!.shaded[s], still.neighbours!.shaded[s]],
        [moving.neighbours!.skyLeft[s], still.neighbours!.skyLeft[s]],
        [moving.neighbours!.groundLeft[s], still.neighbours!.groundLeft[s]],
      ];
      for (const [a, b] of pairs) worst = Math.max(worst, Math.abs(a - b));
      if (still.neighbours!.shaded[s] > 0) shaded++;
    }
  }
  console.log(`still against turning on a slope: worst ${worst} of ${compared} suns, ${shaded} shaded`);
  expect(compared).toBeGreaterThan(10_000);
  expect(shaded).toBeGreaterThan(300);
  expect(worst).toBeLessThan(1e-9); // rounding alone
});

test('a tracker that backtracks on a slope is turned as it points', () => {
  const mount: SingleAxis = { ...onSlope(60), rows: { gcr: 0.5, lowSun: 'backtrack' } };
  const moving = pointSingleAxis(sun, mount);
  let worst = 0;
  for (let s = 0; s < sun.up.length; s += 5) {
    const still = pointAtTurn(sun, { ...mount, rows: null }, turnAt(sun, mount, s));
    worst = Math.max(worst, Math.abs(still.cosIncidence[s] - moving.cosIncidence[s]));
    if (s > 300) break;
  }
  expect(worst).toBeLessThan(1e-9);
});

test('a mast with limits that stopped at random stands within them, and without limits nothing changes', () => {
  const mast: DualAxis = {
    kind: 'dual-axis',
    rows: null,
    turns: { fromDeg: 120, toDeg: 240 },
    elevation: { lowestDeg: 30, highestDeg: 60 },
  };
  const planes = planesStoppedAt(sun, reachOf(mast));
  expect(planes).toHaveLength(18);
  for (const { tiltDeg, azimuthDeg } of planes) {
    expect(tiltDeg).toBeGreaterThanOrEqual(30);
    expect(tiltDeg).toBeLessThanOrEqual(60);
    expect(Math.abs(wrap180(azimuthDeg - 180))).toBeLessThanOrEqual(60 + 1e-9);
  }
  expect(reachOf({ kind: 'dual-axis', rows: null })).toBeNull();
});

test('the nearest plane of a mast to each sun is the one that it points', () => {
  const mast: DualAxis = {
    kind: 'dual-axis',
    rows: null,
    turns: { fromDeg: 100, toDeg: 220 },
    elevation: { lowestDeg: 20, highestDeg: 70 },
  };
  const moving = pointDualAxis(sun, mast);
  let [compared, worst] = [0, 0];
  for (let s = 0; s < sun.up.length; s += 17) {
    const plane = nearestPlane(reachOf(mast)!, sunAzimuthDeg(sun, s), asinDeg(Math.max(0, sun.up[s])));
    worst = Math.max(worst, Math.abs(plane.tiltDeg - acosDeg(moving.cosTilt[s])));
    worst = Math.max(worst, Math.abs(wrap180(plane.azimuthDeg - moving.azimuthDegAt(s))));
    compared++;
  }
  expect(compared).toBeGreaterThan(1000);
  expect(worst).toBeLessThan(1e-5); // degrees; acos near its ends
});

test('hours that a tracker spends lying flat draw where it stops at random towards flat', () => {
  const mount = onSlope(60);
  const free = turnsStoppedAt(sun, mount);
  const none = turnsStoppedAt(sun, mount, new Uint8Array(8760));
  const all = turnsStoppedAt(sun, mount, new Uint8Array(8760).fill(1));
  const some = turnsStoppedAt(
    sun,
    mount,
    Uint8Array.from({ length: 8760 }, (_, h) => h & 1),
  );
  const away = (turns: number[]) => turns.reduce((sum, turn) => sum + Math.abs(turn), 0);
  expect(none).toEqual(free);
  for (const turn of all) expect(turn).toBeCloseTo(0, 12);
  expect(away(some)).toBeLessThan(away(free));
  expect(away(some)).toBeGreaterThan(0);
});
