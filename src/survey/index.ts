/**
 * Survey: from what is read on site to the angles that the comparison needs, each with its error.
 *
 * Compass: text → `parseBearing`, `parseDeclination` or `declinationAt` → `planeAzimuth` (mean of two readings,
 * declination once, turn to the way the plane faces). Slope: `parseSlope`, `slopeOfRiseRun`. Skyline: points, obstacles or
 * a file → `Skyline` → `skylineTable` for the hours → `isBlocked`, `skyViewLeft`, `horizonBandLeft`.
 */

export {
  type DeclinationMistakes,
  declinationMistakes,
  magneticFromTrue,
  parseBearing,
  sumToMagnetic,
  sumToTrue,
  trueFromMagnetic,
} from './bearing.ts';
export { type CalendarDate, dateText, parseCalendarDate } from './calendar-date.ts';
export { SURVEY_CAUTIONS, type Surveyed, surveyCautions } from './cautions.ts';
export {
  compareDeclinations,
  type Declination,
  type DeclinationRequest,
  declinationAt,
  declinationUncertaintyDeg,
} from './declination.ts';
export {
  declinationShort,
  declinationWords,
  type MapDeclination,
  parseDeclination,
  parseMapDeclination,
  yearlyChangeWords,
} from './declination-words.ts';
export {
  type BearingTaken,
  type Downslope,
  facingOf,
  facingWords,
  parseDownslope,
  TAKEN,
  type Taken,
} from './facing.ts';
export { COVERED_DATES } from './magnetic-field.ts';
export { type Obstacle, obstacleElevationDeg, skylineOfObstacles } from './obstacles.ts';
export { type BearingReading, type PlaneAzimuth, planeAzimuth } from './plane-azimuth.ts';
export { horizonBandLeft, type SkyViewLookup, skyViewLeft, skyViewLookup } from './sky-view.ts';
export {
  elevationAt,
  OPEN_SKYLINE,
  outlineOf,
  type Skyline,
  type SkylinePoint,
} from './skyline.ts';
export { readSkylineFile } from './skyline-file.ts';
export {
  checkedSkyline,
  gapFindings,
  type PlaceOf,
  type PointPlace,
  WIDEST_GAP_DEG,
} from './skyline-points.ts';
export {
  HORIZON_BAND_DEG,
  isBlocked,
  type SkylineTable,
  SLOTS,
  skylineTable,
  slotOf,
} from './skyline-table.ts';
export { unionOf } from './skyline-union.ts';
export {
  gradeOfTilt,
  parseSlope,
  type RiseAndRun,
  type Slope,
  slopeOfRiseRun,
  slopeWords,
  tiltErrorOfGrade,
  tiltOfGrade,
  tiltOfRiseRun,
  tiltOfSlopeText,
} from './slope.ts';
export { AGREEMENT_DEG, type MeanReading, meanReading } from './two-readings.ts';
export { type SkylineSurvey, surveySkylines } from './worst-skyline.ts';
