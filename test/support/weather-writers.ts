/**
 * Writers for every weather format that trackworth reads, and an invented year to write: for round trips. They follow
 * the formats' published descriptions, not the readers.
 */
import { HOURS, MONTH_FIRST_DAY, type Place } from '../../src/shared/index.ts';
import { sunOverHours } from '../../src/sun/index.ts';

export interface WrittenYear {
  place: Place;
  /** Hour by hour, hour 0 beginning at 00:00 on 1 January; whole W/m2. */
  ghi: number[];
  dni: number[];
  dhi: number[];
  /** One decimal. */
  temperature: number[];
  wind: number[];
  /** Two decimals. */
  albedo: number[];
  /** Of each month. */
  years: number[];
}

export const INVENTED_PLACE: Place = {
  latitudeDeg: 41.5,
  longitudeDeg: -103.25,
  elevationM: 1204,
  utcOffsetH: -7,
};

const hours = <T>(make: (hour: number) => T): T[] => Array.from({ length: HOURS }, (_, h) => make(h));

/** A clear year of an invented place with a plausible run of temperature and wind; closes to rounding. */
export const inventedYear = (place: Place = INVENTED_PLACE): WrittenYear => {
  const years = [1995, 2001, 1989, 1990, 1999, 2000, 2003, 1996, 1991, 1988, 1985, 1997];
  const sun = sunOverHours(
    place,
    Array.from({ length: 365 }, (_, d) => years[monthOf(d)]),
  );
  const lit = (h: number) => sun.cosZenith[h] > 0;
  const dni = hours((h) =>
    lit(h) ? Math.round(sun.sunlit[h] * 1050 * Math.exp(-0.14 / sun.cosZenith[h])) : 0,
  );
  const dhi = hours((h) => Math.round(sun.sunlit[h] * 110 * Math.sqrt(sun.cosZenith[h])));
  return {
    place,
    years,
    dni,
    dhi,
    ghi: hours((h) => Math.round(dhi[h] + dni[h] * sun.cosZenith[h])),
    temperature: hours((h) =>
      tenth(9 - 13 * Math.cos(h / 1394) * Math.sign(place.latitudeDeg) - 6 * Math.cos((h % 24) / 3.82)),
    ),
    wind: hours((h) => tenth(4 + 2 * Math.sin(h / 7))),
    albedo: hours(() => 0.21),
  };
};

const tenth = (x: number): number => Math.round(x * 10) / 10;
const monthOf = (day: number): number => MONTH_FIRST_DAY.findLastIndex((first) => first <= day);
const pad = (n: number, width = 2): string => String(n).padStart(width, '0');

interface Stamp {
  year: number;
  month: number;
  day: number;
  /** 1..24, by the end of the hour. */
  hour: number;
}

const stampOf = (year: WrittenYear, h: number): Stamp => {
  const day = Math.floor(h / 24);
  const month = monthOf(day);
  return {
    year: year.years[month],
    month: month + 1,
    day: day - MONTH_FIRST_DAY[month] + 1,
    hour: (h % 24) + 1,
  };
};

/** EPW: eight header lines and 35 columns. */
export const writeEpw = (year: WrittenYear): string[] => {
  const { latitudeDeg, longitudeDeg, utcOffsetH, elevationM } = year.place;
  const header = [
    `LOCATION,Orlin Bench,XX,Nowhere,invented,999999,${latitudeDeg},${longitudeDeg},${utcOffsetH},${elevationM}`,
    'DESIGN CONDITIONS,0',
    'TYPICAL/EXTREME PERIODS,0',
    'GROUND TEMPERATURES,0',
    'HOLIDAYS/DAYLIGHT SAVINGS,No,0,0,0',
    'COMMENTS 1,"Invented, all of it"',
    'COMMENTS 2,',
    'DATA PERIODS,1,1,Data,Sunday, 1/ 1,12/31',
  ];
  const rows = hours((h) => {
    const s = stampOf(year, h);
    const before = [
      s.year,
      s.month,
      s.day,
      s.hour,
      60,
      '?9?9',
      year.temperature[h],
      1,
      50,
      88000,
      9999,
      9999,
      300,
    ];
    const after = [
      999999,
      999999,
      999999,
      9999,
      180,
      year.wind[h],
      5,
      5,
      20,
      9999,
      9,
      999999999,
      10,
      0.1,
      0,
      88,
    ];
    return [...before, year.ghi[h], year.dni[h], year.dhi[h], ...after, year.albedo[h], 0, 0].join(',');
  });
  return [...header, ...rows];
};

