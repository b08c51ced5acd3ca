import { readFileSync } from 'node:fs';

/** Rows of a comma-separated reference file in this folder, by the names in its header. Values keep their text. */
export const referenceTable = (name: string): Record<string, string>[] => {
  const [header, ...lines] = readFileSync(new URL(name, import.meta.url), 'utf8')
    .trim()
    .split('\n');
  const keys = header.split(',');
  return lines.map((line) => {
    const cells = line.split(',');
    return Object.fromEntries(keys.map((key, i) => [key, cells[i]]));
  });
};
