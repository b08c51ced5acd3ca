import { type Document, isMap, isNode, isScalar, isSeq, LineCounter, parseDocument } from 'yaml';
import type { Problem } from '../shared/index.ts';

/** `mounts.roof.bearing` and `site.skyline.#2.file` as the document counts: a mount by its id, an entry by its number. */
const nodeOf = (document: Document, field: string): unknown => {
  let node: unknown = document.contents;
  for (const step of field.split('.')) {
    const next = isSeq(node)
      ? node.items.find((item, i) => step === `#${i + 1}` || (isMap(item) && String(item.get('id')) === step))
      : isMap(node)
        ? node.items.find(({ key }) => isScalar(key) && String(key.value) === step)?.value
        : undefined;
    if (!isNode(next)) break;
    node = next;
  }
  return node;
};

/**
 * Line and column (1-based) of a field in a study's text, or of the nearest group around it, for problems that only
 * show once the study has been read.
 */
export const placeOfField = (text: string, field: string): Pick<Problem, 'line' | 'column'> => {
  const lineCounter = new LineCounter();
  const node = nodeOf(parseDocument(text, { lineCounter }), field);
  if (!isNode(node) || !node.range) return {};
  const { line, col } = lineCounter.linePos(node.range[0]);
  return { line, column: col };
};
