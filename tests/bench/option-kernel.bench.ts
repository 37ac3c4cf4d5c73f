import { europeanPriceColumns, europeanValueColumns, valueColumns } from '@/journal/pricing/european-columns';
import { europeanOptionPrice, europeanOptionValue } from '@/journal/pricing/european-option';
import { columnsOf } from '@/tests/bench/column-options';
import { compareSpeed } from '@/tests/bench/compare-speed';
import { priceByPackage } from '@/tests/bench/package-price';
import { randomOptions } from '@/tests/bench/random-options';
import { repeatColumns, repeatOver } from '@/tests/bench/repeat';
import { reportSpeed } from '@/tests/bench/report-speed';

const options = randomOptions(1024);
const columns = columnsOf(options);
const values = valueColumns(options.length);
const oneSession = 1 / 365;

const rows = compareSpeed(
  {
    name: 'black-scholes: price alone',
    work: repeatOver(options, priceByPackage),
  },
  [
    {
      name: 'price, five Greeks, odds, in columns',
      work: repeatColumns(options.length, () => {
        europeanValueColumns(columns, values, oneSession);
        return values.price[0] ?? NaN;
      }),
    },
    {
      name: 'price, five Greeks, odds, one by one',
      work: repeatOver(options, (option) => {
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
    },
    {
      name: 'price alone, in columns',
      work: repeatColumns(options.length, () => {
        europeanPriceColumns(columns, values.price);
        return values.price[0] ?? NaN;
      }),
    },
    {
      name: 'price alone, one by one',
      work: repeatOver(options, europeanOptionPrice),
    },
  ],
);
reportSpeed({ title: 'European options a second', aim: 150, rows });
