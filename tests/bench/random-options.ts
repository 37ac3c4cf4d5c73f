import { type EuropeanOption } from '@/journal/pricing/european-option';

/** The same options in every run: within 45 sessions, strikes within three deviations (linear congruential numbers). */
export function randomOptions(count: number): EuropeanOption[] {
  let state = 20261201;
  const uniform = () => {
    state = (Math.imul(state, 1664525) + 1013904223) >>> 0;
    return state / 2 ** 32;
  };
  return Array.from({ length: count }, (_, index) => {
    const dailyVolatility = 0.005 + 0.045 * uniform();
    const sessions = 0.1 + 44.9 * uniform();
    const spotPrice = 20 + 480 * uniform();
    return {
      type: index % 2 === 0 ? 'call' : 'put',
      spotPrice,
      strikePrice: spotPrice * Math.exp((6 * uniform() - 3) * dailyVolatility * Math.sqrt(sessions)),
      dailyVolatility,
      sessions,
      years: sessions / 252,
      ratePerYear: 0.05 * uniform(),
      dividendYield: 0,
    };
  });
}
