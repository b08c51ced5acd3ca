import { compassWords, type Finding } from '../shared/index.ts';
import {
  type Declination,
  dateText,
  declinationWords,
  magneticFromTrue,
  type PlaneAzimuth,
  planeAzimuth,
  sumToMagnetic,
  sumToTrue,
  surveyCautions,
} from '../survey/index.ts';
import type { BearingRequest } from './bearing-request.ts';

/** The declination to apply, and what is known of it. */
export interface Applied {
  /** East positive. */
  readonly declinationDeg: number;
  /** Null where it was entered by hand. */
  readonly model: Declination | null;
  readonly findings: readonly Finding[];
}

/** Both bearings, the sum between them, and for a compass reading how it was turned. */
const turned = (asked: BearingRequest, declinationDeg: number) => {
  const { to, bearingDeg, backDeg, taken, downslope } = asked;
  if (to === 'magnetic')
    return {
      trueDeg: bearingDeg,
      magneticDeg: magneticFromTrue(bearingDeg, declinationDeg),
      sum: sumToMagnetic(bearingDeg, declinationDeg),
      plane: null,
    };
  const reading = { north: 'magnetic', bearingDeg, backDeg } as const;
  const { azimuthDeg: trueDeg } = planeAzimuth({ ...reading, taken: 'facing' }, declinationDeg);
  const magneticDeg = backDeg === null ? bearingDeg : magneticFromTrue(trueDeg, declinationDeg);
  return {
    trueDeg,
    magneticDeg,
    sum: sumToTrue(magneticDeg, declinationDeg),
    plane: planeAzimuth({ ...reading, taken: taken ?? 'facing', downslope }, declinationDeg),
  };
};

/** Without `taken` the bearing is that of a line, and the step that turns it to a facing is left out. */
const stepsOf = (plane: PlaneAzimuth | null, sum: string, faces: boolean): readonly string[] =>
  plane === null ? [sum] : faces ? plane.steps : plane.steps.slice(0, -1);

/** What `trackworth bearing` tells, key for key what its `--json` prints: fields may be added, never renamed. */
export const bearingFacts = (asked: BearingRequest, applied: Applied) => {
  const { declinationDeg, model } = applied;
  const { trueDeg, magneticDeg, sum, plane } = turned(asked, declinationDeg);
  const facing = asked.taken === null ? null : plane;
  return {
    schema: 'trackworth-bearing-1',
    magnetic_deg: magneticDeg,
    true_deg: trueDeg,
    direction: compassWords(trueDeg),
    sum,
    declination_deg: declinationDeg,
    declination_words: declinationWords(declinationDeg),
    declination_per_year_deg: model ? model.perYearDeg : null,
    /** One standard deviation in open country. */
    declination_uncertainty_deg: model ? model.uncertaintyDeg : null,
    model: model ? model.model : null,
    latitude_deg: asked.place ? asked.place.latitudeDeg : null,
    longitude_deg: asked.place ? asked.place.longitudeDeg : null,
    elevation_m: asked.place ? asked.elevationM : null,
    dated: asked.date ? dateText(asked.date) : null,
    /** True azimuth that the plane faces; null where `--taken` does not say how the bearing was taken. */
    azimuth_deg: facing ? facing.azimuthDeg : null,
    faces: facing ? compassWords(facing.azimuthDeg) : null,
    steps: stepsOf(plane, sum, facing !== null),
    findings: [...applied.findings, ...(plane ? plane.findings : [])],
    cautions: surveyCautions({
      compass: true,
      roof: facing !== null,
      riseAndRun: false,
      skyline: false,
    }),
  };
};

export type BearingFacts = ReturnType<typeof bearingFacts>;
