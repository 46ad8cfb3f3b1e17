/**
 * A small seeded generator of whole numbers below 2^32 (xorshift, Marsaglia 2003). It only chooses which pairs are
 * looked at first: the selected slope does not depend on it, the time hardly.
 */
export function seededGenerator(seed: number): () => number {
  let state = seed | 0 || 1;
  return () => {
    state ^= state << 13;
    state ^= state >>> 17;
    state ^= state << 5;
    return state >>> 0;
  };
}
