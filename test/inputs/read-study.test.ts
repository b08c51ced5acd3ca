import { expect, test } from 'vitest';
import type { Study } from '../../src/inputs/index.ts';
import { readStudy } from '../../src/inputs/index.ts';
import { FILE, LEAST } from './problems-of.ts';

const read = (text: string, file = FILE) => readStudy({ file, text });

const BLANK: Omit<Study, 'title' | 'weather' | 'mounts'> = {
  site: {
    latitudeDeg: null,
    longitudeDeg: null,
    elevationM: null,
    utcOffsetH: null,
    roofHeightM: null,
    skyline: null,
  },
  sky: { model: 'perez', albedo: 0.2 },
  array: { given: false, dcKw: 1, inverterKw: null, module: null },
  losses: { dirt: null, moduleSpread: null, cables: null, conversion: null },
  finance: { realRate: null, years: null, ageing: null, currency: null },
  wind: null,
  objective: null,
  programme: { minimumTof: null, minimumTsrf: null },
  compareWith: null,
};
const WEATHER = { table: null, label: null, addMinutes: 0, acceptClock: false };
const NO_LENGTHS = { slantM: null, axisHeightM: null, lowerEdgeM: null, airBehindM: null };
const BLANK_DRIVE = { working: null, stuck: null, visits: null, ownUse: null };

test('the simplest study gets the documented defaults, and null for all that is blank', async () => {
  const study = await read(`title: Orlin Bench
weather: { file: orlin.epw }
array: { dc: 12 kW, inverter: 10 kW }
mounts:
  - { id: ground,  kind: fixed-tilt,  rows: { gcr: 0.45 } }
  - { id: tracker, kind: single-axis, rows: { gcr: 0.40 } }
`);
  expect(study).toStrictEqual({
    ...BLANK,
    title: 'Orlin Bench',
    weather: { ...WEATHER, file: 'orlin.epw' },
    array: { given: true, dcKw: 12, inverterKw: 10, module: null },
    mounts: [
      {
        id: 'ground',
        label: 'ground',
        geometry: {
          kind: 'fixed-tilt',
          tiltDeg: 'best',
          azimuthDeg: 'best',
          rows: { gcr: 0.45, lowSun: 'shade' },
        },
        readings: null,
        lengths: NO_LENGTHS,
        drive: null,
        stow: null,
        snow: null,
        cost: null,
      },
      {
        id: 'tracker',
        label: 'tracker',
        geometry: {
          kind: 'single-axis',
          axisAzimuthDeg: 180,
          axisTiltDeg: 0,
          swingDeg: 60,
          rows: { gcr: 0.4, lowSun: 'backtrack' },
        },
        readings: null,
        lengths: NO_LENGTHS,
        drive: BLANK_DRIVE,
        stow: null,
        snow: null,
        cost: null,
      },
    ],
  } satisfies Study);
});

/** Costs stand where the contract prints `...`. */
const FULL = `title: Boulder house
site: { latitude: 40.0167, longitude: -105.25, elevation: 1634, utc_offset: -7 }   # optional where the weather file says it
weather: { file: boulder.tmy2.gz }
sky: { model: perez, albedo: 0.2 }
array: { dc: 12 kW, inverter: 10 kW, module: { power: 430, length: 1.76, width: 1.13, heat: -0.34 %/K } }
mounts:
  - { id: roof,    kind: roof-plane,  tilt: "3:12", azimuth: 166, air_behind: 100 mm, cost: { capital_per_kw: 1700, upkeep_per_kw: 15 } }
  - { id: ground,  kind: fixed-tilt,  tilt: best, azimuth: best, rows: { gcr: 0.45 }, cost: { capital: 21000 } }
  - { id: tracker, kind: single-axis, axis: { azimuth: 180, tilt: 0 }, swing: 60, rows: { gcr: 0.4, low_sun: backtrack },
      drive: { working: 97 %, stuck: flat, own_use: 0.3 % }, cost: { upkeep: 0, renewals: [ { what: drive, year: 12, cost: 800 } ] } }
  - { id: mast,    kind: dual-axis, cost: { } }
losses: { dirt: 2 %, module_spread: 1 %, cables: 1.5 %, conversion: 3.5 % }
finance: { real_rate: 6 %, years: 25, ageing: 0.5 %, currency: USD }
wind: { design_gust: 115 mph, exposure: C, limits: { roof_projection: 10 in, height: 3 m } }
advice: { objective: lowest cost per kWh }
compare_with: ground
`;
const NO_COST = { capitalPerKw: null, capital: null, upkeepPerKw: null, upkeep: null, renewals: [] };

