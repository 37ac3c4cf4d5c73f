import reference from '@/tests/reference/data/implied_vol.json';
import { casesOf, expectWithin, numberOf, oneClockOption } from '@/tests/reference/reference-file';
import { impliedDailyVolatility } from '@/journal/pricing/implied-daily-volatility';

describe('implied volatility against 60-digit roots', () => {
  const solvable = ['otm', 'itm', 'tiny-time-value', 'cents'].flatMap((group) => casesOf(reference, group));

  it.each(solvable)('finds the volatility of $id ($type at $K, price $price)', (one) => {
    const found = impliedDailyVolatility({ ...oneClockOption(one), price: numberOf(one, 'price') });
    if (found.kind !== 'found') throw new Error(`${one.id}: ${found.bound}`);
    expectWithin(found.dailyVolatility, numberOf(one, 'sigma'), numberOf(one, 'sigma_tol'));
  });

  it.each(casesOf(reference, 'hull'))('has the printed volatility of $id', (one) => {
    const found = impliedDailyVolatility({ ...oneClockOption(one), price: numberOf(one, 'price') });
    if (found.kind !== 'found') throw new Error(`${one.id}: ${found.bound}`);
    expectWithin(found.dailyVolatility, numberOf(one, 'sigma'), 0.0005); // half of the last printed digit
  });

  it.each(casesOf(reference, 'no-solution'))('reports that $id has none: $reason', (one) => {
    const answer = impliedDailyVolatility({ ...oneClockOption(one), price: numberOf(one, 'price') });
    if (answer.kind !== 'none') throw new Error(`${one.id}: ${answer.dailyVolatility}`);
    const price = numberOf(one, 'price');
    const [lower, upper] = [numberOf(one, 'lower_bound'), numberOf(one, 'upper_bound')];
    const broken =
      numberOf(one, 'T') === 0
        ? 'no-time-left'
        : price >= upper
          ? 'above-maximum'
          : price === lower
            ? 'no-time-value'
            : 'below-intrinsic';
    expect(answer.bound).toBe(broken);
    expectWithin(answer.limit, broken === 'above-maximum' ? upper : lower, 1e-12 * upper); // a few roundings
  });
});
