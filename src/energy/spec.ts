/** What a study says about the energy chain. Shares are fractions 0..1. Null is blank, and blank is not counted. */

export interface LossSpec {
  readonly dirt: number | null;
  readonly moduleSpread: number | null;
  readonly cables: number | null;
  readonly conversion: number | null;
}

export interface DriveSpec {
  /** Share of the time that the tracker works, 0..1. */
  readonly working: number | null;
  /** How a tracker stands that does not work; a turntable faces the equator. Null with `working` blank. */
  readonly stuck: 'flat' | 'equator' | null;
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
