import { type Problem, TrackworthError } from '../shared/index.ts';

/** A raw value as a message may quote it: text in quotation marks, shortened. */
export const shown = (raw: unknown): string => {
  if (raw === undefined || raw === null || raw === '') return 'nothing';
  const text = typeof raw === 'string' ? JSON.stringify(raw) : (JSON.stringify(raw) ?? String(raw));
  return text.length > 60 ? `${text.slice(0, 57)}...` : text;
};

/**
 * Every refusal of the survey is one `TrackworthError` of kind `input`, its problems without file and line, which only
 * the caller knows. A command line rethrows the same problems with kind `usage`.
 */
export const refuse = (...problems: readonly Problem[]): never => {
  throw new TrackworthError('input', problems);
};
