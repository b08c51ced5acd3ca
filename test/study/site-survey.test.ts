import { describe, expect, test } from 'vitest';
import { readStudy } from '../../src/inputs/index.ts';
import { TrackworthError, wrap180 } from '../../src/shared/index.ts';
import { surveySite } from '../../src/study/site-survey.ts';
import { elevationAt } from '../../src/survey/index.ts';

const SEATTLE = { latitudeDeg: 47.45, longitudeDeg: -122.31, elevationM: 0 };
const FILE = 'sites/orlin.yaml';
const noFile = (file: string): Promise<string> => Promise.reject(new RangeError(`asked for ${file}`));

const MOUNTS = (...mounts: string[]) =>
  `weather: { file: a.epw }\nmounts:\n${mounts.map((m) => `  - { ${m} }`).join('\n')}\n`;
const ROOF = (bearing: string) =>
  MOUNTS(`id: roof, label: the barn, kind: roof-plane, tilt: 20, bearing: { ${bearing} }`);
const SITE = (skyline: string) => `${MOUNTS('id: m, kind: dual-axis')}site: { skyline: ${skyline} }\n`;

const survey = async (text: string, readText = noFile, place = SEATTLE) =>
  surveySite(await readStudy({ file: FILE, text }), place, readText, FILE);
const roofOf = async (bearing: string, place = SEATTLE) => {
  const found = await survey(ROOF(bearing), noFile, place);
  return { ...found, roof: found.mounts.get('roof')! };
};
const refusal = async (work: Promise<unknown>): Promise<TrackworthError> => {
  const trouble = await work.then(
    () => expect.fail('the survey was accepted'),
    (error: unknown) => error,
  );
  if (!(trouble instanceof TrackworthError)) throw trouble;
  expect(trouble.kind).toBe('input');
  return trouble;
};

