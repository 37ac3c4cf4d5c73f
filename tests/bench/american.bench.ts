import blackScholesPackage from 'black-scholes';
import { americanOptionPrice, fastScheme } from '@/journal/pricing/american-option';
import { compareSpeed } from '@/tests/bench/compare-speed';
import { randomOptions } from '@/tests/bench/random-options';
import { reportSpeed } from '@/tests/bench/report-speed';

const options = randomOptions(256).map((option) => ({ ...option, type: 'put' as const, ratePerYear: 0.045 }));
const withDividend = options.map((option) => ({
  ...option,
  dividends: [{ years: option.years / 2, amount: option.spotPrice / 200 }],
}));

const over =
  <Item>(items: readonly Item[], priceOf: (item: Item) => number) =>
  (count: number) => {
    let sum = 0;
    for (let done = 0; done < count; done += 1) {
      const item = items[done % items.length];
      if (item !== undefined) sum += priceOf(item);
    }
    return sum;
  };

const rows = compareSpeed(
  {
    name: 'black-scholes: European price alone',
    work: over(options, ({ spotPrice, strikePrice, years, dailyVolatility, sessions, ratePerYear, type }) =>
      blackScholesPackage.blackScholes(
        spotPrice,
        strikePrice,
        years,
        (dailyVolatility * Math.sqrt(sessions)) / Math.sqrt(years),
        ratePerYear,
        type,
      ),
    ),
  },
  [
    {
      name: 'American, within 1e-5 of the spot price',
      work: over(options, (option) => americanOptionPrice(option, fastScheme)),
    },
    { name: 'American, within 1e-6', work: over(options, (option) => americanOptionPrice(option)) },
    {
      name: 'American with a cash dividend, within 2e-5',
      work: over(withDividend, (option) => americanOptionPrice(option)),
    },
  ],
);
reportSpeed({ title: 'American options a second', aim: 0.5, rows });
