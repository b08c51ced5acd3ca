/**
 * Module temperature, degrees C: Faiman 2008, Progress in Photovoltaics 16, 307, eq. 6.
 * @param lightWm2 light on the plane
 * @param windMs wind at the modules (not at 10 m)
 * @param u0 heat lost in still air, W/(m2 K)
 * @param u1 heat lost per m/s of wind, W s/(m3 K)
 */
export const moduleTemperatureC = (
  airC: number,
  lightWm2: number,
  windMs: number,
  u0: number,
  u1: number,
): number => airC + lightWm2 / (u0 + u1 * windMs);

/** Power against that at 25 degrees C, linear in temperature (IEC 60891 first-order form). */
export const powerAtTemperature = (moduleC: number, heatPerK: number): number =>
  1 + heatPerK * (moduleC - 25);

export interface HeatLoss {
  readonly u0: number;
  readonly u1: number;
  readonly source: string;
}

/** Open rack, glass and backsheet: Faiman 2008, table II (U0 23.5 to 26.5, U1 6.25 to 7.68). */
export const OPEN_RACK: HeatLoss = { u0: 25, u1: 6.84, source: 'Faiman 2008, open rack: U0 25, U1 6.84' };

/**
 * Close to a roof the back cools less. Assumption, no source: of an open rack's cooling half is at the back, and of
 * that half a gap of 150 mm or more keeps three quarters, no gap none, in proportion between.
 * @param airBehindM clear gap between roof and modules; null (blank) is taken as 50 mm, and said
 */
export const onRoof = (airBehindM: number | null): HeatLoss => {
  const gap = airBehindM ?? 0.05;
  const share = 0.5 + 0.5 * 0.75 * Math.min(1, gap / 0.15);
  const [u0, u1] = [OPEN_RACK.u0 * share, OPEN_RACK.u1 * share];
  const blank = airBehindM === null ? ', gap blank: 50 mm assumed' : '';
  return {
    u0,
    u1,
    source: `assumption: ${Math.round(share * 100)} % of an open rack's cooling with ${Math.round(gap * 1000)} mm of air behind${blank}`,
  };
};
