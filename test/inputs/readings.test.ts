import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import type { Study } from '../../src/inputs/index.ts';
import { readStudy } from '../../src/inputs/index.ts';
import { marked, onlyProblem, problemsOf } from './problems-of.ts';

const read = (text: string) => readStudy({ file: 'sites/orlin.yaml', text });
const ROOF = (keys: string) =>
  `weather: { file: a.epw }\nmounts:\n  - { id: m, kind: roof-plane, ${keys} }\n`;
const mountOf = async (keys: string): Promise<Study['mounts'][number]> => (await read(ROOF(keys))).mounts[0];
const SITE = (skyline: string) =>
  `weather: { file: a.epw }\nmounts: [ { id: m, kind: dual-axis } ]\nsite: { skyline: ${skyline} }\n`;
const skylinesOf = async (skyline: string) => (await read(SITE(skyline))).site.skyline;

const NORTH = { north: 'true', dated: null, declinationDeg: null, printedYear: null } as const;
const UNTURNED = { backDeg: null, taken: 'facing', downslope: null, errorDeg: null } as const;

describe('a bearing as read on site', () => {
  test('stands in place of azimuth, and waits for its place', async () => {
    const { geometry, readings } = await mountOf(
      'tilt: 3:12, bearing: { magnetic: 150, taken: facing, dated: 2026-05-01, error: 5 }',
    );
    expect(geometry).toStrictEqual({
      kind: 'roof-plane',
      tiltDeg: expect.closeTo(14.036, 3),
      azimuthDeg: 'surveyed',
    });
    expect(readings).toStrictEqual({
      bearing: {
        north: 'magnetic',
        reading: { ...UNTURNED, north: 'magnetic', bearingDeg: 150, errorDeg: 5 },
        dated: { year: 2026, month: 5, day: 1 },
        declinationDeg: null,
        printedYear: null,
      },
      slope: null,
    });
  });

  test('may be true, by hand, from two ends, at the plane or along its ridge; also on a ground rack', async () => {
    const bearingOf = async (keys: string) =>
      (await mountOf(`tilt: 3, bearing: { ${keys} }`)).readings?.bearing;
    expect(await bearingOf('true: 166.5 deg, dated: 2031-01-01')).toStrictEqual({
      ...NORTH,
      dated: { year: 2031, month: 1, day: 1 },
      reading: { ...UNTURNED, north: 'true', bearingDeg: 166.5 },
    });
    expect(
      await bearingOf('magnetic: 60, back: 243, taken: along_ridge, downslope: SE, declination: 13 W'),
    ).toStrictEqual({
      north: 'magnetic',
      dated: null,
      declinationDeg: -13,
      printedYear: null,
      reading: {
        north: 'magnetic',
        bearingDeg: 60,
        backDeg: 243,
        taken: 'along_ridge',
        downslope: { towardDeg: 135 },
        errorDeg: null,
      },
    });
    const looking = await bearingOf("magnetic: '0', taken: looking_at, declination: 16°30' E");
    expect(looking).toMatchObject({
      declinationDeg: 16.5,
      printedYear: null,
      reading: { bearingDeg: 0, taken: 'looking_at' },
    });
    const rack = `weather: { file: a }\nmounts:\n  - id: m\n    kind: fixed-tilt\n    bearing:\n      true: 200\n`;
    expect((await read(rack)).mounts[0].geometry).toMatchObject({ tiltDeg: 'best', azimuthDeg: 'surveyed' });
  });

  test('in JSON it reads the same', async () => {
    const bearing = { magnetic: 150, dated: '2026-05-01', error: 5 };
    const json = { weather: { file: 'a' }, mounts: [{ id: 'm', kind: 'fixed-tilt', tilt: 3, bearing }] };
    const fromYaml = await mountOf('tilt: 3, bearing: { magnetic: 150, dated: 2026-05-01, error: 5 }');
    expect((await read(JSON.stringify(json))).mounts[0].readings).toStrictEqual(fromYaml.readings);
  });

  test.each([
    ['magnetic: ¦400, dated: 2026-05-01', 'magnetic', 'wrong-value', '400', /0 to 360|Read the dial/],
    ['true: ¦-10', 'true', 'wrong-value', '-10', /10 degrees west of north is 350/],
    ['true: ¦south', 'true', 'wrong-value', '"south"', /180 south/],
    ['magnetic: 150, back: ¦361, declination: 0 E', 'back', 'wrong-value', '361', /dial/],
    ['magnetic: 150, declination: ¦16', 'declination', 'wrong-value', '16', /Write 16 E or 16 W/],
    ['magnetic: 150, declination: ¦-13', 'declination', 'wrong-value', '-13', /Write 13 E or 13 W/],
    ['magnetic: 150, dated: ¦2026-02-30', 'dated', 'wrong-value', '"2026-02-30"', /2026-05-01/],
    ['magnetic: 150, dated: ¦2026', 'dated', 'wrong-value', '2026', /2026-05-01/],
    ['magnetic: 150, dated: ¦2031-01-01', 'dated', 'date-outside-model', '"2031-01-01"', /declination: 16 E/],
    ['magnetic: 150, dated: ¦2014-12-31', 'dated', 'date-outside-model', '"2014-12-31"', /declination: 16 E/],
    ['true: 150, taken: ¦facng', 'taken', 'wrong-value', '"facng"', /Did you mean facing/],
    ['true: 150, error: ¦-5', 'error', 'wrong-value', '-5', /5 deg/],
    ['true: 150, error: ¦5 m', 'error', 'wrong-value', '"5 m"', /deg or rad/],
    ['true: 150, downslope: ¦up', 'downslope', 'wrong-value', '"up"', /left or right/],
    ['true: 150, downslope: ¦left', 'downslope', 'wrong-downslope', 'left', /along_ridge/],
    ['true: 150, downslope: ¦north', 'downslope', 'wrong-downslope', 'north', /how the bearing was taken/],
    [
      'magnetic: 150, declination: 0 E, taken: along_ridge, downslope: ¦south-east',
      'downslope',
      'ambiguous-facing',
      'south-east, which is nearly along it',
      /left or right/,
    ],
    ['true: 150, back: ¦150', 'back', 'not-a-back-bearing', '150', /from the far end/],
    ['true: 150, declination: ¦16 E', 'declination', 'declination-twice', 'one', /Remove it/],
    ['magnetic: 150, ¦true: 166', 'true', 'given-twice', 'magnetic and true', /Keep one/],
    ['true: 150, ¦takn: facing', 'takn', 'unknown-key', '"takn"', /Did you mean taken\?/],
  ])('is refused at its place: { %s }', async (keys, key, code, found, fix) => {
    const problem = await onlyProblem(ROOF(`tilt: 3, bearing: { ${keys} }`));
    expect(problem).toMatchObject({ field: `mounts.m.bearing.${key}`, code, found });
    expect(problem.fix).toMatch(fix);
  });

  test.each([
    ['¦{ magnetic: 150 }', 'bearing.dated', 'missing-key', /dated: 2026-05-01.*declination: 16 E/],
    ['¦{ taken: looking_at }', 'bearing.magnetic', 'missing-key', /magnetic: 150/],
    ['¦{ }', 'bearing.magnetic', 'missing-key', /magnetic: 150/],
    ['¦{ true: 76, taken: along_ridge }', 'bearing.downslope', 'ambiguous-facing', /downslope/],
    ['¦150', 'bearing', 'wrong-type', /bearing: \{ magnetic: 150, dated: 2026-05-01 \}/],
  ])('what is missing is said where it should stand: %s', async (bearing, field, code, fix) => {
    const problem = await onlyProblem(ROOF(`tilt: 3, bearing: ${bearing}`));
    expect(problem).toMatchObject({ field: `mounts.m.${field}`, code });
    expect(problem.fix).toMatch(fix);
  });

  test('a ridge that needs its downslope side names both facings', async () => {
    const problem = await onlyProblem(ROOF('tilt: 3, bearing: ¦{ true: 76, taken: along_ridge }'));
    // 76 - 90 = 346 and 76 + 90 = 166
    expect(problem.expected).toContain('left, and it faces 346 (north-north-west)');
    expect(problem.expected).toContain('right, and it faces 166 (south-south-east)');
  });

  test('a rough downslope side waits where the declination does', async () => {
    const keys = 'magnetic: 80, dated: 2026-05-01, taken: looking_at, downslope: east';
    expect((await mountOf(`tilt: 3, bearing: { ${keys} }`)).readings?.bearing?.dated?.year).toBe(2026);
  });

  test('every bearing from 0 to 360 is taken as written', async () => {
    await fc.assert(
      fc.asyncProperty(fc.integer({ min: 0, max: 3600 }), async (tenths) => {
        const { readings } = await mountOf(`tilt: 3, bearing: { true: ${tenths / 10} }`);
        expect(readings?.bearing?.reading.bearingDeg).toBe(tenths / 10);
      }),
      { numRuns: 20 },
    );
  });
});

