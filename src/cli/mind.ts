import { SURVEY_CAUTIONS } from '../survey/index.ts';

/** A screen has room for a reminder; `--json` and the memo have the whole text. */
const SHORT: Record<keyof typeof SURVEY_CAUTIONS, string> = {
  height: 'Reading on a roof is work at height: fall protection.',
  iron: 'Iron, cables and running inverters turn the needle.',
  metalRoof: 'Read no compass on a metal roof.',
  phone: 'A phone may show true north already: check.',
  declinationOnce: 'The declination is applied here; do not apply it again.',
  levelRun: 'A run is measured level, not along the rafter.',
  skylineFrom: "Take a skyline from the array's lowest point; never sight the sun; trees grow.",
};

const keyOf = new Map(
  Object.entries(SURVEY_CAUTIONS).map(([key, text]) => [text as string, key as keyof typeof SURVEY_CAUTIONS]),
);

/** What to mind, in a line or two. */
export const mindWords = (cautions: readonly string[]): string =>
  cautions
    .map((text) => {
      const key = keyOf.get(text);
      return key === undefined ? text : SHORT[key];
    })
    .join(' ');
