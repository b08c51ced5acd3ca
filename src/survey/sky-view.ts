import { cosDeg, sinDeg } from '../shared/index.ts';
import { type SkylineTable, SLOTS } from './skyline-table.ts';

const SLOT_RAD = (2 * Math.PI) / SLOTS;
const COS = Float64Array.from({ length: SLOTS }, (_, i) => Math.cos((i + 0.5) * SLOT_RAD));
const SIN = Float64Array.from({ length: SLOTS }, (_, i) => Math.sin((i + 0.5) * SLOT_RAD));

/**
 * Share (0..1) of an even sky's light on a plane that the skyline leaves; 1 with an open horizon.
 *
 * The light of an even sky on a plane is the integral of cos(incidence) over the sky that it sees, pi (1 + cos tilt) / 2
 * when open (Duffie & Beckman, Solar Engineering of Thermal Processes, isotropic sky). Here cos(incidence) =
 * cos(tilt) sin e + sin(tilt) cos(d) cos e at elevation e and azimuth d from the plane's own, and the solid angle is
 * cos e de dd: over e it integrates to cos(tilt) sin^2(e) / 2 + sin(tilt) cos(d) (e + sin e cos e) / 2. Summed here over
 * azimuth is what the skyline takes, from the level horizon or from the edge of the plane's own view, whichever is higher.
 * Tilt 0..90, azimuth true; 5 microseconds or so.
 */
export const skyViewLeft = (table: SkylineTable, tiltDeg: number, azimuthDeg: number): number => {
  const { sine, levelLoss, uprightLoss } = table;
  const [level, upright] = [cosDeg(tiltDeg), sinDeg(tiltDeg)];
  const [east, north] = [upright * sinDeg(azimuthDeg), upright * cosDeg(azimuthDeg)];
  let lost = 0;
  for (let i = 0; i < SLOTS; i++) {
    if (sine[i] === 0) continue;
    const toward = north * COS[i] + east * SIN[i];
    const below = level * levelLoss[i] + toward * uprightLoss[i];
    lost += toward >= 0 ? below : behindLoss(sine[i], below, level, toward);
  }
  const open = (Math.PI * (1 + level)) / 2;
  return Math.max(0, 1 - (lost * SLOT_RAD) / open);
};

/** Behind the plane its view begins at the elevation where cos(incidence) is 0; only what the skyline hides above that is lost. */
const behindLoss = (sine: number, below: number, level: number, toward: number): number => {
  if (level * sine + toward * Math.sqrt(1 - sine * sine) <= 0) return 0;
  const edge = Math.atan2(-toward, level);
  const s = Math.sin(edge);
  return below - (level * s * s + toward * (edge + s * Math.cos(edge))) / 2;
};

/**
 * Share (0..1) of the horizon band's light on a tilted plane that the skyline leaves: an even band 6.5 degrees high,
 * weighted over the half circle before the plane with the cosine of the azimuth from the plane's own. It does not depend
 * on tilt.
 */
export const horizonBandLeft = ({ bandLeft }: SkylineTable, azimuthDeg: number): number => {
  const [east, north] = [sinDeg(azimuthDeg), cosDeg(azimuthDeg)];
  let [left, open] = [0, 0];
  for (let i = 0; i < SLOTS; i++) {
    const toward = north * COS[i] + east * SIN[i];
    if (toward <= 0) continue;
    open += toward;
    left += toward * bandLeft[i];
  }
  return left / open;
};

const TILT_STEP_DEG = 5;
const AZIMUTH_STEP_DEG = 10;
const [TILTS, AZIMUTHS] = [90 / TILT_STEP_DEG + 1, 360 / AZIMUTH_STEP_DEG];

export interface SkyViewLookup {
  /** `skyViewLeft` for any tilt 0..90 and azimuth 0..360, within 0.002 of it in the skylines tried (hills, a wall, a fence). */
  readonly skyLeft: (tiltDeg: number, azimuthDeg: number) => number;
  /** `horizonBandLeft` for any azimuth 0..360. */
  readonly bandLeft: (azimuthDeg: number) => number;
}

/** Both views at planes of 5 by 10 degrees once, then read between them: for planes that turn every hour. */
export const skyViewLookup = (table: SkylineTable): SkyViewLookup => {
  const width = AZIMUTHS + 1; // 360 repeats 0
  const grid = Float64Array.from({ length: TILTS * width }, (_, at) =>
    skyViewLeft(table, Math.floor(at / width) * TILT_STEP_DEG, (at % width) * AZIMUTH_STEP_DEG),
  );
  const band = Float64Array.from({ length: width }, (_, j) => horizonBandLeft(table, j * AZIMUTH_STEP_DEG));
  return {
    skyLeft: (tiltDeg, azimuthDeg) => {
      const [row, column] = [tiltDeg / TILT_STEP_DEG, azimuthDeg / AZIMUTH_STEP_DEG];
      const [i, j] = [Math.min(TILTS - 2, Math.floor(row)), Math.min(AZIMUTHS - 1, Math.floor(column))];
      const [u, v, at] = [row - i, column - j, i * width + j];
      const low = grid[at] + v * (grid[at + 1] - grid[at]);
      const high = grid[at + width] + v * (grid[at + width + 1] - grid[at + width]);
      return low + u * (high - low);
    },
    bandLeft: (azimuthDeg) => {
      const column = azimuthDeg / AZIMUTH_STEP_DEG;
      const j = Math.min(AZIMUTHS - 1, Math.floor(column));
      return band[j] + (column - j) * (band[j + 1] - band[j]);
    },
  };
};
