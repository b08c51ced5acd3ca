import { describe, expect, test } from 'vitest';
import { LEAST, marked, onlyProblem, problemsOf } from './problems-of.ts';

// In the studies here the mark ¦ stands where the problem must be reported.

/** A mount with these keys; without a mark in them the group itself is where the problem must be. */
const MOUNT = (keys: string) =>
  `weather: { file: a.epw }\nmounts:\n  - ${keys.includes('¦') ? '' : '¦'}{ id: m, ${keys} }\n`;

describe('text that is no study', () => {
  test.each([
    ['an empty file', '', '1:1', 'empty-study', 'nothing'],
    ['blanks and comments alone', '\n  \n# nothing here\n', '1:1', 'empty-study', 'nothing'],
    ['a list', '# sites\n- a\n- b\n', '2:1', 'wrong-type', 'a list of 2'],
    ['a word', 'hello\n', '1:1', 'wrong-type', '"hello"'],
    ['a number', '12', '1:1', 'wrong-type', '12'],
    ['bytes of a zip file', 'PK\u0003\u0004\u0014\u0000', '1:3', 'not-text', 'bytes that are no text'],
    ['a stray byte deep inside', 'title: a\nx: b\u0000c\n', '2:5', 'not-text', 'bytes that are no text'],
    ['text that is not UTF-8', 'title: K\ufffdln\n', '1:9', 'not-text', 'bytes that are no text'],
  ])('%s', async (_, text, place, code, found) => {
    expect(await onlyProblem(text)).toMatchObject({ place, code, found });
  });
});

describe('text that is no YAML', () => {
  test.each([
    ['a missing bracket', 'weather: { file: a\nmounts: []\n', '2:1', 'each { or [ to be closed'],
    ['a bracket too much', 'weather: { file: a } }\n', '1:22', 'the end of the value'],
    ['an open quote', 'title: "a\n', '2:1', 'a closing sign'],
    ['no space after the colon', 'title:a\nweather: b\n', '1:1', 'a key, a colon, a space and a value'],
    ['a colon in a title', 'title: Orlin: the bench\n', '1:8', 'one key with its value on the line'],
    ['a per cent sign in front', 'losses:\n  dirt: %2\n', '2:9', 'does not begin with a special sign'],
    ['two documents', 'title: a\n---\ntitle: b\n', '2:1', 'one study'],
    ['a tag', 'title: !mine a\n', '1:8', 'plain numbers and text'],
    ['a group as key', '? { a: 1 }\n: 2\n', '1:3', 'a plain word as key'],
    ['an alias without anchor', `${LEAST}title: *x\n`, '3:8', 'aliases'],
  ])('%s', async (_, text, place, expected) => {
    const problem = await onlyProblem(text);
    expect(problem.place).toBe(place);
    expect(problem.expected).toContain(expected);
  });

  test('a slip that ends the study early is told once, not on every line that follows', async () => {
    const problem = await onlyProblem(`- \n¦title: a\n${LEAST}site: { latitude: 3 }\n`);
    expect(problem.code).toBe('yaml-syntax');
  });

  test('tabs are named as such, one problem a line', async () => {
    const problems = await problemsOf('title: a\nmounts:\n\t- id: a\n\t  kind: fixed-tilt\n');
    expect(problems.map((p) => [p.line, p.column, p.code, p.found])).toEqual([
      [3, 1, 'tab-indent', 'a tab'],
      [4, 1, 'tab-indent', 'a tab'],
    ]);
    expect(problems[0].fix).toMatch(/replace each tab by two spaces/);
  });

  test('a key that stands twice is named with both lines, beside the other problems', async () => {
    const problems = await problemsOf(
      `title: a\n${LEAST}sky: { model: perez,\n  model: reindl, albedo: 2 }\n`,
    );
    expect(problems.map((p) => [p.line, p.column, p.code, p.found])).toEqual([
      [5, 3, 'duplicate-key', '"model" again, first on line 4'],
      [5, 26, 'wrong-value', '2'],
    ]);
  });

  test('a bomb of aliases is refused', async () => {
    const row = (name: string, of: string) => `${name}: &${name} [${Array(9).fill(of).join(', ')}]\n`;
    const names = ['a', 'b', 'c', 'd', 'e', 'f', 'g', 'h'];
    const bomb = names.map((name, i) => row(name, i === 0 ? 'x' : `*${names[i - 1]}`)).join('');
    expect(await onlyProblem(bomb)).toMatchObject({ place: '2:8', code: 'alias' });
  });

  test('an anchor that holds itself ends in plain problems', async () => {
    const problems = await problemsOf(
      'weather: { file: a.epw }\nmounts: &m\n  - *m\n  - &k { id: a, kind: dual-axis, rows: *k }\n',
    );
    expect(problems.map((p) => p.code)).toContain('wrong-type');
    expect(problems.map((p) => p.field)).toContain('mounts.a.rows.gcr');
  });

  test('5,000 brackets inside each other are refused', async () => {
    const problem = await onlyProblem(`a: ${'['.repeat(5000)}${']'.repeat(5000)}`);
    expect(problem.code).toBe('too-deep');
    expect(problem.line).toBe(1);
  });
});

