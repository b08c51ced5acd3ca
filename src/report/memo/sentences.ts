import type { Comparison } from '../../shared/index.ts';
import { md, mdList } from '../markdown.ts';
import { capitalised, oneLine } from '../plain-text.ts';
import { mountNames } from '../words.ts';

/** Sentences of the advice as an inert list. */
export const sentences = (c: Comparison, texts: readonly string[]): string =>
  mdList(texts.map((text) => md(capitalised(oneLine(text), mountNames(c)))));
