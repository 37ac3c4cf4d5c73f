import { europeanOptionPrice } from '@/journal/pricing/european-option';
import { latticeGrid, type LatticeQuestion } from '@/journal/scenarios/lattice';

const question: LatticeQuestion = {
  legs: [
    { type: 'put', strikePrice: 97, signedShares: -300, dailyVolatility: 0.0208 },
    { type: 'put', strikePrice: 95, signedShares: 300, dailyVolatility: 0.0209 },
  ],
  costToOpen: -161.1,
  spotPrice: 100,
  sigmas: [2, 1, 0, -1, -2],
  holdDeviation: 0.015 * Math.sqrt(10),
  dailyVolatility: 0.015,
  sessionsElapsed: [0, 2, 7, 10],
  sessionsToExpiry: 10,
  yearsToExpiry: 14 / 365,
  ratePerYear: 0.04,
  dividendYield: 0.01,
};

describe('latticeGrid', () => {
  it('equals the option prices cell by cell, less the cost', () => {
    const { prices, profit } = latticeGrid(question);
    for (const [row, spotPrice] of prices.entries()) {
      for (const [column, elapsed] of question.sessionsElapsed.entries()) {
        const left = 1 - elapsed / question.sessionsToExpiry;
        const value = question.legs.reduce(
          (sum, { type, strikePrice, signedShares, dailyVolatility }) =>
            sum +
            signedShares *
              europeanOptionPrice({
                type,
                strikePrice,
                dailyVolatility,
                spotPrice,
                sessions: 10 * left,
                years: question.yearsToExpiry * left,
                ratePerYear: 0.04,
                dividendYield: 0.01,
              }),
          0,
        );
        expect(profit[row]?.[column]).toBeCloseTo(value + 161.1, 9);
      }
    }
  });

  it('moves by whole deviations of the hold', () => {
    expect(latticeGrid(question).prices[1]).toBeCloseTo(100 * Math.exp(0.015 * Math.sqrt(10)), 12);
  });

  it('spreads a likelihood that sums to 1 in each column, wider as time goes on', () => {
    const { likelihood } = latticeGrid(question);
    for (const column of question.sessionsElapsed.keys())
      expect(likelihood.reduce((sum, row) => sum + (row[column] ?? 0), 0)).toBeCloseTo(1, 12);
    expect(likelihood[2]?.[0]).toBe(1);
    expect(likelihood[2]?.[1] ?? 0).toBeGreaterThan(likelihood[2]?.[3] ?? 1);
  });
});
