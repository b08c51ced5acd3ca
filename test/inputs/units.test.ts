import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import type { Study } from '../../src/inputs/index.ts';
import { readStudy } from '../../src/inputs/index.ts';
import { onlyProblem } from './problems-of.ts';

const read = (text: string) => readStudy({ file: 'units.yaml', text });
const withMount = (mount: string) => `weather: { file: a.epw }\nmounts: [ { id: m, ${mount} } ]\n`;
const FIXED = withMount('kind: fixed-tilt');

const gustMs = async (text: string) =>
  (await read(`${FIXED}wind: { design_gust: ${text} }`)).wind!.designGustMs!;
const heightM = async (text: string) =>
  (await read(`${FIXED}wind: { limits: { height: ${text} } }`)).wind!.limits.heightM!;
const dcKw = async (text: string) => (await read(`${FIXED}array: { dc: ${text} }`)).array.dcKw;
const moduleOf = async (text: string) =>
  (await read(`${FIXED}array: { dc: 5, module: { ${text} } }`)).array.module!;
const dirt = async (text: string) => (await read(`${FIXED}losses: { dirt: ${text} }`)).losses.dirt!;
const utcOffsetH = async (text: string) =>
  (await read(`${FIXED}site: { utc_offset: ${text} }`)).site.utcOffsetH!;
const tiltDeg = async (text: string) => {
  const { geometry } = (await read(withMount(`tilt: ${text}, azimuth: 180, kind: roof-plane`))).mounts[0];
  return geometry.kind === 'roof-plane' ? geometry.tiltDeg : Number.NaN;
};

/** Tenths, since nobody writes more digits than that in a study. */
const tenths = (low: number, high: number) =>
  fc.integer({ min: low * 10, max: high * 10 }).map((n) => n / 10);
/** Results are rounded to 15 digits, which moves them by half a unit of the last: 5e-15 at most, and binary rounding. */
const expectEqual = (found: number, wanted: number): void => {
  expect(Math.abs(found - wanted)).toBeLessThanOrEqual(6e-15 * Math.abs(wanted));
};

describe('units are converted by their definitions', () => {
  // 1 in = 0.0254 m and 1 mi = 1609.344 m exactly (international yard and pound agreement, 1959); 1 nmi = 1852 m.
  const speeds = {
    mph: 1609.344 / 3600,
    'mi/h': 1609.344 / 3600,
    'km/h': 1 / 3.6,
    kph: 1 / 3.6,
    'm/s': 1,
    'ft/s': 0.3048,
    kn: 1852 / 3600,
    knots: 1852 / 3600,
  };
  const lengths = {
    m: 1,
    cm: 0.01,
    mm: 0.001,
    in: 0.0254,
    ft: 0.3048,
    yd: 0.9144,
    inches: 0.0254,
    feet: 0.3048,
  };

  test.each(Object.entries(speeds))('a gust in %s', async (unit, factor) => {
    const inUnit = tenths(Math.ceil(11 / factor), Math.floor(100 / factor));
    await fc.assert(
      fc.asyncProperty(inUnit, async (x) => expectEqual(await gustMs(`${x} ${unit}`), x * factor)),
      { numRuns: 25 },
    );
  });

  test.each(Object.entries(lengths))('a height in %s', async (unit, factor) => {
    await fc.assert(
      fc.asyncProperty(tenths(1, Math.floor(900 / factor)), async (x) =>
        expectEqual(await heightM(`${x} ${unit}`), x * factor),
      ),
      { numRuns: 25 },
    );
  });

  test('feet and inches together', async () => {
    await fc.assert(
      fc.asyncProperty(fc.nat(40), tenths(0.1, 11.9), async (ft, inch) => {
        const metres = (ft * 12 + inch) * 0.0254;
        expectEqual(await heightM(`${ft} ft ${inch} in`), metres);
        expectEqual(await heightM(`"${ft}' ${inch}\\""`), metres);
      }),
      { numRuns: 25 },
    );
  });

  test('power of the array in kW, of a module in W', async () => {
    for (const [text, kw] of [
      ['12', 12],
      ['"12"', 12],
      ['12 kW', 12],
      ['12kW', 12],
      ['12000 W', 12],
      ['0.012 MW', 0.012e3],
      ['12 kWp', 12],
      ['12 kWdc', 12],
      ['1.2e4 Wp', 12],
    ] as const)
      expectEqual(await dcKw(text), kw);
    for (const text of ['430', '430 W', '430 Wp', '0.43 kW'])
      expectEqual((await moduleOf(`power: ${text}`)).powerW, 430);
    expectEqual((await moduleOf('power: 430, thickness: 35 mm')).thicknessM!, 0.035);
  });

  test('minutes from hours', async () => {
    for (const [text, minutes] of [
      ['60', 60],
      ['1 h', 60],
      ['-0.5 h', -30],
      ['20 min', 20],
    ] as const) {
      const study = await read(
        `weather: { file: a.epw, add_minutes: ${text} }\nmounts: [ { id: m, kind: dual-axis } ]`,
      );
      expect(study.weather.addMinutes).toBe(minutes);
    }
  });
});

