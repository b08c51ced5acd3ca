/** Where along the way from light to meter the stages of the energy chain take their share. */
const GROUPS = [
  { head: 'before the glass', stages: ['skyline', 'rows', 'snow'] },
  { head: 'in the modules', stages: ['incidence', 'heat', 'dirt', 'module spread'] },
] as const;
const LAST = 'on the way to the meter';

export interface StageGroup {
  readonly head: string;
  readonly stages: readonly string[];
}

/** Stage names under their heads, each head's in the order given; a head without stages is left out. */
export const groupedStages = (names: readonly string[]): StageGroup[] => {
  const known: readonly string[] = GROUPS.flatMap(({ stages }) => stages);
  return [
    ...GROUPS.map(({ head, stages }) => ({
      head,
      stages: names.filter((name) => (stages as readonly string[]).includes(name)),
    })),
    { head: LAST, stages: names.filter((name) => !known.includes(name)) },
  ].filter(({ stages }) => stages.length > 0);
};
