import fc from 'fast-check';
import { type EuropeanOption } from '@/journal/pricing/european-option';

/** Options within 45 sessions at strikes within four deviations of the spot, the volatility from calm to wild. */
export const randomOption: fc.Arbitrary<EuropeanOption> = fc
  .record({
    type: fc.constantFrom('call', 'put'),
    spotPrice: fc.double({ min: 0.5, max: 5000, noNaN: true }),
    deviations: fc.double({ min: -4, max: 4, noNaN: true }),
    dailyVolatility: fc.double({ min: 0.001, max: 0.12, noNaN: true }),
    sessions: fc.double({ min: 0.02, max: 45, noNaN: true }),
    ratePerYear: fc.double({ min: -0.02, max: 0.15, noNaN: true }),
    dividendYield: fc.double({ min: 0, max: 0.1, noNaN: true }),
  })
  .map(({ deviations, ...option }) => ({
    ...option,
    strikePrice: option.spotPrice * Math.exp(deviations * option.dailyVolatility * Math.sqrt(option.sessions)),
    years: option.sessions / 252,
  }));
