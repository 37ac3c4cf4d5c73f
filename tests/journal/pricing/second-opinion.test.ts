import fc from 'fast-check';
import { europeanOptionPrice } from '@/journal/pricing/european-option';
import { secondOpinion } from '@/journal/pricing/second-opinion';
import { randomOption } from '@/tests/journal/pricing/random-option';

fc.configureGlobal({ seed: 20261201 });

const call = {
  type: 'call',
  spotPrice: 100,
  strikePrice: 102,
  dailyVolatility: 0.015,
  sessions: 10,
  years: 14 / 365,
  ratePerYear: 0.04,
  dividendYield: 0.02,
} as const;

describe('second opinion', () => {
  it('agrees within 2e-12 of spot and strike on random options within 45 sessions', () => {
    fc.assert(
      fc.property(randomOption, (option) => {
        const { difference, agrees } = secondOpinion(option);
        expect(agrees).toBe(true);
        expect(Math.abs(difference)).toBeLessThanOrEqual(2e-12 * Math.max(option.spotPrice, option.strikePrice));
      }),
      { numRuns: 2000 },
    );
  });

  it('computes its own price: it loses the tail that the engine keeps', () => {
    const far = { ...call, strikePrice: 160 };
    expect(europeanOptionPrice(far)).toBeGreaterThan(0);
    expect(europeanOptionPrice(far)).toBeLessThan(1e-20);
    const { price, difference, agrees } = secondOpinion(far);
    expect(difference).toBe(price - europeanOptionPrice(far));
    expect(Math.abs(price)).not.toBe(europeanOptionPrice(far));
    expect(agrees).toBe(true);
  });

  it.each([
    { why: 'no session is left', change: { sessions: 0 } },
    { why: 'the volatility is 0', change: { dailyVolatility: 0 } },
    { why: 'only variance is left, no calendar time', change: { years: 0 } },
  ])('agrees where $why', ({ change }) => {
    expect(secondOpinion({ ...call, ...change }).agrees).toBe(true);
  });

  it('throws second-opinion-missing where the other has no number', () => {
    expect(() => secondOpinion({ ...call, years: 1e160, ratePerYear: -0.0018 })).toThrow(
      expect.objectContaining({ code: 'second-opinion-missing' }),
    );
  });

  it('throws option-input-invalid as the engine does', () => {
    expect(() => secondOpinion({ ...call, spotPrice: NaN })).toThrow(
      expect.objectContaining({ code: 'option-input-invalid' }),
    );
  });
});
