/**
 * Numbers in words that do not depend on the machine's language: a point for decimals, a space between thousands.
 * What is not known prints as a dash, never as 0.
 */
export const UNKNOWN = '—';

/** `12345.6` → `12 345.6`. A value that rounds to zero carries no minus sign. */
export const formatNumber = (x: number | null, decimals = 0): string => {
  if (x === null) return UNKNOWN;
  const [whole, part] = Math.abs(x).toFixed(decimals).split('.');
  const grouped = whole.replace(/\B(?=(\d{3})+$)/g, ' ');
  const text = part === undefined ? grouped : `${grouped}.${part}`;
  return x < 0 && /[1-9]/.test(text) ? `-${text}` : text;
};

/** At most `decimals` decimals, without closing zeros: 12.04, 10. */
export const formatUpTo = (x: number | null, decimals = 2): string => {
  const text = formatNumber(x, decimals);
  return text.includes('.') ? text.replace(/\.?0+$/, '') : text;
};

/** A fraction as per cent: `0.123` → `12.3 %`. */
export const formatPercent = (fraction: number | null, decimals = 1): string =>
  fraction === null ? UNKNOWN : `${formatNumber(fraction * 100, decimals)} %`;

/** A gain with its sign: `0.123` → `+12.3 %`. A gain that rounds to zero has no sign. */
export const formatGain = (fraction: number | null, decimals = 1): string => {
  const text = formatPercent(fraction, decimals);
  return fraction !== null && fraction > 0 && /[1-9]/.test(text) ? `+${text}` : text;
};

/** A difference in money or length with its sign: `+400`, `-12`. */
export const formatSigned = (x: number | null, decimals = 0): string => {
  const text = formatNumber(x, decimals);
  return x !== null && x > 0 && /[1-9]/.test(text) ? `+${text}` : text;
};

/** Decimals that give the greatest of `values` three significant digits; 0 for large numbers, at most 6. */
export const decimalsFor = (values: readonly (number | null)[]): number => {
  const greatest = Math.max(0, ...values.map((x) => Math.abs(x ?? 0)));
  if (greatest === 0) return 0;
  return Math.min(6, Math.max(0, 2 - Math.floor(Math.log10(greatest))));
};

/** kWh per kW and day: two decimals, a third where the sun hardly rises. */
export const formatDaily = (kwhPerKwDay: number): string =>
  formatNumber(kwhPerKwDay, kwhPerKwDay > 0 && kwhPerKwDay < 0.1 ? 3 : 2);

/** Latitude and longitude with their letters: `40.10 N 104.92 W`. */
export const formatPlace = (latitudeDeg: number, longitudeDeg: number): string => {
  const north = latitudeDeg < 0 ? 'S' : 'N';
  const east = longitudeDeg < 0 ? 'W' : 'E';
  return `${Math.abs(latitudeDeg).toFixed(2)} ${north} ${Math.abs(longitudeDeg).toFixed(2)} ${east}`;
};