describe('a slope as read on site', () => {
  const slopeOf = async (keys: string) => {
    const { geometry, readings } = await mountOf(`azimuth: 166, slope: { ${keys} }`);
    expect(geometry).toStrictEqual({
      kind: 'roof-plane',
      tiltDeg: readings?.slope?.tiltDeg,
      azimuthDeg: 166,
    });
    return readings!.slope!;
  };

  // check-values 10: 3 in 12 is 14.036 degrees, 4 in 12 18.435, 6 in 12 (50 %) 26.565
  test.each([
    ['reading: 3:12', 14.036, null, '3:12'],
    ['reading: "3:12", error: 2', 14.036, 2, '3:12 (error 2 deg)'],
    ['reading: 3 in 12, error: 1.5 deg', 14.036, 1.5, '3 in 12 (error 1.5 deg)'],
    ['reading: 25 %', 14.036, null, '25 %'],
    ['reading: 14', 14, null, '14 deg'],
    ['reading: 14 deg, error: 0', 14, 0, '14 deg (error 0 deg)'],
    ['rise: 4 ft, run: 12 ft', 18.435, null, 'rise 4 ft, run 12 ft'],
    ['rise: 2 m, run: 4', 26.565, null, 'rise 2 m, run 4 m'],
    ['rise: 0, run: 4', 0, null, 'rise 0 m, run 4 m'],
    ['rise: 3 ft 6 in, run: 14 ft', 14.036, null, 'rise 3 ft 6 in, run 14 ft'],
  ])('{ %s }', async (keys, tiltDeg, errorDeg, written) => {
    const slope = await slopeOf(keys);
    expect(slope.tiltDeg).toBeCloseTo(tiltDeg, 3);
    expect(slope).toMatchObject({ errorDeg, written });
  });

  test('errors of rise and run are carried into the tilt', async () => {
    // By hand: 1 in in 48 over a run of 144 in; d(tilt) = 144 x 1 / (48^2 + 144^2) rad = 0.35810 degrees.
    const rise = await slopeOf('rise: 4 ft, run: 12 ft, rise_error: 1 in');
    expect(rise.errorDeg).toBeCloseTo(((144 / (48 ** 2 + 144 ** 2)) * 180) / Math.PI, 9);
    expect(rise.written).toBe('rise 4 ft (error 1 in), run 12 ft');
    // Both: hypot(144, 48) / (48^2 + 144^2) rad.
    const both = await slopeOf('rise: 4 ft, run: 12 ft, rise_error: 1 in, run_error: 1 in');
    expect(both.errorDeg).toBeCloseTo(180 / Math.PI / Math.hypot(48, 144), 9);
  });

  test('an error of a grade is in points of it', async () => {
    // Half the way from atan 0.23 to atan 0.27; the curve between them moves it by less than 0.002 degrees.
    const { errorDeg } = await slopeOf('reading: 25 %, error: 2 %');
    const span = ((Math.atan(0.27) - Math.atan(0.23)) / 2) * (180 / Math.PI);
    expect(Math.abs(errorDeg! - span)).toBeLessThan(0.002);
  });

  test.each([
    ['reading: ¦3/0', 'reading', 'wrong-value', '"3/0"', /level distance/],
    ['reading: ¦400', 'reading', 'wrong-value', '400', /3:12/],
    ['reading: ¦-3:12', 'reading', 'wrong-value', '"-3:12"', /./],
    ['reading: 14, error: ¦2 %', 'error', 'wrong-value', '"2 %"', /2 deg/],
    ['reading: 14, error: ¦91', 'error', 'wrong-value', '91', /deg/],
    ['reading: 14, ¦rise: 4 ft', 'rise', 'given-twice', 'reading and rise', /Keep one/],
    ['rise: 4 ft, run: ¦0', 'run', 'wrong-value', '0', /12 ft/],
    ['rise: ¦-4 ft, run: 12 ft', 'rise', 'wrong-value', '"-4 ft"', /4 ft/],
    ['rise: 4 ft, run: 12 ft, ¦error: 2', 'error', 'misplaced-key', 'error', /rise_error: 1 in/],
    [
      'rise: 4 ft, run: 12 ft, run_error: ¦1 deg',
      'run_error',
      'wrong-value',
      '"1 deg"',
      /m, cm, mm, in or ft/,
    ],
    ['¦readng: 3:12, rise: 4 ft, run: 12 ft', 'readng', 'unknown-key', '"readng"', /Did you mean reading\?/],
  ])('is refused at its place: { %s }', async (keys, key, code, found, fix) => {
    const problem = await onlyProblem(ROOF(`azimuth: 166, slope: { ${keys} }`));
    expect(problem).toMatchObject({ field: `mounts.m.slope.${key}`, code, found });
    expect(problem.fix).toMatch(fix);
  });

  test.each([
    ['¦{ rise: 4 ft }', 'slope.run', 'missing-key', /run: 12 ft/],
    ['¦{ run: 4 ft }', 'slope.rise', 'missing-key', /rise: 4 ft/],
    ['¦{ error: 2 }', 'slope.reading', 'missing-key', /reading: 3:12/],
    ['¦3:12', 'slope', 'wrong-type', /slope: \{ reading: 3:12 \}/],
  ])('what is missing is said where it should stand: %s', async (slope, field, code, fix) => {
    const problem = await onlyProblem(ROOF(`azimuth: 166, slope: ${slope}`));
    expect(problem).toMatchObject({ field: `mounts.m.${field}`, code });
    expect(problem.fix).toMatch(fix);
  });

  test('a tilt outright is refused by the same arithmetic', async () => {
    const problem = await onlyProblem(ROOF('azimuth: 166, tilt: ¦3/0'));
    expect(problem).toMatchObject({ field: 'mounts.m.tilt', expected: 'a run above 0', found: '"3/0"' });
  });
});

