/** Where on earth, and which clock. */
export interface Place {
  /** North positive, -90..90. */
  readonly latitudeDeg: number;
  /** East positive, -180..180. */
  readonly longitudeDeg: number;
  /** Above sea level. */
  readonly elevationM: number;
  /** Local standard time less UTC, in hours: 5.75 for +05:45. Never daylight saving. */
  readonly utcOffsetH: number;
}

/** Whether a component was in the file, was worked out from the others, or is missing. */
export type Origin = 'given' | 'derived' | 'missing';

/** What the time that a file prints beside an hour stands for. */
export type HourLabel = 'end' | 'start' | 'middle';

export type WeatherFormat = 'EPW' | 'TMY2' | 'TMY3' | 'table';

/**
 * One year of 8,760 hours, the data shape that every stage shares. Element `h` of a column is the mean over
 * the hour that begins `60 h + offsetMin` minutes after 00:00 on 1 January, local standard time.
 * Irradiance columns hold no NaN; a component that is missing altogether is all zero with origin `missing`.
 */
export interface HourlyYear {
  /** File name as the user gave it. */
  readonly source: string;
  readonly format: WeatherFormat;
  readonly station: string;
  readonly place: Place;
  /** What the file's label was taken to mean, for the record. */
  readonly label: HourLabel;
  /** Minutes by which every hour begins later than its index says (negative: earlier). */
  readonly offsetMin: number;
  /** Calendar year of each of the 365 days: typical years are sewn together from months of different years. */
  readonly calendarYear: Int16Array;
  /** Global horizontal irradiance, W/m2, mean over the hour. */
  readonly ghi: Float64Array;
  /** Direct normal irradiance, W/m2. */
  readonly dni: Float64Array;
  /** Diffuse horizontal irradiance, W/m2. */
  readonly dhi: Float64Array;
  readonly origin: { readonly ghi: Origin; readonly dni: Origin; readonly dhi: Origin };
  /** Dry-bulb temperature, degrees C; null where the file has none. */
  readonly temperatureC: Float64Array | null;
  /** Wind speed at 10 m, m/s; null where the file has none. */
  readonly windMs: Float64Array | null;
  /** Ground reflectance 0..1; null where the file has none. */
  readonly albedo: Float64Array | null;
  /** What the reader noticed and did while reading: repairs, missing codes, ignored columns. */
  readonly notes: readonly Finding[];
}

/** How much a finding matters: a `block` withholds the recommendation, a `warning` is repeated in every report. */
export type Severity = 'note' | 'warning' | 'block';

/** Something that trackworth saw in the input and wants the user to know. */
export interface Finding {
  /** Stable, kebab-case, for example `clock-shift`. */
  readonly code: string;
  readonly severity: Severity;
  /** One sentence with its numbers and units. */
  readonly text: string;
  /** What to do about it; empty where nothing is needed. */
  readonly fix: string;
}
