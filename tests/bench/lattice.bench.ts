import blackScholesPackage from 'black-scholes';
import { latticeGrid, type LatticeQuestion } from '@/journal/scenarios/lattice';
import { compareSpeed } from '@/tests/bench/compare-speed';
import { reportSpeed } from '@/tests/bench/report-speed';

/** A condor of four legs over 41 moves of the underlying and 9 moments. */
const question: LatticeQuestion = {
  legs: [
    { type: 'put', strikePrice: 92, signedShares: 100, dailyVolatility: 0.016 },
    { type: 'put', strikePrice: 95, signedShares: -100, dailyVolatility: 0.0155 },
    { type: 'call', strikePrice: 105, signedShares: -100, dailyVolatility: 0.0145 },
    { type: 'call', strikePrice: 108, signedShares: 100, dailyVolatility: 0.015 },
  ],
  costToOpen: -60,
  spotPrice: 100,
  sigmas: Array.from({ length: 41 }, (_, row) => 4 - row / 5),
  holdDeviation: 0.015 * Math.sqrt(16),
  dailyVolatility: 0.015,
  sessionsElapsed: Array.from({ length: 9 }, (_, column) => 2 * column),
  sessionsToExpiry: 21,
  yearsToExpiry: 30 / 365,
  ratePerYear: 0.04,
  dividendYield: 0,
};
const sumOf = (grid: readonly (readonly number[])[]) =>
  grid.reduce((sum, row) => sum + row.reduce((rowSum, value) => rowSum + value, 0), 0);

/** The same profits by the package, one leg at a time. */
function profitsByPackage(): number {
  const { legs, sigmas, spotPrice, holdDeviation, sessionsElapsed, sessionsToExpiry, yearsToExpiry } = question;
  let sum = 0;
  for (const sigma of sigmas) {
    const price = spotPrice * Math.exp(sigma * holdDeviation);
    for (const elapsed of sessionsElapsed) {
      const share = 1 - elapsed / sessionsToExpiry;
      const years = yearsToExpiry * share;
      const rootOfSessionsPerYear = Math.sqrt((sessionsToExpiry * share) / years);
      for (const { type, strikePrice, signedShares, dailyVolatility } of legs) {
        const yearlyVolatility = dailyVolatility * rootOfSessionsPerYear;
        sum +=
          signedShares *
          blackScholesPackage.blackScholes(price, strikePrice, years, yearlyVolatility, question.ratePerYear, type);
      }
      sum -= question.costToOpen;
    }
  }
  return sum;
}

const difference = Math.abs(sumOf(latticeGrid(question).profit) - profitsByPackage());
if (!(difference < 1e-6)) throw new Error(`The lattice and the package differ by ${difference}.`);

const repeat = (once: () => number) => (count: number) => {
  let sum = 0;
  for (let done = 0; done < count; done += 1) sum += once();
  return sum;
};
const rows = compareSpeed({ name: 'black-scholes: profits alone', work: repeat(profitsByPackage) }, [
  {
    name: 'profits and likelihoods',
    work: repeat(() => {
      const { profit, likelihood } = latticeGrid(question);
      return sumOf(profit) + sumOf(likelihood);
    }),
  },
]);
reportSpeed({ title: 'Lattices of 41 × 9 and four legs a second', aim: 150, rows });
