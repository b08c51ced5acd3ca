import { expect, test } from 'vitest';
import { memoMarkdown } from '../../src/report/index.ts';
import { stageOrder } from '../../src/report/memo/energy.ts';
import {
  EXTRAS,
  HOSTILE,
  invented,
  inventedAlone,
  inventedBare,
  inventedBlocked,
  inventedHostile,
  inventedSurveyed,
  inventedWithoutRate,
  READ_ON,
  VARIANTS,
} from './invented.ts';

const memo = (make: () => ReturnType<typeof invented>) => memoMarkdown(make(), EXTRAS);
const cellsOf = (line: string) =>
  line.split(/(?<!\\)\|/).slice(1, -1).map((cell) => cell.replaceAll('\u00a0', ' ').trim()); // biome-ignore format: short

/** Tables as rows of cells, header first, rule left out. */
const tablesOf = (text: string): string[][][] =>
  text
    .split('\n\n')
    .filter((block) => block.startsWith('|'))
    .map((block) => block.split('\n').map(cellsOf));

test.each(VARIANTS)('every table has the same number of cells in each row: %s', (_, make) => {
  const tables = tablesOf(memo(make));
  expect(tables.length).toBeGreaterThanOrEqual(7);
  for (const rows of tables) {
    expect(rows.length).toBeGreaterThanOrEqual(3);
    expect(new Set(rows.map((row) => row.length)).size).toBe(1);
    expect(rows[1].every((cell) => /^-{3}:?$/.test(cell))).toBe(true);
  }
});

