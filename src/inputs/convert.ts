/** The units that trackworth works in, and the kind of quantity that each measures. */
export const KIND_OF_UNIT = {
  kW: 'power',
  W: 'power',
  m: 'length',
  'm/s': 'speed',
  deg: 'angle',
  min: 'time',
  h: 'time',
} as const;
export type Unit = keyof typeof KIND_OF_UNIT;

/** `amount` of `unit` (as a user wrote it) in `target`; null where the unit is unknown or of another kind. */
export type Convert = (amount: number, unit: string, target: Unit) => number | null;

/**
 * Spellings of the trade that the units library does not know, or holds to nine digits only. A knot is 1852 m
 * an hour, exactly (International Hydrographic Conference, 1929). `p`, `dc` and `ac` after a watt say where it is
 * counted, not how much it is.
 */
const SPELLINGS: readonly (readonly [RegExp, string])[] = [
  [/^([kMG]?W)[ _-]?(?:p|dc|ac|peak)$/i, '$1'],
  [/^kw$/i, 'kW'],
  [/^w(?:atts?)?$/i, 'W'],
  [/^(?:°|º|degs?|degrees?)$/i, 'deg'],
  [/^(?:kn|kts?|knots?)$/i, 'nmi/h'],
  [/^(?:kmh|kph|kmph|km\/hr)$/i, 'km/h'],
  [/^(?:mi\/hr?|miles per hour)$/i, 'mph'],
  [/^(?:metres?|meters?)$/i, 'm'],
  [/^(?:′|’)$/, 'ft'],
  [/^(?:″|”)$/, 'in'],
  [/^(?:minutes?|mins?)$/i, 'min'],
  [/^(?:hours?|hrs?|h)$/i, 'h'],
];

const respell = (unit: string): string => {
  for (const [spelling, name] of SPELLINGS) if (spelling.test(unit)) return unit.replace(spelling, name);
  return unit;
};

/** Knows the documented unit alone, which spares most studies the units library; `missed` is told of any other. */
export const documentedUnits =
  (missed: () => void): Convert =>
  (amount, unit, target) => {
    if (respell(unit) === target) return amount;
    missed();
    return null;
  };

/** Any unit of the right kind. Results are rounded to 15 digits, so that 0.3 in is 0.00762 m and not a hair more. */
export const everyUnit = async (): Promise<Convert> => {
  const { default: Qty } = await import('js-quantities/esm');
  const convert = (amount: number, unit: string, target: Unit): number | null => {
    try {
      const quantity = Qty(amount, unit);
      return quantity.kind() === KIND_OF_UNIT[target] ? quantity.to(target).scalar : null;
    } catch {
      return null; // the library throws on a unit that it does not know
    }
  };
  return (amount, unit, target) => {
    const name = respell(unit);
    if (!/^[a-z'"µ]/i.test(name)) return null; // the library would take `10 in` for a unit of ten inches
    const found = convert(amount, name, target) ?? convert(amount, name.toLowerCase(), target);
    return found === null ? null : Number(found.toPrecision(15));
  };
};
