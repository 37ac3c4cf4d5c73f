/** A source of numbers that gives the same ones for the same seed. */
export interface Random {
  /** Uniform in [0, 1). */
  readonly next: () => number;
  /** Standard normal. */
  readonly normal: () => number;
  /** Whole number from `least` through `most`. */
  readonly whole: (least: number, most: number) => number;
  readonly pick: <T>(items: readonly T[]) => T;
}

/** @see mulberry32, a public-domain generator of 32 bits; normal numbers by Box and Muller (1958). */
export function seededRandom(seed: number): Random {
  let state = seed >>> 0;
  const next = () => {
    state = (state + 0x6d2b79f5) >>> 0;
    let mixed = Math.imul(state ^ (state >>> 15), state | 1);
    mixed ^= mixed + Math.imul(mixed ^ (mixed >>> 7), mixed | 61);
    return ((mixed ^ (mixed >>> 14)) >>> 0) / 4_294_967_296;
  };
  const whole = (least: number, most: number) => least + Math.floor(next() * (most - least + 1));
  return {
    next,
    normal: () => Math.sqrt(-2 * Math.log(1 - next())) * Math.cos(2 * Math.PI * next()),
    whole,
    pick: (items) => {
      const item = items[whole(0, items.length - 1)];
      if (item === undefined) throw new RangeError('Nothing to pick from.');
      return item;
    },
  };
}
