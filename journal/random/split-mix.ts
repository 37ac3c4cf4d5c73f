const MASK_BITS = 64;

/**
 * Words that follow from a seed and share no visible pattern with those of its neighbours: what other generators are started from.
 * @param seed any whole number; taken modulo 2^64.
 * @returns a function that gives the next 64-bit word at each call, 0 to 2^64 − 1.
 * @see Steele, Lea and Flood (2014), Fast splittable pseudorandom number generators, OOPSLA; SplitMix64 in the form of Vigna (public
 *   domain).
 */
export function splitMix64(seed: bigint): () => bigint {
  let state = BigInt.asUintN(MASK_BITS, seed);
  return () => {
    state = BigInt.asUintN(MASK_BITS, state + 0x9e3779b97f4a7c15n);
    let mixed = state;
    mixed = BigInt.asUintN(MASK_BITS, (mixed ^ (mixed >> 30n)) * 0xbf58476d1ce4e5b9n);
    mixed = BigInt.asUintN(MASK_BITS, (mixed ^ (mixed >> 27n)) * 0x94d049bb133111ebn);
    return mixed ^ (mixed >> 31n);
  };
}
