import { type SeededRandom } from '@/journal/random/seeded-random';

/** Numbers that formulas stumble over. */
const awkward = [
  0,
  -0,
  1,
  -1,
  0.5,
  2,
  Number.EPSILON,
  1 + Number.EPSILON,
  1 - Number.EPSILON / 2,
  1e-3,
  1e-9,
  1e-16,
  1e-160,
  1e-300,
  2.2250738585072014e-308,
  5e-324,
  -5e-324,
  1e9,
  2 ** 31,
  2 ** 53,
  1e150,
  1e300,
  Number.MAX_VALUE,
  -Number.MAX_VALUE,
  Infinity,
  -Infinity,
  NaN,
] as const;

/** Draws arguments: mostly plausible ones, so that a call comes far, now and then awkward ones. */
export interface Draw {
  /** Mostly within a range, else any double. */
  readonly number: (low: number, high: number) => number;
  readonly whole: (low: number, high: number) => number;
  readonly oneOf: <Item>(items: readonly Item[]) => Item;
  readonly list: <Item>(most: number, item: () => Item) => Item[];
  /** Typed text of a number. */
  readonly decimal: (low: number, high: number) => string;
  readonly sessionDate: () => string;
  readonly instant: () => string;
}

export function drawFrom(random: SeededRandom): Draw {
  const oneOf = <Item>(items: readonly Item[]): Item => {
    const item = items[random.index(items.length)];
    if (item === undefined) throw new Error('nothing to choose from');
    return item;
  };
  const within = (low: number, high: number) => low + (high - low) * random.uniform();
  const number = (low: number, high: number) => {
    const chance = random.uniform();
    if (chance < 0.75) return within(low, high);
    if (chance < 0.8) return oneOf([low, high]);
    if (chance < 0.85) return (random.uniform() < 0.5 ? -1 : 1) * 10 ** within(-308, 308);
    return oneOf(awkward);
  };
  const whole = (low: number, high: number) => {
    const chance = random.uniform();
    if (chance < 0.9) return low + random.index(high - low + 1);
    return chance < 0.95 ? number(low, high) : oneOf(awkward);
  };
  const millisecondsNear = () => Date.UTC(2026, 11, 1) + Math.round(within(-400, 400) * 86_400_000);
  return {
    number,
    whole,
    oneOf,
    list: (most, item) => Array.from({ length: random.index(most + 1) }, item),
    decimal: (low, high) =>
      random.uniform() < 0.85
        ? within(low, high).toFixed(random.index(4))
        : oneOf([
            '',
            '0',
            '-0',
            '-1',
            '1e5',
            'NaN',
            'Infinity',
            '0.000000000001',
            '999999999999.999999',
            ' 1',
            '1,5',
            '٣',
          ]),
    sessionDate: () =>
      random.uniform() < 0.9
        ? new Date(millisecondsNear()).toISOString().slice(0, 10)
        : oneOf(['', '2026-02-30', '1200-01-01', '9999-12-31', '2026-12-25', '26-1-1']),
    instant: () =>
      random.uniform() < 0.9
        ? new Date(millisecondsNear()).toISOString()
        : oneOf(['', '2026-12-09', '2026-12-09T25:00:00Z', '1200-01-01T00:00:00.000Z', '2026-12-18T20:59:59.999Z']),
  };
}