describe('the ground under a tracker', () => {
  const TRACKER = (keys: string) => MOUNT(`kind: single-axis, ${keys}`);
  test.each([
    ['ground: ¦{ slope: 6 % }', 'ground.falls_toward', 'missing-key', 'nothing'],
    ['ground: ¦{ falls_toward: 200 }', 'ground.slope', 'missing-key', 'nothing'],
    ['ground: { slope: ¦70, falls_toward: 200 }', 'ground.slope', 'wrong-value', '70'],
    ['ground: { slope: ¦400 %, falls_toward: 200 }', 'ground.slope', 'wrong-value', '"400 %"'],
    ['ground: { slope: ¦-3, falls_toward: 200 }', 'ground.slope', 'wrong-value', '-3'],
    ['ground: { slope: 6 %, falls_toward: ¦south }', 'ground.falls_toward', 'wrong-value', '"south"'],
    ['ground: ¦6 %', 'ground', 'wrong-type', '"6 %"'],
    ['ground: { slope: 6 %, falls_toward: 200 }, axis: { tilt: ¦5 }', 'axis.tilt', 'given-twice', 'both'],
    ['slope_limits: { across: ¦steep }', 'slope_limits.across', 'wrong-value', '"steep"'],
    ['slope_limits: { ¦cross: 10 % }', 'slope_limits.cross', 'unknown-key', 'cross'],
  ])('%s', async (keys, field, code, found) => {
    const problem = await onlyProblem(TRACKER(keys));
    expect(problem).toMatchObject({ field: `mounts.m.${field}`, code });
    expect(problem.found).toContain(found);
  });
});

