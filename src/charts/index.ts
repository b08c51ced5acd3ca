/** From a comparison to Vega-Lite specifications, and from a specification to SVG. */
import type { Comparison } from '../shared/index.ts';
import { costChart } from './cost.ts';
import type { Chart } from './frame.ts';
import { irradiationChart } from './irradiation.ts';
import { lossesChart } from './losses.ts';
import { monthsChart } from './months.ts';
import { orientationChart } from './orientation.ts';
import { skylineChart } from './skyline.ts';

export { type FontFiles, type FontMetrics, prepareFont } from './font.ts';
export type { Chart, VegaLiteSpec } from './frame.ts';
export { renderSvg } from './render.ts';

/**
 * The charts of one comparison, data included: pure, and cheap enough to call without drawing anything. The specs
 * open as they are in any Vega editor. Every title is worked out from the figures.
 */
export const chartSpecs = (comparison: Comparison): Chart[] => [
  irradiationChart(comparison),
  monthsChart(comparison),
  costChart(comparison),
  orientationChart(comparison),
  ...(comparison.skyline === null ? [] : [skylineChart(comparison, comparison.skyline)]),
  lossesChart(comparison),
];
