import { z } from 'zod';
import { type AmericanOption } from '@/journal/pricing/american-option';
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
  /** How cash dividends move the price; of a European option always 'escrowed', which has a closed form. */
  dividendModel: z.enum(['spot', 'escrowed']).optional(),
};

type OptionCase = z.output<z.ZodObject<typeof optionCaseFields>>;

/** The option a case is about, all but its volatility; of a European one dividends are taken off the spot. @throws as escrowedSpot. */
export function optionOfCase(one: OptionCase): Omit<AmericanOption, 'dailyVolatility'> {
  const { type, style, spot, strike, sessions, years, ratePerYear, dividendYield, dividends } = one;
  const isEuropean = style === 'european';
  return {
    type,
    spotPrice: isEuropean ? escrowedSpot({ spotPrice: spot, dividends, years, ratePerYear }) : spot,
    strikePrice: strike,
    sessions,
    years,
    ratePerYear,
    dividendYield,
    ...(isEuropean ? {} : { dividends, dividendModel: one.dividendModel ?? 'spot' }),
  };
}