describe('a tilt is an angle, a grade or a slope', () => {
  // check-values 10: rise in 12 to degrees
  const RISES = [
    [1, 4.764],
    [2, 9.462],
    [3, 14.036],
    [4, 18.435],
    [5, 22.62],
    [6, 26.565],
    [7, 30.256],
    [8, 33.69],
    [9, 36.87],
    [10, 39.806],
    [12, 45],
  ] as const;

  test('slopes agree with the table of roof pitches within its rounding, unquoted inside braces', async () => {
    for (const [rise, degrees] of RISES) {
      expect(Math.abs((await tiltDeg(`${rise}:12`)) - degrees)).toBeLessThanOrEqual(0.0005);
      expect(await tiltDeg(`"${rise}:12"`)).toBe(await tiltDeg(`${rise}/12`));
    }
    expect(RISES).toHaveLength(11);
  });

  test('a grade in per cent is rise over run', async () => {
    expect(await tiltDeg('50 %')).toBeCloseTo(26.565, 3);
    expect(await tiltDeg('100 %')).toBeCloseTo(45, 12);
    expect(await tiltDeg('"33.33 %"')).toBeCloseTo(18.433, 3);
    expect(await tiltDeg('25%')).toBeCloseTo(await tiltDeg('3:12'), 12);
  });

  test('a slope and its grade are one angle, and its tangent is rise over run', async () => {
    await fc.assert(
      fc.asyncProperty(fc.integer({ min: 0, max: 48 }), async (rise) => {
        const tilt = await tiltDeg(`${rise}:12`);
        expect(tilt).toBeCloseTo(await tiltDeg(`${(rise / 12) * 100} %`), 10);
        expect(Math.tan((tilt * Math.PI) / 180)).toBeCloseTo(rise / 12, 10);
      }),
      { numRuns: 30 },
    );
  });

  test('degrees may be written out', async () => {
    for (const text of ['30', '30 deg', '30°', '30 degrees', '"30"']) expect(await tiltDeg(text)).toBe(30);
    expectEqual(await tiltDeg('0.5 rad'), 90 / Math.PI);
  });
});

describe('shares and rates', () => {
  test('per cent and fraction are the same, to the digit', async () => {
    await fc.assert(
      fc.asyncProperty(fc.integer({ min: 0, max: 999 }), async (permille) => {
        expect(await dirt(`${permille / 10} %`)).toBe(permille / 1000);
        expect(await dirt(String(permille / 1000))).toBe(permille / 1000);
      }),
      { numRuns: 50 },
    );
  });

  test('a yearly rate may name the year', async () => {
    for (const text of ['0.5 %', '0.5 %/yr', '0.5 % per year', '0.5 percent', '0.005'])
      expect((await read(`${FIXED}finance: { ageing: ${text}, years: 25 years }`)).finance).toMatchObject({
        ageing: 0.005,
        years: 25,
      });
  });

  test('a bare number above 1 is refused with the words to write', async () => {
    const problem = await onlyProblem(`${FIXED}finance: { real_rate: 6 }`);
    expect(problem).toMatchObject({
      place: '3:23',
      field: 'finance.real_rate',
      code: 'wrong-value',
      found: '6',
    });
    expect(problem.fix).toMatch(/^Write 6 % /);
  });

  test('half a per cent a year written as 0.5 is caught', async () => {
    expect((await onlyProblem(`${FIXED}finance: { ageing: 0.5 }`)).fix).toBe(
      '0.5 is 50 %; write 0.5 % if that is meant.',
    );
  });
});

