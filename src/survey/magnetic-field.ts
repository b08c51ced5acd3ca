/**
 * The main field of the earth by the World Magnetic Model (Chulliat et al., The US/UK World Magnetic Model for
 * 2015-2020, 2020-2025, 2025-2030, NOAA and BGS technical reports), whose sums the library `geomagnetism` works out.
 */
import { type CalendarDate, dateText, decimalYear } from './calendar-date.ts';

export interface MagneticField {
  /** For example `WMM2025`. */
  readonly model: string;
  /** Nanotesla, toward true north and toward east. */
  readonly northNt: number;
  readonly eastNt: number;
  /** Their change, nT a year. */
  readonly northNtPerYear: number;
  readonly eastNtPerYear: number;
  /** Published 1-sigma error of the model's declination: degrees that hold everywhere, and degrees times nT of H. */
  readonly error: { readonly everywhereDeg: number; readonly perFieldDegNt: number };
}

interface Epoch {
  readonly model: string;
  /** First day on which this model is the one to use. */
  readonly from: string;
  /** Two moments, in years and as the library takes them, at which it picks this very model. */
  readonly moments: readonly (readonly [number, number])[];
  readonly error: MagneticField['error'];
}

const newYear = (year: number): readonly [number, number] => [year, Date.UTC(year, 0, 1)];
const ERROR_2015 = { everywhereDeg: 0.23, perFieldDegNt: 5430 };

/**
 * Newest first. WMM2025 holds to the end of 2029, though the library stops in November of that year and begins in
 * November 2024; the second issue of 2015 holds from the day that its own file names. Error models: the technical
 * reports' formula for declination (2025: table of total errors; 2015 and 2020 likewise, numbers from memory).
 */
const EPOCHS: readonly Epoch[] = [
  {
    model: 'WMM2025',
    from: '2025-01-01',
    moments: [newYear(2025), newYear(2029)],
    error: { everywhereDeg: 0.26, perFieldDegNt: 5417 },
  },
  {
    model: 'WMM2020',
    from: '2020-01-01',
    moments: [newYear(2020), newYear(2024)],
    error: { everywhereDeg: 0.26, perFieldDegNt: 5625 },
  },
  {
    model: 'WMM2015v2',
    from: '2018-09-18',
    moments: [newYear(2019), [2019.5, Date.UTC(2019, 6, 2, 12)]],
    error: ERROR_2015,
  },
  {
    model: 'WMM2015',
    from: '2015-01-01',
    moments: [newYear(2015), newYear(2018)],
    error: ERROR_2015,
  },
];

/** First and last day that a model covers. */
export const COVERED_DATES = { first: '2015-01-01', last: '2029-12-31' } as const;

export const isCovered = (date: CalendarDate): boolean => {
  const text = dateText(date);
  return text >= COVERED_DATES.first && text <= COVERED_DATES.last;
};

/**
 * The field at a place (degrees north and east, metres above the sea) on a covered date. The model is linear in time
 * (technical report, equation for the time-dependent coefficients), so two moments give every other and the rate.
 */
export const magneticField = async (place: {
  readonly latitudeDeg: number;
  readonly longitudeDeg: number;
  readonly elevationM: number;
  readonly date: CalendarDate;
}): Promise<MagneticField> => {
  // The library reads its four models as it loads, which takes 9 ms.
  const { default: geomagnetism } = await import('geomagnetism');
  const day = dateText(place.date);
  const epoch = EPOCHS.find(({ from }) => day >= from) ?? EPOCHS[EPOCHS.length - 1];
  const point = [place.latitudeDeg, place.longitudeDeg, place.elevationM / 1000];
  const [[startYear, start], [endYear, end]] = epoch.moments;
  const [a, b] = [start, end].map((time) => geomagnetism.model(new Date(time)).point(point));
  const northNtPerYear = (b.x - a.x) / (endYear - startYear);
  const eastNtPerYear = (b.y - a.y) / (endYear - startYear);
  const years = decimalYear(place.date) - startYear;
  return {
    model: epoch.model,
    northNt: a.x + years * northNtPerYear,
    eastNt: a.y + years * eastNtPerYear,
    northNtPerYear,
    eastNtPerYear,
    error: epoch.error,
  };
};
