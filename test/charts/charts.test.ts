import { describe, expect, test, vi } from 'vitest';
import { chartSpecs, type FontMetrics, renderSvg } from '../../src/charts/index.ts';
import { SKYLINES } from './skyline-fixture.ts';
import { HOSTILE, interFont, VARIANTS } from './support.ts';

// Drawing may be slow on a busy machine; no test here asserts a time.
vi.setConfig({ testTimeout: 120_000 });

const NAMES = ['irradiation', 'months', 'cost', 'orientation', 'losses'];
const namesFor = (variant: keyof typeof VARIANTS) =>
  variant in SKYLINES ? NAMES.toSpliced(4, 0, 'skyline') : NAMES;
let font: FontMetrics | undefined;
const metrics = async () => (font ??= await interFont());
const chart = (variant: keyof typeof VARIANTS, name: string) =>
  chartSpecs(VARIANTS[variant]()).find((c) => c.name === name)!;
/** What an XML reader makes of the text nodes of an SVG. */
const texts = (svg: string): string[] =>
  [...svg.matchAll(/>([^<>]+)</g)].map(([, text]) =>
    text.replace(/&lt;/g, '<').replace(/&gt;/g, '>').replace(/&amp;/g, '&'),
  );
const datasets = (spec: unknown): Record<string, unknown>[] =>
  (spec as { layer: { data: { values: Record<string, unknown>[] } }[] }).layer.flatMap((l) => l.data.values);

describe.each(Object.keys(VARIANTS) as (keyof typeof VARIANTS)[])('%s', (variant) => {
  test('every chart draws without a warning, the same bytes twice, under 300 kB each', async () => {
    const specs = chartSpecs(VARIANTS[variant]());
    expect(specs.map((c) => c.name)).toEqual(namesFor(variant));
    for (const { name, spec } of specs) {
      const first = await renderSvg(spec, await metrics());
      expect(first.startsWith('<svg')).toBe(true);
      expect(first, name).not.toMatch(/NaN|undefined|Infinity|null/);
      expect(first.length).toBeLessThan(300_000);
      expect(await renderSvg(chartSpecs(VARIANTS[variant]()).find((c) => c.name === name)!.spec, await metrics())).toBe(first); // biome-ignore format: one line
      expect(first).toContain('width="680"');
    }
  });

  test('specs are plain JSON with ASCII keys that read no file', () => {
    for (const { spec } of chartSpecs(VARIANTS[variant]())) {
      const text = JSON.stringify(spec);
      expect(JSON.parse(text)).toEqual(spec);
      expect(text).not.toContain('"url"');
      expect(spec.$schema).toBe('https://vega.github.io/schema/vega-lite/v6.json');
      const keys = new Set(datasets(spec).flatMap((row) => Object.keys(row)));
      expect(keys.size).toBeGreaterThan(3);
      expect([...keys].filter((k) => !/^[A-Za-z][A-Za-z0-9_]*$/.test(k))).toEqual([]);
    }
  });

  test('the alternative text contains the finding, which contains the title', () => {
    for (const { title, finding, altText } of chartSpecs(VARIANTS[variant]())) {
      expect(finding).toContain(title);
      expect(altText).toContain(finding);
      expect(altText).not.toMatch(/NaN|undefined|Infinity|null/);
    }
  });

  test('charts leave the comparison as it was', () => {
    const comparison = VARIANTS[variant]();
    const before = JSON.stringify(comparison);
    chartSpecs(comparison);
    expect(JSON.stringify(comparison)).toBe(before);
  });
});

test('titles are worked out from the figures', () => {
  // By hand from the fixture: 2680/1998 = 1.341; 1 - 0.109/0.113 = 3.5 %; 1 - 1870/2000 = 6.5 %.
  expect(chart('usual', 'irradiation').title).toBe(
    'Dual-axis mast collects 34\u00A0% more light than ground',
  );
  expect(chart('usual', 'cost').title).toBe('ground makes the cheapest energy: 0.109 USD per kWh, 3.5\u00A0% below Shop roof'); // biome-ignore format: a sentence
  expect(chart('usual', 'orientation').title).toBe('The best fixed plane is 34° tilt facing 186° (south); Shop roof loses 6.5\u00A0%'); // biome-ignore format: a sentence
  expect(chart('southern hemisphere', 'orientation').title).toContain('facing 354° (north)');
  expect(chart('no costs', 'cost').title).toMatch(/^No costs given: .* more energy than ground/);
  expect(chart('costs at three rates', 'cost').title).toContain('at 4\u00A0%, 7\u00A0% and 10\u00A0%: 0.087 to 0.142 USD'); // biome-ignore format: a sentence
  expect(chart('usual', 'losses').title).toMatch(/^Every mount loses most kWh at heat: /);
});