test('the fuller study comes out in metres, m/s, degrees and fractions', async () => {
  const study = await read(FULL);
  const roofTiltDeg = (Math.atan(3 / 12) * 180) / Math.PI; // check-values 10: 14.036
  expect(roofTiltDeg).toBeCloseTo(14.036, 3);
  expect(study).toStrictEqual({
    title: 'Boulder house',
    site: {
      latitudeDeg: 40.0167,
      longitudeDeg: -105.25,
      elevationM: 1634,
      utcOffsetH: -7,
      roofHeightM: null,
      skyline: null,
    },
    weather: { ...WEATHER, file: 'boulder.tmy2.gz' },
    sky: { model: 'perez', albedo: 0.2 },
    array: {
      given: true,
      dcKw: 12,
      inverterKw: 10,
      module: { powerW: 430, lengthM: 1.76, widthM: 1.13, thicknessM: null, heatPerK: -0.0034 },
    },
    mounts: [
      {
        id: 'roof',
        label: 'roof',
        geometry: { kind: 'roof-plane', tiltDeg: expect.closeTo(roofTiltDeg, 12) as number, azimuthDeg: 166 },
        readings: null,
        lengths: { ...NO_LENGTHS, airBehindM: 0.1 },
        drive: null,
        stow: null,
        snow: null,
        cost: { ...NO_COST, capitalPerKw: 1700, upkeepPerKw: 15 },
      },
      {
        id: 'ground',
        label: 'ground',
        geometry: {
          kind: 'fixed-tilt',
          tiltDeg: 'best',
          azimuthDeg: 'best',
          rows: { gcr: 0.45, lowSun: 'shade' },
        },
        readings: null,
        lengths: NO_LENGTHS,
        drive: null,
        stow: null,
        snow: null,
        cost: { ...NO_COST, capital: 21000 },
      },
      {
        id: 'tracker',
        label: 'tracker',
        geometry: {
          kind: 'single-axis',
          axisAzimuthDeg: 180,
          axisTiltDeg: 0,
          swingDeg: 60,
          rows: { gcr: 0.4, lowSun: 'backtrack' },
        },
        readings: null,
        lengths: NO_LENGTHS,
        drive: { working: 0.97, stuck: 'flat', visits: null, ownUse: 0.003 },
        stow: null,
        snow: null,
        cost: { ...NO_COST, upkeep: 0, renewals: [{ what: 'drive', year: 12, cost: 800 }] },
      },
      {
        id: 'mast',
        label: 'mast',
        geometry: { kind: 'dual-axis', rows: null },
        readings: null,
        lengths: NO_LENGTHS,
        drive: BLANK_DRIVE,
        stow: null,
        snow: null,
        cost: null,
      },
    ],
    losses: { dirt: 0.02, moduleSpread: 0.01, cables: 0.015, conversion: 0.035 },
    finance: { realRate: 0.06, years: 25, ageing: 0.005, currency: 'USD' },
    wind: {
      designGustMs: 51.4096, // 115 x 0.44704
      exposure: 'C',
      limits: { roofProjectionM: 0.254, heightM: 3 },
    },
    objective: 'lowest cost per kWh',
    programme: { minimumTof: null, minimumTsrf: null },
    compareWith: 'ground',
  } satisfies Study);
});

test('keys with nothing behind them are blank, in groups too', async () => {
  const study = await read(`${LEAST}title:
site:
sky:
  albedo: ~
array: null
losses:
  dirt:
wind: { limits: {} }
advice: { objective: }
compare_with:
`);
  expect(study).toStrictEqual({
    ...(await read(LEAST)),
    ...BLANK,
    title: 'orlin',
  });
});

