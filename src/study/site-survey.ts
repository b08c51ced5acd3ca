import type { Finding, Place } from '../shared/index.ts';
import type { DeclinationMistakes, SkylineSurvey } from '../survey/index.ts';

/** What the readings of one mount came to. */
export interface MountSurvey {
  /** True azimuth that the plane faces; null where the study gives it outright or asks for the best. */
  readonly azimuthDeg: number | null;
  /** Reading errors, either way, degrees; null where not given. */
  readonly azimuthErrorDeg: number | null;
  readonly tiltErrorDeg: number | null;
  /** The raw readings as the user wrote them, one line each. */
  readonly readings: readonly string[];
  /** How the angles follow from them, each with its sum written out. */
  readonly steps: readonly string[];
  /** Azimuths had the declination been forgotten or applied the wrong way; null for true bearings. */
  readonly mistakes: DeclinationMistakes | null;
}

/** What was read on site, worked out once the place is known: what `compareMounts` takes beside study and weather. */
export interface SiteSurvey {
  readonly mounts: ReadonlyMap<string, MountSurvey>;
  /** Null: the horizon is open all round. */
  readonly skyline: SkylineSurvey | null;
  /** Declinations used, in words with their model and uncertainty, each once. */
  readonly declinations: readonly string[];
  readonly findings: readonly Finding[];
}

/** A study without readings or skyline. */
export const NO_SURVEY: SiteSurvey = { mounts: new Map(), skyline: null, declinations: [], findings: [] };

/** True where a study needs `surveySite` before it can be compared. */
export type SurveyPlace = Pick<Place, 'latitudeDeg' | 'longitudeDeg' | 'elevationM'>;
