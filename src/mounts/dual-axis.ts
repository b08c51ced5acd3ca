import { type SunHours, sunAzimuthDeg } from '../sun/index.ts';
import { type MastReach, pointOnMast } from './mast.ts';
import { mastFieldShade } from './mast-field.ts';
import { emptyPointing, type Pointing } from './pointing.ts';
import { groundLeftByRows, skyLeftByRows } from './row-view.ts';
import type { DualAxis } from './spec.ts';

const UPRIGHT_TO_FLAT = { lowestDeg: 0, highestDeg: 90 };

/** Where a mast with limits can face; null where it faces every sun. */
export const reachOf = ({ turns, elevation }: DualAxis): MastReach | null =>
  turns || elevation ? { turns: turns ?? null, elevation: elevation ?? UPRIGHT_TO_FLAT } : null;

/**
 * A plane that faces the sun, or as near to it as its limits allow: alone, or in a level square field of masts. What the
 * neighbours of a field take of sky and ground is that of long rows at the same pitch times the share of a row that the
 * masts fill (assumption: no published figure is known to us).
 */
export const pointDualAxis = (sun: SunHours, mount: DualAxis, used: Pointing | null = null): Pointing => {
  const reach = reachOf(mount);
  if (reach) return pointOnMast(sun, reach, mount.rows?.gcr ?? null, used);
  const pointing = emptyPointing(sun, mount.rows !== null, (s) => sunAzimuthDeg(sun, s), used);
  pointing.cosIncidence.fill(1);
  pointing.cosTilt.set(sun.up);
  for (let s = 0; s < sun.up.length; s++)
    pointing.sinTilt[s] = Math.sqrt(Math.max(0, 1 - sun.up[s] * sun.up[s]));
  if (mount.rows && pointing.neighbours) {
    const { shaded, skyLeft, groundLeft } = pointing.neighbours;
    const filled = Math.sqrt(mount.rows.gcr);
    for (let s = 0; s < sun.up.length; s++) {
      shaded[s] = mastFieldShade(sun.east[s], sun.north[s], sun.up[s], mount.rows.gcr);
      skyLeft[s] = 1 - filled * (1 - skyLeftByRows(sun.up[s], filled));
      groundLeft[s] = 1 - filled * (1 - groundLeftByRows(sun.up[s], filled));
    }
  }
  return pointing;
};
