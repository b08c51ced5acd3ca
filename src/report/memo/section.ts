/** Paragraphs, tables and lists in order, an empty line between them; what is empty is left out. */
export const blocks = (...parts: readonly string[]): string =>
  parts.filter((part) => part !== '').join('\n\n');

/** A heading and what stands under it; nothing where there is nothing. */
export const section = (heading: string, ...parts: readonly string[]): string => {
  const body = blocks(...parts);
  return body === '' ? '' : `## ${heading}\n\n${body}`;
};
