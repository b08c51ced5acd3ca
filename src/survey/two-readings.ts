import { type Finding, wrap180, wrap360 } from '../shared/index.ts';
import { refuse } from './refuse.ts';
import { degreesText, plain } from './words.ts';

/** Common practice, no source: forward and back bearings of one line should fit within this. */
export const AGREEMENT_DEG = 2;

const ROUNDING_DEG = 1e-9;

export interface MeanReading {
  /** Mean of the forward reading and the back reading turned about, 0..360. */
  readonly bearingDeg: number;
  /** How far the two are from 180 degrees apart, 0..90. */
  readonly disagreementDeg: number;
  /** The reading error is at least this: half the disagreement. */
  readonly leastErrorDeg: number;
  /** `forward 10 and back 191: mean 10.5, 1 degree from opposite`. */
  readonly words: string;
  readonly findings: readonly Finding[];
}

/**
 * Two readings of one line from its two ends (both magnetic or both true, 0..360), averaged on the circle. Refuses
 * readings over 90 degrees from opposite (code `not-a-back-bearing`): then both were taken the same way.
 */
export const meanReading = (forwardDeg: number, backDeg: number): MeanReading => {
  const offset = wrap180(backDeg + 180 - forwardDeg);
  const disagreementDeg = Math.abs(offset);
  if (disagreementDeg > 90)
    return refuse({
      code: 'not-a-back-bearing',
      expected: `a back bearing near ${plain(wrap360(forwardDeg + 180))}, opposite the forward bearing ${plain(forwardDeg)}`,
      found: plain(backDeg),
      fix: 'Take the back bearing from the far end, looking to where the first was taken from.',
    });
  const bearingDeg = wrap360(forwardDeg + offset / 2);
  return {
    bearingDeg,
    disagreementDeg,
    leastErrorDeg: disagreementDeg / 2,
    words: `forward ${plain(forwardDeg)} and back ${plain(backDeg)}: mean ${plain(bearingDeg)}, ${degreesText(disagreementDeg, 2)} from opposite`,
    findings:
      disagreementDeg > AGREEMENT_DEG + ROUNDING_DEG ? [localIron(forwardDeg, backDeg, disagreementDeg)] : [],
  };
};

const localIron = (forwardDeg: number, backDeg: number, disagreementDeg: number): Finding => ({
  code: 'bearings-disagree',
  severity: 'warning',
  text: `The bearings ${plain(forwardDeg)} forward and ${plain(backDeg)} back miss 180 degrees by ${plain(disagreementDeg, 1)}, over the ${AGREEMENT_DEG} of common practice: local iron or a current near one end is likely, and their mean may be wrong by more than the ${degreesText(disagreementDeg / 2)} shown.`,
  fix: 'Take the bearing from a map, or both readings again away from metal, vehicles and cables.',
});
