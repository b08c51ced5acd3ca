import { atan2Deg, DEG, type Finding, wrap180 } from '../shared/index.ts';
import { type CalendarDate, dateText } from './calendar-date.ts';
import { declinationWords } from './declination-words.ts';
import { COVERED_DATES, isCovered, type MagneticField, magneticField } from './magnetic-field.ts';
import { refuse } from './refuse.ts';
import { degreesText } from './words.ts';

export interface DeclinationRequest {
  /** North positive, -90..90. */
  readonly latitudeDeg: number;
  /** East positive, -180..180. */
  readonly longitudeDeg: number;
  /** Above sea level; without it sea level. 4000 m move the declination by under 0.1 degree between 60 S and 60 N. */
  readonly elevationM?: number;
  /** The day of the compass reading. */
  readonly date: CalendarDate;
}

export interface Declination {
  /** East positive: true = magnetic + declination. */
  readonly declinationDeg: number;
  /** Its change, degrees a year, toward east positive. */
  readonly perYearDeg: number;
  /** One standard deviation of the model against the field in open country; local iron comes on top. */
  readonly uncertaintyDeg: number;
  /** Horizontal intensity, which turns the needle. */
  readonly horizontalNt: number;
  /** For example `WMM2025`. */
  readonly model: string;
  /** A caution where the horizontal field is weak, else empty. */
  readonly findings: readonly Finding[];
}

/** Blackout and caution zones of the World Magnetic Model (WMM2025 technical report), nT of horizontal intensity. */
const BLACKOUT_NT = 2000;
const CAUTION_NT = 6000;

/**
 * Published 1-sigma error of the declination: sqrt(a^2 + (b / H)^2) degrees, in WMM2025 a = 0.26 degrees and
 * b = 5417 degrees nT (WMM2025 technical report, error model).
 */
export const declinationUncertaintyDeg = (
  horizontalNt: number,
  error: MagneticField['error'] = { everywhereDeg: 0.26, perFieldDegNt: 5417 },
): number => Math.hypot(error.everywhereDeg, error.perFieldDegNt / horizontalNt);

/**
 * Magnetic declination by the World Magnetic Model that covers the date. Refuses (TrackworthError `input`, codes
 * `date-outside-model`, `geographic-pole`, `magnetic-pole`) a date outside 2015 to 2029, a geographic pole, where
 * every direction is south or north, and a place in the blackout zone around a magnetic pole.
 */
export const declinationAt = async (request: DeclinationRequest): Promise<Declination> => {
  const { latitudeDeg, longitudeDeg, elevationM = 0, date } = request;
  if (!isCovered(date)) return refuseDate(date);
  if (Math.abs(latitudeDeg) === 90) return refuseGeographicPole(latitudeDeg);
  const field = await magneticField({ latitudeDeg, longitudeDeg, elevationM, date });
  const { northNt: x, eastNt: y, model } = field;
  const horizontalNt = Math.hypot(x, y);
  if (horizontalNt < BLACKOUT_NT) return refuseMagneticPole(horizontalNt);
  const uncertaintyDeg = declinationUncertaintyDeg(horizontalNt, field.error);
  return {
    declinationDeg: atan2Deg(y, x),
    // WMM technical report, rate of D: (X dY/dt - Y dX/dt) / H^2.
    perYearDeg: (x * field.eastNtPerYear - y * field.northNtPerYear) / horizontalNt ** 2 / DEG,
    uncertaintyDeg,
    horizontalNt,
    model,
    findings: horizontalNt < CAUTION_NT ? [weakField(horizontalNt, uncertaintyDeg)] : [],
  };
};

/** More than this, or three standard deviations, between a declination by hand and the model's is worth a look. Assumption. */
const ODD_DECLINATION_DEG = 2;

/** A finding where a declination entered by hand does not fit the model's at the place; the usual cause is a wrong side. */
export const compareDeclinations = (byHandDeg: number, modelled: Declination): Finding | null => {
  const apart = Math.abs(wrap180(byHandDeg - modelled.declinationDeg));
  if (apart <= Math.max(ODD_DECLINATION_DEG, 3 * modelled.uncertaintyDeg)) return null;
  const mirrored = Math.abs(wrap180(-byHandDeg - modelled.declinationDeg)) < apart / 2;
  return {
    code: 'odd-declination',
    severity: 'warning',
    text: `The declination entered, ${declinationWords(byHandDeg)}, is ${degreesText(apart)} from the ${declinationWords(modelled.declinationDeg)} of ${modelled.model}.`,
    fix: mirrored
      ? 'East and west look exchanged; check the side.'
      : 'Check the value, its side and the year of the map.',
  };
};

const refuseDate = (date: CalendarDate): never =>
  refuse({
    code: 'date-outside-model',
    expected: `a date from ${COVERED_DATES.first} to ${COVERED_DATES.last}, which the World Magnetic Models of 2015, 2020 and 2025 cover`,
    found: dateText(date),
    fix: 'Enter the declination itself, from a map of that year, as 16 E or 16 W.',
  });

const refuseGeographicPole = (latitudeDeg: number): never =>
  refuse({
    code: 'geographic-pole',
    expected: 'a place away from the geographic poles, where bearings have no meaning',
    found: `latitude ${latitudeDeg}`,
    fix: 'Check the place; at a pole every direction is the same.',
  });

const refuseMagneticPole = (horizontalNt: number): never =>
  refuse({
    code: 'magnetic-pole',
    expected: `a horizontal magnetic field of ${BLACKOUT_NT} nT or more, since declination is undefined at a magnetic pole and a compass of no use around it`,
    found: `${Math.round(horizontalNt)} nT`,
    fix: 'Take the bearing from a map or by the sun, and enter it as true.',
  });

const weakField = (horizontalNt: number, uncertaintyDeg: number): Finding => ({
  code: 'weak-horizontal-field',
  severity: 'warning',
  text: `The horizontal magnetic field is ${Math.round(horizontalNt)} nT here, in the caution zone (${BLACKOUT_NT} to ${CAUTION_NT} nT) around a magnetic pole: a compass is sluggish, and the declination good to ${degreesText(uncertaintyDeg)} at best.`,
  fix: 'Prefer a bearing from a map.',
});
