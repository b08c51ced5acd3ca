import { readFileSync } from 'node:fs';
import { expect, test } from 'vitest';
import { parseDocument } from 'yaml';
import { fogEndHours } from '../../sample-data/maker/clouds.ts';
import { makeSampleYear, ORLIN_BENCH, SEED } from '../../sample-data/maker/sample-year.ts';
import { HOURS, yearlySum } from '../../src/shared/index.ts';
import { readWeather } from '../../src/weather/index.ts';

const sample = (name: string) => readFileSync(new URL(`../../sample-data/${name}`, import.meta.url));

test('the EPW reader gives the made year back, column by column, with nothing to remark', async () => {
  const read = await readWeather({ source: 'orlin.epw', bytes: sample('orlin.epw') });
  const made = makeSampleYear(SEED);
  expect(read.place).toEqual(ORLIN_BENCH);
  expect(read.station).toBe('Orlin Bench, invented place');
  expect(read.notes).toEqual([]);
  for (const column of ['ghi', 'dni', 'dhi', 'temperatureC', 'windMs'] as const) {
    expect(read[column]?.length).toBe(HOURS);
    expect(read[column]).toEqual(made[column]);
  }
});

test('the study says that it is invented, names the sample weather, and compares every kind of mount at a cost', () => {
  const text = sample('orlin.yaml').toString();
  expect(text).toMatch(/^# EVERYTHING HERE IS INVENTED/m);
  const document = parseDocument(text, { uniqueKeys: true });
  expect([...document.errors, ...document.warnings]).toEqual([]);
  const study = document.toJS();
  expect(study.weather.file).toBe('orlin.epw');
  expect(study.mounts.map((m: { kind: string }) => m.kind)).toEqual([
    'roof-plane',
    'fixed-tilt',
    'single-axis',
    'dual-axis',
  ]);
  for (const { cost } of study.mounts)
    expect(Object.keys(cost)).toEqual(['capital_per_kw', 'upkeep_per_kw', 'renewals']);
  expect(study.mounts.map((m: { id: string }) => m.id)).toContain(study.compare_with);
});

test('the README says that all is invented, and its figures are those of the year', () => {
  const readme = sample('README.md').toString();
  const year = makeSampleYear(SEED);
  const kwh = (column: Float64Array) => Math.round(yearlySum(column) / 1000).toLocaleString('en-US');
  expect(readme).toContain('**All of this is invented.**');
  expect(readme).toContain(`${kwh(year.ghi)}, ${kwh(year.dhi)} and ${kwh(year.dni)} kWh/m² a year`);
  expect(readme).toContain(`days with morning fog | ${fogEndHours(SEED).filter((end) => end > 0).length} |`);
  expect(readme).toContain(`${Math.min(...year.temperatureC)} to ${Math.max(...year.temperatureC)} °C`);
  const meanWind = (yearlySum(year.windMs) / HOURS).toFixed(1);
  expect(readme).toContain(`mean ${meanWind} m/s, largest hour ${Math.max(...year.windMs)} m/s`);
  expect(readme).toContain(`The seed is ${SEED} `);
  expect(readme).toContain('CC0 1.0');
});