test('a study without a title is called after its file, without folder and ending', async () => {
  for (const [file, title] of [
    ['orlin.yaml', 'orlin'],
    ['a/b.c/orlin bench.yml', 'orlin bench'],
    ['C:\\sites\\orlin.v2.json', 'orlin.v2'],
    ['orlin', 'orlin'],
    ['', 'study'],
  ])
    expect((await read(LEAST, file)).title).toBe(title);
  expect((await read(`title: 2030\n${LEAST}`)).title).toBe('2030');
});

test('JSON is read by the same path', async () => {
  const json = JSON.stringify(
    {
      $schema: './study.schema.json',
      title: 'J',
      weather: { file: 'a.epw', add_minutes: 60, accept_clock: true, label: 'start' },
      mounts: [{ id: 'roof', kind: 'roof-plane', tilt: '25 %', azimuth: 270 }],
    },
    null,
    '\t',
  );
  const study = await read(json, 'j.json');
  expect(study.weather).toStrictEqual({
    ...WEATHER,
    file: 'a.epw',
    addMinutes: 60,
    acceptClock: true,
    label: 'start',
  });
  expect(study.mounts[0].geometry).toStrictEqual({
    kind: 'roof-plane',
    tiltDeg: expect.closeTo(14.036, 3),
    azimuthDeg: 270,
  });
});

test('a byte order mark and Windows line ends change nothing', async () => {
  expect(await read(`\ufeff${FULL.replaceAll('\n', '\r\n')}`)).toStrictEqual(await read(FULL));
});

test('a title that would be harmful elsewhere is kept as it is', async () => {
  const title = '=1+1 | </script><script>alert(1)</script>\nsecond `line` **x** "q" \u2028 end';
  expect((await read(`title: ${JSON.stringify(title)}\n${LEAST}`)).title).toBe(title);
  expect((await read(`title: =SUM(A1) | </script>\n${LEAST}`)).title).toBe('=SUM(A1) | </script>');
  expect((await read(`title: |\n  a\n  </script>\n${LEAST}`)).title).toBe('a\n</script>');
});

test('the columns of a plain table are names, or names with a unit', async () => {
  const study = await read(`mounts: [ { id: a, kind: dual-axis, rows: { gcr: 20 % } } ]
weather:
  file: t.csv
  table: { time: Time (LST), ghi: { column: Global, unit: kJ/m2 }, temperature: { column: 2 }, wind: w }
  label: middle
  add_minutes: -30 min
`);
  expect(study.weather).toStrictEqual({
    file: 't.csv',
    table: {
      time: { name: 'Time (LST)', unit: null },
      ghi: { name: 'Global', unit: 'kJ/m2' },
      dni: null,
      dhi: null,
      temperature: { name: '2', unit: null },
      wind: { name: 'w', unit: null },
    },
    label: 'middle',
    addMinutes: -30,
    acceptClock: false,
  });
  expect(study.mounts[0].geometry).toStrictEqual({ kind: 'dual-axis', rows: { gcr: 0.2, lowSun: 'shade' } });
});