describe('values out of their range or form', () => {
  test.each([
    ['site: { latitude: ¦95 }', 'site.latitude', '95', 'from -90 to 90'],
    ['site: { longitude: ¦-181 }', 'site.longitude', '-181', 'from -180 to 180'],
    ['site: { elevation: ¦9001 }', 'site.elevation', '9001', 'from -500 to 9000'],
    ['site: { elevation: ¦-2000 ft }', 'site.elevation', '"-2000 ft"', 'from -500 to 9000'],
    ['site: { latitude: ¦.nan }', 'site.latitude', 'no number (.nan)', 'from -90 to 90'],
    ['site: { latitude: ¦.inf }', 'site.latitude', 'Infinity', 'from -90 to 90'],
    ['site: { latitude: ¦north }', 'site.latitude', '"north"', 'from -90 to 90'],
    ['site: { roof_height: ¦[5] }', 'site.roof_height', 'a list of 1', 'a height in m'],
    ['site: ¦5', 'site', '5', 'the keys latitude, longitude'],
    ['sky: { model: ¦peres }', 'sky.model', '"peres"', 'perez, hay-davies, reindl or isotropic'],
    ['sky: { albedo: ¦1.2 }', 'sky.albedo', '1.2', 'or file'],
    ['sky: { albedo: ¦fil }', 'sky.albedo', '"fil"', 'or file'],
    ['array: ¦{ inverter: 10 }', 'array.dc', 'nothing', 'a power in kW above 0'],
    ['array: { dc: ¦0 }', 'array.dc', '0', 'above 0'],
    ['array: { dc: ¦-12 kW }', 'array.dc', '"-12 kW"', 'above 0'],
    ['array: { dc: ¦1e999 }', 'array.dc', 'Infinity', 'above 0'],
    ['array: { dc: 5, module: ¦{ length: 1.7 } }', 'array.module.power', 'nothing', 'a power in W'],
    ['array: { dc: 5, module: { power: 430, length: ¦1760 } }', 'array.module.length', '1760', 'at most 10'],
    ['losses: { dirt: ¦-1 % }', 'losses.dirt', '"-1 %"', '0 % or more and below 100 %'],
    ['losses: { dirt: ¦100 % }', 'losses.dirt', '"100 %"', 'below 100 %'],
    ['losses: { cables: ¦2 m }', 'losses.cables', '"2 m"', 'below 100 %'],
    ['finance: { years: ¦25.5 }', 'finance.years', '25.5', 'a whole number from 1 to 100'],
    ['finance: { years: ¦0 }', 'finance.years', '0', 'a whole number from 1 to 100'],
    [
      'finance: { currency: ¦"a currency with a long name" }',
      'finance.currency',
      '"a currency with a long name"',
      'three letters',
    ],
    ['finance: { currency: ¦[USD] }', 'finance.currency', 'a list of 1', 'three letters'],
    ['wind: { design_gust: ¦115 }', 'wind.design_gust', '115', 'a 3-second gust in m/s from 10 to 110'],
    ['wind: { exposure: ¦E }', 'wind.exposure', '"E"', 'B, C or D'],
    ['wind: { limits: { height: ¦-3 m } }', 'wind.limits.height', '"-3 m"', 'above 0'],
    [
      'advice: { objective: ¦cheapest }',
      'advice.objective',
      '"cheapest"',
      'lowest cost per kWh, most kWh per kW or best worst month',
    ],
    ['compare_with: ¦{ }', 'compare_with', 'a group of keys', 'the id of a fixed mount'],
    ['title: ¦[a, b]', 'title', 'a list of 2', 'a text'],
  ])('%s', async (keys, field, found, expected) => {
    const problem = await onlyProblem(`${LEAST}${keys}\n`);
    expect(problem).toMatchObject({ field, found });
    expect(problem.expected).toContain(expected);
  });

  test.each([
    ['{ file: ¦"" }', 'weather.file', 'an empty text'],
    ['{ file: ¦}', 'weather.file', 'nothing'],
    ['{ file: ¦[a] }', 'weather.file', 'a list of 1'],
    ['¦a.epw', 'weather', '"a.epw"'],
    ['{ file: a, label: ¦begin }', 'weather.label', '"begin"'],
    ['{ file: a, add_minutes: ¦800 }', 'weather.add_minutes', '800'],
    ['{ file: a, accept_clock: ¦"yes" }', 'weather.accept_clock', '"yes"'],
    ['{ file: a, table: ¦{ ghi: G } }', 'weather.table.time', 'nothing'],
    ['{ file: a, table: ¦{ time: T } }', 'weather.table.ghi', 'no column of irradiance'],
    ['{ file: a, table: ¦{ time: T, dni: N } }', 'weather.table.ghi', 'dni alone'],
    ['{ file: a, table: { time: T, ghi: ¦{ unit: W/m2 } } }', 'weather.table.ghi.column', 'nothing'],
    ['{ file: a, table: { time: T, ghi: ¦[G] } }', 'weather.table.ghi', 'a list of 1'],
  ])('weather: %s', async (weather, field, found) => {
    const problem = await onlyProblem(`weather: ${weather}\nmounts: [ { id: ground, kind: fixed-tilt } ]\n`);
    expect(problem).toMatchObject({ field, found });
  });
});

