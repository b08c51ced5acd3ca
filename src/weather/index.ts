/**
 * Weather: one reader per format, and findings on how far to trust a year.
 *
 * The flow: bytes → lines (`text.ts`) → the reader that recognises them (`epw.ts`, `tmy2.ts`, `tmy3.ts`, `table.ts`)
 * → rows in trackworth's units → checks of order, place and gaps (`assemble.ts`) → `RawYear`, in which missing
 * irradiance is NaN → with the sun, `fillByClosure` → `HourlyYear` → `weatherFindings`.
 *
 * To add a format, write one file that exports a `WeatherReader` (see `raw-year.ts`): `recognises` looks at the first
 * lines and answers for its own format only; `read` returns rows with the hour of the year (0..8759) that each stands
 * for, values in W/m2, degrees C, m/s and 0..1 with NaN for the format's signs of missing, the place with null for
 * what the file does not say, and reports what it cannot read to `problems` with the line instead of throwing at the
 * first. Cite the format's published description at the top. Then add it to `READERS` in `read.ts` and to
 * `WeatherFormat` in `src/shared/hourly-year.ts`, write a small writer under `test/support/` and read its output back.
 */

export { BLOCKING_SHIFT_MIN } from './clock.ts';
export type { Closure } from './closure.ts';
export { fillByClosure } from './fill.ts';
export { type WeatherFindings, weatherFindings } from './findings.ts';
export type { PartialPlace, RawYear } from './raw-year.ts';
export { readWeather, type WeatherInput } from './read.ts';
export type * from './spec.ts';
export type { SunHours } from './sun-hours.ts';