describe('an angle is given once', () => {
  test.each([
    ['tilt: 3, azimuth: 166, ¦bearing: { true: 166 }', 'bearing', 'azimuth and bearing'],
    ['azimuth: 166, tilt: 14, ¦slope: { reading: 3:12 }', 'slope', 'tilt and slope'],
  ])('%s', async (keys, key, found) => {
    expect(await onlyProblem(ROOF(keys))).toMatchObject({
      field: `mounts.m.${key}`,
      code: 'given-twice',
      found,
    });
  });

  test('best counts as given', async () => {
    const rack =
      'weather: { file: a }\nmounts: [ { id: m, kind: fixed-tilt, tilt: best, ¦slope: { reading: 9 } } ]\n';
    expect((await onlyProblem(rack)).code).toBe('given-twice');
  });

  test('a roof with neither is told of both ways', async () => {
    const { text } = marked(ROOF('label: a'));
    const problems = await problemsOf(text);
    expect(problems.map((p) => [p.line, p.column, p.field, p.code])).toEqual([
      [3, 5, 'mounts.m.tilt', 'missing-key'],
      [3, 5, 'mounts.m.azimuth', 'missing-key'],
    ]);
    expect(problems[0].fix).toContain('slope: { reading: 3:12, error: 2 }');
    expect(problems[1].fix).toContain('bearing: { magnetic: 150, dated: 2026-05-01 }');
  });

  test('a tracker takes no readings, and says whose they are', async () => {
    const tracker = (keys: string) =>
      `weather: { file: a }\nmounts: [ { id: m, kind: dual-axis, ${keys} } ]\n`;
    for (const keys of ['¦bearing: { true: 3 }', '¦slope: { reading: 3 }', '¦dated: 2026-05-01'])
      expect((await onlyProblem(tracker(keys))).fix).toMatch(/belongs to .*roof-plane mounts/);
  });
});