describe('a bearing read on site', () => {
  test('of 150 magnetic at 16 east faces 166 true, south-south-east', async () => {
    // Common practice, no source: 150 magnetic at 16 east is 166 true.
    const { roof, declinations, findings } = await roofOf('magnetic: 150, declination: 16 E, error: 5');
    expect(roof).toStrictEqual({
      azimuthDeg: 166,
      azimuthErrorDeg: 5,
      tiltErrorDeg: null,
      measuredWith: ['compass'],
      readings: ['bearing 150 magnetic, taken facing, declination 16 E, error 5 deg'],
      steps: ['150 + 16 E = 166 true', 'taken facing out from the plane: 166 true, faces south-south-east'],
      mistakes: { forgottenDeg: 150, reversedDeg: 134 },
    });
    expect(declinations).toEqual(['16 E as entered, applied to the bearing of roof']);
    expect(findings).toEqual([]);
  });

  // Rows of the official WMM2025 test file (check-values 10), whose declinations are printed to 0.01; noon of the day is
  // the middle of the year to 0.002 years, which moves them by less than 0.001 degrees.
  test.each([
    [33, -118, 44_000, '2025-07-02', 11.1, 'east', '33.00 N 118.00 W'],
    [-37, 140, 22_000, '2025-07-02', 9.28, 'east', '37.00 S 140.00 E'],
    [59, -77, 61_000, '2027-01-01', -16.48, 'west', '59.00 N 77.00 W'],
    [-33, 109, 51_000, '2025-01-01', -5.49, 'west', '33.00 S 109.00 E'],
  ])(
    'at %d, %d is turned by the declination of its day and place',
    async (lat, lon, elevationM, day, d, side, place) => {
      const at = { latitudeDeg: lat, longitudeDeg: lon, elevationM };
      const { roof, declinations } = await roofOf(`magnetic: 150, dated: ${day}`, at);
      expect(Math.abs(roof.azimuthDeg! - (150 + d))).toBeLessThan(0.01);
      expect(roof.steps[0]).toMatch(
        d > 0 ? /^150 \+ [\d.]+ E = [\d.]+ true$/ : /^150 - [\d.]+ W = [\d.]+ true$/,
      );
      expect(roof.azimuthErrorDeg).toBeNull();
      expect(Math.abs(wrap180(roof.mistakes!.forgottenDeg - 150))).toBeLessThan(1e-9);
      expect(Math.abs(wrap180(roof.mistakes!.reversedDeg - (150 - d)))).toBeLessThan(0.01);
      expect(declinations).toHaveLength(1);
      const words = `${side} (WMM2025 at ${place} on ${day}, `;
      expect(declinations[0]).toContain(words);
      expect(declinations[0]).toMatch(/^\d+\.\d\d degrees/);
      expect(declinations[0].split(words)[1]).toMatch(
        /^0\.\d+ degrees a year toward (east|west), \+- 0\.\d\d\), applied to the bearing of roof$/,
      );
    },
  );

  test('that is true already is left alone', async () => {
    const { roof, declinations } = await roofOf('true: 166, dated: 2026-07-02');
    expect(roof).toMatchObject({ azimuthDeg: 166, mistakes: null });
    expect(roof.readings).toEqual(['bearing 166 true, taken facing, dated 2026-07-02']);
    expect(declinations).toEqual([]);
  });

  test('may be taken at the plane or along its ridge', async () => {
    const { roof } = await roofOf('magnetic: 330, declination: 16 E, taken: looking_at');
    expect(roof.azimuthDeg).toBe(166);
    // Looking along 60 magnetic, 76 true: right is 166, left 346.
    for (const [side, azimuthDeg, words] of [
      ['right', 166, 'right'],
      ['left', 346, 'left'],
      ['south', 166, 'south'],
      ['NNW', 346, 'north-north-west'],
    ] as const) {
      const ridge = await roofOf(`magnetic: 60, declination: 16 E, taken: along_ridge, downslope: ${side}`);
      expect(ridge.roof.azimuthDeg).toBe(azimuthDeg);
      expect(ridge.roof.readings[0]).toContain(`taken along_ridge, downslope ${words}, declination 16 E`);
    }
  });

  test('from both ends is averaged, and half of what they disagree by is the least error', async () => {
    // By hand: back 183 turned about is 3; the mean of 359 and 3 is 1; with 10 E 11. They miss 180 by 4.
    const { roof, findings } = await roofOf('magnetic: 359, back: 183, declination: 10 E, error: 1');
    expect(roof.azimuthDeg).toBeCloseTo(11, 12);
    expect(roof.azimuthErrorDeg).toBe(2);
    expect(roof.readings[0]).toContain('bearing 359 magnetic, back 183');
    expect(roof.steps[0]).toContain('mean 1');
    expect(findings.map((f) => [f.code, f.severity])).toEqual([['bearings-disagree', 'warning']]);
    expect(findings[0].text).toMatch(/^the barn: /);
    expect((await roofOf('magnetic: 359, back: 180, declination: 10 E')).findings).toEqual([]);
  });

  test('a declination by hand is held against the model where it has a date that the model covers', async () => {
    const codes = async (keys: string) => (await roofOf(keys)).findings.map((f) => f.code);
    expect(await codes('magnetic: 150, declination: 15 E, dated: 2026-05-01')).toEqual([]);
    expect(await codes('magnetic: 150, declination: 15 W, dated: 2026-05-01')).toEqual(['odd-declination']);
    expect(await codes('magnetic: 150, declination: 15 W')).toEqual([]);
    expect(await codes('magnetic: 150, declination: 15 W, dated: 1990-05-01')).toEqual([]);
  });

  test('beside a magnetic pole is refused with its field, unless the declination is entered', async () => {
    // WMM2025's north magnetic dip pole lies near 85.8 N 139.3 E (from memory); at 2025 it is within the blackout zone.
    const pole = { latitudeDeg: 85.8, longitudeDeg: 139.3, elevationM: 0 };
    const { problems } = await refusal(roofOf('magnetic: 150, dated: 2026-05-01', pole));
    expect(problems).toMatchObject([{ code: 'magnetic-pole', file: FILE, field: 'mounts.roof.bearing' }]);
    const byHand = await roofOf('magnetic: 150, declination: 16 E, dated: 2026-05-01', pole);
    expect(byHand.roof.azimuthDeg).toBe(166);
  });

  test('warns where the field is weak', async () => {
    const arctic = { latitudeDeg: 80, longitudeDeg: -60, elevationM: 0 };
    const { findings } = await roofOf('magnetic: 150, dated: 2026-05-01', arctic);
    expect(findings.map((f) => f.severity)).toEqual(['warning']);
  });
});

