import type { Problem } from '../shared/index.ts';
import { TrackworthError } from '../shared/index.ts';
import { compareDeclinations, type Declination, declinationAt } from '../survey/index.ts';
import { type Applied, bearingFacts } from './bearing-facts.ts';
import { type BearingOptions, type BearingRequest, bearingRequest } from './bearing-request.ts';
import { bearingScreen } from './bearing-screen.ts';
import { factsJson } from './facts-json.ts';
import type { Io } from './io.ts';
import { atOption, BY_HAND } from './option-problems.ts';

/** Which option a refusal of the survey is about. */
const OPTION_OF: Record<string, string> = {
  'date-outside-model': '--dated',
  'geographic-pole': '--at',
  'magnetic-pole': '--at',
  'not-a-back-bearing': '--back',
  'ambiguous-facing': '--downslope',
  'wrong-downslope': '--downslope',
};

const said = (problem: Problem): Problem => ({
  ...atOption(problem, OPTION_OF[problem.code] ?? 'bearing'),
  ...(problem.code === 'date-outside-model' ? { fix: BY_HAND } : {}),
});

/** What the survey refuses is wrong usage here. */
const asUsage = async <T>(work: () => T | Promise<T>): Promise<T> => {
  try {
    return await work();
  } catch (error) {
    if (!(error instanceof TrackworthError)) throw error;
    throw new TrackworthError('usage', error.problems.map(said), { cause: error });
  }
};

const modelled = async ({ place, elevationM, date }: BearingRequest): Promise<Declination | null> =>
  place && date ? declinationAt({ ...place, elevationM, date }) : null;

/** By hand where given, held against the model where place and date allow; else by the model. */
const declinationOf = async (asked: BearingRequest): Promise<Applied> => {
  const { byHandDeg } = asked;
  if (byHandDeg === null) {
    const model = (await modelled(asked)) as Declination; // place and date were asked for
    return { declinationDeg: model.declinationDeg, model, findings: model.findings };
  }
  // By hand is the way out where the model has no answer: its refusal is no problem then.
  const model = await modelled(asked).catch((error) => {
    if (error instanceof TrackworthError) return null;
    throw error;
  });
  const odd = model && compareDeclinations(byHandDeg, model);
  return {
    declinationDeg: byHandDeg,
    model: null,
    findings: [...(model?.findings ?? []), ...(odd ? [odd] : [])],
  };
};

/** A compass bearing to true, or a true one to magnetic, with its sum. */
export const bearing = async (typed: string, options: BearingOptions, io: Io): Promise<void> => {
  const asked = bearingRequest(typed, options);
  const facts = await asUsage(async () => bearingFacts(asked, await declinationOf(asked)));
  io.out(options.json ? factsJson(facts) : bearingScreen(facts));
};
