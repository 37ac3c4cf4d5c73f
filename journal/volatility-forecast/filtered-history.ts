import { normalCumulative, normalDensity } from '@/journal/distributions/normal-distribution';
import { searchQuantile } from '@/journal/distributions/quantile-search';
import { DomainError } from '@/journal/errors/domain-error';
import { quantile } from '@/journal/returns/quantile';
import { type ForecastDensity } from '@/journal/volatility-forecast/forecast-density';

/** The past is thinned to so many quantiles, so that the law stays small and quick. */
const ATOMS = 199;

/**
 * Law of the summed return of a horizon in the shape of the past: past sums over their own forecast deviations, times the deviation of
 * today, smoothed by a normal kernel.
 * @param question.sums running sums of the log returns, one more than there are returns. @param question.totalVariance of the horizon
 *   as known after so many returns, above 0 from `from` on. @param question.sessions whole number from 1. @param question.from first
 *   past forecast to use.
 * @throws {DomainError} `too-few-returns` where fewer than 21 past sums are there.
 * @see Barone-Adesi, Giannopoulos and Vosper (1999), J. of Futures Markets 19, 583-602, here with whole past sums in place of drawn
 *   sessions, so that nothing is drawn; bandwidth: Silverman (1986), Density Estimation, eq. 3.31, for sums that do not overlap.
 */
export function filteredHistory(question: {
  readonly sums: readonly number[];
  readonly totalVariance: (knownReturns: number) => number;
  readonly sessions: number;
  readonly from: number;
}): ForecastDensity {
  const { sums, totalVariance, sessions, from } = question;
  const now = sums.length - 1;
  const filtered: number[] = [];
  for (let at = from; at + sessions <= now; at += 1) {
    filtered.push(((sums[at + sessions] ?? 0) - (sums[at] ?? 0)) / Math.sqrt(totalVariance(at)));
  }
  if (filtered.length < 21) throw new DomainError('too-few-returns', { required: from + sessions + 20, received: now });
  filtered.sort((left, right) => left - right);
  const deviation = Math.sqrt(totalVariance(now));
  const atoms = Array.from(
    { length: ATOMS },
    (_, index) => deviation * (filtered[Math.floor(((index + 0.5) / ATOMS) * filtered.length)] ?? 0),
  );
  const mean = atoms.reduce((sum, value) => sum + value / ATOMS, 0);
  const spread = Math.sqrt(atoms.reduce((sum, value) => sum + (value - mean) ** 2 / ATOMS, 0));
  const middle = (quantile(atoms, 0.75) - quantile(atoms, 0.25)) / 1.34;
  const width = 0.9 * (middle > 0 ? Math.min(spread, middle) : spread) * (filtered.length / sessions) ** -0.2;
  // Atoms that are all alike (a history without moves) are smoothed by a thousandth of the forecast.
  return kernelForecast(atoms, Math.max(width, deviation / 1000));
}

/**
 * An equal mixture of normal laws of one width.
 * @see CRPS: Grimit, Gneiting, Berrocal and Johnson (2006), Quarterly J. of the Royal Meteorological Society 132, 2925-2942, eq. 5.
 */
function kernelForecast(atoms: readonly number[], width: number): ForecastDensity {
  const meanOf = (valueOf: (atom: number) => number) =>
    atoms.reduce((sum, atom) => sum + valueOf(atom), 0) / atoms.length;
  const location = meanOf((atom) => atom);
  const deviation = Math.sqrt(meanOf((atom) => (atom - location) ** 2) + width ** 2);
  const distance = (gap: number, scale: number) =>
    2 * scale * normalDensity(gap / scale) + gap * (2 * normalCumulative(gap / scale) - 1);
  let ownDistance: number | null = null;
  const cdf = (x: number) => meanOf((atom) => normalCumulative((x - atom) / width));
  const densityAt = (x: number) => meanOf((atom) => normalDensity((x - atom) / width)) / width;
  return {
    kind: 'kernel',
    location,
    scale: deviation,
    degreesOfFreedom: null,
    deviation,
    quantile: (probability) =>
      searchQuantile({
        probability,
        cumulative: cdf,
        density: densityAt,
        start: location,
        least: Math.min(...atoms) - 40 * width,
        most: Math.max(...atoms) + 40 * width,
      }),
    cdf,
    logDensity: (x) => {
      // Relative to the nearest atom, so that the far tails keep a finite score.
      const nearest = atoms.reduce((least, atom) => Math.min(least, Math.abs(x - atom)), Infinity) / width;
      const rest = meanOf((atom) => Math.exp((nearest ** 2 - ((x - atom) / width) ** 2) / 2));
      return Math.log(rest / (width * Math.sqrt(2 * Math.PI))) - nearest ** 2 / 2;
    },
    crps: (observed) => {
      if (!Number.isFinite(observed)) throw new DomainError('value-invalid', { value: observed });
      ownDistance ??= meanOf((first) => meanOf((second) => distance(first - second, width * Math.SQRT2)));
      return meanOf((atom) => distance(observed - atom, width)) - ownDistance / 2;
    },
  };
}
