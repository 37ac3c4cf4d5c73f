import { chiSquareQuantile } from '@/journal/distributions/chi-square-distribution';
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

  it.each(casesOf(reference, 'table'))('has the printed quantile at $df degrees', (one) => {
    expectWithin(
      chiSquareQuantile(1 - numberOf(one, 'p_upper_tail'), numberOf(one, 'df')),
      numberOf(one, 'chi2'),
      5e-4,
    );
  });
});
