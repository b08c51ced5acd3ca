import { HOURS, type HourlyYear, monthlySums } from '../shared/index.ts';
import type { ReadyYear } from '../study.ts';

/** Mean and extremes of an hourly column. */
const spread = (column: Float64Array | null) => {
  if (!column) return null;
  let [sum, least, most] = [0, Number.POSITIVE_INFINITY, Number.NEGATIVE_INFINITY];
  for (let h = 0; h < HOURS; h++) {
    sum += column[h];
    least = Math.min(least, column[h]);
    most = Math.max(most, column[h]);
  }
  return { mean: sum / HOURS, least, most };
};

const inKwh = (column: Float64Array): number[] => monthlySums(column).map((sum) => sum / 1000);

const originOf = ({ origin }: HourlyYear, globalOnly: boolean) => ({
  ghi: origin.ghi,
  dni: origin.dni,
  dhi: origin.dhi,
  split_from_global: globalOnly,
});

/** What `trackworth weather` tells, key for key what its `--json` prints: fields may be added, never renamed. */
export const weatherFacts = ({ year, found, globalOnly }: ReadyYear) => ({
  schema: 'trackworth-weather-1',
  source: year.source,
  format: year.format,
  station: year.station,
  site: {
    latitude_deg: year.place.latitudeDeg,
    longitude_deg: year.place.longitudeDeg,
    elevation_m: year.place.elevationM,
    utc_offset_h: year.place.utcOffsetH,
  },
  label: year.label,
  components: originOf(year, globalOnly),
  ghi_kwh_m2: found.annual.ghiKwhM2,
  dni_kwh_m2: found.annual.dniKwhM2,
  dhi_kwh_m2: found.annual.dhiKwhM2,
  ghi_monthly_kwh_m2: [...found.ghiMonthlyKwhM2],
  dni_monthly_kwh_m2: inKwh(year.dni),
  dhi_monthly_kwh_m2: inKwh(year.dhi),
  temperature_c: spread(year.temperatureC),
  wind_10m_ms: spread(year.windMs),
  albedo: spread(year.albedo),
  /** GHI less DNI·cos z and DHI over hours of daylight; null unless all three were in the file. */
  closure: found.closure && {
    bias_w_m2: found.closure.biasWm2,
    rms_w_m2: found.closure.rmsWm2,
    hours: found.closure.hours,
  },
  time_shift_min: found.timeShiftMin,
  time_shift_sure: found.sure,
  dropped_night_kwh_m2: found.droppedNightKwhM2,
  findings: [...found.findings],
});

export type WeatherFacts = ReturnType<typeof weatherFacts>;
