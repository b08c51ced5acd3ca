import type { HourLabel } from '../shared/index.ts';

/** Minutes from the beginning of the hour to the printed time. */
export const MINUTES_BEFORE_LABEL: Record<HourLabel, number> = { end: 60, middle: 30, start: 0 };

/** How much later every hour begins than in the hour-ending reading of the same label. */
export const offsetOfLabel = (label: HourLabel): number =>
  MINUTES_BEFORE_LABEL.end - MINUTES_BEFORE_LABEL[label];

/** The label under which every hour begins so many minutes later than under `label`; null where none does. */
export const labelThatShifts = (label: HourLabel, shiftMin: number): HourLabel | null =>
  (['start', 'middle', 'end'] as const).find(
    (other) => other !== label && offsetOfLabel(other) - offsetOfLabel(label) === shiftMin,
  ) ?? null;
