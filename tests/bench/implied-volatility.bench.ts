import { europeanOptionPrice, type EuropeanOption } from '@/journal/pricing/european-option';
import { impliedDailyVolatility } from '@/journal/pricing/implied-daily-volatility';
import { compareSpeed } from '@/tests/bench/compare-speed';
import { priceByPackage } from '@/tests/bench/package-price';
import { randomOptions } from '@/tests/bench/random-options';
import { repeatOver } from '@/tests/bench/repeat';
import { reportSpeed } from '@/tests/bench/report-speed';

const options = randomOptions(1024);
// Every field by name: copies made by spreading are slow to read, and reading is not what is measured.
const quotes = options.map((option) => ({
  type: option.type,
  spotPrice: option.spotPrice,
  strikePrice: option.strikePrice,
  sessions: option.sessions,
  years: option.years,
  ratePerYear: option.ratePerYear,
  dividendYield: option.dividendYield,
  price: europeanOptionPrice(option),
}));

/** Halving between 0 and 1 a session until the volatility is known to 1e-9. */
function volatilityByBisection(quote: (typeof quotes)[number]): number {
  const option: EuropeanOption & { dailyVolatility: number } = {
    ...quote,
    dailyVolatility: 0,
  };
  let [low, high] = [0, 1];
  while (high - low > 1e-9) {
    option.dailyVolatility = (low + high) / 2;
    if (priceByPackage(option) > quote.price) high = option.dailyVolatility;
    else low = option.dailyVolatility;
  }
  return (low + high) / 2;
}

const volatilityByEngine = (quote: (typeof quotes)[number]): number => {
  const answer = impliedDailyVolatility(quote);
  if (answer.kind === 'none') throw new Error(`no volatility: ${answer.bound}`);
  return answer.dailyVolatility;
};
for (const [row, quote] of quotes.entries()) {
  const { dailyVolatility } = options[row] ?? { dailyVolatility: NaN };
  if (!(Math.abs(volatilityByEngine(quote) - dailyVolatility) < 1e-9)) throw new Error(`row ${row} came back wrong`);
}

const rows = compareSpeed(
  {
    name: 'black-scholes: price alone',
    work: repeatOver(options, priceByPackage),
  },
  [
    {
      name: 'implied daily volatility',
      work: repeatOver(quotes, volatilityByEngine),
    },
    {
      name: 'bisection with black-scholes, to 1e-9',
      work: repeatOver(quotes, volatilityByBisection),
    },
  ],
);
reportSpeed({ title: 'Implied volatilities a second', aim: 50, rows });
