import { expect, test } from 'vitest';
import {
  BAR,
  dialColor,
  INK,
  LIGHT,
  MUTED,
  ON_LIGHT,
  PAPER,
  SERIES,
  SUN_PATH,
} from '../../src/charts/palette.ts';

type Rgb = [number, number, number];
const channels = (hex: string): Rgb =>
  [1, 3, 5].map((i) => Number.parseInt(hex.slice(i, i + 2), 16) / 255) as Rgb;
/** sRGB to linear light, IEC 61966-2-1. */
const linear = (hex: string): Rgb => channels(hex).map((c) => (c <= 0.04045 ? c / 12.92 : ((c + 0.055) / 1.055) ** 2.4)) as Rgb; // biome-ignore format: one formula
const luminance = ([r, g, b]: Rgb) => 0.2126 * r + 0.7152 * g + 0.0722 * b;
/** Contrast ratio of WCAG 2.2, "contrast ratio". */
const contrast = (a: string, b: string): number => {
  const [high, low] = [luminance(linear(a)), luminance(linear(b))].sort((x, y) => y - x);
  return (high + 0.05) / (low + 0.05);
};
/** Deuteranopia as in Machado, Oliveira & Fernandes, IEEE TVCG 15(6), 2009, severity 1; matrix from memory. */
const deuteranope = ([r, g, b]: Rgb): Rgb =>
  [
    0.367322 * r + 0.860646 * g - 0.227968 * b,
    0.280085 * r + 0.672501 * g + 0.047413 * b,
    -0.01182 * r + 0.04294 * g + 0.968881 * b,
  ].map((c) => Math.min(1, Math.max(0, c))) as Rgb;
/** CIE 1976 L*a*b* under D65. */
const lab = ([r, g, b]: Rgb): Rgb => {
  const f = (t: number) => (t > 216 / 24389 ? Math.cbrt(t) : (841 / 108) * t + 4 / 29);
  const [x, y, z] = [(0.4124 * r + 0.3576 * g + 0.1805 * b) / 0.95047, luminance([r, g, b]), (0.0193 * r + 0.1192 * g + 0.9505 * b) / 1.08883].map(f); // biome-ignore format: one matrix
  return [116 * y - 16, 500 * (x - y), 200 * (y - z)];
};
const distance = (a: Rgb, b: Rgb) => Math.hypot(...a.map((x, i) => x - b[i]));
const closest = (colors: string[], see: (c: Rgb) => Rgb) => {
  const seen = colors.map((c) => lab(see(linear(c))));
  return Math.min(...seen.flatMap((a, i) => seen.slice(0, i).map((b) => distance(a, b))));
};

test('marks stand out from paper by 3 to 1, text by 4.5 to 1 (WCAG 2.2, 1.4.11 and 1.4.3)', () => {
  for (const color of [...SERIES.map((s) => s.color), LIGHT.sky, LIGHT.ground, BAR, SUN_PATH])
    expect(contrast(color, PAPER), color).toBeGreaterThan(3);
  // Amber is pale by nature: its bars are told by their place and their printed figures, not by their edge.
  expect(contrast(LIGHT.beam, PAPER)).toBeGreaterThan(2);
  for (const text of [INK, MUTED]) expect(contrast(text, PAPER), text).toBeGreaterThan(4.5);
  for (const part of ['beam', 'sky', 'ground'] as const)
    expect(contrast(LIGHT[part], ON_LIGHT[part]), part).toBeGreaterThan(4.5);
});

test('no two colours of a set come close, with all cones or without the green ones', () => {
  // A distance of 2.3 is just noticeable (Mahy, Van Eycken & Oosterlinck 1994); 15 is told apart at a glance (common practice).
  for (const set of [SERIES.map((s) => s.color), Object.values(LIGHT)]) {
    expect(closest(set, (c) => c)).toBeGreaterThan(15);
    expect(closest(set, deuteranope)).toBeGreaterThan(15);
  }
});

test('colour is never the only sign: every series has its own dash and shape', () => {
  expect(SERIES).toHaveLength(8);
  expect(new Set(SERIES.map((s) => s.dash.join())).size).toBe(8);
  expect(new Set(SERIES.map((s) => s.shape)).size).toBe(8);
});

test('the dial only darkens as more is lost', () => {
  const shades = Array.from({ length: 71 }, (_, i) => luminance(linear(dialColor(i / 100))));
  expect(shades.slice(1).every((l, i) => l < shades[i])).toBe(true);
  expect(contrast(dialColor(0.2), INK)).toBeGreaterThan(4.5);
});
