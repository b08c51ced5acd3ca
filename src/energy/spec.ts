/** What a study says about the energy chain. Shares are fractions 0..1. Null is blank, and blank is not counted. */

export interface LossSpec {
  readonly dirt: number | null;
  readonly moduleSpread: number | null;
  readonly cables: number | null;
  readonly conversion: number | null;
}

/**
 * Where a dead tracker stands: flat, or as flat as it goes; facing the equator at the tilt that it keeps (turntable);
 * where it stopped, on average over every moment of daylight; turned about its axis (degrees, signed as for
 * `pointSingleAxis`); or at a tilt and azimuth (dual-axis).
 */
export type StuckAt =
  | 'flat'
  | 'equator'
  | 'average'
  | { readonly turnDeg: number }
  | { readonly tiltDeg: number; readonly azimuthDeg: number };

export interface DriveSpec {
  /** Share of the time that the tracker works, 0..1. */
  readonly working: number | null;
  /** What a tracker that does not work does; null with `working` blank. */
  readonly stuck: StuckAt | null;
  /** Repair visits a year: listed, not priced. */
  readonly visits: number | null;
  /** Share of the yield that the drive itself uses. */
  readonly ownUse: number | null;
}

export interface ModuleSpec {
  /** Rated power at standard test conditions, W. */
  readonly powerW: number;
  readonly lengthM: number | null;
  readonly widthM: number | null;
  readonly thicknessM: number | null;
  /** Change of power with module temperature, fraction per K; negative. */
  readonly heatPerK: number | null;
}

export interface ArraySpec {
  /** False where the study has no `array`: then 1 kW is compared. */
  readonly given: boolean;
  /** DC rating asked for, kW. */
  readonly dcKw: number;
  /** Inverter's AC rating, kW; null: its ceiling is not counted. */
  readonly inverterKw: number | null;
  readonly module: ModuleSpec | null;
}
