import { toModelNumber } from '@/journal/money/decimal';
import { logReturns } from '@/journal/returns/log-returns';
import { quantile } from '@/journal/returns/quantile';
import { type FileBar } from '@/server/prices/reading/read-bars';

const suspectDeviations = 6;
const fewestReturns = 20;
/** Of a normal sample, the deviation in units of its median absolute deviation. */
const deviationPerMedianDeviation = 1.4826;

export interface Suspect {
  row: number;
  sessionDate: string;
  message: string;
}

/**
 * Rows of the file whose return is beyond six usual deviations, the usual one taken from the median so that a slip of
 * the keyboard does not hide itself. Stored closes stand in where the file has none.
 */
export function findSuspects(bars: readonly FileBar[], storedCloses: ReadonlyMap<string, string>): Suspect[] {
  const rowOf = new Map(bars.map(({ sessionDate, row }) => [sessionDate, row]));
  const closes = new Map([...storedCloses, ...bars.map(({ sessionDate, close }) => [sessionDate, close] as const)]);
  const dates = [...closes.keys()].sort();
  if (dates.length <= fewestReturns) return [];
  const returns = logReturns(dates.map((date) => toModelNumber(closes.get(date) ?? '')));
  const middle = quantile(returns, 0.5);
  const deviation =
    deviationPerMedianDeviation *
    quantile(
      returns.map((value) => Math.abs(value - middle)),
      0.5,
    );
  if (!(deviation > 0)) return [];
  return returns.flatMap((value, index) => {
    const sessionDate = dates[index + 1] ?? '';
    const row = rowOf.get(sessionDate);
    const deviations = Math.abs(value - middle) / deviation;
    if (row === undefined || deviations <= suspectDeviations) return [];
    const percent = (100 * Math.expm1(value)).toFixed(1);
    return [
      {
        row,
        sessionDate,
        message: `Row ${row}: a move of ${percent} % on the session before, ${deviations.toFixed(1)} times the usual. Check the close.`,
      },
    ];
  });
}
