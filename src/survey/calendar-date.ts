import { refuse, shown } from './refuse.ts';

/** A day of the common calendar; `month` and `day` from 1. */
export interface CalendarDate {
  readonly year: number;
  readonly month: number;
  readonly day: number;
}

const DAY_MS = 86_400_000;
const ISO_DATE = /^(\d{4})-(\d{2})-(\d{2})$/;

/** `2026-05-01` (ISO 8601). Refuses anything else, 30 February among it. */
export const parseCalendarDate = (raw: unknown): CalendarDate => {
  const parts = typeof raw === 'string' ? ISO_DATE.exec(raw.trim()) : null;
  const [year, month, day] = parts ? parts.slice(1).map(Number) : [0, 0, 0];
  const there = new Date(Date.UTC(year, month - 1, day));
  if (parts && there.getUTCMonth() === month - 1 && there.getUTCDate() === day) return { year, month, day };
  return refuse({
    code: 'wrong-date',
    expected: 'the day of the reading as year-month-day',
    found: shown(raw),
    fix: 'Write for example 2026-05-01.',
  });
};

/** `2026-05-01`. */
export const dateText = ({ year, month, day }: CalendarDate): string =>
  `${String(year).padStart(4, '0')}-${String(month).padStart(2, '0')}-${String(day).padStart(2, '0')}`;

/** Noon of the day in years: noon of 2 July 2027 is 2027.5. */
export const decimalYear = ({ year, month, day }: CalendarDate): number => {
  const [start, end] = [Date.UTC(year, 0, 1), Date.UTC(year + 1, 0, 1)];
  return year + (Date.UTC(year, month - 1, day) + DAY_MS / 2 - start) / (end - start);
};
