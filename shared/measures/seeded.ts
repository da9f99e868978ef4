/**
 * Numbers from 0 up to, but not, 1 that look drawn by chance and are the same for the same seed (xorshift, 32 bits:
 * Marsaglia 2003, Journal of Statistical Software 8): what rests on them can be worked out again by anybody. `seed` is
 * a whole number from 1 to 2³² − 1. Example: seed 1 begins with 270,369 / 2³².
 */
export function seeded(seed: number): () => number {
  let state = seed >>> 0;
  if (state === 0) throw new RangeError('a seed of 0 would stay 0');
  return () => {
    state ^= state << 13;
    state ^= state >>> 17;
    state ^= state << 5;
    return (state >>> 0) / 2 ** 32;
  };
}
