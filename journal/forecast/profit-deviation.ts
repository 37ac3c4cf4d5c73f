import { type ProfitDistribution } from '@/journal/forecast/forecast';

/**
 * Standard deviation of a sealed profit distribution, from its lumps and classes: evenly spread inside a class; the half percent
 * beyond the first and beyond the last class counts at their edges, so that a profit without limit reads a little low.
 * @returns 0 or more, in the currency of the profit; 0 for a single lump.
 * @throws nothing.
 * @see Sheppard (1898) for the variance inside a class of even spread; common practice.
 */
export function profitDeviation({ lumps, classes }: Pick<ProfitDistribution, 'lumps' | 'classes'>): number {
  const parts = [
    ...lumps.map(({ profit, probability }) => ({ at: profit, probability, spread: 0 })),
    ...classes.map(({ from, to, probability }) => ({
      at: from / 2 + to / 2,
      probability,
      spread: (to - from) ** 2 / 12,
    })),
  ];
  const known = parts.reduce((sum, { probability }) => sum + probability, 0);
  const [first, last] = [classes[0], classes.at(-1)];
  if (first !== undefined && last !== undefined && known < 1) {
    const outer = (1 - known) / 2;
    parts.push({ at: first.from, probability: outer, spread: 0 }, { at: last.to, probability: outer, spread: 0 });
  }
  const total = parts.reduce((sum, { probability }) => sum + probability, 0);
  if (!(total > 0)) return 0;
  const mean = parts.reduce((sum, { at, probability }) => sum + at * probability, 0) / total;
  const square = parts.reduce((sum, { at, probability, spread }) => sum + probability * ((at - mean) ** 2 + spread), 0);
  return Math.sqrt(square / total);
}