describe('mounts', () => {
  test.each([
    ['kind: roof-plane, tilt: ¦120, azimuth: 180', 'tilt', '120', /25 %/],
    ['kind: roof-plane, tilt: ¦best, azimuth: 180', 'tilt', '"best"', /3:12/],
    ['kind: roof-plane, tilt: 20', 'azimuth', 'nothing', /Add for example azimuth: 180/],
    ['kind: roof-plane, azimuth: 180', 'tilt', 'nothing', /Add for example tilt: 30 deg/],
    ['kind: fixed-tilt, azimuth: ¦south', 'azimuth', '"south"', /180 south/],
    ['kind: fixed-tilt, azimuth: ¦-10', 'azimuth', '-10', /10 degrees west of north is 350/],
    ['kind: fixed-tilt, azimuth: ¦25 %', 'azimuth', '"25 %"', /"%" is no unit for it here; use deg or rad/],
    ['kind: fixed-tilt, tilt: ¦bset', 'tilt', '"bset"', /30 deg/],
    ['kind: fixed-tilt, rows: { gcr: ¦1 }', 'rows.gcr', '1', /1 is 100 %; write 1 % if that is meant/],
    ['kind: fixed-tilt, rows: { gcr: ¦45 }', 'rows.gcr', '45', /Write 45 %/],
    ['kind: fixed-tilt, rows: ¦{ }', 'rows.gcr', 'nothing', /gcr: 0.4/],
    ['kind: fixed-tilt, rows: ¦0.4', 'rows', '0.4', /\{ gcr: ... \}/],
    ['kind: single-axis, swing: ¦91', 'swing', '91', /60 deg/],
    [
      'kind: single-axis, rows: { gcr: 0.4, low_sun: ¦backtracking }',
      'rows.low_sun',
      '"backtracking"',
      /Did you mean backtrack\?/,
    ],
    ['kind: dual-axis, slant: ¦0', 'slant', '0', /3.5 m/],
    ['kind: dual-axis, drive: { working: 97 %, stuck: ¦east }', 'drive.stuck', '"east"', /./],
    [
      'kind: dual-axis, drive: { working: 1, stuck: { tilt: ¦95, azimuth: 90 } }',
      'drive.stuck.tilt',
      '95',
      /upright is 90/,
    ],
    [
      'kind: dual-axis, drive: { working: 1, stuck: ¦{ tilt: 30 } }',
      'drive.stuck.azimuth',
      'nothing',
      /azimuth: 180/,
    ],
    [
      'kind: dual-axis, drive: { working: 1, stuck: { ¦turn: 30, tilt: 3, azimuth: 4 } }',
      'drive.stuck.turn',
      '"turn"',
      /single-axis/,
    ],
    ['kind: dual-axis, drive: { visits: ¦-1 }', 'drive.visits', '-1', /0.5 for one in two years/],
    [
      'kind: single-axis, drive: { working: 1, stuck: ¦averge }',
      'drive.stuck',
      '"averge"',
      /Did you mean average\?/,
    ],
    [
      'kind: single-axis, drive: { working: 1, stuck: { turn: ¦-45 } }',
      'drive.stuck.turn',
      '-45',
      /without a sign.*faces: east/,
    ],
    [
      'kind: single-axis, drive: { working: 1, stuck: { turn: ¦61, faces: east } }',
      'drive.stuck.turn',
      '61',
      /at most 60, or widen swing/,
    ],
    [
      'kind: single-axis, drive: { working: 1, stuck: ¦{ turn: 45 } }',
      'drive.stuck.faces',
      'nothing',
      /faces: east/,
    ],
    [
      'kind: single-axis, drive: { working: 1, stuck: { turn: 45, faces: ¦south } }',
      'drive.stuck.faces',
      '"south"',
      /lies along 180 degrees; write east or west/,
    ],
    [
      'kind: single-axis, axis: { azimuth: 90 }, drive: { working: 1, stuck: { turn: 45, faces: ¦east } }',
      'drive.stuck.faces',
      '"east"',
      /write north or south/,
    ],
    ['kind: dual-axis, stow: ¦{ hold: 3 h }', 'stow.gust', 'nothing', /gust: 18 m\/s/],
    ['kind: dual-axis, stow: { gust: ¦0 }', 'stow.gust', '0', /18 m\/s/],
    [
      'kind: dual-axis, stow: { gust: 18, release: ¦20 }',
      'stow.release',
      '20',
      /lower release or leave it blank/,
    ],
    ['kind: dual-axis, stow: { gust: 18, gust_factor: ¦0.9 }', 'stow.gust_factor', '0.9', /1.5/],
    ['kind: dual-axis, stow: { gust: 18, hold: ¦3 m/s }', 'stow.hold', '"3 m/s"', /use min or h/],
    ['kind: dual-axis, stow: { gust: 18, ¦faces: west }', 'stow.faces', '"faces"', /single-axis/],
    ['kind: dual-axis, stow: ¦18', 'stow', '18', /gust: .../],
    ['kind: single-axis, stow: { gust: 18, angle: ¦70, faces: west }', 'stow.angle', '70', /widen swing/],
    ['kind: single-axis, swing: 50, stow: ¦{ gust: 18, angle: 30 }', 'stow.faces', 'nothing', /faces: east/],
    ['kind: fixed-tilt, ¦stow: { gust: 18 }', 'stow', '"stow"', /single-axis mounts and dual-axis mounts/],
    ['kind: dual-axis, snow: ¦5 %', 'snow', '"5 %"', /snow: \{ Jan: 20 %, Feb: 15 % \}/],
    ['kind: dual-axis, snow: ¦[ 5 %, 3 % ]', 'snow', 'a list of 2', /Jan: 20 %/],
    ['kind: dual-axis, snow: ¦{ }', 'snow', 'a group without keys', /Jan: 20 %/],
    ['kind: dual-axis, snow: { Jan: ¦20 }', 'snow.Jan', '20', /Write 20 %/],
    ['kind: dual-axis, snow: { ¦jan: 20 % }', 'snow.jan', '"jan"', /Did you mean Jan\?/],
    ['kind: dual-axis, snow: [ 0, 0, 0, 0, 0, 0, 0, ¦101 %, 0, 0, 0, 0 ]', 'snow.#8', '"101 %"', /20 %/],
    [
      'kind: dual-axis, snow: ¦[ 1, 1, 1, 1, 1, 1, 1, 1, 1, 1, 1, 1 ]',
      'snow',
      'a list of 12',
      /months that have snow/,
    ],
    ['kind: dual-axis, cost: { capital: ¦-1 }', 'cost.capital', '-1', /cannot be negative/],
    ['kind: dual-axis, cost: { capital: ¦1700 USD }', 'cost.capital', '"1700 USD"', /finance.currency/],
    [
      'kind: dual-axis, cost: { renewals: [ ¦{ what: a, year: 3 } ] }',
      'cost.renewals.#1.cost',
      'nothing',
      /cost: 800/,
    ],
    ['kind: dual-axis, cost: { renewals: ¦3 }', 'cost.renewals', '3', /renewals: \[ \{/],
    ['kind: dual-axis, label: ¦""', 'label', 'an empty text', /./],
  ])('%s', async (keys, field, found, fix) => {
    const problem = await onlyProblem(MOUNT(keys));
    expect(problem).toMatchObject({ field: `mounts.m.${field}`, found });
    expect(problem.fix).toMatch(fix);
  });

  test.each([
    ['weather: { file: a }\n', '1:1', 'nothing'],
    ['weather: { file: a }\nmounts:\n', '2:8', 'nothing'],
    ['weather: { file: a }\nmounts: []\n', '2:9', 'an empty list'],
    ['weather: { file: a }\nmounts: { id: a }\n', '2:9', 'a group of keys'],
    ['weather: { file: a }\nmounts: ground\n', '2:9', '"ground"'],
  ])('a study needs at least one: %j', async (text, place, found) => {
    expect(await onlyProblem(text)).toMatchObject({ place, field: 'mounts', found });
  });

  test.each(['ground', '3', '[ ]', ''])('an entry is a group of keys, not "%s"', async (entry) => {
    expect(await onlyProblem(`weather: { file: a }\nmounts:\n  - ${entry}\n`)).toMatchObject({
      line: 3,
      field: 'mounts.#1',
      fix: 'Write for example { id: ground, kind: fixed-tilt }.',
    });
  });

  test.each(['Roof', 'a b', '-a', 'dach/1', '__proto__', 'x'.repeat(41), 'ä'])(
    'an id is plain: %s',
    async (id) => {
      expect(
        await onlyProblem(`weather: { file: a }\nmounts: [ { id: "${id}", kind: fixed-tilt } ]\n`),
      ).toMatchObject({ place: '2:17', code: 'wrong-value' });
    },
  );

  test('two mounts with one id are named with both lines', async () => {
    const problem = await onlyProblem(
      'weather: { file: a }\nmounts:\n  - { id: a, kind: fixed-tilt }\n  - { id: b, kind: dual-axis }\n  - { id: a, kind: dual-axis }\n',
    );
    expect(problem).toMatchObject({
      place: '5:11',
      code: 'duplicate-id',
      field: 'mounts.a.id',
      found: '"a" again, first on line 3',
    });
  });

  test('an unknown kind gets the nearest, and its other faults still show', async () => {
    const { text, places } = marked(
      MOUNT('kind: ¦fixed_rack, tilt: ¦120, ¦colour: red, rows: { gcr: ¦2 }, cost: { capital: ¦-1 }'),
    );
    const problems = await problemsOf(text);
    expect(problems.map((p) => `${p.line}:${p.column}`)).toEqual(places);
    expect(problems.map((p) => p.field)).toEqual(
      ['kind', 'tilt', 'colour', 'rows.gcr', 'cost.capital'].map((key) => `mounts.m.${key}`),
    );
    expect(problems[0].expected).toBe('one of roof-plane, fixed-tilt, single-axis, dual-axis, turntable');
    for (const [kind, near] of [
      ['fixed-tlt', 'fixed-tilt'],
      ['Single_Axis', 'single-axis'],
      ['dualaxis', 'dual-axis'],
      ['roofplane', 'roof-plane'],
    ])
      expect((await onlyProblem(MOUNT(`kind: ¦${kind}`))).fix).toBe(`Did you mean ${near}?`);
    expect((await onlyProblem(MOUNT('tilt: 30'))).code).toBe('missing-key');
  });
});

describe('unknown keys', () => {
  test.each([
    ['¦sitee: { }', 'sitee', 'Did you mean site?'],
    ['¦sitee:', 'sitee', 'Did you mean site?'],
    ['site: { ¦latitud: 40 }', 'site.latitud', 'Did you mean latitude?'],
    ['site: { ¦UTC-offset: 1 }', 'site.UTC-offset', 'Did you mean utc_offset?'],
    ['site: { ¦lattiude: 40 }', 'site.lattiude', 'Did you mean latitude?'],
    ['finance: { ¦year: 25 }', 'finance.year', 'Did you mean years?'],
    [
      'array: { dc: 5, ¦power: 430 }',
      'array.power',
      'power belongs to array.module; move it there or remove it.',
    ],
    ['¦albedo: 0.2', 'albedo', 'albedo belongs to sky; move it there or remove it.'],
    [
      'losses: { ¦elves: 1 % }',
      'losses.elves',
      'The keys here are dirt, module_spread, cables and conversion.',
    ],
    ['¦"__proto__": { a: 1 }', '__proto__', /keys here are/],
    ['¦constructor: 1', 'constructor', /keys here are/],
    ['¦<<: { title: a }', '<<', /keys here are/],
    ['sky: {¦albedo:0.3}', 'sky.albedo:0.3', 'Put a space after the colon: albedo: 0.3.'],
    ['array:\n  ¦dc:12', 'array', 'Put a space after the colon: dc: 12.'],
  ])('%s', async (keys, field, fix) => {
    const problem = await onlyProblem(`${LEAST}${keys}\n`);
    expect(problem).toMatchObject({ field });
    expect(problem.fix).toMatch(
      typeof fix === 'string' ? new RegExp(`^${fix.replace(/[?.]/g, '\\$&')}$`) : fix,
    );
  });

  test.each([
    ['kind: dual-axis, ¦axis: { tilt: 3 }', 'axis', /^axis belongs to single-axis mounts;/],
    ['kind: dual-axis, ¦swing: 60', 'swing', /single-axis mounts/],
    [
      'kind: roof-plane, tilt: 3, azimuth: 4, ¦rows: { gcr: 0.4 }',
      'rows',
      /fixed-tilt mounts, single-axis mounts, dual-axis mounts and turntable mounts/,
    ],
    [
      'kind: fixed-tilt, ¦drive: { own_use: 1 % }',
      'drive',
      /single-axis mounts, dual-axis mounts and turntable mounts/,
    ],
    ['kind: single-axis, ¦tilt: 20', 'tilt', /axis of single-axis mounts/],
    ['kind: fixed-tilt, rows: { gcr: 0.4, ¦low_sun: shade }', 'rows.low_sun', /rows of single-axis mounts/],
    ['kind: fixed-tilt, ¦gcr: 0.4', 'gcr', /rows of fixed-tilt mounts/],
    ['kind: fixed-tilt, ¦slants: 3', 'slants', /^Did you mean slant\?$/],
    ['kind: fixed-tilt, ¦dirt: 3 %', 'dirt', /belongs to losses/],
  ])('a key of another kind says where it belongs: %s', async (keys, key, fix) => {
    const problem = await onlyProblem(MOUNT(keys));
    expect(problem).toMatchObject({ field: `mounts.m.${key}`, code: 'unknown-key' });
    expect(problem.fix).toMatch(fix);
  });
});

describe('parts of a study that do not fit together', () => {
  test.each([
    ['drive: ¦{ working: 97 % }', 'drive.stuck', 'working alone', 'Add stuck: flat.'],
    [
      'drive: ¦{ stuck: flat }',
      'drive.working',
      'stuck alone',
      'Add for example working: 97 %, or remove stuck.',
    ],
  ])('%s', async (drive, field, found, fix) => {
    expect(await onlyProblem(MOUNT(`kind: dual-axis, ${drive}`))).toMatchObject({
      field: `mounts.m.${field}`,
      found,
      fix,
    });
  });

  test('a renewal lies within the life of the study', async () => {
    const study = (years: string) =>
      `${MOUNT('kind: dual-axis, cost: { renewals: [ { what: drive, year: ¦26, cost: 5 } ] }')}finance: { ${years} }\n`;
    expect(await onlyProblem(study('years: 25'))).toMatchObject({
      field: 'mounts.m.cost.renewals.#1.year',
      found: '26',
      expected: "a year of the study's life, from 1 to 25",
    });
    // seen beside other faults of the same groups
    expect((await problemsOf(marked(study('years: 25, ageing: 3')).text)).map((p) => p.field)).toEqual([
      'mounts.m.cost.renewals.#1.year',
      'finance.ageing',
    ]);
    await expect(problemsOf(marked(study('years: 26')).text)).rejects.toThrow('the study was accepted');
    await expect(problemsOf(marked(study('')).text)).rejects.toThrow('the study was accepted');
  });

  test('the reference is a mount of the study that does not move', async () => {
    const study =
      'weather: { file: a }\nmounts: [ { id: rack, kind: fixed-tilt }, { id: roof, kind: roof-plane, tilt: 3, azimuth: 4 }, { id: mast, kind: dual-axis } ]\ncompare_with: ';
    expect(await onlyProblem(`${study}rck`)).toMatchObject({
      place: '3:15',
      expected: 'the id of a mount (rack, roof, mast)',
      fix: 'Did you mean rack?',
    });
    expect(await onlyProblem(`${study}mast`)).toMatchObject({
      place: '3:15',
      found: 'mast, a dual-axis tracker',
      fix: 'Gains are counted from a mount that does not move: write rack or roof.',
    });
  });
});

test('all problems of a file are told at once, in line order, each with its place', async () => {
  const { text, places } = marked(`¦titel: Many
weather: { file: ¦"", label: ¦begin }
site: { latitude: ¦95, utc_offset: ¦5.7 }
array: { dc: ¦-3, module: { power: 430, heat: ¦-0.34 } }
mounts:
  - { id: a, kind: roof-plane, tilt: ¦120, azimuth: ¦400, ¦swing: 3 }
  - { id: ¦a, kind: ¦fixed-tlt, rows: { gcr: ¦40 } }
  - { id: c, kind: dual-axis, drive: ¦{ working: ¦97 },
      cost: { capital: ¦-5, renewals: [ { what: x, year: ¦30, cost: 1 } ] } }
finance: { real_rate: ¦6, years: 25 }
wind: { design_gust: ¦115 kg }
compare_with: ¦d
`);
  const problems = await problemsOf(text);
  expect(problems.map((p) => `${p.field} ${p.code}`)).toEqual([
    'titel unknown-key',
    'weather.file wrong-value',
    'weather.label wrong-value',
    'site.latitude wrong-value',
    'site.utc_offset wrong-value',
    'array.dc wrong-value',
    'array.module.heat wrong-value',
    'mounts.a.tilt wrong-value',
    'mounts.a.azimuth wrong-value',
    'mounts.a.swing unknown-key',
    'mounts.a.id duplicate-id',
    'mounts.a.kind unknown-kind',
    'mounts.a.rows.gcr wrong-value',
    'mounts.c.drive.stuck missing-key',
    'mounts.c.drive.working wrong-value',
    'mounts.c.cost.capital wrong-value',
    'mounts.c.cost.renewals.#1.year late-renewal',
    'finance.real_rate wrong-value',
    'wind.design_gust wrong-value',
    'compare_with unknown-mount',
  ]);
  expect(problems.map((p) => `${p.line}:${p.column}`)).toEqual(places);
});

test('what is shown of a file cannot drive a terminal or break a line', async () => {
  const long = 'x'.repeat(500);
  const problem = await onlyProblem(`${LEAST}sky: { model: "\\e[31m\\u202e${long}\\n" }`);
  expect(problem.found).toMatch(/^"\\u001b\[31m\\u202ex+\.\.\."$/);
  expect(problem.found.length).toBeLessThan(90);

  const problems = await problemsOf(`weather: { file: a, "file:\\e[2J\\r\\n": }
array: { dc: "12 \\e]0;${long}" }
"\\e[31mkey\\u2028": { a: 1 }
mounts: [ { id: "\\e[0m", kind: fixed-tilt }, { id: "\\e[0m", kind: "\\u009b2J" } ]
compare_with: "\\u0085"
`);
  expect(problems.length).toBeGreaterThan(6);
  for (const p of problems)
    for (const text of [p.field ?? '', p.expected, p.found, p.fix]) {
      expect(text).not.toMatch(/[^\P{C}\u00ad]|[\u2028\u2029]/u);
      expect(text.length).toBeLessThan(400);
    }
});

describe('the reach of a mast', () => {
  test.each([
    ['dual-axis', 'turns: { from: 60, to: ¦60 }', 'turns.to', 'no-turn'],
    ['dual-axis', 'turns: { from: 0, to: ¦360 }', 'turns.to', 'no-turn'],
    ['turntable', 'turns: ¦{ from: 60 }', 'turns.to', 'missing-key'],
    ['turntable', 'turns: { from: ¦-60, to: 60 }', 'turns.from', 'wrong-value'],
    ['dual-axis', 'elevation: { lowest: ¦60 deg, highest: 20 }', 'elevation.lowest', 'limits-crossed'],
    ['dual-axis', 'elevation: { highest: ¦100 }', 'elevation.highest', 'wrong-value'],
    ['turntable', '¦elevation: { lowest: 10 }', 'elevation', 'unknown-key'],
    ['turntable', '¦azimuth: 180', 'azimuth', 'unknown-key'],
    ['turntable', 'tilt: ¦95', 'tilt', 'wrong-value'],
    ['turntable', 'drive: { working: 97 %, stuck: ¦flat }', 'drive.stuck', 'wrong-value'],
    ['turntable', 'drive: ¦{ working: 97 % }', 'drive.stuck', 'missing-key'],
    ['turntable', '¦stow: { gust: 18 }', 'stow', 'unknown-key'],
    ['dual-axis', 'drive: { working: 97 %, stuck: ¦equator }', 'drive.stuck', 'wrong-value'],
    [
      'dual-axis',
      'elevation: { highest: 60 }, drive: { working: 1, stuck: { tilt: ¦20, azimuth: 90 } }',
      'drive.stuck.tilt',
      'beyond-reach',
    ],
    [
      'dual-axis',
      'turns: { from: 120, to: 240 }, drive: { working: 1, stuck: { tilt: 20, azimuth: ¦90 } }',
      'drive.stuck.azimuth',
      'beyond-reach',
    ],
    ['dual-axis', 'elevation: { highest: 60 }, stow: { gust: 18, angle: ¦0 }', 'stow.angle', 'beyond-reach'],
  ])('%s with %s', async (kind, keys, field, code) => {
    const problem = await onlyProblem(MOUNT(`kind: ${kind}, ${keys}`));
    expect(problem).toMatchObject({ field: `mounts.m.${field}`, code });
    if (keys.includes('97 % }')) expect(problem.fix).toContain('equator');
  });

  test('a turntable is no mount to count gains from', async () => {
    const problem = await onlyProblem(`${MOUNT('kind: turntable').replace('¦', '')}compare_with: ¦m\n`);
    expect(problem).toMatchObject({ code: 'reference-moves', found: 'm, a turntable' });
  });
});
