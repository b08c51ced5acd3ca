import { beforeAll, describe, expect, test } from 'vitest';
import { fromJSONSchema } from 'zod';
import { studyJsonSchema } from '../../src/inputs/index.ts';

type Json = Record<string, unknown>;
const inside = (schema: unknown, ...path: (string | number)[]): Json =>
  path.reduce<unknown>((at, step) => (at as Json)[step], schema) as Json;

/** Every schema below `schema`, with its path. */
const all = (schema: unknown, path = '#'): [string, Json][] => {
  if (typeof schema !== 'object' || schema === null) return [];
  const below = Object.entries(schema).flatMap(([key, inner]) => all(inner, `${path}/${key}`));
  return Array.isArray(schema) ? below : [[path, schema as Json], ...below];
};

let schema: object;
beforeAll(async () => {
  schema = await studyJsonSchema();
});

describe('the JSON Schema of a study', () => {
  test('is draft 7, needs weather and mounts alone, and takes a $schema key', () => {
    expect(inside(schema)).toMatchObject({
      $schema: 'http://json-schema.org/draft-07/schema#',
      type: 'object',
      required: ['weather', 'mounts'],
      additionalProperties: false,
    });
    expect(Object.keys(inside(schema, 'properties'))).toEqual([
      '$schema', 'title', 'weather', 'site', 'sky', 'array', 'mounts', 'losses', 'finance', 'wind', 'advice', 'compare_with',
    ]); // biome-ignore format: one list
  });

  test('refuses unknown keys in every group, and asks only for keys that are there', () => {
    const groups = all(schema).filter(
      ([, s]) => typeof s.properties === 'object' && 'additionalProperties' in s,
    );
    expect(groups.length).toBeGreaterThan(20);
    for (const [path, group] of groups) {
      expect([path, group.additionalProperties]).toEqual([path, false]);
      const keys = Object.keys(group.properties as Json);
      expect(keys).toEqual(expect.arrayContaining((group.required as string[] | undefined) ?? []));
    }
  });

  test('describes every key', () => {
    const keys = all(schema).filter(([path]) => /\/properties\/[^/]+$/.test(path));
    expect(keys.length).toBeGreaterThan(100);
    const bare = keys.filter(([, s]) => !/\w/.test(String(s.description ?? '')) && !('const' in s));
    expect(bare.map(([path]) => path)).toEqual([]);
  });

  test('takes numbers in their range, and text with a unit', () => {
    expect(inside(schema, 'properties', 'site', 'properties', 'latitude', 'anyOf')).toEqual([
      { type: 'number', minimum: -90, maximum: 90 },
      { type: 'string', pattern: '[0-9]' },
      { type: 'null' },
    ]);
    expect(inside(schema, 'properties', 'array', 'properties', 'dc')).toMatchObject({
      anyOf: [{ type: 'number', exclusiveMinimum: 0 }, { type: 'string' }],
      description: 'DC rating of the modules; a bare number is kW.',
      examples: ['12 kW'],
    });
    const heat = inside(schema, 'properties', 'array', 'properties', 'module', 'properties', 'heat');
    const pattern = new RegExp(heat.pattern as string);
    for (const right of ['-0.34 %/K', '-0.0034 /K', '-0.34%/°C']) expect(right).toMatch(pattern);
    for (const wrong of ['-0.34', '0.34 %/K']) expect(wrong).not.toMatch(pattern);
  });

  test('has one form of mount for each kind, told apart by kind', () => {
    const kinds = inside(schema, 'properties', 'mounts', 'items').oneOf as Json[];
    expect(kinds.map((k) => inside(k, 'properties', 'kind').const)).toEqual([
      'roof-plane',
      'fixed-tilt',
      'single-axis',
      'dual-axis',
      'turntable',
    ]);
    expect(kinds.map((k) => k.required)).toEqual([
      ['kind', 'id'],
      ['kind', 'id'],
      ['kind', 'id'],
      ['kind', 'id'],
      ['kind', 'id'],
    ]);
  });

  test('asks of a roof each angle outright or as read on site', () => {
    const [roof] = inside(schema, 'properties', 'mounts', 'items').oneOf as Json[];
    expect(roof.allOf).toEqual([
      { anyOf: [{ required: ['tilt'] }, { required: ['slope'] }] },
      { anyOf: [{ required: ['azimuth'] }, { required: ['bearing'] }] },
    ]);
  });

  test('read back as a schema, takes what was read on site, and refuses it where a value is out of range', () => {
    const reader = fromJSONSchema(schema as Parameters<typeof fromJSONSchema>[0]);
    const takes = (mount: Json, more: Json = {}) =>
      reader.safeParse({
        weather: { file: 'a' },
        mounts: [{ id: 'a', kind: 'roof-plane', ...mount }],
        ...more,
      }).success;
    const bearing = { magnetic: 150, taken: 'facing', dated: '2026-05-01', error: 5 };
    const slope = { reading: '3:12', error: 2 };
    const points = [
      [90, 12],
      [120, 8],
    ];
    const obstacles = [{ height: '6 m', distance: 20, from: 100, to: 130 }];
    expect(takes({ bearing, slope })).toBe(true);
    expect(takes({ bearing: { true: 76, back: 257, taken: 'along_ridge', downslope: 'left' }, slope })).toBe(
      true,
    );
    expect(takes({ bearing: { magnetic: 76, declination: '16 E' }, slope: { rise: '4 ft', run: 12 } })).toBe(
      true,
    );
    expect(takes({ bearing: { ...bearing, magnetic: 400 }, slope })).toBe(false);
    expect(takes({ bearing: { ...bearing, taken: 'facng' }, slope })).toBe(false);
    expect(takes({ bearing: { ...bearing, dated: 'May' }, slope })).toBe(false);
    expect(takes({ bearing: { magnetic: 150, declination: 16 }, slope })).toBe(false);
    expect(takes({ bearing, slope: { reading: 400 } })).toBe(false);
    for (const skyline of [
      { points },
      { file: 'a.csv', bearings: true },
      { obstacles, bearings: 'magnetic', declination: '13 W' },
      [
        { points, name: 'a' },
        { file: 'a.csv', name: 'b' },
      ],
    ])
      expect(takes({ tilt: 3, azimuth: 3 }, { site: { skyline } })).toBe(true);
    for (const skyline of [{ points: [[90]] }, { pints: points }, { obstacles: [{ height: 6 }] }, 5])
      expect(takes({ tilt: 3, azimuth: 3 }, { site: { skyline } })).toBe(false);
    expect(takes({ tilt: 3, azimuth: 3 }, { advice: { minimum_tof: '75 %', minimum_tsrf: 0.75 } })).toBe(
      true,
    );
    expect(takes({ tilt: 3, azimuth: 3 }, { advice: { minimum_tof: 75 } })).toBe(false);
  });

  test('is plain JSON', () => {
    expect(JSON.parse(JSON.stringify(schema))).toEqual(schema);
  });
});
