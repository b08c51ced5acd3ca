import type { North } from '../inputs/index.ts';
import { type Finding, type Place, TrackworthError } from '../shared/index.ts';
import {
  type CalendarDate,
  compareDeclinations,
  type Declination,
  dateText,
  declinationAt,
  declinationShort,
  yearlyChangeWords,
} from '../survey/index.ts';

/** Where the array stands, as far as the declination needs it. */
export type SurveyPlace = Pick<Place, 'latitudeDeg' | 'longitudeDeg' | 'elevationM'>;

/** The declination that turns magnetic bearings to true ones. */
export interface NorthFound {
  /** East positive. */
  readonly declinationDeg: number;
  /** With its source: `16 E as entered`, or the model's with its place, date, yearly change and uncertainty. */
  readonly words: string;
  readonly findings: readonly Finding[];
}

/**
 * The declination of bearings read at a place: by hand where entered, else by the model on the day of the reading; null for
 * true bearings. One entered by hand with a date is held against the model's, where the model covers both.
 */
export const northAt = async (north: North, place: SurveyPlace): Promise<NorthFound | null> => {
  if (north.north === 'true') return null;
  const { declinationDeg, dated, printedYear } = north;
  if (declinationDeg !== null)
    return {
      declinationDeg,
      words: `${declinationShort(declinationDeg)} as entered${printedYear === null ? '' : `, printed for ${printedYear}`}`,
      findings: [
        ...(dated && printedYear !== null ? ageOf(declinationDeg, printedYear, dated) : []),
        ...(dated ? await secondLook(declinationDeg, place, dated) : []),
      ],
    };
  if (!dated) throw new RangeError('a magnetic bearing needs its date or its declination');
  const modelled = await declinationAt({ ...place, date: dated });
  return {
    declinationDeg: modelled.declinationDeg,
    words: modelWords(modelled, place, dated),
    findings: modelled.findings,
  };
};

/** Declination drifts by up to a fifth of a degree a year over most of the land (WMM2025 charts; from memory). */
const OLD_YEARS = 5;

const ageOf = (declinationDeg: number, printedYear: number, { year }: CalendarDate): Finding[] =>
  Math.abs(year - printedYear) <= OLD_YEARS
    ? []
    : [
        {
          code: 'old-declination',
          severity: 'warning',
          text: `The declination ${declinationShort(declinationDeg)} was printed for ${printedYear}, ${Math.abs(year - printedYear)} years from the reading; it may have drifted by a degree or more.`,
          fix: 'Leave declination out, and the model works it out for the date of the reading.',
        },
      ];

/** Entering the declination is the way out where the model has none, so its refusal is no problem here. */
const secondLook = async (byHandDeg: number, place: SurveyPlace, date: CalendarDate): Promise<Finding[]> => {
  try {
    const modelled = await declinationAt({ ...place, date });
    const odd = compareDeclinations(byHandDeg, modelled);
    return [...modelled.findings, ...(odd ? [odd] : [])];
  } catch (trouble) {
    if (trouble instanceof TrackworthError) return [];
    throw trouble;
  }
};

/** `14.91 degrees east (WMM2025 at 45.60 N 121.20 W on 2026-05-01, 0.11 degrees a year toward west, +- 0.37)`. */
const modelWords = (found: Declination, place: SurveyPlace, date: CalendarDate): string => {
  const side = found.declinationDeg < 0 ? 'west' : 'east';
  const about = [
    `${found.model} at ${placeWords(place)} on ${dateText(date)}`,
    yearlyChangeWords(found.perYearDeg),
    `+- ${found.uncertaintyDeg.toFixed(2)}`,
  ];
  return `${Math.abs(found.declinationDeg).toFixed(2)} degrees ${side} (${about.join(', ')})`;
};

const placeWords = ({ latitudeDeg, longitudeDeg }: SurveyPlace): string =>
  `${Math.abs(latitudeDeg).toFixed(2)} ${latitudeDeg < 0 ? 'S' : 'N'} ` +
  `${Math.abs(longitudeDeg).toFixed(2)} ${longitudeDeg < 0 ? 'W' : 'E'}`;