test('beam, sky and ground bars sum to the irradiation of each mount', () => {
  const comparison = VARIANTS['eight mounts with long labels']();
  const rows = datasets(chart('eight mounts with long labels', 'irradiation').spec).filter((r) => 'kwh_m2' in r && r.part !== undefined); // biome-ignore format: one line
  const unique = new Map(rows.map((r) => [`${r.row} ${r.part}`, r]));
  expect(unique.size).toBe(24);
  const sums = Array.from({ length: 8 }, (_, row) => [...unique.values()].filter((r) => r.row === row).reduce((sum, r) => sum + (r.kwh_m2 as number), 0)); // biome-ignore format: one line
  const expected = comparison.mounts.map((m) => m.irradiation_kwh_m2).sort((a, b) => b - a);
  // Data in a spec carries six significant digits: three parts of under 2 000 are good to 0.015 together.
  for (const [i, sum] of sums.entries()) expect(Math.abs(sum - expected[i])).toBeLessThan(0.02);
});

test('what the stages take adds up to light less delivered energy', () => {
  for (const variant of ['usual', 'gain by cold'] as const) {
    const { mounts } = VARIANTS[variant]();
    const rows = datasets(chart(variant, 'losses').spec).filter(
      (r) => typeof r.taken_kwh_per_kw === 'number',
    );
    for (const m of mounts) {
      const own = new Map(rows.filter((r) => r.mount === m.label).map((r) => [r.stage, r.taken_kwh_per_kw as number])); // biome-ignore format: one line
      const taken = [...own.values()].reduce((a, b) => a + b, 0);
      expect(own.size).toBe(m.stages.length);
      expect(Math.abs(taken - (m.irradiation_kwh_m2 - m.stages.at(-1)!.kwh_per_kw_after))).toBeLessThan(0.01);
    }
  }
});

test('the optimum stands south of the centre in the north and north of it in the south', () => {
  const marker = (variant: keyof typeof VARIANTS) =>
    datasets(chart(variant, 'orientation').spec).find((r) => r.plane === 'best fixed plane' && 'east' in r)!;
  // 34 sin 186° and 34 cos 186°, then the same with 354°.
  expect(marker('usual').east).toBeCloseTo(-3.554, 3);
  expect(marker('usual').north).toBeCloseTo(-33.814, 3);
  expect(marker('southern hemisphere').east).toBeCloseTo(-3.554, 3);
  expect(marker('southern hemisphere').north).toBeCloseTo(33.814, 3);
});

test('the title of the skyline tells who loses most and least, with the worst of several points behind it', () => {
  expect(chart('a ridge in the north', 'skyline').title).toBe('The skyline takes most from Dual-axis mast, 7.1\u00A0% of its light, least from ground, 2.1\u00A0%');
  expect(chart('hostile names', 'skyline').title).toBe('The skyline takes 3.0\u00A0% of the light of every mount');
  expect(chart('one angle all round', 'skyline').title).toBe('The skyline takes 2.1\u00A0% of the light of ground');
  expect(chart('open and dark', 'skyline').title).toBe('There is no light for the skyline to take');
  // The fixture's worst point loses half as much again: 7.1 * 1.5 = 10.65.
  expect(chart('six points', 'skyline').finding).toContain('At row 6, the worst of 6 points for it, it takes 11\u00A0% from Dual-axis mast.');
  // Where no mount loses more there than over the whole array, nothing is claimed of it.
  const even = SKYLINES['six points']();
  const mounts = even.mounts.map((m) => ({ ...m, shading_worst_point: m.shading_fraction * 0.97 }));
  expect(chartSpecs({ ...even, mounts }).find((c) => c.name === 'skyline')!.finding).not.toContain('worst of');
  expect((chart('polar day and night', 'skyline').spec.title as { subtitle: string[] }).subtitle.join(' ')).toContain('The sun stays down on 21 December');
  // One angle of 90 degrees all round hides the sun whenever it is up.
  for (const day of ['21 June', '21 March', '21 December']) expect(JSON.stringify(chart('one angle all round', 'skyline').spec)).toContain(`${day}: 100\u00A0% hidden`);
  expect(JSON.stringify(chart('open and dark', 'skyline').spec)).not.toMatch(/hidden|dashed/);
}); // biome-ignore format: a sentence a line

