import { readFileSync } from 'node:fs';
import { join, resolve } from 'node:path';
import { readStudy, type Study } from '../../src/inputs/index.ts';
import { type RawYear, readWeather } from '../../src/weather/index.ts';

const SAMPLE = resolve(import.meta.dirname, '../../sample-data');

/** A study from its text, as a user would write it. */
export const studyFrom = (text: string): Promise<Study> => readStudy({ file: 'study.yaml', text });

/** The sample's invented year, read as the command line reads it. */
export const sampleYear = (): Promise<RawYear> =>
  readWeather({ source: 'orlin.epw', bytes: readFileSync(join(SAMPLE, 'orlin.epw')) });

export const sampleStudy = (): Promise<Study> => studyFrom(readFileSync(join(SAMPLE, 'orlin.yaml'), 'utf8'));

/** The same year with every column moved later by `hours` (earlier where negative), wrapping round the year. */
export const movedBy = (raw: RawYear, hours: number): RawYear => {
  const move = (column: Float64Array) =>
    column.map((_, h) => column[(((h - hours) % column.length) + column.length) % column.length]);
  return {
    ...raw,
    ghi: move(raw.ghi),
    dni: move(raw.dni),
    dhi: move(raw.dhi),
    temperatureC: raw.temperatureC && move(raw.temperatureC),
    windMs: raw.windMs && move(raw.windMs),
  };
};
