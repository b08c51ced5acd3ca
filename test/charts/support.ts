import { readFileSync } from 'node:fs';
import { createRequire } from 'node:module';
import { prepareFont } from '../../src/charts/index.ts';
import { EIGHT, type InventedMount, inventedComparison, USUAL } from './fixture.ts';
import { SKYLINES } from './skyline-fixture.ts';

const require = createRequire(import.meta.url);
const file = (name: string) =>
  new Uint8Array(readFileSync(require.resolve(`@expo-google-fonts/inter/${name}.ttf`)));
export const interFont = () =>
  prepareFont({ regular: file('400Regular/Inter_400Regular'), bold: file('700Bold/Inter_700Bold') });

export const HOSTILE = `</script><img src=x onerror="alert('1')">|\n=1+1 & ]]> <!-- \u202E\u0000\uD800 {datum.x}`;

const atRates = () => {
  const comparison = inventedComparison(USUAL);
  for (const mount of comparison.mounts) {
    const cost = mount.lcoe_per_kwh!;
    mount.lcoe_per_kwh = null;
    mount.lcoe_at_rates = { '4 %': cost * 0.8, '7 %': cost, '10 %': cost * 1.3 };
  }
  return comparison;
};

const coldPlace = () => {
  const comparison = inventedComparison(USUAL);
  // Heat gives in the cold: the stage after `incidence` is larger than the one before.
  for (const mount of comparison.mounts)
    for (const [i, stage] of mount.stages.entries())
      if (i >= 2) stage.kwh_per_kw_after = (stage.kwh_per_kw_after * 1.03) / 0.94;
  return comparison;
};

const dark = () => {
  const comparison = inventedComparison(USUAL.map((m) => ({ ...m, light: 0, tof: null, lcoe: null })));
  comparison.best_orientation.irradiation_kwh_m2 = 0;
  comparison.orientation_map.irradiation_kwh_m2 = comparison.orientation_map.irradiation_kwh_m2.map((row) => row.map(() => 0));
  for (const m of comparison.tilted_for_month) m.kwh_per_kw_day = 0;
  return comparison;
}; // biome-ignore format: a short fixture

const without = (mounts: readonly InventedMount[], keys: (keyof InventedMount)[]): InventedMount[] =>
  mounts.map((m) => Object.fromEntries(Object.entries(m).filter(([k]) => !keys.includes(k as keyof InventedMount))) as unknown as InventedMount); // biome-ignore format: one expression

/** Every shape of comparison that the charts must bear. */
export const VARIANTS = {
  usual: () => inventedComparison(USUAL),
  'eight mounts with long labels': () => inventedComparison(EIGHT),
  'southern hemisphere': () => inventedComparison(USUAL, { tilt: 34, azimuth: 354 }),
  'no costs': () => inventedComparison(without(USUAL, ['lcoe'])),
  'costs at three rates': atRates,
  'one mount': () => inventedComparison([USUAL[0]]),
  'trackers only': () => inventedComparison(USUAL.slice(2)),
  'optimum lying flat': () => inventedComparison(USUAL, { tilt: 0, azimuth: 0 }),
  'optimum upright at a pole': () => inventedComparison(USUAL, { tilt: 88, azimuth: 12 }),
  'gain by cold': coldPlace,
  'no light at all': dark,
  'hostile labels': () => inventedComparison(USUAL.map((m) => ({ ...m, label: HOSTILE + m.id }))),
  ...SKYLINES,
} as const;
