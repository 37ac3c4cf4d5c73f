import { seededRandom, type SeededRandom } from '@/journal/random/seeded-random';

interface GarchLaw {
  readonly deviation: number;
  readonly reaction: number;
  readonly persistence: number;
  readonly degrees: number | null;
}

/** A normal draw, or a Student draw of variance 1 with whole degrees above 2. */
function innovation(random: SeededRandom, degrees: number | null): number {
  const draw = random.normal();
  if (degrees === null) return draw;
  let square = 0;
  for (let index = 0; index < degrees; index += 1) square += random.normal() ** 2;
  return (draw / Math.sqrt(square / degrees)) * Math.sqrt((degrees - 2) / degrees);
}

/** Returns that follow GARCH(1,1) exactly, started at the long run. */
export function garchReturns(count: number, seed: number, law: GarchLaw): number[] {
  const random = seededRandom(seed);
  const longRun = law.deviation ** 2;
  let variance = longRun;
  return Array.from({ length: count }, () => {
    const value = Math.sqrt(variance) * innovation(random, law.degrees);
    variance =
      longRun * (1 - law.persistence) + law.reaction * value ** 2 + (law.persistence - law.reaction) * variance;
    return value;
  });
}

/** Series unlike one another, so that a method cannot be right by being made for one of them. */
export const inventedSeries: Readonly<Record<string, () => number[]>> = {
  'constant volatility': () => {
    const random = seededRandom(11);
    return Array.from({ length: 1500 }, () => 0.01 * random.normal());
  },
  'fat tails, constant volatility': () => {
    const random = seededRandom(12);
    return Array.from({ length: 1500 }, () => 0.01 * innovation(random, 4));
  },
  'GARCH of an index': () => garchReturns(1900, 13, { deviation: 0.01, reaction: 0.07, persistence: 0.98, degrees: 6 }),
  'quiet and slow, as a currency': () =>
    garchReturns(2000, 14, { deviation: 0.005, reaction: 0.04, persistence: 0.99, degrees: 7 }),
  'stochastic volatility': () => {
    const random = seededRandom(15);
    let level = 0;
    return Array.from({ length: 1800 }, () => {
      const value = 0.012 * Math.exp(level / 2) * random.normal();
      level = 0.97 * level + 0.2 * random.normal();
      return value;
    });
  },
  'two regimes': () => {
    const random = seededRandom(16);
    let isWild = false;
    return Array.from({ length: 1800 }, () => {
      if (random.uniform() < (isWild ? 0.02 : 0.006)) isWild = !isWild;
      return (isWild ? 0.022 : 0.008) * random.normal();
    });
  },
  'a share with quarterly jumps': () => {
    const random = seededRandom(17);
    const calm = garchReturns(1800, 18, { deviation: 0.018, reaction: 0.05, persistence: 0.98, degrees: 6 });
    return calm.map((value, index) => (index % 63 === 40 ? value + 0.055 * random.normal() : value));
  },
  'breaks of level': () => {
    const random = seededRandom(19);
    const levels = [0.008, 0.016, 0.006, 0.012, 0.02];
    return Array.from(
      { length: 2000 },
      (_, index) => (levels[Math.floor(index / 400)] ?? 0.01) * innovation(random, 8),
    );
  },
};
