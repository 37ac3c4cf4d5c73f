/**
 * The generator xoshiro128**: 32 bits a call, period 2^128 − 1, exact in 32-bit integer arithmetic and so the same in every engine.
 * @param state four words of 32 bits, not all 0.
 * @returns a function that gives the next word at each call, 0 to 2^32 − 1.
 * @see Blackman and Vigna (2021), Scrambled linear pseudorandom number generators, ACM Transactions on Mathematical Software 47(4).
 */
export function xoshiro128(state: readonly [number, number, number, number]): () => number {
  let [first, second, third, fourth] = state;
  return () => {
    const word = Math.imul(rotateLeft(Math.imul(second, 5), 7), 9) >>> 0;
    const shifted = second << 9;
    third ^= first;
    fourth ^= second;
    second ^= third;
    first ^= fourth;
    third ^= shifted;
    fourth = rotateLeft(fourth, 11);
    return word;
  };
}

function rotateLeft(word: number, bits: number): number {
  return (word << bits) | (word >>> (32 - bits));
}
