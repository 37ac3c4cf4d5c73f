import blackScholesPackage from 'black-scholes';
import { europeanOptionPrice, europeanOptionValue } from '@/journal/pricing/european-option';
import { impliedDailyVolatility } from '@/journal/pricing/implied-daily-volatility';
import { compareSpeed, type Contender } from '@/tests/bench/compare-speed';
import { randomOptions } from '@/tests/bench/random-options';
import { reportSpeed } from '@/tests/bench/report-speed';

const options = randomOptions(1024);
const packageArguments = options.map((option) => ({
  ...option,
  yearlyVolatility: (option.dailyVolatility * Math.sqrt(option.sessions)) / Math.sqrt(option.years),
}));
const quotes = options.map((option) => ({ ...option, price: europeanOptionPrice(option) }));

/** Goes round the list, adding up what each item gives. */
function over<Item>(name: string, items: readonly Item[], figureOf: (item: Item) => number): Contender {
  return {
    name,
    work: (count) => {
      let sum = 0;
      for (let done = 0; done < count;) {
        for (const item of items) {
          if (done === count) break;
          sum += figureOf(item);
          done += 1;
        }
      }
      return sum;
    },
  };
}

const rows = compareSpeed(
  over('black-scholes: price alone', packageArguments, (option) =>
    blackScholesPackage.blackScholes(
      option.spotPrice,
      option.strikePrice,
      option.years,
      option.yearlyVolatility,
      option.ratePerYear,
      option.type,
    ),
  ),
  [
    over('price, five Greeks, odds', options, (option) => {
      const value = europeanOptionValue(option);
      return (
        value.price +
        value.delta +
        value.gamma +
        value.vegaPerDailyPoint +
        value.thetaPerSession +
        value.rhoPerPercent +
        value.oddsInTheMoney
      );
    }),
    over('price alone', options, europeanOptionPrice),
    over('implied daily volatility', quotes, (quote) => {
      const answer = impliedDailyVolatility(quote);
      return answer.kind === 'found' ? answer.dailyVolatility : 0;
    }),
  ],
);
reportSpeed({ title: 'Options a second', aim: 100, rows });