/** TMY2: fixed columns; only the fields that are read have values. */
export const writeTmy2 = (year: WrittenYear): string[] => {
  const { latitudeDeg, longitudeDeg, utcOffsetH, elevationM } = year.place;
  const angle = (deg: number, letters: string, width: number): string => {
    const minutes = Math.round(Math.abs(deg) * 60);
    const whole = String(Math.floor(minutes / 60)).padStart(width);
    return `${letters[deg < 0 ? 1 : 0]} ${whole} ${String(minutes % 60).padStart(2)}`;
  };
  const station = ` 99999 ${'ORLIN_BENCH'.padEnd(22)} XX ${String(utcOffsetH).padStart(3)} ${angle(latitudeDeg, 'NS', 2)} ${angle(longitudeDeg, 'EW', 3)} ${String(elevationM).padStart(5)}`;
  const signed = (tenths: number, width: number): string =>
    tenths < 0 ? `-${pad(-tenths, width - 1)}` : pad(tenths, width);
  const rows = hours((h) => {
    const s = stampOf(year, h);
    const line = Array.from<string>({ length: 142 }).fill('0');
    const put = (first: number, text: string): void => {
      line.splice(first - 1, text.length, ...text);
    };
    put(1, ` ${pad(s.year % 100)}${pad(s.month)}${pad(s.day)}${pad(s.hour)}`);
    put(18, `${pad(year.ghi[h], 4)}A7${pad(year.dni[h], 4)}A7${pad(year.dhi[h], 4)}A7`);
    put(68, `${signed(Math.round(year.temperature[h] * 10), 4)}A7`);
    put(96, `${pad(Math.round(year.wind[h] * 10), 3)}A7`);
    return line.join('');
  });
  return [station, ...rows];
};

export interface Tmy3Style {
  delimiter?: ',' | '\t';
  quoted?: boolean;
  padded?: boolean;
  /** What stands for 24:00: a spreadsheet writes 0:00 of the same or of the next day. */
  midnight?: '24:00' | '0:00 same day' | '0:00 next day';
}

/** TMY3: station line, header line, a few of the columns of the original, in its order. */
export const writeTmy3 = (year: WrittenYear, style: Tmy3Style = {}): string[] => {
  const { delimiter = ',', quoted = false, padded = true, midnight = '24:00' } = style;
  const { latitudeDeg, longitudeDeg, utcOffsetH, elevationM } = year.place;
  const cell = (x: string | number): string => (quoted ? `"${x}"` : String(x));
  const line = (cells: (string | number)[]): string => cells.map(cell).join(delimiter);
  const station = `999999${delimiter}"ORLIN BENCH, UPPER"${delimiter}XX${delimiter}${utcOffsetH}${delimiter}${latitudeDeg}${delimiter}${longitudeDeg}${delimiter}${elevationM}`;
  const header = line([
    'Date (MM/DD/YYYY)', 'Time (HH:MM)', 'ETR (W/m^2)', 'GHI (W/m^2)', 'GHI source', 'DNI (W/m^2)', 'DNI source',
    'DHI (W/m^2)', 'DHI source', 'Dry-bulb (C)', 'Dry-bulb source', 'Wspd (m/s)', 'Alb (unitless)',
  ]); // biome-ignore format: the columns in their order
  const number = (n: number): string => (padded ? pad(n) : String(n));
  const rows = hours((h) => {
    const s = stampOf(year, h);
    const next = stampOf(year, (h + 1) % HOURS);
    const zero = s.hour === 24 && midnight !== '24:00';
    const date = zero && midnight === '0:00 next day' ? next : s;
    const time = zero ? '0:00' : `${number(s.hour)}:00`;
    const values = [
      0,
      year.ghi[h],
      1,
      year.dni[h],
      1,
      year.dhi[h],
      1,
      year.temperature[h],
      'A',
      year.wind[h],
      year.albedo[h],
    ];
    return line([`${number(date.month)}/${number(date.day)}/${date.year}`, time, ...values]);
  });
  return [station, header, ...rows];
};

export interface TableStyle {
  delimiter?: string;
  decimalComma?: boolean;
  /** Minutes from the beginning of hour 0 to its printed time. */
  printedAfterMin?: number;
  year?: number;
  /** Multiplies irradiance, for other units. */
  factor?: number;
}

/** A plain table: when, global, beam, diffuse, air, breeze. */
export const writeTable = (year: WrittenYear, style: TableStyle = {}): string[] => {
  const {
    delimiter = ',',
    decimalComma = false,
    printedAfterMin = 60,
    year: calendarYear = 2021,
    factor = 1,
  } = style;
  const number = (x: number): string => (decimalComma ? String(x).replace('.', ',') : String(x));
  const start = Date.UTC(calendarYear, 0, 1) + printedAfterMin * 60_000;
  const rows = hours((h) => {
    const when = new Date(start + h * 3_600_000).toISOString().slice(0, 16).replace('T', ' ');
    const light = [year.ghi[h], year.dni[h], year.dhi[h]].map((v) => number(v * factor));
    return [when, ...light, number(year.temperature[h]), number(year.wind[h])].join(delimiter);
  });
  return [['when', 'global', 'beam', 'diffuse', 'air', 'breeze'].join(delimiter), ...rows];
};

const plain = (name: string) => ({ name, unit: null });
export const TABLE_COLUMNS = {
  time: plain('when'),
  ghi: plain('global'),
  dni: plain('beam'),
  dhi: plain('diffuse'),
  temperature: plain('air'),
  wind: plain('breeze'),
};

export const bytesOf = (lines: readonly string[], lineEnd = '\n'): Uint8Array =>
  new TextEncoder().encode(lines.join(lineEnd) + lineEnd);
