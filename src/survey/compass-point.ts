import { compassWords } from '../shared/index.ts';

const letters = (words: string): string => words.replace(/(north|south|east|west)-?/g, (word) => word[0]);
const flat = (text: string): string => text.toLowerCase().replace(/[\s-]/g, '');

/** All sixteen points by their words and their letters: `south-south-east`, `sse`. */
const AZIMUTHS = new Map(
  Array.from({ length: 16 }, (_, i) => i * 22.5).flatMap((azimuthDeg) => {
    const words = compassWords(azimuthDeg);
    return [
      [flat(words), azimuthDeg],
      [letters(words), azimuthDeg],
    ] as const;
  }),
);

/** `south`, `South East`, `SSW` to degrees clockwise from north; null where it is no point of the compass. */
export const compassPoint = (text: string): number | null => AZIMUTHS.get(flat(text)) ?? null;