describe('a skyline', () => {
  test('is points, a file or obstacles, by true or magnetic bearings', async () => {
    expect(await skylinesOf('{ points: [ [90, 12], [120.5, 8] ] }')).toStrictEqual([
      {
        ...NORTH,
        name: 'point 1',
        file: null,
        points: [
          { azimuthDeg: 90, elevationDeg: 12 },
          { azimuthDeg: 120.5, elevationDeg: 8 },
        ],
        obstacles: null,
      },
    ]);
    expect(
      await skylinesOf('{ name: door, file: skyline.csv, bearings: magnetic, dated: 2026-05-01 }'),
    ).toStrictEqual([
      {
        north: 'magnetic',
        dated: { year: 2026, month: 5, day: 1 },
        declinationDeg: null,
        printedYear: null,
        name: 'door',
        file: 'skyline.csv',
        points: null,
        obstacles: null,
      },
    ]);
    expect(
      await skylinesOf(
        '{ obstacles: [ { height: 6 m, distance: 20 ft, from: 100, to: 130 } ], bearings: magnetic, declination: 13 W }',
      ),
    ).toMatchObject([
      {
        north: 'magnetic',
        declinationDeg: -13,
        printedYear: null,
        points: null,
        obstacles: [{ heightM: 6, distanceM: 6.096, fromDeg: 100, toDeg: 130 }],
      },
    ]);
  });

  test('may be several, named by hand or by their number', async () => {
    const several = await skylinesOf(
      '[ { file: a.csv, bearings: true }, { name: gate, file: b.csv, bearings: "true" }, { file: c.csv } ]',
    );
    expect(several?.map((s) => [s.name, s.file, s.north])).toEqual([
      ['point 1', 'a.csv', 'true'],
      ['gate', 'b.csv', 'true'],
      ['point 3', 'c.csv', 'true'],
    ]);
  });

  test.each([
    ['{ points: [ ¦[90, 95], [100, 3] ] }', 'points.#1', 'wrong-elevation', '95'],
    ['{ points: [ [90, 5], ¦[400, 3], [20, 1] ] }', 'points.#2', 'wrong-bearing', '400'],
    ['{ points: [ ¦[90, 12] ] }', 'points.#1', 'too-few-points', 'one'],
    ['{ points: ¦[] }', 'points', 'too-few-points', 'none'],
    ['{ points: [ [90, 12], ¦[90, 13], [20, 3] ] }', 'points.#2', 'two-elevations', '12 and 13'],
    ['{ points: [ [90, 12], ¦[90], [20, 3] ] }', 'points.#2', 'wrong-value', 'a list of 1'],
    ['{ points: [ [90, 12], ¦south ] }', 'points.#2', 'wrong-value', '"south"'],
    ['{ points: ¦12 }', 'points', 'wrong-type', '12'],
    ['{ obstacles: ¦[] }', 'obstacles', 'wrong-obstacle', 'none'],
    [
      '{ obstacles: [ ¦{ height: 6, distance: 20, from: 100, to: 100 } ] }',
      'obstacles.#1',
      'wrong-bearing',
      '100',
    ],
    [
      '{ obstacles: [ { height: ¦0, distance: 20, from: 1, to: 2 } ] }',
      'obstacles.#1.height',
      'wrong-value',
      '0',
    ],
    [
      '{ obstacles: [ { height: 6, distance: ¦-2 m, from: 1, to: 2 } ] }',
      'obstacles.#1.distance',
      'wrong-value',
      '"-2 m"',
    ],
    [
      '{ obstacles: [ { height: 6, distance: 2, from: ¦401, to: 2 } ] }',
      'obstacles.#1.from',
      'wrong-value',
      '401',
    ],
    ['{ obstacles: [ ¦{ height: 6, distance: 2, from: 1 } ] }', 'obstacles.#1.to', 'missing-key', 'nothing'],
    ['{ file: a.csv, bearings: ¦compass }', 'bearings', 'wrong-value', '"compass"'],
    ['¦{ file: a.csv, bearings: magnetic }', 'dated', 'missing-key', 'nothing'],
    ['{ file: a.csv, declination: ¦16 E }', 'declination', 'declination-twice', 'one'],
    ['{ file: a.csv, bearings: magnetic, declination: ¦16 }', 'declination', 'wrong-value', '16'],
    [
      '{ file: a.csv, bearings: magnetic, dated: ¦2030-01-01 }',
      'dated',
      'date-outside-model',
      '"2030-01-01"',
    ],
    ['¦{ name: a }', 'points', 'missing-key', 'nothing'],
    ['{ file: ¦"" }', 'file', 'wrong-value', 'an empty text'],
    ['{ points: [ [90, 12], [9, 1] ], ¦file: a.csv }', 'file', 'given-twice', 'points and file'],
    ['{ ¦point: [ [90, 12], [9, 1] ], file: a }', 'point', 'unknown-key', '"point"'],
    ['[ { file: a }, { ¦flie: b, points: [ [1, 2], [9, 1] ] } ]', '#2.flie', 'unknown-key', '"flie"'],
    ['[ { file: a }, { name: ¦point 1, file: b } ]', '#2.name', 'duplicate-name', '"point 1"'],
    ['[ { file: a }, ¦12 ]', '#2', 'wrong-type', '12'],
  ])('is refused at its place: %s', async (skyline, key, code, found) => {
    expect(await onlyProblem(SITE(skyline))).toMatchObject({ field: `site.skyline.${key}`, code, found });
  });

  test.each([
    ['¦12', '12', 'a group with the keys points, file'],
    ['¦[]', 'an empty list', 'a list with at least one entry'],
  ])('is a group or a list of groups, not %s', async (skyline, found, expected) => {
    const problem = await onlyProblem(SITE(skyline));
    expect(problem).toMatchObject({ field: 'site.skyline', found, code: 'wrong-type' });
    expect(problem.expected).toContain(expected);
    expect(problem.fix).toContain('skyline: { points: [ [90, 12], [105, 9] ] }');
  });
});

