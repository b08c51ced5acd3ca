/** A study file, checked and in trackworth's own units: what `readStudy` returns. Null is blank. */
import type { CostSpec, FinanceSpec } from '../cost/index.ts';
import type { ArraySpec, DriveSpec, LossSpec } from '../energy/index.ts';
import type { MountGeometry, MountLengths } from '../mounts/index.ts';
import type { HourLabel, Objective, Place, SkyModel } from '../shared/index.ts';
import type { BearingReading, CalendarDate, Obstacle, SkylinePoint, Slope } from '../survey/index.ts';
import type { TableColumns } from '../weather/index.ts';
import type { StowSpec, WindSpec } from '../wind/index.ts';

/** What turns the bearings of one reading from magnetic to true: a date (with the place), or the declination itself. */
export interface North {
  readonly north: 'magnetic' | 'true';
  /** When the reading was taken; null where not given. */
  readonly dated: CalendarDate | null;
  /** Entered by hand, east positive; null: worked out from the date and the place. */
  readonly declinationDeg: number | null;
  /** The year that a map prints beside a declination entered by hand; null where not given. */
  readonly printedYear: number | null;
}

/** A mount's bearing as read on site. `surveySite` turns it into an azimuth, once the place is known. */
export interface StudyBearing extends North {
  readonly reading: BearingReading;
}

/** What was read on site for one mount; null where the study gives an angle outright. */
export interface MountReadings {
  readonly bearing: StudyBearing | null;
  /** Tilt and its reading error, and the reading as written (`3:12`, `rise 4 ft, run 12 ft`). */
  readonly slope: (Slope & { readonly written: string; readonly riseAndRun: boolean }) | null;
}

/** One skyline, seen from one point of the array. Exactly one of `file`, `points` and `obstacles` is given. */
export interface StudySkyline extends North {
  readonly name: string;
  /** A table `bearing,elevation`, relative to the study. */
  readonly file: string | null;
  /** Bearings as read, not yet turned to true north. */
  readonly points: readonly SkylinePoint[] | null;
  readonly obstacles: readonly Obstacle[] | null;
}

export interface StudyMount {
  readonly id: string;
  readonly label: string;
  readonly geometry: MountGeometry;
  /** Null where neither bearing nor slope was read on site. */
  readonly readings: MountReadings | null;
  readonly lengths: MountLengths;
  /** Null for mounts without a drive. */
  readonly drive: DriveSpec | null;
  /** Null for mounts that do not move, and where blank: it never parks, which is listed as not counted. */
  readonly stow: StowSpec | null;
  /** Share of each month's light that snow takes, January first; null where blank. */
  readonly snow: readonly number[] | null;
  readonly cost: CostSpec | null;
}

export interface StudyWeather {
  /** As written: relative to the study file, or absolute. */
  readonly file: string;
  /** Set for a plain table. */
  readonly table: TableColumns | null;
  /** What the file's labels mean, where the study overrules the format. */
  readonly label: HourLabel | null;
  /** Minutes to add to the file's times. */
  readonly addMinutes: number;
  /** The user has looked at the clock finding and stands by the file. */
  readonly acceptClock: boolean;
}

export interface Study {
  readonly title: string;
  /** What the study says of the place; each field null where the weather file is to say it. */
  readonly site: { readonly [K in keyof Place]: Place[K] | null } & {
    readonly roofHeightM: number | null;
    /** One for each point of the array where it was read; null: open all round. */
    readonly skyline: readonly StudySkyline[] | null;
  };
  readonly weather: StudyWeather;
  readonly sky: { readonly model: SkyModel; readonly albedo: number | 'file' };
  readonly array: ArraySpec;
  readonly mounts: readonly StudyMount[];
  readonly losses: LossSpec;
  readonly finance: FinanceSpec;
  readonly wind: WindSpec | null;
  readonly objective: Objective | null;
  /** What a programme demands of fixed planes, 0..1; null: not checked. */
  readonly programme: { readonly minimumTof: number | null; readonly minimumTsrf: number | null };
  readonly compareWith: string | null;
}
