import { describe, expect, test } from 'vitest';
import { beamThroughGlass, diffuseThroughGlass, tiltIndex } from '../../src/energy/index.ts';
import { Worst } from '../shared/seeded.ts';

const DEG = Math.PI / 180;

test('beam passes the glass as in Martin & Ruiz 2001 with an angular loss of 0.16', () => {
  // Their eq. 2 in another program (Python), four decimals.
  const table = [
    [0, 1],
    [30, 0.9975],
    [45, 0.9899],
    [50, 0.9839],
    [60, 0.9579],
    [70, 0.8838],
    [80, 0.6635],
    [85, 0.4208],
    [90, 0],
  ];
  const worst = new Worst();
  for (const [angle, expected] of table)
    worst.note(beamThroughGlass(Math.cos(angle * DEG)) - expected, `${angle} degrees`);
  worst.print('beam through glass');
  expect(worst.count).toBe(9);
  expect(worst.size).toBeLessThan(1e-4);
});

test('light from behind does not pass, and more passes the nearer to normal', () => {
  expect(beamThroughGlass(0)).toBe(0);
  expect(beamThroughGlass(-0.5)).toBe(0);
  for (let c = 0; c < 1; c += 0.01) expect(beamThroughGlass(c + 0.01)).toBeGreaterThan(beamThroughGlass(c));
  expect(beamThroughGlass(1)).toBeCloseTo(1, 12);
});

/** The same by throwing directions over the half sphere of the plane itself, sky or ground by where each points. */
const byRings = (tiltDeg: number): { sky: number; ground: number } => {
  const [rings, spokes] = [400, 400];
  const sums = { sky: [0, 0], ground: [0, 0] };
  for (let i = 0; i < rings; i++) {
    const incidence = ((i + 0.5) / rings) * (Math.PI / 2);
    for (let j = 0; j < spokes; j++) {
      const around = ((j + 0.5) / spokes) * 2 * Math.PI;
      const up =
        Math.cos(incidence) * Math.cos(tiltDeg * DEG) +
        Math.sin(incidence) * Math.cos(around) * Math.sin(tiltDeg * DEG);
      const light = Math.cos(incidence) * Math.sin(incidence);
      const sum = up > 0 ? sums.sky : sums.ground;
      sum[0] += light;
      sum[1] += light * beamThroughGlass(Math.cos(incidence));
    }
  }
  return { sky: sums.sky[1] / sums.sky[0], ground: sums.ground[1] / sums.ground[0] };
};

describe('diffuse light through the glass', () => {
  const glass = diffuseThroughGlass();

  test('agrees with the hemisphere integrals at 0, 30, 45 and 90 degrees', () => {
    // Worked out in another program (Python); at 90 degrees sky and ground are alike.
    const table: [number, number, number | null][] = [
      [0, 0.9514, null],
      [30, 0.9634, 0.7833],
      [45, 0.9649, 0.8726],
      [90, 0.951, 0.951],
    ];
    const worst = new Worst();
    for (const [tilt, sky, ground] of table) {
      worst.note(glass.sky[tilt] - sky, `sky at ${tilt}`);
      if (ground !== null) worst.note(glass.ground[tilt] - ground, `ground at ${tilt}`);
    }
    worst.print('diffuse light through glass');
    expect(worst.count).toBe(7);
    expect(worst.size).toBeLessThan(0.002);
  });

  test('agrees at every whole tilt with another way of integrating', () => {
    const [sky, ground] = [new Worst(), new Worst()];
    for (const tilt of [5, 12, 20, 33, 48, 60, 71, 85]) {
      const rings = byRings(tilt);
      sky.note(glass.sky[tilt] - rings.sky, `tilt ${tilt}`);
      ground.note((glass.ground[tilt] - rings.ground) * ((1 - Math.cos(tilt * DEG)) / 2), `tilt ${tilt}`);
    }
    sky.print('sky through glass against rings');
    ground.print('ground through glass, weighed by its view, against rings');
    expect(sky.size).toBeLessThan(0.001);
    // The table is straight between steps of 5 degrees; what counts is the loss times the view of the ground.
    expect(ground.size).toBeLessThan(0.001);
  });

  test('of the horizon passes by the mean over the band', () => {
    // An upright plane: mean of cos(a) f(cos(a)) over azimuths -90..90, over the mean of cos(a).
    let [light, through] = [0, 0];
    for (let i = 0; i < 5000; i++) {
      const c = Math.cos((((i + 0.5) / 5000) * Math.PI) / 2);
      light += c;
      through += c * beamThroughGlass(c);
    }
    expect(glass.horizon[90]).toBeCloseTo(through / light, 4);
  });

  test('is read by the cosine of the tilt', () => {
    expect([0, 30, 45, 90, 120].map((tilt) => tiltIndex(Math.cos(tilt * DEG)))).toEqual([0, 30, 45, 90, 90]);
  });
});
