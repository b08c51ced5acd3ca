/** Common practice, no source: grass and bare soil lie between 0.15 and 0.25. */
export const DEFAULT_ALBEDO = 0.2;
/** Common practice, no source: the usual limit of a horizontal tracker. */
export const DEFAULT_SWING_DEG = 60;
/** A level axis from north to south. */
export const DEFAULT_AXIS_AZIMUTH_DEG = 180;
