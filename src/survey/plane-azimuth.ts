import { type Finding, wrap360 } from '../shared/index.ts';
import { type DeclinationMistakes, declinationMistakes, sumToTrue, trueFromMagnetic } from './bearing.ts';
import { type Downslope, facingOf, facingWords, type Taken } from './facing.ts';
import { refuse } from './refuse.ts';
import { meanReading } from './two-readings.ts';
import { plain } from './words.ts';

/** A compass or map bearing of a plane, as read. */
export interface BearingReading {
  readonly north: 'magnetic' | 'true';
  /** 0..360, clockwise. */
  readonly bearingDeg: number;
  /** The same line read from its far end; null where it was not. */
  readonly backDeg?: number | null;
  readonly taken: Taken;
  readonly downslope?: Downslope | null;
  /** Reading error, either way; null where the user gives none. */
  readonly errorDeg?: number | null;
}

export interface PlaneAzimuth {
  /** True azimuth that the plane faces, 0..360. */
  readonly azimuthDeg: number;
  /** The user's error, or half the disagreement of two readings where that is more; null where neither is known. */
  readonly errorDeg: number | null;
  /** Each step with its sum, in the order taken: the mean, the declination, the turn. */
  readonly steps: readonly string[];
  /** `faces south-south-east`. */
  readonly words: string;
  readonly findings: readonly Finding[];
  /** Null for a bearing that is true as read. */
  readonly mistakes: DeclinationMistakes | null;
}

const TURN_WORDS: Record<Taken, string> = {
  facing: 'taken facing out from the plane',
  looking_at: 'taken looking at the plane, so turned by 180',
  along_ridge: 'taken along the ridge or eave, so turned by 90 to the downslope side',
};

/**
 * From the readings to the way that the plane faces. `declinationDeg` (east positive) is needed for magnetic readings and
 * is not used for true ones, so that nobody applies it twice.
 */
export const planeAzimuth = (reading: BearingReading, declinationDeg: number | null): PlaneAzimuth => {
  const { north, taken, downslope = null } = reading;
  const pair =
    reading.backDeg === undefined || reading.backDeg === null
      ? null
      : meanReading(reading.bearingDeg, reading.backDeg);
  const readDeg = pair ? pair.bearingDeg : reading.bearingDeg;
  const declination = north === 'magnetic' ? (declinationDeg ?? refuseWithoutDeclination(readDeg)) : null;
  const bearingDeg = declination === null ? wrap360(readDeg) : trueFromMagnetic(readDeg, declination);
  const azimuthDeg = facingOf({ bearingDeg, taken, downslope });
  return {
    azimuthDeg,
    errorDeg: largest(reading.errorDeg ?? null, pair ? pair.leastErrorDeg : null),
    steps: [
      ...(pair ? [pair.words] : []),
      declination === null ? `${plain(readDeg)} true as read` : sumToTrue(readDeg, declination),
      `${TURN_WORDS[taken]}: ${plain(azimuthDeg)} true, ${facingWords(azimuthDeg)}`,
    ],
    words: facingWords(azimuthDeg),
    findings: pair ? pair.findings : [],
    mistakes: declination === null ? null : declinationMistakes(azimuthDeg, declination),
  };
};

const largest = (a: number | null, b: number | null): number | null =>
  a === null ? b : b === null ? a : Math.max(a, b);

const refuseWithoutDeclination = (bearingDeg: number): never =>
  refuse({
    code: 'missing-declination',
    expected: `the declination of the magnetic bearing ${plain(bearingDeg)}`,
    found: 'neither a date with a place nor a declination',
    fix: 'Give the date of the reading, or the declination itself as 16 E or 16 W.',
  });
