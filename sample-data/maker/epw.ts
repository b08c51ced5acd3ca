import { HOURS, MONTH_DAYS } from '../../src/shared/index.ts';
import { CALENDAR_YEAR, GROUND_ALBEDO, ORLIN_BENCH, type SampleYear } from './sample-year.ts';

const HEADER = [
  [
    'LOCATION,Orlin Bench,invented place,,invented data,000000',
    ORLIN_BENCH.latitudeDeg.toFixed(2),
    ORLIN_BENCH.longitudeDeg.toFixed(2),
    ORLIN_BENCH.utcOffsetH.toFixed(1),
    ORLIN_BENCH.elevationM.toFixed(1),
  ].join(','),
  'DESIGN CONDITIONS,0',
  'TYPICAL/EXTREME PERIODS,0',
  'GROUND TEMPERATURES,0',
  'HOLIDAYS/DAYLIGHT SAVINGS,No,0,0,0',
  'COMMENTS 1,INVENTED DATA: Orlin Bench is no real place and nobody measured this weather; build nothing on it',
  'COMMENTS 2,Written by sample-data/make-sample.ts of trackworth; fields that its model does not cover are blank; CC0 1.0',
  'DATA PERIODS,1,1,Data,Friday, 1/ 1,12/31',
];

/** The 35 fields of one hour, in the order of the EPW format; hours count from 1 and carry the time of their end. */
const row = (year: SampleYear, h: number, month: number, day: number): string => {
  const blank = '';
  return [
    CALENDAR_YEAR,
    month,
    day,
    (h % 24) + 1,
    0,
    '?', // where each value comes from: a source that the format has no letter for
    year.temperatureC[h],
    blank, // dew point
    blank, // relative humidity
    year.pressurePa,
    blank, // extraterrestrial, horizontal
    blank, // extraterrestrial, normal
    blank, // infrared from the sky
    year.ghi[h],
    year.dni[h],
    year.dhi[h],
    blank, // illuminance, global
    blank, // illuminance, beam
    blank, // illuminance, diffuse
    blank, // luminance of the zenith
    blank, // wind direction
    year.windMs[h],
    year.coverTenths[h], // all cloud
    year.coverTenths[h], // opaque cloud
    blank, // visibility
    blank, // ceiling
    blank, // weather observed or not
    blank, // weather codes
    blank, // precipitable water
    blank, // optical depth of the aerosol
    blank, // snow depth
    blank, // days since snowfall
    GROUND_ALBEDO,
    blank, // rain, depth
    blank, // rain, hours
  ].join(',');
};

/** The year as the text of an EPW file, line ends `\n`. */
export const epwText = (year: SampleYear): string => {
  const lines = [...HEADER];
  for (let h = 0, month = 1, day = 1; h < HOURS; h++) {
    lines.push(row(year, h, month, day));
    if (h % 24 < 23) continue;
    day++;
    if (day > MONTH_DAYS[month - 1]) [month, day] = [month + 1, 1];
  }
  return `${lines.join('\n')}\n`;
};
