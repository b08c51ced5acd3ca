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

export interface DualAxis {
  readonly kind: 'dual-axis';
  readonly rows: RowSpec | null;
}

export type MountGeometry = RoofPlane | FixedTilt | SingleAxis | DualAxis;
