import { textWidth } from './text.ts';

/** A place in pixels of the plot. */
export type Pixel = readonly [x: number, y: number];

export interface LineLabel {
  readonly text: string;
  /** The line that is named, close points in its order. */
  readonly line: readonly Pixel[];
  /** Where the label would stand if nothing were in its way. */
  readonly near: Pixel;
}

export interface Box {
  readonly x: number;
  readonly y: number;
  readonly halfWidth: number;
  readonly halfHeight: number;
}

const GAP = 3;
/** Further apart than this, nothing is gained. */
const CLEAR = 12;
/** A label gives up so many pixels of air rather than move one pixel further along its line. */
const PULL = 0.04;

/**
 * Puts each label just above or below its line, where it is clear of the other lines and of the labels before it, near
 * to where it would like to stand.
 * @param others points of all lines, whose own points are told by identity
 * @param bounds where a label may lie
 */
export const placeOnLines = (
  labels: readonly LineLabel[],
  others: readonly (readonly Pixel[])[],
  fontSize: number,
  bounds: { readonly left: number; readonly right: number; readonly top: number; readonly bottom: number },
): Box[] => {
  const placed: Box[] = [];
  for (const label of labels) {
    const halfWidth = textWidth(label.text, fontSize) / 2;
    const halfHeight = fontSize / 2 + 2;
    const obstacles = others.filter((line) => line !== label.line).flat();
    const candidates = label.line.flatMap(([x]) => {
      const centre = Math.min(bounds.right - halfWidth, Math.max(bounds.left + halfWidth, x));
      const under = label.line.filter((p) => Math.abs(p[0] - centre) <= halfWidth + GAP).map((p) => p[1]);
      if (under.length === 0) return [];
      return [Math.min(...under) - halfHeight - GAP, Math.max(...under) + halfHeight + GAP].map((y) => ({ x: centre, y, halfWidth, halfHeight }));
    }); // biome-ignore format: two places on a line
    const inside = candidates.filter(
      (b) => b.y - halfHeight >= bounds.top && b.y + halfHeight <= bounds.bottom,
    );
    const worth = (box: Box): number => {
      const air = Math.min(
        CLEAR,
        ...obstacles.map((p) => gapTo(box, p[0], p[1], 0, 0)),
        ...placed.map((b) => gapTo(box, b.x, b.y, b.halfWidth, b.halfHeight)),
      );
      return air - PULL * Math.hypot(box.x - label.near[0], box.y - label.near[1]);
    };
    const scored = (inside.length > 0 ? inside : candidates).map((box) => ({ box, worth: worth(box) }));
    placed.push(scored.reduce((best, c) => (c.worth > best.worth ? c : best)).box);
  }
  return placed;
};

/** Pixels of air between a box and another; negative where they overlap. */
const gapTo = (box: Box, x: number, y: number, halfWidth: number, halfHeight: number): number =>
  Math.max(
    Math.abs(x - box.x) - halfWidth - box.halfWidth,
    Math.abs(y - box.y) - halfHeight - box.halfHeight,
  );
