import { chiSquareQuantile } from '@/journal/distributions/chi-square-distribution';
import { estimateCloseVolatility } from '@/journal/volatility/estimate-close-volatility';
import { volatilityInterval } from '@/journal/volatility/volatility-interval';
import reference from '@/tests/reference/data/sigma_interval.json';
import { casesOf, expectWithin, numberOf } from '@/tests/reference/reference-file';

describe('the chi-square interval of a volatility', () => {
  it.each(casesOf(reference, 'intervals'))('has the factors of R’s qchisq at $df degrees and $confidence', (one) => {
    const question = {
      dailyVolatility: 0.015,
      degreesOfFreedom: numberOf(one, 'df'),
      confidence: numberOf(one, 'confidence'),
    };
    const { low, high } = volatilityInterval(question);
    expectWithin(low / 0.015, numberOf(one, 'factor_lower'), 1e-9 * numberOf(one, 'factor_lower'));
    expectWithin(high / 0.015, numberOf(one, 'factor_upper'), 1e-9 * numberOf(one, 'factor_upper'));
  });

  it.each(casesOf(reference, 'intervals'))('rests on the quantiles of R at $df degrees and $confidence', (one) => {
    const quantile = (probability: number) => chiSquareQuantile(probability, numberOf(one, 'df'));
    const tail = (1 - numberOf(one, 'confidence')) / 2;
    expectWithin(quantile(tail), numberOf(one, 'chi2_lower'), 1e-9 * numberOf(one, 'chi2_lower'));
    expectWithin(quantile(1 - tail), numberOf(one, 'chi2_upper'), 1e-9 * numberOf(one, 'chi2_upper'));
  });

  it.each(casesOf(reference, 'intervals'))(
    'is that of a close estimate over $n returns, $mean, at $confidence',
    (one) => {
      const count = numberOf(one, 'n');
      const closes = Array.from({ length: count + 1 }, (_, at) => 100 + ((at * at) % 7));
      const mean = numberOf(one, 'df') === count ? 'zero' : 'sample';
      const method = { kind: 'close', window: count, mean } as const;
      const { low, dailyVolatility, high } = estimateCloseVolatility(closes, method, numberOf(one, 'confidence'));
      expectWithin(low / dailyVolatility, numberOf(one, 'factor_lower'), 1e-9 * numberOf(one, 'factor_lower'));
      expectWithin(high / dailyVolatility, numberOf(one, 'factor_upper'), 1e-9 * numberOf(one, 'factor_upper'));
    },
  );

  it.each(casesOf(reference, 'table'))('has the printed quantile at $df degrees', (one) => {
    expectWithin(
      chiSquareQuantile(1 - numberOf(one, 'p_upper_tail'), numberOf(one, 'df')),
      numberOf(one, 'chi2'),
      5e-4,
    );
  });
});
