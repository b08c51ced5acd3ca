import { HOURS, type HourlyYear } from '../shared/index.ts';
import type { SunHours } from './sun-hours.ts';

/** How well GHI = DNI cos z + DHI holds over the hours of daylight. */
export interface Closure {
  /** Mean of GHI less DNI cos z + DHI, W/m2. */
  readonly biasWm2: number;
  readonly rmsWm2: number;
  readonly hours: number;
}

/** Null unless the file gives all three components: a derived one closes by itself. */
export const closureOf = (year: HourlyYear, sun: SunHours): Closure | null => {
  const { ghi, dni, dhi, origin } = year;
  if (origin.ghi !== 'given' || origin.dni !== 'given' || origin.dhi !== 'given') return null;
  let [sum, squares, hours] = [0, 0, 0];
  for (let h = 0; h < HOURS; h++) {
    if (sun.sunlit[h] === 0) continue;
    const excess = ghi[h] - dhi[h] - dni[h] * sun.cosZenith[h];
    sum += excess;
    squares += excess ** 2;
    hours++;
  }
  return hours === 0 ? null : { biasWm2: sum / hours, rmsWm2: Math.sqrt(squares / hours), hours };
};