test('tilts carry their errors, and mounts without readings are left out', async () => {
  const { mounts, declinations, skyline } = await survey(
    MOUNTS(
      'id: a, kind: fixed-tilt, slope: { reading: 6:12, error: 2 }',
      'id: b, kind: fixed-tilt, slope: { rise: 4 ft, run: 12 ft, rise_error: 1 in }, bearing: { true: 200 }',
      'id: c, kind: fixed-tilt, tilt: 30, azimuth: 180',
      'id: d, kind: dual-axis',
    ),
  );
  expect([...mounts.keys()]).toEqual(['a', 'b']);
  expect(mounts.get('a')).toStrictEqual({
    azimuthDeg: null,
    azimuthErrorDeg: null,
    tiltErrorDeg: 2,
    measuredWith: ['rise and run'],
    readings: ['slope 6:12 (error 2 deg)'],
    steps: ['6:12 = 50 % = 26.6 degrees, +- 2'],
    mistakes: null,
  });
  expect(mounts.get('b')).toMatchObject({ azimuthDeg: 200, azimuthErrorDeg: null });
  // By hand: 144 in x 1 in / (48^2 + 144^2) in^2 = 0.00625 rad = 0.358 degrees.
  expect(mounts.get('b')?.tiltErrorDeg).toBeCloseTo(0.3581, 4);
  expect(mounts.get('b')?.readings).toEqual([
    'bearing 200 true, taken facing',
    'slope rise 4 ft (error 1 in), run 12 ft',
  ]);
  expect(declinations).toEqual([]);
  expect(skyline).toBeNull();
});

test('a study without readings needs no survey', async () => {
  expect(await survey(MOUNTS('id: a, kind: dual-axis'))).toStrictEqual({
    mounts: new Map(),
    skyline: null,
    declinations: [],
    findings: [],
  });
});

test('one declination is named once, several each', async () => {
  const roof = (id: string, keys: string) => `id: ${id}, kind: roof-plane, tilt: 3, bearing: { ${keys} }`;
  const { declinations } = await survey(
    MOUNTS(
      roof('a', 'magnetic: 150, dated: 2026-05-01'),
      roof('b', 'magnetic: 330, dated: 2026-05-01'),
      roof('c', 'magnetic: 330, dated: 2016-05-01'),
      roof('d', 'magnetic: 330, declination: 15 E'),
    ),
  );
  expect(declinations.map((d) => /WMM\w+|as entered/.exec(d)?.[0])).toEqual([
    'WMM2025',
    'WMM2015',
    'as entered',
  ]);
});

