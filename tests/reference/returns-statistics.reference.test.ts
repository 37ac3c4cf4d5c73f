import { logReturns } from '@/journal/returns/log-returns';
import { kurtosisTypes, skewnessTypes } from '@/journal/returns/moment-types';
import { quantile } from '@/journal/returns/quantile';
import { sampleStatistics } from '@/journal/returns/sample-statistics';
import reference from '@/tests/reference/data/returns_stats.json';
import { indexCloses } from '@/tests/reference/index-closes';
import { casesOf, expectWithin, numberOf, type ReferenceCase } from '@/tests/reference/reference-file';

function nistData(one: ReferenceCase): number[] {
  if (Array.isArray(one.data)) return one.data.map(Number);
  // NumAcc3 by the rule the file states.
  return [1_000_000.2, ...Array.from({ length: 500 }, () => [1_000_000.1, 1_000_000.3]).flat()];
}

function entriesOf(one: ReferenceCase, field: string): [string, number][] {
  const value = one[field];
  if (typeof value !== 'object' || value === null) throw new Error(`${one.id} has no ${field}`);
  return Object.entries(value).map(([key, number]) => [key, Number(number)]);
}

describe('sample statistics against NIST StRD', () => {
  it.each(casesOf(reference, 'nist-strd'))('has the certified values of $dataset', (one) => {
    const statistics = sampleStatistics(nistData(one));
    const ours = {
      mean: statistics.mean,
      sd: statistics.standardDeviation,
      autocorr_lag1: statistics.lagOneAutocorrelation,
    };
    for (const [field, tolerance] of entriesOf(one, 'tol_rel')) {
      const expected = numberOf(one, field);
      // The certified digits are rounded to the last place of a double, so half a unit there is allowed on top.
      expectWithin(
        Number(Object.entries(ours).find(([key]) => key === field)?.[1]),
        expected,
        (tolerance + 2.3e-16) * Math.abs(expected),
      );
    }
  });
});

describe('sample statistics against R on index returns', () => {
  it.each(casesOf(reference, 'eustockmarkets-moments'))('has the moments of $series, $n returns', (one) => {
    const closes = indexCloses(String(one.series));
    const returns = logReturns(closes).slice(numberOf(one, 'first_return') - 1, numberOf(one, 'last_return'));
    const statistics = sampleStatistics(returns);
    const skewness = skewnessTypes(statistics.skewness, returns.length);
    const kurtosis = kurtosisTypes(statistics.excessKurtosis, returns.length);
    const check = (actual: number, field: string, relative: number) =>
      expectWithin(actual, numberOf(one, field), Math.max(1e-13, relative * Math.abs(numberOf(one, field))));
    check(statistics.mean, 'mean', 1e-10);
    check(statistics.standardDeviation, 'sd', 1e-10);
    check(statistics.rootMeanSquare, 'rms', 1e-10);
    check(statistics.lagOneAutocorrelation, 'autocorr_lag1', 1e-10);
    check(skewness.type1, 'skewness_g1', 1e-9);
    check(skewness.type2, 'skewness_G1', 1e-9);
    check(skewness.type3, 'skewness_b1', 1e-9);
    check(kurtosis.type1, 'excess_kurtosis_g2', 1e-9);
    check(kurtosis.type2, 'excess_kurtosis_G2', 1e-9);
    check(kurtosis.type3, 'excess_kurtosis_b2', 1e-9);
    check(statistics.jarqueBera, 'jarque_bera', 1e-9);
    // Where R's own probability underflows, so does ours.
    const probability = 10 ** numberOf(one, 'jarque_bera_log10_p');
    expectWithin(statistics.jarqueBeraPValue, probability, 1e-8 * probability);
  });

  it.each(casesOf(reference, 'eustockmarkets-moments'))('has the type 7 quantiles of $series, $n returns', (one) => {
    const returns = logReturns(indexCloses(String(one.series))).slice(
      numberOf(one, 'first_return') - 1,
      numberOf(one, 'last_return'),
    );
    for (const [probability, expected] of entriesOf(one, 'quantiles_type7'))
      expectWithin(quantile(returns, Number(probability)), expected, 1e-13);
    expectWithin(quantile(returns, 0), numberOf(one, 'min'), 1e-13);
    expectWithin(quantile(returns, 1), numberOf(one, 'max'), 1e-13);
  });
});
