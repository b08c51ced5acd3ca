import type { Comparison } from '../../shared/index.ts';
import { md, mdList } from '../markdown.ts';
import { capitalised } from '../plain-text.ts';
import { withShortNames } from '../words.ts';

/** Sentences of the advice as an inert list, with short names. */
export const sentences = (c: Comparison, texts: readonly string[]): string =>
  mdList(texts.map((text) => md(capitalised(withShortNames(c, text)))));
