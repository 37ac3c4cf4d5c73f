import * as fc from 'fast-check';
import { realisedVolatility, volatilityRatioRange } from '@/journal/outcome/realised-volatility';

const seed = 20261201;
const fullSessions = (percents: readonly number[]) =>
  percents.map((percent) => ({ logReturn: percent / 100, sessions: 1 }));

describe('realisedVolatility', () => {
  it('is 1.432 % for five returns, 0.955 of an estimate of 1.5 %', () => {
    const { dailyVolatility, sessions } = realisedVolatility(fullSessions([0.8, -1.6, 2.4, 0.3, -1.1]));
    expect(dailyVolatility).toBeCloseTo(0.01432, 5);
    expect(dailyVolatility / 0.015).toBeCloseTo(0.955, 3);
    expect(sessions).toBe(5);
  });

  it('spreads a return over the part of a session it covers', () => {
    const { dailyVolatility, sessions } = realisedVolatility([
      { logReturn: 0.01, sessions: 0.25 },
      { logReturn: 0, sessions: 0.75 },
    ]);
    expect([dailyVolatility, sessions]).toEqual([0.01, 1]);
  });

  it('is 0 when no price moved', () => {
    expect(realisedVolatility(fullSessions([0, 0]))).toMatchObject({ dailyVolatility: 0, low: 0, high: 0 });
  });

  it('has the chi-square interval of its number of returns, none taken off for a mean', () => {
    // Chi-square with 5 degrees of freedom: 0.831212 at 2.5 % and 12.832502 at 97.5 %, any table.
    const { low, high, degreesOfFreedom, confidence } = realisedVolatility(fullSessions([0.8, -1.6, 2.4, 0.3, -1.1]));
    expect([degreesOfFreedom, confidence]).toEqual([5, 0.95]);
    expect(low).toBeCloseTo(0.0143248 * Math.sqrt(5 / 12.832502), 6);
    expect(high).toBeCloseTo(0.0143248 * Math.sqrt(5 / 0.831212), 6);
  });

  it('counts fewer degrees of freedom than returns when they cover unequal times', () => {
    const returns = [1, 1, 0.3].map((sessions) => ({ logReturn: 0.01, sessions }));
    expect(realisedVolatility(returns).degreesOfFreedom).toBeCloseTo(2.3 ** 2 / 2.09, 12);
  });

  it('grows with the size of the returns and not with their sign (property)', () => {
    const percents = fc.array(fc.double({ min: -20, max: 20, noNaN: true }), { minLength: 1, maxLength: 30 });
    fc.assert(
      fc.property(percents, fc.double({ min: 0.1, max: 10, noNaN: true }), (values, factor) => {
        const plain = realisedVolatility(fullSessions(values)).dailyVolatility;
        const scaled = realisedVolatility(fullSessions(values.map((value) => -value * factor))).dailyVolatility;
        expect(Math.abs(scaled - plain * factor)).toBeLessThanOrEqual(1e-14 * factor);
      }),
      { seed, numRuns: 200 },
    );
  });

  it('refuses no returns', () => {
    expect(() => realisedVolatility([])).toThrow(expect.objectContaining({ code: 'returns-missing' }));
  });

  it.each([
    { logReturn: NaN, sessions: 1 },
    { logReturn: Infinity, sessions: 1 },
    { logReturn: 0.01, sessions: 0 },
    { logReturn: 0.01, sessions: NaN },
  ])('refuses %p and names its index', (bad) => {
    expect(() => realisedVolatility([{ logReturn: 0, sessions: 1 }, bad])).toThrow(
      expect.objectContaining({ code: 'return-invalid', details: expect.objectContaining({ index: 1 }) }),
    );
  });
});

describe('volatilityRatioRange', () => {
  it.each([
    [1, 0.03, 2.43],
    [5, 0.4, 1.83],
    [10, 0.54, 1.68],
    [20, 0.64, 1.58],
  ])('after %d returns against an estimate from 20 runs from %d to %d', (returnsRealised, low, high) => {
    const range = volatilityRatioRange({ returnsRealised, degreesOfFreedom: 19 });
    // The published figures have two decimals; 0.635 of 20 returns is printed as 0.64.
    expect(Math.abs(range.low - low)).toBeLessThanOrEqual(0.0055);
    expect(Math.abs(range.high - high)).toBeLessThanOrEqual(0.0055);
  });

  it('narrows as the hold grows, and is wider at a higher confidence', () => {
    const width = (returnsRealised: number, confidence?: number) => {
      const { low, high } = volatilityRatioRange({ returnsRealised, degreesOfFreedom: 19, confidence });
      return high - low;
    };
    expect(width(10)).toBeLessThan(width(5));
    expect(width(5, 0.99)).toBeGreaterThan(width(5));
  });

  it.each([0, 1, NaN])('refuses a confidence of %p', (confidence) => {
    expect(() => volatilityRatioRange({ returnsRealised: 5, degreesOfFreedom: 19, confidence })).toThrow(
      expect.objectContaining({ code: 'confidence-invalid' }),
    );
  });

  it('refuses an estimate without degrees of freedom', () => {
    expect(() => volatilityRatioRange({ returnsRealised: 5, degreesOfFreedom: 0 })).toThrow(
      expect.objectContaining({ code: 'variance-ratio-invalid' }),
    );
  });
});
