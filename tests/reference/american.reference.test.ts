import reference from '@/tests/reference/data/american.json';
import {
  americanOptionPrice,
  americanOptionValue,
  type AmericanOption,
  type DividendModel,
  fastScheme,
} from '@/journal/pricing/american-option';
import { casesOf, expectWithin, numberOf, oneClockOption, type ReferenceCase } from '@/tests/reference/reference-file';

const optionOf = (one: ReferenceCase): AmericanOption => ({
  ...oneClockOption(one),
  dailyVolatility: numberOf(one, 'sigma'),
});

/** Of the file: converged values within 1e-5 of the spot price, 2e-5 with dividends. */
const convergedShare = 1e-5;
const dividendShare = 2e-5;

/** The groups whose own approximation is not what is asked of an engine; `converged` is. */
const withConverged = [
  'haug-baw',
  'bjerksund-stensland-1993',
  'bjerksund-stensland-2002',
  'ju-1999',
  'geske-johnson-grid',
];

describe('American options against converged values of published tables', () => {
  it.each(withConverged.flatMap((group) => casesOf(reference, group)))('has the price of $id', (one) => {
    const option = optionOf(one);
    const converged = numberOf(one, 'converged');
    expectWithin(americanOptionPrice(option), converged, convergedShare * option.spotPrice);
    expectWithin(americanOptionPrice(option, fastScheme), converged, convergedShare * option.spotPrice);
  });

  it('has the premium of the benchmark of Andersen, Lake and Offengenden', () => {
    const [one] = casesOf(reference, 'andersen-lake-offengenden');
    if (one === undefined) throw new Error('the case is gone');
    // The file asks for 1e-8 of the spot price: a scheme as fine as theirs.
    const finest = { intervals: 20, quadrature: 48, iterations: 16, priceQuadrature: 128, tailWithin: 1e-3 };
    expectWithin(americanOptionPrice(optionOf(one), finest), numberOf(one, 'price'), 1e-8 * 100);
  });
});

describe('American options held for days and weeks', () => {
  it.each(casesOf(reference, 'short-dated'))('has price, delta and exercise of $id', (one) => {
    const option = optionOf(one);
    const value = americanOptionValue(option);
    expectWithin(value.price, numberOf(one, 'price'), convergedShare * option.spotPrice);
    expectWithin(value.delta, numberOf(one, 'delta'), 1e-3);
    expect(value.exerciseNow).toBe(one.exercise_now);
    expectWithin(americanOptionPrice(option, fastScheme), numberOf(one, 'price'), convergedShare * option.spotPrice);
  });
});

const modelOf = (one: ReferenceCase): DividendModel => {
  if (one.dividend_model !== 'spot' && one.dividend_model !== 'escrowed') throw new Error(`${one.id} has no model`);
  return one.dividend_model;
};
const dividendsOf = (one: ReferenceCase) => {
  const list: unknown = one.dividends;
  if (!Array.isArray(list)) throw new Error(`${one.id} has no dividends`);
  return list.map((each: { t: number; amount: number }) => ({ years: each.t, amount: each.amount }));
};

describe('American options on shares with cash dividends', () => {
  it.each(casesOf(reference, 'cash-dividends'))('has the price of $id', (one) => {
    const option = { ...optionOf(one), dividends: dividendsOf(one), dividendModel: modelOf(one) };
    expectWithin(americanOptionPrice(option), numberOf(one, 'price'), dividendShare * option.spotPrice);
  });

  it.each(casesOf(reference, 'roll-geske-whaley'))('has the printed price of $id', (one) => {
    const option = { ...optionOf(one), dividends: dividendsOf(one), dividendModel: modelOf(one) };
    expectWithin(americanOptionPrice(option), numberOf(one, 'price'), 1e-4);
  });
});
