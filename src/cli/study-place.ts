import { isNode, LineCounter, parseDocument } from 'yaml';
import type { Problem } from '../shared/index.ts';

/** Line and column (1-based) of `weather.file` in a study's text, for a message about the file that it names. */
export const placeOfWeatherFile = (text: string): Pick<Problem, 'line' | 'column'> => {
  const lineCounter = new LineCounter();
  const node = parseDocument(text, { lineCounter }).getIn(['weather', 'file'], true);
  if (!isNode(node) || !node.range) return {};
  const { line, col } = lineCounter.linePos(node.range[0]);
  return { line, column: col };
};