describe("a programme's minimum", () => {
  test('is a share', async () => {
    const { programme, objective } = await read(
      `${ROOF('tilt: 3, azimuth: 3')}advice: { minimum_tof: 75 %, minimum_tsrf: 0.7 }\n`,
    );
    expect(programme).toStrictEqual({ minimumTof: 0.75, minimumTsrf: 0.7 });
    expect(objective).toBeNull();
  });

  test.each([
    ['minimum_tof: ¦75', 'minimum_tof', /Write 75 %/],
    ['minimum_tof: ¦0', 'minimum_tof', /75 %/],
    ['minimum_tsrf: ¦101 %', 'minimum_tsrf', /75 %/],
    ['¦minimum_tosf: 75 %', 'minimum_tosf', /Did you mean minimum_t(of|srf)\?/],
  ])('is refused at its place: { %s }', async (keys, key, fix) => {
    const problem = await onlyProblem(`${ROOF('tilt: 3, azimuth: 3')}advice: { ${keys} }\n`);
    expect(problem.field).toBe(`advice.${key}`);
    expect(problem.fix).toMatch(fix);
  });
});

test('all that is wrong with the readings of a study is told at once, in line order', async () => {
  const { text, places } = marked(`weather: { file: a.epw }
site:
  skyline:
    - { points: [ ¦[90, 95], ¦[400, 3] ] }
    - ¦{ name: far, bearings: magnetic, file: b.csv }
mounts:
  - { id: a, kind: roof-plane, tilt: ¦3/0, bearing: { magnetic: ¦400, dated: ¦2026-13-01, error: ¦-5 } }
  - { id: b, kind: roof-plane, azimuth: 3, slope: { reading: ¦400 }, ¦bearing: ¦{ true: 9, taken: along_ridge } }
  - { id: c, kind: fixed-tilt, bearing: { magnetic: 9, declination: ¦16 }, slope: ¦{ rise: 4 ft } }
advice: { minimum_tof: ¦75 }
`);
  const problems = await problemsOf(text);
  expect(problems.map((p) => `${p.field} ${p.code}`)).toEqual([
    'site.skyline.#1.points.#1 wrong-elevation',
    'site.skyline.#1.points.#2 wrong-bearing',
    'site.skyline.#2.dated missing-key',
    'mounts.a.tilt wrong-value',
    'mounts.a.bearing.magnetic wrong-value',
    'mounts.a.bearing.dated wrong-value',
    'mounts.a.bearing.error wrong-value',
    'mounts.b.slope.reading wrong-value',
    'mounts.b.bearing given-twice',
    'mounts.b.bearing.downslope ambiguous-facing',
    'mounts.c.bearing.declination wrong-value',
    'mounts.c.slope.run missing-key',
    'advice.minimum_tof wrong-value',
  ]);
  expect(problems.map((p) => `${p.line}:${p.column}`)).toEqual(places);
});