describe('the heat coefficient', () => {
  test('per cent and fraction per kelvin are read alike', async () => {
    for (const text of ['-0.34 %/K', '-0.34%/°C', '-0.34 % per K', '-0.0034 /K', '-0.0034 1/K', '−0.34 %/C'])
      expect((await moduleOf(`power: 430, heat: ${text}`)).heatPerK).toBe(-0.0034);
  });

  test.each([
    ['-0.34', /bare number may be per cent or a fraction/],
    ['"-0.34"', /-0.34 %\/K or -0.0034 \/K/],
    ['0.34 %/K', /with a minus/],
    ['0 %/K', /with a minus/],
    ['-0.34 /K', /did you mean -0.34 %\/K/],
    ['-0.34 %', /-0.34 %\/K/],
    ['[1]', /-0.34 %\/K/],
  ])('%s is refused with the reason', async (text, fix) => {
    const problem = await onlyProblem(`${FIXED}array: { dc: 5, module: { power: 430, heat: ${text} } }`);
    expect(problem.place).toBe('3:45');
    expect(problem.field).toBe('array.module.heat');
    expect(problem.fix).toMatch(fix);
  });
});

describe('place and clock', () => {
  test('an offset is hours or a clock reading, half and quarter hours too', async () => {
    for (const [text, hours] of [
      ['-7', -7],
      ['5.75', 5.75],
      ['"+05:45"', 5.75],
      ['+05:45', 5.75],
      ['-07:00', -7],
      ['"-03:30"', -3.5],
      ['UTC-7', -7],
      ['"+00:00"', 0],
      ['-0.5', -0.5],
      ['"-00:30"', -0.5],
      ['14', 14],
    ] as const)
      expect(await utcOffsetH(text)).toBe(hours);
  });

  test.each(['15', '-12.25', '5.7', '"05:61"', '+0545', '"05:20"', 'MST', '""', 'true'])(
    'the offset %s is refused',
    async (text) => {
      const problem = await onlyProblem(`${FIXED}site: { utc_offset: ${text} }`);
      expect(problem).toMatchObject({ place: '3:21', field: 'site.utc_offset', code: 'wrong-value' });
    },
  );

  test('latitude and longitude take a sign or a letter', async () => {
    const siteOf = async (lat: string, lon: string): Promise<Study['site']> =>
      (await read(`${FIXED}site: { latitude: ${lat}, longitude: ${lon} }`)).site;
    for (const [lat, lon] of [
      ['-33.9', '18.4'],
      ['33.9 S', '18.4 E'],
      ['33.9° S', '18.4°E'],
      ['-33.9 deg', '18.4 deg'],
    ])
      expect(await siteOf(lat, lon)).toMatchObject({ latitudeDeg: -33.9, longitudeDeg: 18.4 });
    expect((await onlyProblem(`${FIXED}site: { latitude: 18.4 E }`)).fix).toBe(
      'North is positive, south negative.',
    );
  });
});

test('a unit of another kind is refused with the units that do', async () => {
  for (const [where, wrong, units] of [
    ['array: { dc: ', '12 kg', 'W, kW or MW'],
    ['array: { dc: ', '12 kWh', 'W, kW or MW'],
    ['wind: { design_gust: ', '50 m', 'm/s, km/h, mph or kn'],
    ['site: { elevation: ', '5 min', 'm, cm, mm, in or ft'],
    ['site: { elevation: ', '5 10 m', 'm, cm, mm, in or ft'],
  ]) {
    const problem = await onlyProblem(`${FIXED}${where}${wrong} }`);
    expect(problem.place).toBe(`3:${where.length + 1}`);
    expect(problem.found).toBe(`"${wrong}"`);
    expect(problem.fix).toContain(units);
  }
});

test('decimal commas and thousands marks are refused rather than guessed', async () => {
  for (const wrong of ['"3,5 m"', '"1,700 m"'])
    expect((await onlyProblem(`${FIXED}site: { elevation: ${wrong} }`)).fix).toMatch(/decimal point/);
});
