import { expect, test } from 'vitest';
import { mastFieldShade, pointDualAxis } from '../../src/mounts/index.ts';
import { seeded, Worst } from '../shared/seeded.ts';
import { sunAt } from './direction.ts';

const DEG = Math.PI / 180;
type Vector = readonly [number, number, number];
const dot = (a: Vector, b: Vector) => a[0] * b[0] + a[1] * b[1] + a[2] * b[2];

/** Shaded share of a square collector among others on a square grid, all facing the sun: rays from seeded points, in space. */
const byRays = (sun: Vector, gcr: number, random: () => number, side = 70): number => {
  const pitch = 1 / Math.sqrt(gcr);
  const level = Math.hypot(sun[0], sun[1]);
  const right: Vector = [sun[1] / level, -sun[0] / level, 0];
  const upward: Vector = [
    right[1] * sun[2] - right[2] * sun[1],
    right[2] * sun[0] - right[0] * sun[2],
    right[0] * sun[1] - right[1] * sun[0],
  ];
  const nearer: [number, number][] = [];
  for (let x = -25; x <= 25; x++)
    for (let y = -25; y <= 25; y++) {
      const mast: Vector = [x * pitch, y * pitch, 0];
      if (dot(mast, sun) > 1e-9) nearer.push([dot(mast, right), dot(mast, upward)]);
    }
  let shaded = 0;
  for (let i = 0; i < side * side; i++) {
    // One seeded point in each cell of a grid scatters far less than as many points anywhere.
    const [a, b] = [((i % side) + random()) / side - 0.5, (Math.floor(i / side) + random()) / side - 0.5];
    let hit = false;
    // Only collectors nearer the sun can be met, and the ray meets their plane square on.
    for (let m = 0; m < nearer.length && !hit; m++)
      hit = Math.abs(a - nearer[m][0]) < 0.5 && Math.abs(b - nearer[m][1]) < 0.5;
    if (hit) shaded++;
  }
  return shaded / side ** 2;
};

test('the shade in a field of masts agrees with rays cast in space', { timeout: 60_000 }, () => {
  const random = seeded(11);
  const worst = new Worst();
  let shadedCases = 0;
  for (const gcr of [0.05, 0.15, 0.3, 0.5])
    for (const elevation of [2, 5, 10, 15, 25, 40, 60])
      for (let i = 0; i < 4; i++) {
        const azimuth = i === 0 ? 90 : i === 1 ? 135 : 360 * random();
        const [z, a] = [(90 - elevation) * DEG, azimuth * DEG];
        const sun: Vector = [Math.sin(z) * Math.sin(a), Math.sin(z) * Math.cos(a), Math.cos(z)];
        const expected = byRays(sun, gcr, random);
        const shade = mastFieldShade(...sun, gcr);
        if (expected > 0.05) shadedCases++;
        worst.note(
          shade - expected,
          `GCR ${gcr}, elevation ${elevation}, azimuth ${azimuth.toFixed(1)}: ${shade.toFixed(3)} for ${expected.toFixed(3)}`,
        );
      }
  worst.print('shaded share of a collector in a field of masts');
  expect(worst.count).toBe(112);
  expect(shadedCases).toBeGreaterThan(30);
  // Only cells on the edge of a shadow are in doubt: some 200 of 4,900, half a cell each, so 0.0015 (one sigma).
  expect(worst.size).toBeLessThan(0.006);
});

test('the shade of a field is the same seen from eight sides, and none under a high sun', () => {
  const [z, a] = [80 * DEG, 25 * DEG];
  const [p, q, up] = [Math.sin(z) * Math.sin(a), Math.sin(z) * Math.cos(a), Math.cos(z)];
  const shade = mastFieldShade(p, q, up, 0.3);
  expect(shade).toBeGreaterThan(0.1);
  for (const [e, n] of [
    [-p, q],
    [p, -q],
    [-p, -q],
    [q, p],
    [-q, p],
    [q, -p],
    [-q, -p],
  ])
    expect(Math.abs(mastFieldShade(e, n, up, 0.3) - shade)).toBeLessThan(1e-9);
  expect(mastFieldShade(0, 0, 1, 0.3)).toBe(0);
  expect(mastFieldShade(0.1, 0, Math.sqrt(0.99), 0.3)).toBe(0);
});

test('a lone mast faces the sun, unshaded, and a thin field comes near it', () => {
  const directions = [
    [85, 90],
    [60, 120],
    [30, 180],
    [0, 0],
    [89, 271],
  ] as const;
  const sun = sunAt(directions);
  const alone = pointDualAxis(sun, { kind: 'dual-axis', rows: null });
  expect(alone.neighbours).toBeNull();
  directions.forEach(([z], s) => {
    expect(alone.cosIncidence[s]).toBe(1);
    expect(alone.cosTilt[s]).toBeCloseTo(Math.cos(z * DEG), 12);
    expect(alone.sinTilt[s]).toBeCloseTo(Math.sin(z * DEG), 7);
  });
  const thin = pointDualAxis(sun, { kind: 'dual-axis', rows: { gcr: 1e-5, lowSun: 'shade' } }).neighbours!;
  for (let s = 0; s < 4; s++) {
    expect(thin.shaded[s]).toBe(0);
    expect(thin.skyLeft[s]).toBeGreaterThan(0.999);
    expect(thin.groundLeft[s]).toBeGreaterThan(0.999);
  }
});
