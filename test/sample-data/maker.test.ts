import fc from 'fast-check';
import { expect, test } from 'vitest';
import { type ClearAir, clearSky } from '../../sample-data/maker/clear-sky.ts';
import { belowClouds } from '../../sample-data/maker/cloudy-sky.ts';
import { nextState, seededNumbers, withMemory } from '../../sample-data/maker/random.ts';

const SEA_LEVEL: ClearAir = {
  pressureHpa: 1013.25,
  ozoneCm: 0.3,
  waterCm: 1.5,
  aerosol380: 0.15,
  aerosol500: 0.1,
  groundAlbedo: 0.2,
};

test('the generator reaches the published 10,000th state from seed 1', () => {
  // ISO/IEC 14882 (C++), [rand.predef], from memory: the 10000th invocation of minstd_rand, multiplier 48271, gives
  // 399268537.
  let state = 1;
  for (let i = 0; i < 10_000; i++) state = nextState(state);
  expect(state).toBe(399268537);
});

test('normal deviates with memory keep mean 0, deviation 1 and their memory', () => {
  const count = 20_000;
  const next = withMemory(seededNumbers(3, 1), 0.7);
  const x = Array.from({ length: count }, next);
  const mean = x.reduce((s, v) => s + v, 0) / count;
  const variance = x.reduce((s, v) => s + (v - mean) ** 2, 0) / count;
  const lagged = x.slice(1).reduce((s, v, i) => s + (v - mean) * (x[i] - mean), 0) / (count - 1);
  // Four standard errors of a mean with memory 0.7: 4 sqrt((1 + 0.7) / (1 - 0.7) / 20000) = 0.067.
  expect(Math.abs(mean)).toBeLessThan(0.067);
  expect(Math.abs(variance - 1)).toBeLessThan(0.07);
  expect(Math.abs(lagged / variance - 0.7)).toBeLessThan(0.02);
});

test('clear-sky global light agrees with Haurwitz 1945 to 8 % at sea level', () => {
  // From memory: Haurwitz 1945, Journal of Meteorology 2, 154-166: GHI = 1098 cos z exp(-0.057 / cos z) W/m2, a fit to Blue Hill.
  let worst = 0;
  for (let zenithDeg = 0; zenithDeg <= 70; zenithDeg += 5) {
    const cosZenith = Math.cos((zenithDeg * Math.PI) / 180);
    const { dni, dhi } = clearSky(cosZenith, 1361, SEA_LEVEL);
    const haurwitz = 1098 * cosZenith * Math.exp(-0.057 / cosZenith);
    worst = Math.max(worst, Math.abs((dni * cosZenith + dhi) / haurwitz - 1));
  }
  console.log(`clear sky against Haurwitz: worst ${(100 * worst).toFixed(1)} %`);
  expect(worst).toBeLessThan(0.08);
});

test('clear-sky beam agrees with the air-mass form of Meinel & Meinel 1976 to 8 % at sea level', () => {
  // From memory: Meinel & Meinel 1976, Applied Solar Energy: DNI = 1353 * 0.7^(AM^0.678) W/m2 (their solar constant).
  let worst = 0;
  for (let zenithDeg = 0; zenithDeg <= 75; zenithDeg += 5) {
    const cosZenith = Math.cos((zenithDeg * Math.PI) / 180);
    const meinel = 1353 * 0.7 ** ((1 / cosZenith) ** 0.678);
    worst = Math.max(worst, Math.abs(clearSky(cosZenith, 1353, SEA_LEVEL).dni / meinel - 1));
  }
  console.log(`clear beam against Meinel: worst ${(100 * worst).toFixed(1)} %`);
  expect(worst).toBeLessThan(0.08);
});

test('less air, less water and less haze each let more beam through', () => {
  const beam = (change: Partial<ClearAir>) => clearSky(0.6, 1361, { ...SEA_LEVEL, ...change }).dni;
  const now = beam({});
  expect(beam({ pressureHpa: 835 })).toBeGreaterThan(now);
  expect(beam({ waterCm: 0.5 })).toBeGreaterThan(now);
  expect(beam({ aerosol380: 0.05, aerosol500: 0.03 })).toBeGreaterThan(now);
  expect(beam({ ozoneCm: 0.2 })).toBeGreaterThan(now);
});

test('clouds follow Kasten & Czeplak: none changes nothing, a whole cover leaves a quarter, all of it diffuse', () => {
  const clear = { dni: 900, dhi: 80 };
  const clearGhi = 900 * 0.7 + 80;
  expect(belowClouds(clear, 0, 0.7)).toEqual(clear);
  const overcast = belowClouds(clear, 1, 0.7);
  expect(overcast.dni).toBe(0);
  expect(overcast.dhi).toBeCloseTo(0.25 * clearGhi, 9);
  // By hand: 0.5^3.4 = 0.094732, so global keeps 0.928951, and the beam 0.75 of that.
  const half = belowClouds(clear, 0.5, 0.7);
  expect(half.dni * 0.7 + half.dhi).toBeCloseTo(0.928951 * clearGhi, 2);
  expect(half.dni).toBeCloseTo(900 * 0.928951 * 0.75, 2);
});

test('more cloud never means more beam or more global light, and no component is ever negative', () => {
  const share = fc.double({ min: 0, max: 1, noNaN: true });
  fc.assert(
    fc.property(share, share, fc.double({ min: 0.01, max: 1, noNaN: true }), (a, b, cosZenith) => {
      const clear = clearSky(cosZenith, 1361, SEA_LEVEL);
      const less = belowClouds(clear, Math.min(a, b), cosZenith);
      const more = belowClouds(clear, Math.max(a, b), cosZenith);
      const ghi = (l: { dni: number; dhi: number }) => l.dni * cosZenith + l.dhi;
      return (
        more.dni >= 0 &&
        more.dhi >= 0 &&
        more.dni <= less.dni + 1e-9 &&
        ghi(more) <= ghi(less) + 1e-9 &&
        ghi(less) < 1361 * cosZenith
      );
    }),
  );
});
