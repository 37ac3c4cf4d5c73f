import { type EuropeanOption } from '@/journal/pricing/european-option';

/** The worked example: ten sessions and fourteen days to expiry, the strike a little above the spot. */
export const plannedCall: EuropeanOption = {
  type: 'call',
  spotPrice: 100,
  strikePrice: 102,
  dailyVolatility: 0.015,
  sessions: 10,
  years: 14 / 365,
  ratePerYear: 0.04,
  dividendYield: 0,
};
