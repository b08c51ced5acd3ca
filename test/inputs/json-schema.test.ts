import { beforeAll, describe, expect, test } from 'vitest';
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
    ]);
    expect(kinds.map((k) => k.required)).toEqual([
      ['kind', 'id', 'tilt', 'azimuth'],
      ['kind', 'id'],
      ['kind', 'id'],
      ['kind', 'id'],
    ]);
  });

  test('is plain JSON', () => {
    expect(JSON.parse(JSON.stringify(schema))).toEqual(schema);
  });
});
