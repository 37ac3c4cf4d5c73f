import { type EuropeanOption } from '@/journal/pricing/european-option';
import { optionColumns, type OptionColumns } from '@/journal/pricing/european-columns';

/** The same options as columns of numbers. */
export function columnsOf(options: readonly EuropeanOption[]): OptionColumns {
  const columns = optionColumns(options.length);
  for (const [row, option] of options.entries()) {
    columns.direction[row] = option.type === 'call' ? 1 : -1;
    columns.spotPrice[row] = option.spotPrice;
    columns.strikePrice[row] = option.strikePrice;
    columns.dailyVolatility[row] = option.dailyVolatility;
    columns.sessions[row] = option.sessions;
    columns.years[row] = option.years;
    columns.ratePerYear[row] = option.ratePerYear;
    columns.dividendYield[row] = option.dividendYield;
  }
  return columns;
}
