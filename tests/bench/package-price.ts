import blackScholesPackage from 'black-scholes';
import { type EuropeanOption } from '@/journal/pricing/european-option';

/** The price by the package, which knows one clock: the volatility per calendar year that gives the same total deviation. */
export function priceByPackage(option: EuropeanOption): number {
  return blackScholesPackage.blackScholes(
    option.spotPrice,
    option.strikePrice,
    option.years,
    option.dailyVolatility * Math.sqrt(option.sessions / option.years),
    option.ratePerYear,
    option.type,
  );
}