test('every key of every mount arrives where it belongs', async () => {
  const { mounts, sky, site } = await read(`weather: { file: a.epw }
sky: { model: hay-davies, albedo: file }
site: { roof_height: 5 }
mounts:
  - { id: g_1, label: the old rack, kind: fixed-tilt, tilt: 30, azimuth: 0, slant: 12 ft, lower_edge: 0 }
  - { id: t-2, kind: single-axis, axis: { azimuth: 0, tilt: 10 % }, rows: { gcr: .3, low_sun: shade }, slant: 2, axis_height: 1.5 }
  - { id: "3", kind: dual-axis, slant: 4, axis_height: 3, drive: { own_use: 0.002 } }
`);
  expect(sky).toStrictEqual({ model: 'hay-davies', albedo: 'file' });
  expect(site.roofHeightM).toBe(5);
  expect(mounts.map((m) => m.id)).toEqual(['g_1', 't-2', '3']);
  expect(mounts[0].label).toBe('the old rack');
  expect(mounts[0].geometry).toStrictEqual({ kind: 'fixed-tilt', tiltDeg: 30, azimuthDeg: 0, rows: null });
  expect(mounts[0].lengths).toStrictEqual({ ...NO_LENGTHS, slantM: 3.6576, lowerEdgeM: 0 });
  expect(mounts[1].geometry).toStrictEqual({
    kind: 'single-axis',
    axisAzimuthDeg: 0,
    axisTiltDeg: expect.closeTo(5.7106, 4), // atan 0.1
    swingDeg: 60,
    rows: { gcr: 0.3, lowSun: 'shade' },
  });
  expect(mounts[1].lengths).toStrictEqual({ ...NO_LENGTHS, slantM: 2, axisHeightM: 1.5 });
  expect(mounts[2].drive).toStrictEqual({ working: null, stuck: null, visits: null, ownUse: 0.002 });
});

test('the tilt of an axis on sloping ground follows from the ground', async () => {
  const { mounts } = await read(`weather: { file: a.epw }
mounts:
  - id: t
    kind: single-axis
    axis: { azimuth: 195 }
    ground: { slope: 10 deg, falls_toward: 180 }
    slope_limits: { along: 15 %, across: 5.7 }
`);
  expect(mounts[0].geometry).toStrictEqual({
    kind: 'single-axis',
    axisAzimuthDeg: 195,
    axisTiltDeg: expect.closeTo(9.666, 3), // Anderson & Mikofski 2020, NREL/TP-5K00-76626, eq. 18
    swingDeg: 60,
    rows: null,
    ground: { slopeDeg: 10, fallsTowardDeg: 180 },
    slopeLimits: { alongDeg: expect.closeTo(8.5308, 4), acrossDeg: 5.7 }, // atan 0.15
  });
});

test('the reach of masts and the tilt of turntables arrive, and what is blank is left out', async () => {
  const { mounts } = await read(`weather: { file: a.epw }
mounts:
  - { id: m, kind: dual-axis, turns: { from: 300, to: 60 deg }, elevation: { lowest: 15 } }
  - { id: t, kind: turntable, tilt: 100 %, turns: { from: 60, to: 300 }, drive: { working: 90 %, stuck: equator } }
  - { id: b, kind: turntable, rows: { gcr: 0.2 } }
`);
  expect(mounts.map(({ geometry }) => geometry)).toStrictEqual([
    {
      kind: 'dual-axis',
      rows: null,
      turns: { fromDeg: 300, toDeg: 60 },
      elevation: { lowestDeg: 15, highestDeg: 90 },
    },
    {
      kind: 'turntable',
      planeTiltDeg: expect.closeTo(45, 9),
      rows: null,
      turns: { fromDeg: 60, toDeg: 300 },
    },
    { kind: 'turntable', planeTiltDeg: 'best', rows: { gcr: 0.2, lowSun: 'shade' } },
  ]);
  expect(mounts[1].drive).toStrictEqual({ working: 0.9, stuck: 'equator', visits: null, ownUse: null });
  expect(mounts[2].drive).toStrictEqual({ working: null, stuck: null, visits: null, ownUse: null });
});

test('anchors and aliases may share a group between mounts', async () => {
  const { mounts } = await read(`weather: { file: a.epw }
mounts:
  - { id: a, kind: fixed-tilt, cost: &c { capital_per_kw: 1700 } }
  - { id: b, kind: fixed-tilt, cost: *c }
`);
  expect(mounts[1].cost).toStrictEqual({ ...NO_COST, capitalPerKw: 1700 });
});

test('what is read is not shared between two studies', async () => {
  const [a, b] = [await read(FULL), await read(FULL)];
  expect(a).toStrictEqual(b);
  expect(a.mounts[0]).not.toBe(b.mounts[0]);
});

