import { TrackworthError } from '../shared/index.ts';
import {
  type CalendarDate,
  type Downslope,
  parseBearing,
  parseCalendarDate,
  parseDeclination,
  parseDownslope,
  type Taken,
} from '../survey/index.ts';
import { missingDate, OptionReader } from './option-problems.ts';

export interface BearingOptions {
  readonly at?: string;
  readonly elevation?: number;
  readonly dated?: string;
  readonly declination?: string;
  readonly to: 'true' | 'magnetic';
  readonly back?: string;
  readonly taken?: Taken;
  readonly downslope?: string;
  readonly json?: boolean;
}

export interface LatLon {
  readonly latitudeDeg: number;
  readonly longitudeDeg: number;
}

/** The options of `trackworth bearing`, each checked; null is blank. */
export interface BearingRequest {
  readonly to: 'true' | 'magnetic';
  readonly bearingDeg: number;
  readonly backDeg: number | null;
  readonly taken: Taken | null;
  readonly downslope: Downslope | null;
  readonly place: LatLon | null;
  /** Above sea level; 0 where not given. */
  readonly elevationM: number;
  readonly date: CalendarDate | null;
  /** Entered by hand, east positive. */
  readonly byHandDeg: number | null;
}

const PAIR = /^\s*([+-]?(?:\d+\.?\d*|\.\d+))\s*[,;\s]\s*([+-]?(?:\d+\.?\d*|\.\d+))\s*$/;

/** `45.6,-121.2`: latitude, then longitude, degrees, south and west negative. */
export const parseLatLon = (text: string): LatLon => {
  const parts = PAIR.exec(text);
  const [latitudeDeg, longitudeDeg] = parts ? [Number(parts[1]), Number(parts[2])] : [Number.NaN, Number.NaN];
  if (Math.abs(latitudeDeg) <= 90 && Math.abs(longitudeDeg) <= 180) return { latitudeDeg, longitudeDeg };
  const swapped = Math.abs(longitudeDeg) <= 90 && Math.abs(latitudeDeg) <= 180;
  throw new TrackworthError('usage', [
    {
      code: 'wrong-place',
      expected: 'latitude from -90 to 90 and longitude from -180 to 180',
      found: JSON.stringify(text),
      fix: swapped
        ? 'Latitude comes first, such as 45.6,-121.2.'
        : 'Write degrees with a comma between, south and west with a minus sign: --at=-33.9,18.4.',
    },
  ]);
};

/** Without a declination by hand, the model needs to know where and when. */
const askForModel = (reader: OptionReader, { at, dated, declination }: BearingOptions): void => {
  if (declination !== undefined) return;
  if (at === undefined)
    reader.refuse(
      '--at',
      'missing-place',
      'the place of the reading, since declination differs from place to place',
      'none',
      'Write for example --at 45.6,-121.2, or give it by hand: --declination "16 E".',
    );
  if (dated === undefined) reader.problems.push(missingDate);
};

/** The turning options belong to what was read with a compass. */
const askForReading = (reader: OptionReader, { to, back, taken, downslope }: BearingOptions): void => {
  if (to === 'magnetic') {
    const given = Object.entries({ '--back': back, '--taken': taken, '--downslope': downslope });
    for (const [option] of given.filter(([, value]) => value !== undefined))
      reader.refuse(
        option,
        'not-with-to-magnetic',
        'a compass reading that is turned to true',
        '--to magnetic',
        `Leave ${option} out, or --to magnetic.`,
      );
  } else if (downslope !== undefined && taken === undefined)
    reader.refuse(
      '--downslope',
      'missing-taken',
      'to know how the bearing was taken',
      'no --taken',
      'Write --taken along_ridge beside it.',
    );
};

/** @throws TrackworthError of kind `usage` with every problem of the options */
export const bearingRequest = (typed: string, options: BearingOptions): BearingRequest => {
  const reader = new OptionReader();
  const bearingDeg = reader.read('bearing', typed, parseBearing);
  const request = {
    to: options.to,
    backDeg: reader.read('--back', options.back, parseBearing),
    taken: options.taken ?? null,
    downslope: reader.read('--downslope', options.downslope, parseDownslope),
    place: reader.read('--at', options.at, parseLatLon),
    elevationM: options.elevation ?? 0,
    date: reader.read('--dated', options.dated, parseCalendarDate),
    byHandDeg: reader.read('--declination', options.declination, parseDeclination),
  };
  askForModel(reader, options);
  askForReading(reader, options);
  reader.done();
  return { ...request, bearingDeg: bearingDeg as number };
};
