import fc from 'fast-check';
import { beforeAll, expect, test } from 'vitest';
import type { FontMetrics } from '../../src/charts/index.ts';
import { fixed, money, percentSize, whole } from '../../src/charts/numbers.ts';
import { spreadLabels } from '../../src/charts/spread.ts';
import { oneLine, shorten, textWidth, wrap } from '../../src/charts/text.ts';
import { interFont } from './support.ts';

let font: FontMetrics;
beforeAll(async () => {
  font = await interFont();
});

test('labels never overlap, keep their order and stay inside where they fit', () => {
  const label = fc.record({ at: fc.integer({ min: -50, max: 350 }), size: fc.integer({ min: 10, max: 34 }) });
  fc.assert(
    fc.property(fc.array(label, { minLength: 1, maxLength: 9 }), (labels) => {
      const sizes = labels.map((l) => l.size);
      const centres = spreadLabels(labels.map((l) => l.at), sizes, 0, 306); // biome-ignore format: one call
      const order = labels.map((_, i) => i).sort((a, b) => centres[a] - centres[b]);
      for (let i = 1; i < order.length; i++) {
        const [a, b] = [order[i - 1], order[i]];
        expect(centres[b] - centres[a]).toBeGreaterThanOrEqual((sizes[a] + sizes[b]) / 2 - 1e-9);
        expect(labels[b].at).toBeGreaterThanOrEqual(labels[a].at);
      }
      expect(centres[order[0]] - sizes[order[0]] / 2).toBeGreaterThanOrEqual(-1e-9);
      const last = order.at(-1)!;
      expect(centres[last] + sizes[last] / 2).toBeLessThanOrEqual(306 + 1e-9);
    }),
  );
});

test('labels that do not touch stay where they want to be', () => {
  expect(spreadLabels([50, 10, 90], [20, 20, 20], 0, 100)).toEqual([50, 10, 90]);
  // Two that want the same place part evenly.
  expect(spreadLabels([50, 50], [20, 20], 0, 100)).toEqual([40, 60]);
});

test('widths that specs are laid out by are those of Inter within 2 %', () => {
  const ascii = String.fromCharCode(...Array.from({ length: 95 }, (_, i) => i + 32));
  const lines = [
    ascii,
    'Ground rack on the old orchard terrace',
    'kWh per kW a year: 1 792',
    '34° facing 186°',
  ];
  for (const line of lines) {
    expect(Math.abs(textWidth(line, 12) / font.width(line, 12, false) - 1), line).toBeLessThan(0.02);
    // Bold is one factor for all letters.
    expect(Math.abs(textWidth(line, 12, true) / font.width(line, 12, true) - 1), line).toBeLessThan(0.05);
  }
});

test('wrapped lines fit, lose nothing unless shortened, and are at most as many as asked', () => {
  fc.assert(
    fc.property(fc.string({ minLength: 1, maxLength: 120, unit: 'grapheme' }), fc.integer({ min: 1, max: 3 }), (raw, most) => {
      const text = oneLine(raw);
      const lines = wrap(text, 120, 12, most);
      expect(lines.length).toBeLessThanOrEqual(most);
      for (const line of lines) expect(textWidth(line, 12)).toBeLessThanOrEqual(120);
      if (!lines.join('').includes('\u2026')) expect(lines.join(' ')).toBe(text);
    }),
  ); // biome-ignore format: one property
});

test('a line is one line whatever was written', () => {
  expect(oneLine(' a\n\tb\u2028c\u202Ed\u0000e\uD800f ')).toBe('a b c d e f');
  expect(oneLine('Südhang 東 🌞')).toBe('Südhang 東 🌞');
  expect(shorten('Ground rack', 30, 12)).toMatch(/^Gr.*\u2026$/);
});

test('numbers are written alike everywhere', () => {
  expect(whole(1234567.4)).toBe('1\u00A0234\u00A0567');
  expect(whole(-0.3)).toBe('0');
  expect(whole(-1234)).toBe('\u22121\u00A0234');
  expect(fixed(2.449, 1)).toBe('2.4');
  expect([0.18, 0.0742, 0.0996, 0.0995, -0.004].map(percentSize)).toEqual(['18', '7.4', '10', '10', '0.4'].map((n) => `${n}\u00A0%`)); // biome-ignore format: one line
  expect([0.1094, 0.0937, 12.34, 1240, 0.00456, 0].map(money)).toEqual(['0.109', '0.094', '12.3', '1\u00A0240', '0.00456', '0']); // biome-ignore format: one line
});
