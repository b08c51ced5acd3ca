/**
 * The public functions of trackworth, in the order of its flow. All of them are pure: they touch no disk, console or clock.
 * The short way, from a study's text and a weather file's bytes to every figure of a report:
 *
 *     const study = await readStudy({ file: 'site.yaml', text });
 *     const year = await readWeather({ source: study.weather.file, bytes, place: study.site });
 *     const survey = await surveySite(study, year.place, readText); // where the study has readings or a skyline
 *     const comparison = compareMounts(study, year, survey);
 *
 * The single stages serve whoever wants one of them alone.
 */

// Inputs: the study file

export {
  type MountReadings,
  readStudy,
  type Study,
  type StudyBearing,
  type StudyMount,
  type StudySkyline,
  studyJsonSchema,
  studyTemplate,
} from './inputs/index.ts';

// Weather: a file's bytes → a year of hours, and how far to trust it

export {
  fillByClosure,
  type RawYear,
  readWeather,
  type TableColumn,
  type TableColumns,
  type WeatherFindings,
  type WeatherInput,
  weatherFindings,
} from './weather/index.ts';

// Survey: compass, clinometer and skyline → angles of a plane, each with its error

export {
  type BearingReading,
  type CalendarDate,
  checkedSkyline,
  type Declination,
  type DeclinationRequest,
  declinationAt,
  facingOf,
  magneticFromTrue,
  meanReading,
  type Obstacle,
  type PlaneAzimuth,
  parseBearing,
  parseCalendarDate,
  parseDeclination,
  parseSlope,
  planeAzimuth,
  readSkylineFile,
  type Skyline,
  type SkylinePoint,
  type SkylineSurvey,
  type Slope,
  skylineOfObstacles,
  slopeOfRiseRun,
  slopeWords,
  sumToMagnetic,
  sumToTrue,
  surveySkylines,
  type Taken,
  trueFromMagnetic,
} from './survey/index.ts';

// Sun: where it stands, when it rises, and every hour of a year

export {
  type RiseSet,
  relativeAirMass,
  type SunHours,
  type SunPosition,
  sunOverHours,
  sunPosition,
  sunriseSunset,
} from './sun/index.ts';

// Sky: light on tilted planes, and the fixed plane that collects most

export {
  type OrientationMap,
  orientationMap,
  planeIrradiation,
  type SkyHours,
  skyOverHours,
  splitGlobal,
} from './sky/index.ts';

// Wind: screening only; structure belongs to the local code and a licensed engineer

export {
  type EdgeGeometry,
  type Exposure,
  exposureCoefficient,
  type HighestEdge,
  highestEdge,
  type StowSpec,
  stowHours,
  type VelocityPressure,
  velocityPressure,
  type WindSpec,
  windAtHeight,
} from './wind/index.ts';

// Mounts: where a plane points in every hour, and the shade of its rows

export {
  backtrackTurn,
  type DualAxis,
  type FixedTilt,
  type MountGeometry,
  type Pointing,
  pointMount,
  type ResolvedGeometry,
  type RoofPlane,
  type RowSpec,
  resolveAngles,
  rowShade,
  type SingleAxis,
} from './mounts/index.ts';

// Energy: from light on the plane to delivered kWh, stage after stage

export {
  type ArraySpec,
  type ChainSpec,
  type Delivered,
  type DriveSpec,
  deliver,
  type LossSpec,
  lightThrough,
  type ModuleSpec,
  moduleTemperatureC,
  planeViews,
  type SkylineShade,
  type Stage,
  type StuckAt,
  skylineShade,
} from './energy/index.ts';

// Cost: cost per kWh, what a tracker may cost, and the fixed array in its place

export {
  type BreakEven,
  breakEven,
  type CostOfEnergy,
  type CostSpec,
  capitalRecoveryFactor,
  costOfEnergy,
  type FinanceSpec,
  lcoePerKwh,
  presentCost,
  presentEnergy,
  type Renewal,
  sameEnergy,
} from './cost/index.ts';

// Advice: which mount, how sure, and why

export { type AdviceInput, type AdviceMount, advise } from './advice/index.ts';

// Charts: results → Vega-Lite specifications → SVG

export { type Chart, chartSpecs, prepareFont, renderSvg, type VegaLiteSpec } from './charts/index.ts';

// Report: results → text

export {
  memoMarkdown,
  monthlyCsv,
  mountsCsv,
  type ReportExtras,
  reportFiles,
  resultsJson,
  type ScreenOptions,
  screenTable,
} from './report/index.ts';

// Study: the whole calculation, and its result

export type {
  AdviceResult,
  Comparison,
  Confidence,
  LimitStatus,
  MountKind,
  MountResult,
  Objective,
  SkyModel,
} from './shared/index.ts';
export {
  compareMounts,
  NO_SURVEY,
  type PlaneFacts,
  planeFacts,
  type ReadyYear,
  readyYear,
  type SiteSurvey,
  surveySite,
} from './study.ts';

// What all stages share

export {
  describeProblem,
  type Finding,
  type HourLabel,
  type HourlyYear,
  type Origin,
  type Place,
  type Problem,
  type Severity,
  TrackworthError,
  type WeatherFormat,
} from './shared/index.ts';
