import { describe, expect, test } from 'vitest';
import { editorSchema } from '../../src/inputs/editor-schema.ts';
import { readStudy, studyTemplate } from '../../src/inputs/index.ts';

const read = (text: string) => readStudy({ file: 'study.yaml', text });
const TEXT = studyTemplate({ title: 'Orlin Bench', weatherFile: 'orlin.epw' });
/** A key that waits behind a #, as the head of the template explains it. */
const WAITING = /^#(?=(?: {2,}(?:- )?)?[a-z_]+:(?: |$))/gm;

describe('the template of a study', () => {
  test('is a right study as it stands', async () => {
    const study = await read(TEXT);
    expect(study.title).toBe('Orlin Bench');
    expect(study.weather.file).toBe('orlin.epw');
    expect(study.mounts.map((m) => m.geometry.kind)).toEqual(['fixed-tilt', 'single-axis']);
    expect(study.mounts.every((m) => m.cost === null)).toBe(true); // no price that is not the user's
    expect(study.finance.realRate).toBeNull();
  });

  test('stays one with every waiting key taken in, and then holds every kind and section', async () => {
    expect(TEXT.match(WAITING)!.length).toBeGreaterThan(40);
    const study = await read(TEXT.replace(WAITING, ''));
    expect(study.mounts.map((m) => m.geometry.kind)).toEqual([
      'fixed-tilt',
      'single-axis',
      'roof-plane',
      'dual-axis',
      'turntable',
    ]);
    expect(study.mounts.every((m) => m.cost !== null)).toBe(true);
    const { site, losses, finance } = study;
    expect(study.programme).toEqual({ minimumTof: 0.75, minimumTsrf: 0.75 });
    expect(site.skyline?.[0].points).toHaveLength(5);
    for (const group of [site, losses, finance, study.array.module!, study.wind!])
      expect(Object.values(group)).not.toContain(null);
    expect(study.objective).toBe('lowest cost per kWh');
    expect(study.compareWith).toBe('ground');
  });

  test('shows readings that may stand in place of the keys beside them', async () => {
    const shown = (key: string) =>
      [...TEXT.matchAll(new RegExp(`^# (${key}: \\{.*\\})(?: #.*)?$`, 'gm'))].map(([, line]) => line);
    const study = (keys: string, site = '') =>
      read(`weather: { file: a }\nmounts: [ { id: m, kind: fixed-tilt, ${keys} } ]\nsite: { ${site} }\n`);
    const [bearings, slopes, skylines] = [shown('bearing'), shown('slope'), shown('skyline')];
    expect([bearings.length, slopes.length, skylines.length]).toEqual([3, 2, 2]);
    for (const bearing of bearings) expect((await study(bearing)).mounts[0].readings?.bearing).not.toBeNull();
    for (const slope of slopes)
      expect((await study(slope)).mounts[0].readings?.slope?.errorDeg).toBeGreaterThan(0);
    for (const skyline of skylines) expect((await study('', skyline)).site.skyline).toHaveLength(1);
  });

  test('names every key that a study may have', () => {
    const keysOf = (schema: unknown): string[] => {
      if (typeof schema !== 'object' || schema === null) return [];
      const { properties = {}, ...rest } = schema as { properties?: Record<string, unknown> };
      return [
        ...Object.keys(properties),
        ...[...Object.values(properties), ...Object.values(rest)].flatMap(keysOf),
      ];
    };
    const keys = [...new Set(keysOf(editorSchema()))].filter(
      (key) => !['$schema', 'label', 'upkeep'].includes(key),
    );
    expect(keys.length).toBeGreaterThan(60);
    expect(keys.filter((key) => !new RegExp(`\\b${key}:`).test(TEXT))).toEqual([]);
  });

  test('takes any title and file name', async () => {
    const title = '=1 | </script>: # "x" \\ \n - y';
    const study = await read(studyTemplate({ title, weatherFile: 'C:\\a b\\#1: "x".epw' }));
    expect(study.title).toBe(title);
    expect(study.weather.file).toBe('C:\\a b\\#1: "x".epw');
  });

  test('fits a screen of 120 columns and has no tabs', () => {
    expect(Math.max(...TEXT.split('\n').map((line) => line.length))).toBeLessThanOrEqual(120);
    expect(TEXT).not.toContain('\t');
  });
});
