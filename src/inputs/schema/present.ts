import * as z from 'zod/mini';

/** Whether a study has something at this path of keys. */
export type Present = (...path: string[]) => boolean;
export const everything: Present = () => true;

const ABSENT = z.optional(z.unknown());

/**
 * The schema of a section, made only where the study has the section. Making schemas is what reading a study costs
 * most, and most studies leave most sections out. An absent section is undefined under any schema.
 */
export const wherePresent = <S extends z.ZodMiniType>(present: boolean, make: () => S): S =>
  present ? make() : (ABSENT as unknown as S);

/** Makes a thing at its first use. */
export const once = <T>(make: () => T): (() => T) => {
  let made: { thing: T } | null = null;
  return () => {
    made ??= { thing: make() };
    return made.thing;
  };
};