test('a dead tracker stands flat, where it stopped, or as given; a side is a word and not a sign', async () => {
  const stuck = async (kind: string, keys: string) => {
    const text = `weather: { file: a }\nmounts: [ { id: m, kind: ${kind}, ${keys} } ]\n`;
    return (await readStudy({ file: 'x', text })).mounts[0].drive;
  };
  const single = (at: string, keys = '') =>
    stuck('single-axis', `drive: { working: 97 %, stuck: ${at}, visits: 2 }${keys}`);
  expect(await single('average')).toStrictEqual({ working: 0.97, stuck: 'average', visits: 2, ownUse: null });
  // With the axis falling south a positive turn faces west (src/mounts/single-axis.ts).
  expect((await single('{ turn: 45, faces: west }'))?.stuck).toEqual({ turnDeg: 45 });
  expect((await single('{ turn: 45, faces: east }'))?.stuck).toEqual({ turnDeg: -45 });
  expect((await single('{ turn: 0 }'))?.stuck).toEqual({ turnDeg: 0 });
  expect((await single('{ turn: 30, faces: east }', ', axis: { azimuth: 0 }'))?.stuck).toEqual({
    turnDeg: 30,
  });
  expect((await single('{ turn: 30, faces: north }', ', axis: { azimuth: 270 }'))?.stuck).toEqual({
    turnDeg: 30,
  });
  const dual = await stuck('dual-axis', 'drive: { working: 90 %, stuck: { tilt: 30, azimuth: 90 } }');
  expect(dual?.stuck).toEqual({ tiltDeg: 30, azimuthDeg: 90 });
});

test('stow is read with its blanks; speeds and times in any unit; a side is a word', async () => {
  const stow = async (kind: string, keys: string) => {
    const text = `weather: { file: a }\nmounts: [ { id: m, kind: ${kind}, ${keys} } ]\n`;
    return (await readStudy({ file: 'x', text })).mounts[0].stow;
  };
  expect(await stow('single-axis', 'stow: { gust: 18 m/s }')).toStrictEqual({
    gustMs: 18,
    gustFactor: null,
    releaseMs: null,
    holdH: 0,
    angleDeg: 0,
  });
  const full =
    'stow: { gust: 72 km/h, gust_factor: 1.4, release: 36 km/h, hold: 90 min, angle: 30, faces: west }';
  expect(await stow('single-axis', full)).toStrictEqual({
    gustMs: 20,
    gustFactor: 1.4,
    releaseMs: 10,
    holdH: 1.5,
    angleDeg: 30,
  });
  expect((await stow('single-axis', full.replace('west', 'east')))?.angleDeg).toBe(-30);
  expect((await stow('single-axis', 'stow: { gust: 18, hold: 3 h }'))?.holdH).toBe(3);
  expect((await stow('dual-axis', 'stow: { gust: 18, hold: 3, angle: 20 }'))?.angleDeg).toBe(20);
});

test('snow is a list of twelve months or those that have any, on every kind of mount', async () => {
  const snow = async (keys: string) =>
    (await readStudy({ file: 'x', text: `weather: { file: a }\nmounts: [ { id: m, ${keys} } ]\n` })).mounts[0]
      .snow;
  const expected = [0.2, 0.15, 0, 0, 0, 0, 0, 0, 0, 0, 0, 0.1];
  const list = 'snow: [ 20 %, 0.15, 0, 0, 0, 0, 0, 0, 0, 0, 0, 10 % ]';
  const named = 'snow: { Feb: 15 %, Jan: 20 %, Dec: 0.1 }';
  for (const kind of [
    'kind: fixed-tilt',
    'kind: single-axis',
    'kind: dual-axis',
    'kind: roof-plane, tilt: 3, azimuth: 9',
  ])
    for (const keys of [list, named]) expect(await snow(`${kind}, ${keys}`)).toEqual(expected);
  expect(await snow('kind: fixed-tilt, snow: { Jan: 100 % }')).toEqual([1, 0, 0, 0, 0, 0, 0, 0, 0, 0, 0, 0]);
  expect(await snow('kind: fixed-tilt')).toBeNull();
});
