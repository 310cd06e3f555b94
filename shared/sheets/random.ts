/**
 * Numbers from 0 up to 1, the same for the same seed: a 32-bit xorshift (G. Marsaglia, Journal of Statistical Software
 * 8(14), 2003), with the seed spread first so that neighbouring seeds go different ways.
 */
export function seededNumbers(seed: number): () => number {
  let state = (Math.imul(seed ^ 0x9e3779b9, 0x85ebca6b) ^ 0x5bd1e995) >>> 0 || 1;
  return () => {
    state ^= state << 13;
    state ^= state >>> 17;
    state ^= state << 5;
    state >>>= 0;
    return state / 2 ** 32;
  };
}
