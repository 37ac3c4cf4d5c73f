import { type LowBaseHigh, type ProfitClass, type ProfitDistribution } from '@/journal/forecast/forecast';
import { type ProfitLaw } from '@/journal/forecast/profit-law';

const SHORTFALL = 0.05;
const CLASSES = 12;
const OUTER = 0.005;

/** The figures of a profit distribution that are shown and sealed, from its laws under low, base and high volatility. */
export function describeDistribution(
  horizon: ProfitDistribution['horizon'],
  laws: { readonly low: ProfitLaw; readonly base: ProfitLaw; readonly high: ProfitLaw },
): ProfitDistribution {
  const over = (figure: (law: ProfitLaw) => number): LowBaseHigh => ({
    low: figure(laws.low),
    base: figure(laws.base),
    high: figure(laws.high),
  });
  return {
    horizon,
    mean: over((law) => law.mean),
    oddsOfProfit: over(oddsOfProfit),
    expectedShortfall: laws.base.expectedShortfall(SHORTFALL),
    percentiles: [5, 25, 50, 75, 95].map((percent) => ({ percent, profit: laws.base.quantile(percent / 100) })),
    lumps: laws.base.lumps,
    classes: classesOf(laws.base),
  };
}

/** P(profit > 0); a profit of exactly 0 is none. */
export function oddsOfProfit(law: ProfitLaw): number {
  return Math.min(1, Math.max(0, 1 - law.atOrBelow(0)));
}

/** The continuous part cut into classes of one width, 0 being an edge where it lies inside. */
function classesOf(law: ProfitLaw): ProfitClass[] {
  const lumped = law.lumps.reduce((sum, lump) => sum + lump.probability, 0);
  if (lumped > 1 - 1e-9) return [];
  const low = law.quantile(OUTER);
  const high = law.quantile(1 - OUTER);
  const width = (high - low) / CLASSES;
  if (!(width > 0)) return [];
  const classes: ProfitClass[] = [];
  for (let edge = Math.floor(low / width + 1e-9); edge * width < high - width * 1e-6; edge += 1) {
    const from = edge * width;
    const to = from + width;
    const inLumps = law.lumps.reduce(
      (sum, lump) => sum + (lump.profit > from && lump.profit <= to ? lump.probability : 0),
      0,
    );
    const probability = law.atOrBelow(to) - law.atOrBelow(from) - inLumps;
    classes.push({ from: Math.max(from, low), to: Math.min(to, high), probability: Math.max(0, probability) });
  }
  return classes;
}
