/** Numbers that look random and are the same on every machine for the same seed. */
export interface SeededNumbers {
  /** Evenly spread over 0..1, both ends left out. */
  uniform(): number;
  /** Normal with mean 0 and standard deviation 1. */
  normal(): number;
}

const MODULUS = 2 ** 31 - 1;
const MULTIPLIER = 48271;

/** One step of the generator: a whole number 1 .. 2^31 - 2 to the next. Every product stays below 2^53, so a double holds it exactly. */
export const nextState = (state: number): number => (state * MULTIPLIER) % MODULUS;

/** Neighbouring seeds begin alike; this many draws later nothing is left of it. */
const WARM_UP = 32;

/**
 * The multiplicative congruential generator of Park & Miller 1988, Communications of the ACM 31, 1192-1201, with
 * the multiplier 48271 of Park, Miller & Stockmeyer 1993, Communications of the ACM 36(7), 108-110; normal
 * deviates by Box & Muller 1958, Annals of Mathematical Statistics 29, 610-611.
 *
 * @param seed a whole number from 1 up; @param stream sets apart the draws of one purpose from another's, so that a
 * change in the wind leaves the clouds as they were.
 */
export const seededNumbers = (seed: number, stream: number): SeededNumbers => {
  let state = 1 + ((seed * 1009 + stream * 104729) % (MODULUS - 1));
  const uniform = (): number => {
    state = nextState(state);
    return state / MODULUS;
  };
  for (let i = 0; i < WARM_UP; i++) uniform();
  const normal = (): number => Math.sqrt(-2 * Math.log(uniform())) * Math.cos(2 * Math.PI * uniform());
  return { uniform, normal };
};

/**
 * Normal deviates with memory: each is `memory` times the one before plus fresh noise, scaled so that mean 0 and
 * standard deviation 1 hold throughout (first-order autoregression; Box & Jenkins 1970, Time Series Analysis, ch. 3).
 */
export const withMemory = (numbers: SeededNumbers, memory: number): (() => number) => {
  const fresh = Math.sqrt(1 - memory * memory);
  let value = numbers.normal();
  return () => {
    value = memory * value + fresh * numbers.normal();
    return value;
  };
};
