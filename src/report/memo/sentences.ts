import { md, mdList } from '../markdown.ts';
import { capitalised, oneLine } from '../plain-text.ts';

/** Sentences of the advice as an inert list. */
export const sentences = (texts: readonly string[]): string =>
  mdList(texts.map((text) => md(capitalised(oneLine(text)))));
