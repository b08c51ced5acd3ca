/** What the help of a command opens with. */
export const examples = (...lines: string[]): string =>
  `Examples:\n${lines.map((line) => `  ${line}\n`).join('')}`;
