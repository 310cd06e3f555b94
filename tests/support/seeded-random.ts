/**
 * Numbers from 0 up to 1 that are the same for the same seed: a linear congruential generator with the multiplier and
 * increment of "Numerical Recipes in C" (2nd edition, section 7.1).
 */
export function seededRandom(seed: number): () => number {
  let state = seed >>> 0;
  return () => {
    state = (Math.imul(state, 1_664_525) + 1_013_904_223) >>> 0;
    return state / 2 ** 32;
  };
}
