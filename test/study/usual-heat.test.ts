import { beforeAll, expect, test } from 'vitest';
import { studyJsonSchema, studyTemplate } from '../../src/inputs/index.ts';
import { compareMounts } from '../../src/study.ts';
import type { RawYear } from '../../src/weather/index.ts';
import { sampleYear, studyFrom } from '../support/sample.ts';

let raw: RawYear;
beforeAll(async () => {
  raw = await sampleYear();
});

const energyWith = async (module: string): Promise<number> => {
  const text = `
weather: { file: x }
array: { dc: 12 kW, inverter: 10 kW, module: { power: 400 W${module} } }
mounts: [ { id: ground, kind: fixed-tilt } ]`;
  return compareMounts(await studyFrom(text), raw).mounts[0].energy_kwh;
};

test('a blank heat counts as what the template and the schema say of a blank one', async () => {
  const said = [studyTemplate({ title: 'x', weatherFile: 'x.epw' }), JSON.stringify(await studyJsonSchema())];
  for (const text of said) expect(text).toContain('Blank: -0.35 %/K');
  expect(await energyWith('')).toBe(await energyWith(', heat: -0.35 %/K'));
  expect(await energyWith('')).not.toBe(await energyWith(', heat: -0.30 %/K'));
});
