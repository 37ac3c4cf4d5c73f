import { placeInOwnYear } from '@/journal/volatility/place-in-own-year';
import { type ListedUnderlying } from '@/shared/underlyings/underlying-endpoints';

const volatilityWindow = 21;

/** The volatility of the last 21 returns and its place in its own past year; null while there are too few closes. */
export function ownYearVolatility(closes: readonly number[]): ListedUnderlying['volatility'] {
  const place = placeInOwnYear(closes, volatilityWindow);
  if (place === null) return null;
  const { current, percentile, lowerQuartile, upperQuartile, lowest, highest } = place;
  return { dailyVolatility: current, percentile, lowerQuartile, upperQuartile, lowest, highest };
}
