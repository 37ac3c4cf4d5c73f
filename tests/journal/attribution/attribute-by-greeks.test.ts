import * as fc from 'fast-check';
import { attributeByGreeks } from '@/journal/attribution/attribute-by-greeks';
import { type AttributedLeg, type MarketState } from '@/journal/attribution/attributed-leg';
import { europeanOptionPrice } from '@/journal/pricing/european-option';
import { testDLeg, testDOptions } from '@/tests/journal/attribution/test-d-leg';

const seed = 20261201;
const refusal = (code: string) => expect.objectContaining({ code });

describe('attributeByGreeks', () => {
  it('tells test D as delta 433.60, gamma 121.61, theta -131.34, vega -58.37, residual -16.10 = 349.40', () => {
    // Worked outside this project.
    expect(attributeByGreeks([testDLeg], testDOptions)).toEqual({
      delta: '433.6',
      gamma: '121.61',
      theta: '-131.34',
      vega: '-58.37',
      carry: '0',
      residual: '-16.1',
      modelChange: '349.4',
    });
  });

  it('moves stock by delta 1 with no residual', () => {
    const stock: AttributedLeg = { ...testDLeg, instrument: { kind: 'stock' }, multiplier: '1' };
    expect(attributeByGreeks([stock], testDOptions)).toMatchObject({
      delta: '12.5',
      gamma: '0',
      theta: '0',
      vega: '0',
      residual: '0',
      modelChange: '12.5',
    });
  });

  it('has the slopes of the price: a small step of each factor leaves next to no residual (property)', () => {
    const state = fc.record({
      spotPrice: fc.double({ min: 80, max: 120, noNaN: true }),
      sessions: fc.double({ min: 2, max: 30, noNaN: true }),
      years: fc.double({ min: 0.01, max: 0.2, noNaN: true }),
      ratePerYear: fc.double({ min: -0.02, max: 0.08, noNaN: true }),
      dividendYield: fc.double({ min: 0, max: 0.05, noNaN: true }),
    });
    fc.assert(
      fc.property(state, fc.constantFrom('call' as const, 'put' as const), (from, type) => {
        const step = 1e-4;
        const to: MarketState = {
          spotPrice: from.spotPrice + step,
          sessions: from.sessions - step,
          years: from.years - step / 365,
          ratePerYear: from.ratePerYear + step,
          dividendYield: from.dividendYield + step,
        };
        const leg: AttributedLeg = {
          ...testDLeg,
          instrument: { kind: 'option', type, strikePrice: 100 },
          signedQuantity: '1000000',
          multiplier: '100',
          entry: { ...testDLeg.entry, state: from, dailyVolatility: 0.015 },
          exit: { ...testDLeg.exit, state: to, dailyVolatility: 0.015 + 1e-7 },
        };
        const { residual, modelChange } = attributeByGreeks([leg], testDOptions);
        const option = { type, strikePrice: 100 };
        const change =
          europeanOptionPrice({ ...option, ...to, dailyVolatility: 0.015 + 1e-7 }) -
          europeanOptionPrice({ ...option, ...from, dailyVolatility: 0.015 });
        // 1e8 shares: amounts in units of 1e-8 a share. Steps of 1e-4 leave second orders of about 1e-8 x curvature.
        expect(Math.abs(Number(modelChange) - 1e8 * change)).toBeLessThan(0.01);
        expect(Math.abs(Number(residual))).toBeLessThan(40);
      }),
      { seed, numRuns: 300 },
    );
  });

  it('has no theta at expiry itself', () => {
    const over = { ...testDLeg.entry.state, sessions: 0, years: 0 };
    const leg = { ...testDLeg, entry: { ...testDLeg.entry, state: over }, exit: { ...testDLeg.exit, state: over } };
    expect(attributeByGreeks([leg], testDOptions)).toMatchObject({ theta: '0', vega: '0', modelChange: '0' });
  });

  it('throws legs-missing without legs', () => {
    expect(() => attributeByGreeks([], testDOptions)).toThrow(refusal('legs-missing'));
  });
});
