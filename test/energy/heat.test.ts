import { expect, test } from 'vitest';
import { moduleTemperatureC, OPEN_RACK, onRoof, powerAtTemperature } from '../../src/energy/index.ts';

test('module temperature is Faiman’s: 20 degrees air, 800 W/m2', () => {
  // Hand arithmetic from Faiman 2008, eq. 6, with U0 25 and U1 6.84: 20 + 800 / (25 + 6.84 v).
  const table = [
    [0, 52],
    [1, 45.126],
    [3, 37.575],
    [5, 33.514],
  ];
  for (const [wind, expected] of table)
    expect(Math.abs(moduleTemperatureC(20, 800, wind, OPEN_RACK.u0, OPEN_RACK.u1) - expected)).toBeLessThan(
      1e-3,
    );
});

test('power falls in a line with temperature', () => {
  // Hand arithmetic: 1 - heat * (56.25 - 25).
  const table = [
    [-0.0035, 0.890625],
    [-0.003, 0.90625],
    [-0.0045, 0.859375],
  ];
  for (const [heat, expected] of table) expect(powerAtTemperature(56.25, heat)).toBeCloseTo(expected, 12);
  expect(powerAtTemperature(25, -0.004)).toBe(1);
  expect(powerAtTemperature(0, -0.004)).toBeGreaterThan(1);
});

test('a roof cools less than a rack, the less air behind the less, and a blank gap is said', () => {
  const gaps = [0, 0.05, 0.1, 0.15, 0.5].map((gap) => onRoof(gap).u0);
  expect(gaps).toEqual([...gaps].sort((a, b) => a - b));
  expect(gaps[0]).toBeGreaterThanOrEqual(OPEN_RACK.u0 / 2);
  expect(gaps[4]).toBeLessThan(OPEN_RACK.u0);
  expect(onRoof(null).u0).toBe(onRoof(0.05).u0);
  expect(onRoof(null).source).toContain('blank');
  expect(onRoof(0.05).source).not.toContain('blank');
});