test.each(VARIANTS)('nothing unknown prints as null, NaN, undefined or an empty cell: %s', (_, make) => {
  const text = memo(make);
  expect(text).not.toMatch(/null|NaN|undefined|Infinity|\[object/);
  for (const rows of tablesOf(text)) for (const row of rows) expect(row).not.toContain('');
});

test.each(VARIANTS)(
  'headings are those of the memo, none comes from a study, and no date is printed but those of readings: %s',
  (_, make) => {
    const text = memo(make);
    const headings = text.split('\n').filter((line) => /^#{1,6} /.test(line));
    expect(headings[0]).toMatch(/^# /);
    expect(headings.slice(1).every((line) => /^#{2,3} [A-Z][A-Za-z ,?]+$/.test(line))).toBe(true);
    expect(text.replaceAll(READ_ON, '')).not.toMatch(/\b20\d\d-\d\d-\d\d\b/);
    expect(text.endsWith('\n') && !text.endsWith('\n\n')).toBe(true);
  },
);

test('the answer and what would reverse it come before anything else', () => {
  const text = memo(invented);
  const places = ['# Orlin Bench', 'CHOOSE Ground rack', 'What would reverse it', '## Results at a glance', 'charts/cost.svg', 'charts/months.svg', '## Site and weather', '## Mounts compared', '## Energy and losses', '## Wind', '## Costs', '## Tracker, or more modules', '## Not counted', '## Doubts', '## Cautions', 'charts/dial.svg', '## Assumptions', '## Inputs'].map((part) => text.indexOf(part));
  expect(places.every((place) => place >= 0)).toBe(true);
  expect(places).toEqual([...places].sort((a, b) => a - b));
}); // biome-ignore format: the outline on one line

test('page one holds one table of results and two charts, and every chart appears once', () => {
  const text = memo(invented);
  const glance = text.slice(text.indexOf('## Results at a glance'), text.indexOf('## Reasons'));
  expect(tablesOf(glance)).toHaveLength(1);
  expect(glance.match(/!\[/g)).toHaveLength(2);
  for (const { file } of EXTRAS.chartFiles) expect(text.split(`](${file})`)).toHaveLength(2);
  const withoutCost = { ...EXTRAS, chartFiles: EXTRAS.chartFiles.filter(({ name }) => name !== 'cost') };
  const bare = memoMarkdown(inventedBare(), withoutCost);
  expect(bare.indexOf('charts/months.svg')).toBeLessThan(bare.indexOf('charts/irradiation.svg'));
  expect(bare.indexOf('charts/irradiation.svg')).toBeLessThan(bare.indexOf('## Reasons'));
});

test('the printed light times the printed shares is the printed energy, within their rounding', () => {
  const c = invented();
  const table = tablesOf(memo(invented)).find(([head]) => head[0] === 'Share kept')!;
  const number = (cell: string) => Number(cell.replace(/[*%]/g, '').replaceAll(' ', ''));
  const row = (name: string) => table.find(([first]) => first === name)!;
  let compared = 0;
  for (const [i, mount] of c.mounts.entries()) {
    const printed = stageOrder(c.mounts).map((name) => row(name)[i + 1]);
    const shares = printed.filter((cell) => cell !== '—').map((cell) => number(cell) / 100);
    expect(shares).toHaveLength(mount.stages.length);
    const product = shares.reduce(
      (whole, share) => whole * share,
      number(row('Light on the plane, kWh/m²')[i + 1]),
    );
    const energy = number(row('Delivered, kWh/kW')[i + 1]);
    // Each share is rounded by at most 0.00005 of about 0.95; the light and the energy by 0.05 kWh.
    const rounding = energy * shares.length * (0.00005 / 0.9) + 0.1;
    expect(Math.abs(product - energy)).toBeLessThan(rounding);
    expect(Math.abs(energy - mount.energy_kwh_per_kw)).toBeLessThanOrEqual(0.0501);
    expect(row('Weakest stage')[i + 1]).toBe(mount.weakest_stage);
    expect(row(mount.weakest_stage)[i + 1]).toMatch(/^\*\*.*\*\*$/);
    compared++;
  }
  expect(compared).toBe(4);
});

test('stages stand under three heads, each with what its own stages keep together', () => {
  const table = tablesOf(memo(invented)).find(([head]) => head[0] === 'Share kept')!;
  const row = (name: string) => table.find(([first]) => first === name)!;
  // By hand for the ground rack: 0.975; 0.972 x 0.957 x 0.98 x 0.99; 0.985 x 0.965 x 0.998.
  expect(row('*Before the glass, together*')[1]).toBe('*97.50 %*');
  expect(row('*In the modules, together*')[1]).toBe('*90.25 %*');
  expect(row('*On the way to the meter, together*')[1]).toBe('*94.86 %*');
  const places = ['*Before the glass, together*', 'rows', '*In the modules, together*', 'heat', '*On the way to the meter, together*', 'cables'].map((name) => table.indexOf(row(name))); // biome-ignore format: in order
  expect(places).toEqual([...places].sort((a, b) => a - b));
});

test('a tracker tells its axis where a fixed mount tells its tilt', () => {
  const table = tablesOf(memo(invented)).find(([head]) => head.includes('Where it points'))!;
  expect(table.find(([name]) => name === 'Tracker')![2]).toBe(
    'axis level, north-south, swing 60°, backtracks',
  );
});

test('stages that only some mounts have keep their place in the chain', () => {
  const [ground, , , mast] = invented().mounts;
  expect(stageOrder([ground, mast]).at(-1)).toBe('drive');
  const only = (names: string[]) => ({
    ...ground,
    stages: names.map((name) => ({ name, efficiency: 1, kwh_per_kw_after: 1, source: '' })),
  });
  expect(stageOrder([only(['rows', 'heat', 'conversion']), only(['incidence', 'heat', 'drive', 'conversion'])])).toEqual([
    'incidence', 'rows', 'heat', 'drive', 'conversion',
  ]); // biome-ignore format: one chain
});

test('the month table compares each mount with the plane tilted for that month', () => {
  const c = invented();
  const table = tablesOf(memo(invented)).find(([head]) => head[0] === 'kWh/kW·day')!;
  expect(table).toHaveLength(14);
  // By hand: January, 31 days.
  const ground = c.mounts[0].energy_monthly_kwh_per_kw[0] / 31;
  const plane = c.tilted_for_month[0].kwh_per_kw_day;
  expect(table[2][2]).toBe(`${ground.toFixed(2)} (${Math.round((ground / plane - 1) * 100)} %)`);
  expect(memo(invented)).toMatch(
    /Tracker delivers least in December: 2\.21 kWh\/kW·day, 41\.9 % less than a fixed plane/,
  );
});

test('every table or sentence of gains names its reference', () => {
  for (const make of [invented, inventedBare, inventedWithoutRate]) {
    const gains = memo(make)
      .split('\n')
      .filter((line) => /\b[Gg]ains?\b|Against/.test(line));
    expect(gains.length).toBeGreaterThan(3);
    // A line that says what break-even needs holds no figure of a gain.
    for (const line of gains) expect(line).toMatch(/Ground rack|^## |^Break-even needs/);
  }
});

test('wind figures carry their basis and the sentence that defers to others', () => {
  const text = memo(invented);
  for (const part of [
    'ASCE 7-16',
    '51.4 m/s',
    'exposure C',
    'Kzt 1,',
    'Kd 0.85',
    'Ke 1.',
    '0.849',
    '1\u00a0123',
  ])
    expect(text).toContain(part);
  expect(text).toContain('**Screening only: structure belongs to the local code and a licensed engineer.**');
  const c = invented();
  const withoutGust = memoMarkdown({ ...c, wind_basis: null }, EXTRAS);
  expect(withoutGust).toContain('no wind pressure was worked out: not counted');
  expect(withoutGust).toMatch(/screening only.*licensed engineer/);
  expect(memo(inventedBare)).toContain('Not checked: the study gives no wind');
});

test('blanks are words, never 0', () => {
  const bare = memo(inventedBare);
  expect(bare).toContain('The study lacks finance.real_rate, finance.years and the capital of');
  expect(bare).not.toMatch(/\| 0(?:\.0+)? \|/);
  expect(memo(inventedWithoutRate)).toMatch(/Real discount rate not given/);
  expect(memo(inventedWithoutRate)).toMatch(
    /\| Tracker \| 27\u00a0692 \| 2\u00a0300 \| not counted \| none given \| 0\.091\\\*/,
  );
});

test('a blocked study says so at the top', () => {
  const text = memo(inventedBlocked);
  expect(text.indexOf('**Blocked:**')).toBeGreaterThan(0);
  expect(text.indexOf('**Blocked:**')).toBeLessThan(text.indexOf('## Results'));
  expect(text).toContain('Settle the warnings');
});

test('one mount alone has no gains to show', () => {
  const text = memo(inventedAlone);
  expect(text).not.toMatch(/Against|How the sky model|Tracker, or more/);
});

test('break-even figures stand beside what was quoted, negative ones too', () => {
  const c = invented();
  c.mounts[3].break_even_premium_per_kw = -120.4;
  const text = memoMarkdown(c, EXTRAS);
  expect(text).toContain('| Tracker | +400 | +66.7 | +13.1\u00a0% | +27.9\u00a0% |');
  expect(text).toContain('| Mast | +1\u00a0500 | -120 |');
});

test('hostile text is inert everywhere', () => {
  const text = memo(inventedHostile);
  expect(HOSTILE).toMatch(/<\/script>.*\n/s);
  expect(text.split('HYPERLINK').length).toBeGreaterThan(25);
  // Every `<`, `[`, backtick and `*b*` of the study is escaped; what is left bare is the memo's own.
  const bare = text.replace(/\\[!-/:-@[-`{-~]/g, '');
  expect(bare).not.toMatch(/[<>`]/);
  expect(bare.match(/\[[^\]]*\]/g)).toHaveLength(EXTRAS.chartFiles.length);
  expect(bare).not.toMatch(/https?:\/\/|[^\P{Cc}\n]|\u202e/u);
});

test('readings stand beside the angles that follow, and the declination is said to be applied once', () => {
  const text = memo(inventedSurveyed);
  const [head, , roof, ...more] = tablesOf(text).find(([first]) => first[1] === 'As read')!;
  expect(head).toEqual(['Mount', 'As read', 'How the angles follow', 'Tilt', 'True azimuth']);
  expect(more).toEqual([]);
  expect(roof[1]).toBe('bearing 150 magnetic, taken facing, dated 2026-05-01, error 5 deg; slope 3:12');
  expect(roof[2]).toContain('150 + 16 E = 166 true');
  expect(roof.slice(3)).toEqual(['14.0° ± 2.0°', '166.0° ± 5.0° (south-south-east)']);
  expect(text).toContain('16.02 E by an invented model');
  expect(text.split('Declination is applied once')).toHaveLength(2);
  expect(text).toContain(
    'Barn roof: ±2.0° of tilt and ±5.0° of azimuth leave TOF between 70.3 % and 72.3 %; as read it is 71.2 %.',
  );
  // Without readings nothing is said of them, and without a magnetic one no declination is claimed.
  expect(memo(invented)).not.toMatch(/Readings on site|Declination/);
  const c = inventedSurveyed();
  const trueOnly = memoMarkdown({ ...c, declinations: [] }, EXTRAS);
  expect(trueOnly).toContain('No magnetic bearing was read: no declination was applied.');
  expect(trueOnly).not.toContain('Declination is applied once');
  const unsure = c.mounts.map((m) => ({ ...m, tilt_error_deg: null, azimuth_error_deg: null, orientation_factor_band: null }));
  expect(memoMarkdown({ ...c, mounts: unsure }, EXTRAS)).toContain('Barn roof: no reading error is given, so how far its TOF may be out is not known.');
}); // biome-ignore format: sentences

test('factors and shading stand in one table, each month in another, and TSRF is TOF times what is left', () => {
  const c = inventedSurveyed();
  const tables = tablesOf(memo(inventedSurveyed));
  const factors = tables.find(([head]) => head[1] === 'TOF')!;
  expect(factors[3]).toEqual([
    'Barn roof',
    '71.2 % (70.3 to 72.3 %)',
    '3.4 %',
    '5.1 % at east row',
    '68.8 %',
    '67.6 %',
  ]);
  expect(factors[4]).toEqual(['Tracker', '—', '6.2 %', '9.4 % at east row', '—', '—']);
  const percent = (cell: string) => Number.parseFloat(cell) / 100;
  for (const row of factors.slice(2, 4)) {
    // Both are rounded to a tenth of a per cent.
    expect(Math.abs(percent(row[4]) - percent(row[1]) * (1 - percent(row[2])))).toBeLessThan(0.0016);
    expect(Math.abs(percent(row[5]) - percent(row[1]) * (1 - percent(row[3])))).toBeLessThan(0.0016);
  }
  const months = tables.find(([head]) => head[0] === 'Shading')!;
  expect(months).toHaveLength(14);
  expect(months[2]).toEqual(['Jan', ...c.mounts.map((m) => `${(100 * m.shading_monthly[0]!).toFixed(1)} %`)]);
  expect(months[13]).toEqual(['Dec', 'no light', 'no light', 'no light', 'no light']);
  const points = tables.find(([head]) => head[0] === 'Skyline seen from')!;
  expect(points[3]).toEqual(['east row (least sky)', '33.4°', '262.0° (west)', '4.7 %']);
});

test('an open horizon is told as such, not as shading of 0', () => {
  const text = memo(invented);
  const section = text.slice(text.indexOf('## Orientation and shading'), text.indexOf('## Energy'));
  expect(section).toContain('no skyline: the horizon is taken as open');
  expect(section).not.toMatch(/Shading, year|\b0\.0\u00a0%/);
  const c = invented();
  const trackers = { ...inventedAlone(), reference_id: 'tracker', mounts: [c.mounts[2]], advice: { ...inventedAlone().advice, choice: null } };
  expect(memoMarkdown(trackers, EXTRAS)).not.toContain('Orientation and shading');
}); // biome-ignore format: a fixture on a line

test('what a programme asks is below or within, never exceeded, and no matter of wind', () => {
  const text = memo(inventedSurveyed);
  expect(text).toContain('Barn roof: TOF below by 3.8 points: 71.2 % where at least 75 % is asked, 70.3 %');
  expect(text).toContain('Barn roof: TSRF too near to tell: 67.6 % where at least 68 % is asked');
  expect(text).toContain('Ground rack: TOF within: 99.9 % where at least 75 % is asked.');
  expect(text).toContain('its TSRF held against the worst point');
  expect(text).not.toMatch(/(?:TOF|TSRF)[^.|]*exceed/);
  const wind = text.slice(text.indexOf('## Wind'), text.indexOf('## Costs'));
  expect(wind).toContain('height exceeds 3 m');
  expect(wind).not.toMatch(/TOF|TSRF/);
  // A programme's minimum alone shows no figure of wind, so it calls for no engineer.
  const bare = inventedBare();
  const mounts = bare.mounts.map((m, i) => ({ ...m, limits: inventedSurveyed().mounts[i].limits.filter(({ bound }) => bound === 'least') }));
  expect(memoMarkdown({ ...bare, mounts }, EXTRAS)).toContain('Not checked: the study gives no wind');
}); // biome-ignore format: a fixture on a line

test('cautions of the survey follow what was read', () => {
  const cautions = (c: ReturnType<typeof invented>) => {
    const text = memoMarkdown(c, EXTRAS);
    return text.slice(text.indexOf('## Cautions'), text.indexOf('## More charts'));
  };
  expect(cautions(invented())).not.toMatch(/Compass|Skyline|Slope/);
  for (const part of ['Falls: reading a compass', 'Compass: keep away', 'Metal roof', 'Phone compass', 'Slope: the run', 'Skyline: take'])
    expect(cautions(inventedSurveyed())).toContain(part);
  const c = inventedSurveyed();
  const open = { ...c, skyline: null, mounts: c.mounts.map((m) => ({ ...m, measured_with: m.measured_with.filter((w) => w !== 'rise and run') })) };
  expect(cautions(open)).not.toMatch(/Skyline: take|Slope: the run/);
  expect(cautions({ ...invented(), skyline: c.skyline })).not.toContain('Compass');
}); // biome-ignore format: a list

test('the chart of the skyline stands beside the shading, once', () => {
  const skyline = { name: 'skyline', title: 'Finding of skyline', altText: 'x', file: 'charts/skyline.svg' };
  const text = memoMarkdown(inventedSurveyed(), { ...EXTRAS, chartFiles: [...EXTRAS.chartFiles, skyline] });
  expect(text.split('charts/skyline.svg')).toHaveLength(2);
  expect(text.indexOf('charts/skyline.svg')).toBeGreaterThan(text.indexOf('## Orientation and shading'));
  expect(text.indexOf('charts/skyline.svg')).toBeLessThan(text.indexOf('## Energy'));
});

test('inputs are listed with their checksums, and the version is named', () => {
  const text = memo(invented);
  expect(text).toContain(`| study.yaml | ${EXTRAS.inputs[0].sha256} |`);
  expect(text).toContain('trackworth 0.0.0-invented');
});