test('every line of the skyline chart stays inside its panorama, the sun in the middle', () => {
  for (const [variant, middle] of [['a ridge in the north', 180], ['a ridge in the south', 0], ['polar day in the south, clock far off', 0]] as const) {
    const rows = datasets(chart(variant, 'skyline').spec).filter((r) => 'azimuth_deg' in r) as { name: string; azimuth_deg: number; elevation_deg: number }[];
    expect(rows.length).toBeGreaterThan(100);
    expect(rows.filter((r) => Math.abs(r.azimuth_deg - middle) > 180 || r.elevation_deg < 0 || r.elevation_deg > 90)).toEqual([]);
    for (const date of new Set(rows.filter((r) => /^21/.test(r.name)).map((r) => r.name))) {
      const path = rows.filter((r) => r.name === date);
      const top = path.reduce((a, b) => (b.elevation_deg > a.elevation_deg ? b : a));
      // Noon falls between two samples, up to five minutes away: a few degrees of azimuth under a high sun.
      expect(Math.abs(top.azimuth_deg - middle), `${variant} ${date}`).toBeLessThan(5);
    }
  }
}); // biome-ignore format: long rows

test('reading errors are outlined on the dial and banded in the label', () => {
  const spec = chart('a ridge in the north', 'orientation').spec;
  const rows = datasets(spec).filter((r) => 'box_step' in r) as { plane: string; box_east: number; box_north: number }[];
  expect(new Set(rows.map((r) => r.plane))).toEqual(new Set(['Shop roof']));
  // 14.04 ± 2° of tilt, 166 ± 5° of azimuth, as given in the fixture.
  const tilts = rows.map((r) => Math.hypot(r.box_east, r.box_north));
  const azimuths = rows.map((r) => (Math.atan2(r.box_east, r.box_north) * 180) / Math.PI);
  for (const [found, expected] of [[Math.min(...tilts), 12.04], [Math.max(...tilts), 16.04], [Math.min(...azimuths), 161], [Math.max(...azimuths), 171]]) expect(found).toBeCloseTo(expected, 3);
  expect(JSON.stringify(spec)).toContain('TOF 0.94\\n(0.92 to 0.95)');
  expect(JSON.stringify(spec)).toContain('Outlined: what the reading');
  expect(JSON.stringify(chart('usual', 'orientation').spec)).not.toContain('Outlined');
}); // biome-ignore format: long rows

test.each(['hostile labels', 'hostile names'] as const)('%s stay inert text', async (variant) => {
  for (const { name, spec } of chartSpecs(VARIANTS[variant]())) {
    const svg = await renderSvg(spec, await metrics());
    expect(svg, name).not.toMatch(/<img|<script|<\/script|<!--|\u202E/);
    expect(svg).not.toContain('\u0000');
    expect(svg).not.toMatch(/[\uD800-\uDFFF]/);
    // No ids either: several charts may stand in one HTML page.
    expect(svg).not.toMatch(/ id="/);
    const tags = new Set([...svg.matchAll(/<\/?([A-Za-z!?]+)/g)].map(([, tag]) => tag));
    expect([...tags].filter((t) => !['svg', 'g', 'path', 'text', 'line', 'rect', 'tspan', 'defs'].includes(t))).toEqual([]); // biome-ignore format: one line
    expect(texts(svg).some((t) => t.includes('</script><img'))).toBe(true);
  }
  expect(HOSTILE).toContain('\n');
});

test('a chart that names a file is refused', async () => {
  const spec = {
    $schema: 'https://vega.github.io/schema/vega-lite/v6.json',
    data: { url: 'package.json' },
    mark: 'bar',
  };
  await expect(renderSvg(spec, await metrics())).rejects.toThrow(/load nothing/);
  // The next chart is drawn as if nothing had happened.
  expect(await renderSvg(chart('usual', 'cost').spec, await metrics())).toContain('</svg>');
});

test('a warning of Vega-Lite is an error', async () => {
  const { spec } = chart('one mount', 'cost');
  const odd = { ...spec, layer: [{ data: { values: [{ a: 1 }] }, mark: 'bar', encoding: { x: { field: 'a', type: 'quantitative' }, shape: { field: 'a' } } }] }; // biome-ignore format: one line
  await expect(renderSvg(odd, await metrics())).rejects.toThrow(/Vega warned/);
});

test('charts drawn at the same time come out as if drawn one by one', async () => {
  const specs = chartSpecs(VARIANTS.usual()).map((c) => c.spec);
  const alone: string[] = [];
  for (const spec of specs) alone.push(await renderSvg(spec, await metrics()));
  const m = await metrics();
  expect(await Promise.all(specs.map((spec) => renderSvg(spec, m)))).toEqual(alone);
});
