import type { SkylinePoint } from '../../src/survey/index.ts';
import { seeded } from '../shared/seeded.ts';

const RAD = Math.PI / 180;

/** Straight lines between points in order of azimuth, with the first repeated a turn later; by plain search. */
export const lineThrough = (points: readonly SkylinePoint[]) => {
  const turn = [...points, { azimuthDeg: points[0].azimuthDeg + 360, elevationDeg: points[0].elevationDeg }];
  return (azimuthDeg: number): number => {
    const az = azimuthDeg < points[0].azimuthDeg ? azimuthDeg + 360 : azimuthDeg;
    const i = turn.findIndex((p, k) => k > 0 && az <= p.azimuthDeg);
    const [a, b] = [turn[i - 1], turn[i]];
    return (
      a.elevationDeg +
      ((az - a.azimuthDeg) / (b.azimuthDeg - a.azimuthDeg)) * (b.elevationDeg - a.elevationDeg)
    );
  };
};

/**
 * Share of an even sky's light that a skyline leaves on a plane, by casting 160,000 rays from the plane: spread over its own
 * half of space in proportion to the cosine of incidence (jittered), each either below level, behind the skyline, or free.
 */
export const castRays = (
  elevationDegAt: (azimuthDeg: number) => number,
  tiltDeg: number,
  azimuthDeg: number,
): number => {
  const side = 400;
  const random = seeded(17);
  const [ct, st] = [Math.cos(tiltDeg * RAD), Math.sin(tiltDeg * RAD)];
  const [ca, sa] = [Math.cos(azimuthDeg * RAD), Math.sin(azimuthDeg * RAD)];
  let [open, free] = [0, 0];
  for (let i = 0; i < side; i++)
    for (let j = 0; j < side; j++) {
      const sine = Math.sqrt((i + random()) / side);
      const turn = (2 * Math.PI * (j + random())) / side;
      // In the plane's frame: up its slope, along it, and out of it.
      const [slope, along, out] = [sine * Math.cos(turn), sine * Math.sin(turn), Math.sqrt(1 - sine * sine)];
      const up = out * ct + slope * st;
      if (up <= 0) continue;
      const forward = out * st - slope * ct;
      const [north, east] = [forward * ca - along * sa, forward * sa + along * ca];
      open++;
      const rayAzimuth = (Math.atan2(east, north) / RAD + 360) % 360;
      if (Math.asin(Math.min(1, up)) / RAD > elevationDegAt(rayAzimuth)) free++;
    }
  return free / open;
};
