/** A study file, checked and in trackworth's own units: what `readStudy` returns. Null is blank. */
import type { CostSpec, FinanceSpec } from '../cost/index.ts';
import type { ArraySpec, DriveSpec, LossSpec } from '../energy/index.ts';
import type { MountGeometry, MountLengths } from '../mounts/index.ts';
import type { HourLabel, Objective, Place, SkyModel } from '../shared/index.ts';
import type { TableColumns } from '../weather/index.ts';
import type { WindSpec } from '../wind/index.ts';

export interface StudyMount {
  readonly id: string;
  readonly label: string;
  readonly geometry: MountGeometry;
  readonly lengths: MountLengths;
  /** Null for mounts without a drive. */
  readonly drive: DriveSpec | null;
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
  readonly site: { readonly [K in keyof Place]: Place[K] | null } & { readonly roofHeightM: number | null };
  readonly weather: StudyWeather;
  readonly sky: { readonly model: SkyModel; readonly albedo: number | 'file' };
  readonly array: ArraySpec;
  readonly mounts: readonly StudyMount[];
  readonly losses: LossSpec;
  readonly finance: FinanceSpec;
  readonly wind: WindSpec | null;
  readonly objective: Objective | null;
  readonly compareWith: string | null;
}
