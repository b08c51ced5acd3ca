/**
 * The real typical years that tests compare with: a folder named by TRACKWORTH_WEATHER_DIR (TMY2, TMY3 and EPW files
 * in the public domain). They are not part of the project; without the variable these tests are skipped.
 */
import { readdirSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import { describe } from 'vitest';
import type { HourlyYear, Place } from '../../src/shared/index.ts';
import { sunOverHours } from '../../src/sun/index.ts';
import { fillByClosure, type RawYear, readWeather, type SunHours } from '../../src/weather/index.ts';

const FOLDER = process.env.TRACKWORTH_WEATHER_DIR;
const REASON = 'skipped: TRACKWORTH_WEATHER_DIR names no folder of weather files';

/** Names of all weather files, sorted; empty where the folder is not given. */
export const realYearNames = (): string[] =>
  FOLDER
    ? readdirSync(FOLDER)
        .filter((name) => /\.(tmy2|tmy3|epw)(\.gz)?$/.test(name))
        .sort()
    : [];

/** The bytes of one weather file. */
export const realYearBytes = (name: string): Uint8Array => {
  if (!FOLDER) throw new Error(REASON);
  return new Uint8Array(readFileSync(join(FOLDER, name)));
};

/** One weather file as it was read, missing irradiance as NaN. */
export const realRawYear = (name: string): Promise<RawYear> =>
  readWeather({ source: name, bytes: realYearBytes(name) });

const suns = new WeakMap<Place, Map<number, SunHours>>();

/** The sun over the hours of a year, moved by `offsetMin`: what `weatherFindings` asks for. Remembered by place. */
export const sunOf = (
  year: Pick<HourlyYear, 'place' | 'calendarYear'>,
): ((offsetMin: number) => SunHours) => {
  const known = suns.get(year.place) ?? new Map<number, SunHours>();
  suns.set(year.place, known);
  return (offsetMin) => {
    const { cosZenith, sunlit, extraterrestrialWm2 } =
      known.get(offsetMin) ?? sunOverHours(year.place, year.calendarYear, offsetMin);
    known.set(offsetMin, { cosZenith, sunlit, extraterrestrialWm2 });
    return { cosZenith, sunlit, extraterrestrialWm2 };
  };
};

const years = new Map<string, Promise<HourlyYear>>();

const complete = async (name: string): Promise<HourlyYear> => {
  const raw = await realRawYear(name);
  return fillByClosure(raw, sunOf(raw)(raw.offsetMin));
};

/** One weather file, complete. Remembered: do not change its columns. */
export const realYear = (name: string): Promise<HourlyYear> => {
  const year = years.get(name) ?? complete(name);
  years.set(name, year);
  return year;
};

/** `describe` where the folder is given, else a skipped block whose title says why. */
export const describeWithWeather = (title: string, body: () => void): void => {
  describe.skipIf(!FOLDER)(FOLDER ? title : `${title} (${REASON})`, body);
};
