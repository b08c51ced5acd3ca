import { resolve } from 'node:path';
import type { Study } from '../inputs/index.ts';
import { type Place, TrackworthError } from '../shared/index.ts';
import type { RawYear } from '../weather/index.ts';
import { isStudyName, readStudyInputs, readWeatherFile } from './inputs.ts';
import type { Io } from './io.ts';
import { shellWord } from './plain.ts';
import type { WeatherOverrides } from './weather-options.ts';

export interface WeatherOptions extends WeatherOverrides {
  readonly json?: boolean;
}

interface Read {
  readonly raw: RawYear;
  readonly clock: Pick<Study['weather'], 'addMinutes' | 'acceptClock'>;
  /** What to do with it, in words. */
  readonly next: string;
}

const placeOf = (o: WeatherOptions): { [K in keyof Place]: Place[K] | null } => ({
  latitudeDeg: o.latitude ?? null,
  longitudeDeg: o.longitude ?? null,
  elevationM: o.elevation ?? null,
  utcOffsetH: o.utcOffset ?? null,
});

const readFile = async (typed: string, options: WeatherOptions, cwd: string): Promise<Read> => {
  const bytes = await readWeatherFile(resolve(cwd, typed), typed);
  const { readWeather } = await import('../weather/index.ts');
  const label = options.label ?? null;
  const raw = await readWeather({ source: typed, bytes, label, place: placeOf(options) });
  const next = `name it in a study: weather: { file: ${shellWord(typed)} }, then trackworth compare STUDY`;
  return { raw, clock: { addMinutes: 0, acceptClock: false }, next };
};

/** The weather of a study, with the study's columns, place and clock, which no option may contradict. */
const readOfStudy = async (
  typed: string,
  { json: _, ...over }: WeatherOptions,
  cwd: string,
): Promise<Read> => {
  if (Object.keys(over).length > 0)
    throw new TrackworthError('usage', [
      {
        code: 'options-with-study',
        expected: 'a weather file beside options that overrule it',
        found: `the study ${typed}`,
        fix: 'Write the place and the label in the study: site: { ... }, weather: { label: ... }.',
      },
    ]);
  const { study, raw } = await readStudyInputs(typed, cwd);
  return { raw, clock: study.weather, next: `trackworth compare ${shellWord(typed)}` };
};

/** What a weather file holds and how far to trust it. */
export const weather = async (typed: string, options: WeatherOptions, io: Io): Promise<void> => {
  const { raw, clock, next } = isStudyName(typed)
    ? await readOfStudy(typed, options, io.cwd)
    : await readFile(typed, options, io.cwd);
  const [{ readyYear }, { weatherFacts }] = await Promise.all([
    import('../study.ts'),
    import('./weather-facts.ts'),
  ]);
  const facts = weatherFacts(readyYear(raw, clock));
  if (options.json) {
    const { factsJson } = await import('./facts-json.ts');
    return io.out(factsJson(facts));
  }
  const { weatherScreen } = await import('./weather-screen.ts');
  io.out(weatherScreen(facts, next));
};
