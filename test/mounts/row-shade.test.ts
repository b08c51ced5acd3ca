import fc from 'fast-check';
import { expect, test } from 'vitest';
import { rowShade, trackerRowShade } from '../../src/mounts/index.ts';
import { Worst } from '../shared/seeded.ts';
import { SHADED_ROWS } from './published-rows.ts';

const DEG = Math.PI / 180;

/** A fixed row seen from the side: slant, pitch, tilt and the profile angle of the sun. */
const fixedShade = (slant: number, pitch: number, tiltDeg: number, profileDeg: number): number =>
  rowShade(Math.sin(profileDeg * DEG), Math.sin((profileDeg + tiltDeg) * DEG), slant / pitch);

test('eight tracker rows are shaded as worked out', () => {
  // turn, turn that faces the sun, GCR, cross slope, shaded share: Anderson & Mikofski 2020, eq. 32, in another program
  // (Python), checked there by an independent ray trace.
  const table = SHADED_ROWS;
  const worst = new Worst();
  for (const [turn, facing, gcr, crossAxis, expected] of table)
    worst.note(
      trackerRowShade(turn, facing, gcr, crossAxis) - expected,
      `turn ${turn}, sun ${facing}, slope ${crossAxis}`,
    );
  worst.print('shaded share of a tracker row');
  expect(worst.count).toBe(8);
  expect(worst.size).toBeLessThan(1e-5);
});

test('six fixed rows are shaded as worked out', () => {
  // slant, pitch, tilt, profile angle, shaded share: 1 - P sin(ap) / (L sin(ap + tilt)) in another program (Python).
  const table = [
    [2, 4, 30, 10, 0.4597],
    [2, 4, 30, 15, 0.26795],
    [2, 4, 30, 20, 0.10705],
    [2, 4, 30, 5, 0.6961],
    [1, 2, 20, 12, 0.21531],
    [4, 6, 35, 20, 0.37371],
  ];
  const worst = new Worst();
  for (const [slant, pitch, tilt, profile, expected] of table)
    worst.note(
      fixedShade(slant, pitch, tilt, profile) - expected,
      `L ${slant} P ${pitch} tilt ${tilt} sun ${profile}`,
    );
  worst.print('shaded share of a fixed row');
  expect(worst.count).toBe(6);
  expect(worst.size).toBeLessThan(1e-5);
});

test('shade ends where the profile angle reaches atan(L sin tilt / (P - L cos tilt))', () => {
  // The limit angle of three rows, degrees, worked out in another program (Python).
  const table = [
    [2, 4, 30, 23.794],
    [1, 2, 20, 17.878],
    [4, 6, 35, 40.1123],
  ];
  for (const [slant, pitch, tilt, limit] of table) {
    const rise = slant * Math.sin(tilt * DEG);
    expect(Math.atan(rise / (pitch - slant * Math.cos(tilt * DEG))) / DEG).toBeCloseTo(limit, 3);
    expect(fixedShade(slant, pitch, tilt, limit - 0.01)).toBeGreaterThan(0);
    expect(fixedShade(slant, pitch, tilt, limit + 0.01)).toBe(0);
  }
});

test('the shaded share is what a ray from each point of the slant finds blocked', () => {
  fc.assert(
    fc.property(
      fc.double({ min: 1, max: 89, noNaN: true }),
      fc.double({ min: 0.5, max: 89, noNaN: true }),
      fc.double({ min: 0.1, max: 0.9, noNaN: true }),
      (tilt, profile, gcr) => {
        const [pitch, points] = [1 / gcr, 4000];
        let blocked = 0;
        for (let i = 0; i < points; i++) {
          // Point on the slant, lower edge at the origin, the next row `pitch` in front with its lower edge level.
          const along = (i + 0.5) / points;
          const [x, y] = [-along * Math.cos(tilt * DEG), along * Math.sin(tilt * DEG)];
          // Where the ray (cos, sin) meets the line of the next row: solve for its height along that row.
          const [dx, dy] = [Math.cos(profile * DEG), Math.sin(profile * DEG)];
          const normal = [Math.sin(tilt * DEG), Math.cos(tilt * DEG)];
          const reach = ((pitch - x) * normal[0] + (0 - y) * normal[1]) / (dx * normal[0] + dy * normal[1]);
          const height = (y + reach * dy) / Math.sin(tilt * DEG);
          if (height > 0 && height < 1) blocked++;
        }
        expect(Math.abs(fixedShade(1, pitch, tilt, profile) - blocked / points)).toBeLessThan(5e-4);
      },
    ),
    { numRuns: 60 },
  );
});

test('the shaded share lies between 0 and 1 and falls as the sun rises', () => {
  fc.assert(
    fc.property(
      fc.double({ min: 0, max: 90, noNaN: true }),
      fc.double({ min: 0.1, max: 80, noNaN: true }),
      fc.double({ min: 0.05, max: 1, noNaN: true }),
      (tilt, profile, gcr) => {
        const low = fixedShade(gcr, 1, tilt, profile);
        const high = fixedShade(gcr, 1, tilt, profile + 1);
        expect(low).toBeGreaterThanOrEqual(0);
        expect(low).toBeLessThanOrEqual(1);
        if (profile + tilt < 178) expect(high).toBeLessThanOrEqual(low + 1e-12);
      },
    ),
  );
});