describe('a skyline', () => {
  const EVERY_15 = Array.from({ length: 24 }, (_, i) => [15 * i, i % 5]);

  test('is taken from the study, and its gaps are named', async () => {
    const { skyline, findings } = await survey(SITE('{ points: [ [90, 12], [120, 6], [240, 0] ] }'));
    expect(skyline?.profiles.map((p) => p.name)).toEqual(['point 1']);
    expect(elevationAt(skyline!.worst, 105)).toBeCloseTo(9, 12); // half way
    expect(findings.map((f) => f.code)).toEqual(['skyline-gap']);
    const full = await survey(SITE(`{ points: ${JSON.stringify(EVERY_15)} }`));
    expect(full.findings).toEqual([]);
  });

  test('is read from a file, and turned by its declination once', async () => {
    const asked: string[] = [];
    const { skyline, declinations, findings } = await survey(
      SITE('{ name: gate, file: sky/line.csv, bearings: magnetic, declination: 16 E }'),
      async (file) => {
        asked.push(file);
        return `bearing,elevation\n${EVERY_15.map((row) => row.join()).join('\n')}\n`;
      },
    );
    expect(asked).toEqual(['sky/line.csv']);
    expect(skyline?.worst.name).toBe('gate');
    for (const [bearing, elevation] of EVERY_15)
      expect(elevationAt(skyline!.worst, bearing + 16)).toBeCloseTo(elevation, 12);
    expect(declinations).toEqual(['16 E as entered, applied to the skyline at gate']);
    expect(findings).toEqual([]);
  });

  test('of obstacles stands at their height over their bearings, by the declination of the day', async () => {
    const { skyline, declinations, findings } = await survey(
      SITE(
        '{ obstacles: [ { height: 20 ft, distance: 20 ft, from: 100, to: 130 } ], bearings: magnetic, dated: 2026-07-02 }',
      ),
    );
    // 100 and 130 magnetic are 114.9 and 144.9 true in Seattle; as high as far is 45 degrees.
    for (const [azimuth, elevation] of [
      [114.5, 0],
      [115.5, 45],
      [144.5, 45],
      [145.5, 0],
    ])
      expect(elevationAt(skyline!.worst, azimuth)).toBeCloseTo(elevation, 12);
    expect(declinations).toHaveLength(1);
    expect(findings).toEqual([]);
  });

  test('from several points names the worst', async () => {
    const low = JSON.stringify(EVERY_15);
    const high = JSON.stringify(EVERY_15.map(([bearing, elevation]) => [bearing, elevation + 10]));
    const { skyline } = await survey(
      SITE(`[ { name: west, points: ${low} }, { name: east, points: ${high} } ]`),
    );
    expect(skyline?.profiles.map((p) => p.name)).toEqual(['west', 'east']);
    expect(skyline?.worst.name).toBe('east');
    expect(skyline!.blockedSky[1]).toBeGreaterThan(skyline!.blockedSky[0]);
  });
});

test('problems of all mounts and skylines are told together, in the study or in the file', async () => {
  const roof = (id: string, keys: string) => `id: ${id}, kind: roof-plane, tilt: 3, bearing: { ${keys} }`;
  const text = `${MOUNTS(
    // at 15 E: 95, so it faces 275
    roof('a', 'magnetic: 80, dated: 2026-05-01, taken: looking_at, downslope: east'),
    roof('b', 'magnetic: 150, dated: 2026-05-01'),
    // at 15 E: a ridge at 165, south-south-east nearly along it
    roof('c', 'magnetic: 150, dated: 2026-05-01, taken: along_ridge, downslope: SSE'),
  )}site: { skyline: [ { file: a.csv }, { file: b.csv } ] }\n`;
  const lost = new TrackworthError('input', [
    { code: 'no-file', expected: 'a file', found: 'none', fix: 'Look again.' },
  ]);
  const { problems } = await refusal(
    survey(text, async (file) => {
      if (file === 'b.csv') throw lost;
      return 'bearing,elevation\n90,5\n400,2\n120,95\n';
    }),
  );
  expect(problems.map((p) => [p.code, p.file, p.line, p.field])).toEqual([
    ['wrong-downslope', FILE, undefined, 'mounts.a.bearing'],
    ['ambiguous-facing', FILE, undefined, 'mounts.c.bearing'],
    ['wrong-bearing', 'a.csv', 3, undefined],
    ['wrong-elevation', 'a.csv', 4, undefined],
    ['no-file', FILE, undefined, 'site.skyline.#2'],
  ]);
});

test('a fault that is no problem of the input is passed on', async () => {
  await expect(survey(SITE('{ file: a.csv }'))).rejects.toThrow('asked for a.csv');
});

test("a map's declination may carry its year, which is echoed, and an old one is warned of", async () => {
  const read = (year: string) => roofOf(`magnetic: 150, declination: 16 E${year}, dated: 2026-05-01`);
  const old = await read(' (1998)');
  expect(old.roof.azimuthDeg).toBe(166);
  expect(old.declinations).toEqual(['16 E as entered, printed for 1998, applied to the bearing of roof']);
  expect(old.findings.map(({ code }) => code)).toContain('old-declination');
  const recent = await read(' 2024');
  expect(recent.declinations[0]).toContain('printed for 2024');
  expect(recent.findings.map(({ code }) => code)).not.toContain('old-declination');
});
