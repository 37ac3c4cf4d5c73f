import { bootstrapInterval, type BootstrapOptions } from '@/journal/random/bootstrap-interval';
import { closeDailyVolatility } from '@/journal/volatility/close-daily-volatility';

/**
 * Interval of a volatility by drawing its returns anew, whatever their law; they are taken as independent, so that clusters of large
 * returns make the true interval wider.
 * @param returns log returns of a magnitude up to 1e308, at least 2.
 * @param options.mean as for closeDailyVolatility; the rest as for bootstrapInterval.
 * @throws {DomainError} `too-few-values`, `value-invalid`, `resamples-invalid`, `confidence-out-of-range`, `seed-invalid`.
 * @see Efron (1979), Annals of Statistics 7(1), 1-26; Efron (1987), J. American Statistical Association 82, 171-185.
 */
export function bootstrapVolatilityInterval(
  returns: readonly number[],
  { mean, ...options }: BootstrapOptions & { readonly mean: 'sample' | 'zero' },
): { low: number; high: number } {
  // One draw fewer by the jackknife leaves one return of two, whose deviation about its own mean is 0.
  const deviation = (sample: readonly number[]) =>
    sample.length < 2 && mean === 'sample' ? 0 : closeDailyVolatility(sample, { mean });
  return bootstrapInterval(returns, deviation, options);
}
