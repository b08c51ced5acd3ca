import type { Document, Pair, YAMLMap } from 'yaml';
import { isAlias, isMap, isNode, isScalar, isSeq } from 'yaml';

export type Path = readonly PropertyKey[];
export interface Position {
  readonly line: number;
  readonly column: number;
}

/** The way from a path in the values back to the text. */
export interface Places {
  /** Of the value at `path`, or of the nearest group around it that is there. */
  readonly at: (path: Path) => Position;
  /** Of the key `key` in the group at `path`. */
  readonly atKey: (path: Path, key: string) => Position;
}

export const START: Position = { line: 1, column: 1 };

/**
 * Line and column of an offset, as editors count. Own counting: the library's line counter loses lines once the
 * text has derailed, for example where a document is at its end before the text is.
 */
export const positionsIn = (text: string): ((offset: number) => Position) => {
  const starts = [0, ...Array.from(text.matchAll(/\n/g), ({ index }) => index + 1)];
  return (offset) => {
    const line = starts.findLastIndex((start) => start <= offset);
    return { line: line + 1, column: offset - starts[line] + 1 };
  };
};

/** Where the same key stands twice, the last one counts, as it does for the values. */
const pairOf = (map: YAMLMap, name: PropertyKey): Pair | undefined =>
  map.items.findLast(({ key }) => isScalar(key) && String(key.value) === String(name));

export const placesIn = (document: Document, positionOf: (offset: number) => Position): Places => {
  const follow = (node: unknown): unknown => (isAlias(node) ? node.resolve(document) : node);
  const nodeAt = (path: Path): unknown => {
    let node = follow(document.contents);
    for (const step of path) {
      const next = isMap(node)
        ? pairOf(node, step)?.value
        : isSeq(node)
          ? node.items[Number(step)]
          : undefined;
      if (next === undefined || next === null) break;
      node = follow(next);
    }
    return node;
  };
  const at = (path: Path): Position => {
    const node = nodeAt(path);
    return isNode(node) && node.range ? positionOf(node.range[0]) : START;
  };
  const atKey = (path: Path, key: string): Position => {
    const map = nodeAt(path);
    const node = isMap(map) ? pairOf(map, key)?.key : undefined;
    return isScalar(node) && node.range ? positionOf(node.range[0]) : at(path);
  };
  return { at, atKey };
};
