import { LABEL_SIZE, type Layer, LINE_HEIGHT, MARGIN, textLayer } from './frame.ts';
import { textWidth, wrap } from './text.ts';

/** Charts with one row per mount: names on the left, in at most two lines, and the room that they need. */
export const ROW_HEIGHT = 42;
const NAME_ROOM = 180;
const GAP = 10;

export interface RowNames {
  /** Pixels from the left edge of the chart to the plot. */
  readonly left: number;
  readonly layer: Layer;
}

/** @param names one per row, from the top, drawable lines */
export const rowNames = (names: readonly string[]): RowNames => {
  const lines = names.map((name) => wrap(name, NAME_ROOM, LABEL_SIZE, 2));
  const widest = Math.max(...lines.flat().map((line) => textWidth(line, LABEL_SIZE)));
  return {
    left: Math.ceil(MARGIN + Math.min(NAME_ROOM, widest) + GAP),
    layer: textLayer(
      lines.map((text, row) => ({ row, text: text.join('\n'), lines: text.length })),
      { y: rowPosition, x: { value: -GAP } },
      { align: 'right', dy: { expr: `(1 - datum.lines) * ${LINE_HEIGHT / 2}` } },
    ),
  };
};

/** The vertical place of a mark that belongs to a row. */
export const rowPosition = {
  field: 'row',
  type: 'ordinal',
  axis: null,
  scale: { paddingInner: 0.42, paddingOuter: 0.21 },
} as const;
