/**
 * The one palette of trackworth, checked in test/charts/palette.test.ts: every mark stands out from white paper,
 * and no two colours of a set come close for a reader without green cones. Shape, dash or order always says the same.
 */
export const INK = '#1E2A35';
export const MUTED = '#55626E';
export const HAIRLINE = '#D9DEE3';
export const PAPER = '#FFFFFF';

/** Where the light comes from: straight from the sun, from the sky, from the ground. */
export const LIGHT = { beam: '#E2A336', sky: '#3E6F9E', ground: '#5A4632' } as const;
/** Text that is printed on each of them. */
export const ON_LIGHT = { beam: INK, sky: PAPER, ground: PAPER } as const;

export const BAR = '#3E6F9E';
/** The sun's path as a line: amber, dark enough for a thin mark. What stands before it. */
export const SUN_PATH = '#B5770D';
export const HILL = '#CBD4DB';
export interface SeriesStyle {
  readonly color: string;
  readonly dash: readonly number[];
  readonly shape: string;
}

/** One style per mount, in the order of the study; a ninth mount starts again with the first. */
export const SERIES: readonly SeriesStyle[] = [
  { color: '#0F497D', dash: [1, 0], shape: 'circle' },
  { color: '#AE510F', dash: [7, 3], shape: 'square' },
  { color: '#448563', dash: [2, 2], shape: 'triangle-up' },
  { color: '#4696D7', dash: [9, 3, 2, 3], shape: 'diamond' },
  { color: '#550F20', dash: [4, 2], shape: 'triangle-down' },
  { color: '#949451', dash: [12, 3], shape: 'cross' },
  { color: '#AC6797', dash: [3, 4], shape: 'triangle-right' },
  { color: '#475156', dash: [6, 2, 1, 2, 1, 2], shape: 'triangle-left' },
];

export const seriesStyle = (index: number): SeriesStyle => SERIES[index % SERIES.length];

/** The dial's one hue: pale where nothing is lost, dark where most is. */
const DIAL_STOPS = [
  [246, 249, 252],
  [168, 195, 217],
  [62, 108, 148],
] as const;
const DARKEST_LOSS = 0.7;

/** Colour of a loss (fraction) on the dial: straight in RGB between three stops of one hue, darkest from 70 % on. */
export const dialColor = (loss: number): string => {
  const along = Math.min(1, Math.max(0, loss / DARKEST_LOSS)) * 2;
  const from = DIAL_STOPS[along < 1 ? 0 : 1];
  const to = DIAL_STOPS[along < 1 ? 1 : 2];
  const share = along < 1 ? along : along - 1;
  return `#${from.map((c, i) => hexByte(c + share * (to[i] - c))).join('')}`;
};

const hexByte = (value: number): string => Math.round(value).toString(16).padStart(2, '0').toUpperCase();
