import { type AttributedLeg } from '@/journal/attribution/attributed-leg';

/** Five 102 calls, 100 to 102.50, 10 sessions left to 7, 1.5 to 1.4 %; middle prices 1.08 and 1.77, fills 1.10 and 1.75, fees 6.65. */
export const testDLeg: AttributedLeg = {
  legId: 'call',
  instrument: { kind: 'option', type: 'call', strikePrice: 102 },
  signedQuantity: '5',
  multiplier: '100',
  entry: {
    state: { spotPrice: 100, sessions: 10, years: 14 / 365, ratePerYear: 0, dividendYield: 0 },
    fillPrice: '1.10',
    midPrice: '1.08',
    fees: '3.33',
    dailyVolatility: 0.015,
  },
  exit: {
    state: { spotPrice: 102.5, sessions: 7, years: 9 / 365, ratePerYear: 0, dividendYield: 0 },
    fillPrice: '1.75',
    midPrice: '1.77',
    fees: '3.32',
    dailyVolatility: 0.014,
  },
};
export const testDOptions = { fallbackDailyVolatility: 0.015 };
