import { toModelNumber } from '@/journal/money/decimal';
import { findSuspectPrices } from '@/journal/returns/find-suspect-prices';
import { type FileBar } from '@/server/prices/reading/read-bars';

export interface Suspect {
  row: number;
  sessionDate: string;
  message: string;
}

/** Rows of the file that are worth a look. Stored closes stand in where the file has none. */
export function findSuspects(bars: readonly FileBar[], storedCloses: ReadonlyMap<string, string>): Suspect[] {
  const rowOf = new Map(bars.map(({ sessionDate, row }) => [sessionDate, row]));
  const stored = [...storedCloses]
    .filter(([sessionDate]) => !rowOf.has(sessionDate))
    .map(([sessionDate, close]) => ({ sessionDate, close: toModelNumber(close) }));
  const inFile = bars.map(({ sessionDate, open, high, low, close }) => ({
    sessionDate,
    open: open === null ? null : toModelNumber(open),
    high: high === null ? null : toModelNumber(high),
    low: low === null ? null : toModelNumber(low),
    close: toModelNumber(close),
  }));
  const prices = [...stored, ...inFile].sort((left, right) => left.sessionDate.localeCompare(right.sessionDate));
  return findSuspectPrices(prices).flatMap(({ sessionDate, why }) => {
    const row = rowOf.get(sessionDate);
    return row === undefined ? [] : [{ row, sessionDate, message: `Row ${row}: ${why}` }];
  });
}
