import { atan2Deg, cosDeg, DEG, tanDeg } from '../shared/index.ts';
import { refuse, shown } from './refuse.ts';
import { degreesText, plain } from './words.ts';

export interface Slope {
  /** From horizontal, 0..90. */
  readonly tiltDeg: number;
  /** Reading error of the tilt, either way, degrees; null where none was given. */
  readonly errorDeg: number | null;
}

/** Rise over run, in one unit for both; the run is level, not along the roof. 0..90 degrees. */
export const tiltOfRiseRun = (rise: number, run: number): number => atan2Deg(rise, run);

/** Per cent grade: 50 is 26.57 degrees. */
export const tiltOfGrade = (percent: number): number => atan2Deg(percent, 100);

export const gradeOfTilt = (tiltDeg: number): number => 100 * tanDeg(tiltDeg);

const NUMBER = String.raw`(\d+(?:\.\d*)?|\.\d+)`;
const RATIO = new RegExp(`^${NUMBER} ?(?::|/|in) ?${NUMBER}$`, 'i');
const GRADE = new RegExp(`^${NUMBER} ?(?:%|per ?cent)$`, 'i');
const DEGREES = new RegExp(`^${NUMBER} ?(?:°|º|deg|degrees?)?$`, 'i');

/** The tilt of `3:12`, `3/12`, `3 in 12` or `25 %`; null where the text is of neither form. Refuses a run of 0. */
export const tiltOfSlopeText = (text: string): number | null => {
  const tidy = text.replace(/\s+/g, ' ').trim();
  const grade = GRADE.exec(tidy);
  if (grade) return tiltOfGrade(Number(grade[1]));
  const ratio = RATIO.exec(tidy);
  if (!ratio) return null;
  const [rise, run] = [Number(ratio[1]), Number(ratio[2])];
  return run > 0 ? tiltOfRiseRun(rise, run) : refuseRun(shown(tidy));
};

/**
 * A roof's slope in any form of the trade: `3:12`, `3/12`, `25 %`, or degrees as a clinometer shows them (`14 deg`, a
 * bare number). Refuses the rest with code `wrong-slope`. `errorDeg` is the clinometer's or the reader's.
 */
export const parseSlope = (raw: unknown, errorDeg: number | null = null): Slope => {
  const text = typeof raw === 'string' ? raw.replace(/\s+/g, ' ').trim() : '';
  const degrees = typeof raw === 'number' ? raw : Number(DEGREES.exec(text)?.[1] ?? Number.NaN);
  const tiltDeg = tiltOfSlopeText(text) ?? degrees;
  if (tiltDeg >= 0 && tiltDeg <= 90) return { tiltDeg, errorDeg };
  return refuse({
    code: 'wrong-slope',
    expected: 'a slope from 0 to 90 degrees',
    found: shown(raw),
    fix: 'Write rise and run as 3:12, a grade as 25 %, or the clinometer reading as 14 deg.',
  });
};

export interface RiseAndRun {
  /** Height gained, 0 or more; any unit, the same for all four. */
  readonly riseM: number;
  /** Level distance, above 0. */
  readonly runM: number;
  /** Reading errors, either way; null or absent where not known. */
  readonly riseErrorM?: number | null;
  readonly runErrorM?: number | null;
}

/**
 * Tilt from rise and level run, with the error that theirs carry into it: the law of propagation for independent
 * errors (JCGM 100:2008, Guide to the Expression of Uncertainty in Measurement, eq. 10) on atan(rise / run). An error
 * known for only one of the two is carried alone; null where neither is known.
 */
export const slopeOfRiseRun = ({ riseM, runM, riseErrorM, runErrorM }: RiseAndRun): Slope => {
  if (!(runM > 0)) return refuseRun(`a run of ${runM}`);
  if (!(riseM >= 0 && Number.isFinite(riseM)))
    return refuse({
      code: 'wrong-slope',
      expected: 'a rise of 0 or more',
      found: shown(riseM),
      fix: 'Measure the rise upward; which way the roof falls is told by its bearing.',
    });
  const known = typeof riseErrorM === 'number' || typeof runErrorM === 'number';
  const across = Math.hypot(runM * (riseErrorM ?? 0), riseM * (runErrorM ?? 0));
  return {
    tiltDeg: tiltOfRiseRun(riseM, runM),
    errorDeg: known ? across / (riseM ** 2 + runM ** 2) / DEG : null,
  };
};

/** Degrees of tilt that an error of a grade (in per cent points) stands for: the derivative of atan, cos^2. */
export const tiltErrorOfGrade = (tiltDeg: number, gradeErrorPercent: number): number =>
  (cosDeg(tiltDeg) ** 2 * gradeErrorPercent) / 100 / DEG;

/** All forms of one tilt, `6:12 = 50 % = 26.6 degrees`; an upright plane has the last alone. */
export const slopeWords = (tiltDeg: number): string => {
  const degrees = degreesText(tiltDeg);
  if (tiltDeg > 89.9) return `upright, ${degrees}`;
  const grade = gradeOfTilt(tiltDeg);
  return `${plain((grade * 12) / 100)}:12 = ${plain(grade, 1)} % = ${degrees}`;
};

const refuseRun = (found: string): never =>
  refuse({
    code: 'wrong-slope',
    expected: 'a run above 0',
    found,
    fix: 'Measure the level distance below the rise; an upright wall is 90 deg.',
  });
