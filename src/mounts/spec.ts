/** What a study says about each mount's geometry. Angles in degrees, lengths in metres. `best` is worked out from the site's own hours. */

/** Rows of a ground mount: how close, and what trackers do when the sun is low. */
export interface RowSpec {
  /** Ground coverage ratio: slant length of a row over the pitch between rows, 0..1. */
  readonly gcr: number;
  /** Trackers turn back to stay out of each other's shade, or stay on the sun and take the shade. */
  readonly lowSun: 'backtrack' | 'shade';
}

/** Lengths that only the wind screen needs; null where the study is blank. */
export interface MountLengths {
  /** Rack or tracker chord, measured along the slope. */
  readonly slantM: number | null;
  /** Trackers: height of the axis above ground. */
  readonly axisHeightM: number | null;
  /** Racks: height of the lower edge above ground. */
  readonly lowerEdgeM: number | null;
  /** Roof mounts: clear gap between the roof and the back of the modules. */
  readonly airBehindM: number | null;
}

export interface RoofPlane {
  readonly kind: 'roof-plane';
  /** Of the roof itself, 0..90. */
  readonly tiltDeg: number;
  /** The way the roof faces, 0..360 clockwise from true north; `surveyed`: from a bearing, which needs the place first. */
  readonly azimuthDeg: number | 'surveyed';
}

export interface FixedTilt {
  readonly kind: 'fixed-tilt';
  readonly tiltDeg: number | 'best';
  readonly azimuthDeg: number | 'best' | 'surveyed';
  readonly rows: RowSpec | null;
}

/** Even ground on a slope. */
export interface GroundSlope {
  /** Steepness of the steepest way down, 0..90. */
  readonly slopeDeg: number;
  /** Azimuth of that way, 0..360 clockwise from true north. */
  readonly fallsTowardDeg: number;
}

/** The steepest ground that a tracker's maker allows, 0..90 each way; null: not checked. */
export interface SlopeLimits {
  readonly alongDeg: number | null;
  readonly acrossDeg: number | null;
}

export interface SingleAxis {
  readonly kind: 'single-axis';
  /** The direction towards which a tilted axis falls; 180 for a level north-south axis. */
  readonly axisAzimuthDeg: number;
  /** Of the axis, -90..90; below 0 it rises towards its azimuth. On sloping ground that of `axisTiltOnSlope`. */
  readonly axisTiltDeg: number;
  /** Greatest turn either way from lying flat, 0..90. */
  readonly swingDeg: number;
  readonly rows: RowSpec | null;
  /** The ground that axis and rows follow; absent: level from row to row. */
  readonly ground?: GroundSlope;
  readonly slopeLimits?: SlopeLimits;
  /** Lies flat under an overcast sky; absent: keeps to the sun behind the cloud. */
  readonly cloudy?: 'flat';
}

/** Azimuths that a mast can face: clockwise from one to the other, each 0..360; from 300 to 60 passes north. */
export interface TurnRange {
  readonly fromDeg: number;
  readonly toDeg: number;
}

/** How high a plane's normal can point, 0 (upright plane) to 90 (lying flat). */
export interface ElevationRange {
  readonly lowestDeg: number;
  readonly highestDeg: number;
}

export interface DualAxis {
  readonly kind: 'dual-axis';
  readonly rows: RowSpec | null;
  /** Absent: all round. */
  readonly turns?: TurnRange;
  /** Absent: from upright to flat. */
  readonly elevation?: ElevationRange;
}

/** A plane that turns about an upright axis and keeps its tilt. */
export interface Turntable {
  readonly kind: 'turntable';
  /** Held all year, 0..90; `best`: where it collects most in the year, turning. */
  readonly planeTiltDeg: number | 'best';
  readonly rows: RowSpec | null;
  /** Absent: all round. */
  readonly turns?: TurnRange;
}

export type MountGeometry = RoofPlane | FixedTilt | SingleAxis | DualAxis | Turntable;
