import { TrackworthError } from '../../shared/index.ts';

/** The words of a refusal, as src/inputs/faults-of.ts unpacks them. */
interface Words {
  readonly code: string;
  readonly expected: string;
  readonly fix: string;
  readonly found?: string;
}

/** An issue of a group at a path inside it. */
export const refuseIn = (path: PropertyKey[], params: Words) => ({
  code: 'custom' as const,
  input: undefined,
  path,
  params: { ...params },
});

/**
 * What the survey finds wrong with a group or list whose every value is sound. A problem's place is the number of its
 * entry, as `entriesOf` gives it to the survey, or the key that its code stands for.
 */
export const surveyIssues = (check: () => unknown, keyOfCode: Readonly<Record<string, string>> = {}) => {
  try {
    check();
    return [];
  } catch (trouble) {
    if (!(trouble instanceof TrackworthError)) throw trouble;
    return trouble.problems.map(({ code, expected, found, fix, field }) => {
      const key = field === undefined ? keyOfCode[code] : Number(field);
      return refuseIn(key === undefined ? [] : [key], { code, expected, found, fix });
    });
  }
};

/** How the survey is to name the entries of a list; what is wrong with an empty one has the list's own place. */
export const entriesOf = (list: readonly unknown[]) => (index: number) =>
  index < list.length ? { field: String(index) } : {};
