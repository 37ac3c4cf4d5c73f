import fc from 'fast-check';
import { europeanOptionPrice, europeanOptionValue } from '@/journal/pricing/european-option';
import { impliedDailyVolatility } from '@/journal/pricing/implied-daily-volatility';
import { impliedQuote, type QuoteQuestion } from '@/journal/pricing/implied-quote';
import { randomOption } from '@/tests/journal/pricing/random-option';

fc.configureGlobal({ seed: 20261201 });

const quote: QuoteQuestion = {
  type: 'call',
  bidPrice: 1.15,
  askPrice: 1.25,
  tickSize: 0.05,
  spotPrice: 100,
  strikePrice: 102,
  sessions: 10,
  years: 14 / 365,
  ratePerYear: 0.04,
  dividendYield: 0,
};

describe('implied volatility of a quote', () => {
  it.each([
    { sessions: 1, annualPoints: 2 },
    { sessions: 0.1, annualPoints: 6.3 },
  ])('moves by $annualPoints annual points a tick of 0.05 at the money with $sessions sessions left', (row) => {
    const { sessions, annualPoints } = row;
    const atTheMoney = { ...quote, strikePrice: 100, sessions, years: 0, ratePerYear: 0 };
    const price = europeanOptionPrice({ ...atTheMoney, dailyVolatility: 0.015 });
    const { perTick } = impliedQuote({ ...atTheMoney, bidPrice: price - 0.05, askPrice: price + 0.05 });
    expect(perTick?.annualPoints).toBeCloseTo(annualPoints, 1);
    expect(perTick?.dailyPoints).toBeCloseTo(annualPoints / Math.sqrt(252), 2);
  });

  it('has the volatilities of bid, mean and ask', () => {
    const { bid, mid, ask } = impliedQuote(quote);
    expect(bid).toEqual(impliedDailyVolatility({ ...quote, price: 1.15 }));
    expect(mid).toEqual(impliedDailyVolatility({ ...quote, price: 1.2 }));
    expect(ask).toEqual(impliedDailyVolatility({ ...quote, price: 1.25 }));
  });

  it('counts a year in the sessions it is told', () => {
    const { perTick } = impliedQuote(quote, 256);
    expect(perTick?.annualPoints).toBeCloseTo(16 * (perTick?.dailyPoints ?? NaN), 12);
  });

  it('moves by a tick over vega where ticks are small', () => {
    fc.assert(
      fc.property(randomOption, (option) => {
        const { price, vegaPerDailyPoint } = europeanOptionValue(option);
        const tickSize = 1e-5 * vegaPerDailyPoint;
        // Within three deviations or so; further out or in the money the rounding of the price outweighs such a tick.
        fc.pre(vegaPerDailyPoint > 1e-3 * 0.4 * option.spotPrice * Math.sqrt(option.sessions) * 0.01);
        const { perTick } = impliedQuote({ ...option, bidPrice: price, askPrice: price, tickSize });
        expect(Math.abs((perTick?.dailyPoints ?? NaN) - 1e-5)).toBeLessThanOrEqual(1e-7);
      }),
    );
  });

  it('has a volatility of the ask alone where nobody bids', () => {
    const { bid, mid, ask } = impliedQuote({ ...quote, bidPrice: 0, askPrice: 0.05 });
    expect(bid).toEqual({ kind: 'none', bound: 'no-time-value', limit: 0 });
    expect([mid.kind, ask.kind]).toEqual(['found', 'found']);
  });

  it('names the bound for each side that has none, and has no step where the mid has none', () => {
    const deep = { ...quote, spotPrice: 110, ratePerYear: 0, bidPrice: 7.9, askPrice: 8 };
    expect(impliedQuote(deep)).toEqual({
      bid: { kind: 'none', bound: 'below-intrinsic', limit: 8 },
      mid: { kind: 'none', bound: 'below-intrinsic', limit: 8 },
      ask: { kind: 'none', bound: 'no-time-value', limit: 8 },
      perTick: null,
    });
    expect(impliedQuote({ ...quote, bidPrice: 1, askPrice: 200 }).ask).toEqual({
      kind: 'none',
      bound: 'above-maximum',
      limit: 100,
    });
    expect(impliedQuote({ ...quote, sessions: 0 }).bid).toEqual({ kind: 'none', bound: 'no-time-left', limit: 0 });
  });

  it('takes the half above twice where half a tick below the mid there is no volatility', () => {
    const cheap = { ...quote, bidPrice: 0.01, askPrice: 0.03 };
    const volatilityAt = (price: number) => {
      const answer = impliedDailyVolatility({ ...quote, price });
      return answer.kind === 'found' ? answer.dailyVolatility : NaN;
    };
    const { perTick } = impliedQuote(cheap);
    expect(perTick?.dailyPoints).toBeCloseTo(200 * (volatilityAt(0.045) - volatilityAt(0.02)), 12);
  });

  it('throws quote-crossed when the bid is above the ask', () => {
    expect(() => impliedQuote({ ...quote, bidPrice: 1.3 })).toThrow(
      expect.objectContaining({ code: 'quote-crossed', details: { bidPrice: 1.3, askPrice: 1.25 } }),
    );
  });

  it.each([
    ['bidPrice', -0.01],
    ['bidPrice', NaN],
    ['askPrice', Infinity],
    ['askPrice', NaN],
    ['tickSize', 0],
    ['tickSize', Infinity],
  ] as const)('throws quote-invalid for a %s of %p', (field, value) => {
    expect(() => impliedQuote({ ...quote, [field]: value })).toThrow(
      expect.objectContaining({ code: 'quote-invalid', details: expect.objectContaining({ [field]: value }) }),
    );
  });

  it('throws quote-invalid for a year without sessions, and option-input-invalid as the solution does', () => {
    expect(() => impliedQuote(quote, 0)).toThrow(expect.objectContaining({ code: 'quote-invalid' }));
    expect(() => impliedQuote({ ...quote, spotPrice: 0 })).toThrow(
      expect.objectContaining({ code: 'option-input-invalid' }),
    );
  });
});
