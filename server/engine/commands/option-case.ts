import { z } from 'zod';
import { DomainError } from '@/journal/errors/domain-error';
import { type EuropeanOption } from '@/journal/pricing/european-option';
import { escrowedSpot } from '@/journal/pricing/escrowed-spot';

/** What the cases of `price` and `implied` share. */
export const optionCaseFields = {
  type: z.enum(['call', 'put']),
  style: z.enum(['european', 'american']).default('european'),
  spot: z.number(),
  strike: z.number(),
  sessions: z.number(),
  years: z.number(),
  ratePerYear: z.number(),
  dividendYield: z.number().default(0),
  dividends: z.array(z.strictObject({ years: z.number(), amount: z.number() })).default([]),
};

type OptionCase = z.output<z.ZodObject<typeof optionCaseFields>>;

/**
 * The option a case is about, all but its volatility; dividends are taken off the spot.
 * @throws {DomainError} `style-not-supported`, and as escrowedSpot.
 */
export function optionOfCase(one: OptionCase): Omit<EuropeanOption, 'dailyVolatility'> {
  if (one.style !== 'european') throw new DomainError('style-not-supported', { style: one.style });
  const { type, spot, strike, sessions, years, ratePerYear, dividendYield, dividends } = one;
  return {
    type,
    spotPrice: escrowedSpot({ spotPrice: spot, dividends, years, ratePerYear }),
    strikePrice: strike,
    sessions,
    years,
    ratePerYear,
    dividendYield,
  };
}
