import { DomainError } from '@/journal/errors/domain-error';
import { splitMix64 } from '@/journal/random/split-mix';
import { xoshiro128 } from '@/journal/random/xoshiro';

/** A source of draws that gives the same ones for the same seed, on every machine. */
export interface SeededRandom {
  /** Uniform, strictly between 0 and 1, in steps of 2^-52. */
  uniform(): number;
  /** Standard normal. */
  normal(): number;
  /** Whole number from 0 to count − 1, each as likely; count a whole number from 1 to 2^32, or DomainError `index-count-invalid`. */
  index(count: number): number;
}

const WORDS = 2 ** 32;
const STEP = 2 ** -52;

/**
 * Random draws from a seed.
 * @param seed whole number, safe as a number or of any size as a bigint (taken modulo 2^64).
 * @throws {DomainError} `seed-invalid`.
 * @see generator: xoshiro128** of Blackman and Vigna (2021), started from SplitMix64 as they advise; normal draws: the polar method of
 *   Marsaglia and Bray (1964), SIAM Review 6; whole numbers: rejection of the incomplete last round, so that none is favoured.
 */
export function seededRandom(seed: number | bigint): SeededRandom {
  if (typeof seed === 'number' && !Number.isSafeInteger(seed)) throw new DomainError('seed-invalid', { seed });
  const seedWord = splitMix64(BigInt(seed));
  const [low, high] = [seedWord(), seedWord()];
  const half = (word: bigint, shift: bigint) => Number(BigInt.asIntN(32, word >> shift));
  const nextWord = xoshiro128([half(low, 0n), half(low, 32n), half(high, 0n), half(high, 32n)]);

  const uniform = () => {
    const upper = nextWord() >>> 6;
    const lower = nextWord() >>> 6;
    return (upper * 2 ** 26 + lower + 0.5) * STEP; // half a step, so that neither 0 nor 1 comes
  };

  let spare: number | null = null;
  const normal = () => {
    if (spare !== null) {
      const kept = spare;
      spare = null;
      return kept;
    }
    for (;;) {
      const x = 2 * uniform() - 1;
      const y = 2 * uniform() - 1;
      const square = x * x + y * y;
      if (square > 0 && square < 1) {
        const stretch = Math.sqrt((-2 * Math.log(square)) / square);
        spare = y * stretch;
        return x * stretch;
      }
    }
  };

  const index = (count: number) => {
    if (!(Number.isInteger(count) && count >= 1 && count <= WORDS))
      throw new DomainError('index-count-invalid', { count });
    const whole = WORDS - (WORDS % count);
    let word = nextWord();
    while (word >= whole) word = nextWord();
    return word % count;
  };

  return { uniform, normal, index };
}
