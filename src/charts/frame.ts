import { HAIRLINE, INK, MUTED, PAPER } from './palette.ts';
import { wrap } from './text.ts';

/** A Vega-Lite specification as plain JSON; it opens as it is in any Vega editor. */
export type VegaLiteSpec = { $schema: string } & Record<string, unknown>;
export type Layer = Record<string, unknown>;

export interface Chart {
  /** File name without ending. */
  name: string;
  /** States the finding in one line. */
  title: string;
  /** The finding with what it rests on, one or two sentences. */
  finding: string;
  /** For readers who do not see the chart: what it is, the finding, the figures. */
  altText: string;
  spec: VegaLiteSpec;
}

/** Every chart is this wide, pixels. */
export const CHART_WIDTH = 680;
export const MARGIN = 20;
/** Inter by the report, the nearest common face elsewhere. */
export const FONT = "Inter, 'Helvetica Neue', Arial, sans-serif";
export const LABEL_SIZE = 12;
export const LINE_HEIGHT = 15;

/** Where Inter is lacking, the viewer's own face may run a tenth wider: lines are broken early enough for that. */
const OTHER_FACES = 0.91;
const TITLE_SIZE = 16;
const TITLE_LINE = 21;
const SUBTITLE_SIZE = 12;
const SUBTITLE_LINE = 16;
const SUBTITLE_GAP = 6;

export interface Plot {
  readonly title: string;
  /** How to read the chart: quantity, unit, marks. */
  readonly subtitle: string;
  readonly altText: string;
  /** Pixels from the left edge of the chart to the plot. */
  readonly left: number;
  readonly right: number;
  readonly height: number;
  /** Pixels between the subtitle and the plot. */
  readonly above: number;
  readonly below: number;
  readonly layers: readonly Layer[];
  readonly rest?: Record<string, unknown>;
}

/** Width of the plot inside a chart with these margins. */
export const plotWidth = (left: number, right: number): number => CHART_WIDTH - left - right;

/**
 * Puts layers into the common frame: fixed size (no text can push the layout about), title and subtitle flush left
 * with the page, one font.
 */
export const frame = (plot: Plot): VegaLiteSpec => {
  const textWidth = (CHART_WIDTH - 2 * MARGIN) * OTHER_FACES;
  const title = wrap(plot.title, textWidth, TITLE_SIZE, 3, true);
  const subtitle = wrap(plot.subtitle, textWidth, SUBTITLE_SIZE, 3);
  const head = title.length * TITLE_LINE + SUBTITLE_GAP + subtitle.length * SUBTITLE_LINE;
  return {
    $schema: 'https://vega.github.io/schema/vega-lite/v6.json',
    description: plot.altText,
    background: PAPER,
    width: plotWidth(plot.left, plot.right),
    height: plot.height,
    autosize: { type: 'none' },
    padding: { left: plot.left, right: plot.right, top: MARGIN + head + plot.above, bottom: plot.below },
    title: {
      text: title,
      subtitle,
      anchor: 'start',
      frame: 'group',
      dx: MARGIN - plot.left,
      offset: 0,
      fontSize: TITLE_SIZE,
      lineHeight: TITLE_LINE,
      color: INK,
      subtitleFontSize: SUBTITLE_SIZE,
      subtitleLineHeight: SUBTITLE_LINE,
      subtitleColor: MUTED,
      subtitlePadding: SUBTITLE_GAP,
    },
    layer: [ceiling(plot.above), ...plot.layers],
    ...plot.rest,
    config: {
      font: FONT,
      aria: false,
      view: { stroke: null },
      axis: {
        labelFontSize: 11,
        labelColor: MUTED,
        titleFontSize: 11,
        titleFontWeight: 'normal',
        titleColor: MUTED,
        gridColor: HAIRLINE,
        domain: false,
        ticks: false,
        labelPadding: 6,
        labelFlush: false,
      },
      text: { fontSize: LABEL_SIZE, color: INK, lineHeight: LINE_HEIGHT, baseline: 'middle' },
    },
  };
};

/**
 * An invisible rule above the plot. Vega stacks the title on the topmost mark: with the rule in place that is always
 * here, whatever a chart prints above its plot.
 */
const ceiling = (above: number): Layer => ({
  data: { values: [{}] },
  mark: { type: 'rule', opacity: 0 },
  encoding: { x: { value: 0 }, x2: { value: 1 }, y: { value: -above }, y2: { value: -above } },
});

/** Numbers on axes as everywhere: `1 500`, without the comma of d3. */
export const GROUPED_AXIS_LABEL = "replace(format(datum.value, ',~f'), /,/g, '\u00A0')";

/** A text layer; `\n` in the field breaks the line. */
export const textLayer = (
  values: readonly object[],
  encoding: Record<string, unknown>,
  mark: Record<string, unknown> = {},
): Layer => ({
  data: { values },
  mark: { type: 'text', lineBreak: '\n', ...mark },
  encoding: { text: { field: 'text', type: 'nominal' }, ...encoding },
});
