import { toDecimal } from '@/journal/money/decimal';
import { type ExchangeCalendar } from '@/journal/sessions/exchange-calendar';
import { readingLimits } from '@/server/prices/reading/reading-limits';
import { readPrice } from '@/server/prices/reading/price-text';
import { readSessionDate, type DateOrder } from '@/server/prices/reading/session-date-text';
import { cellText, isBlankRow, type SourceRow } from '@/server/prices/reading/source-table';
import { type Reading } from '@/shared/prices/price-upload';

export interface FileBar {
  readonly row: number;
  readonly sessionDate: string;
  readonly close: string;
  readonly open: string | null;
  readonly high: string | null;
  readonly low: string | null;
}

export interface RefusedRow {
  readonly row: number;
  /** The row as it stands in the file, shortened. */
  readonly text: string;
  /** Header of the column at fault; empty for the whole row. */
  readonly column: string;
  readonly message: string;
}

export interface BarsReading {
  readonly headerCells: readonly string[];
  readonly columns: Reading['columns'];
  readonly dateOrder: DateOrder;
  readonly decimalMark: Reading['decimalMark'];
  readonly calendar: ExchangeCalendar;
  /** Instant; a session that has not closed by then has no bar. */
  readonly now: string;
}

const longestShownRow = 200;

/** Why a date cannot carry a bar, or null. */
export function sessionProblem(
  sessionDate: string,
  { calendar, now }: { calendar: ExchangeCalendar; now: string },
): string | null {
  if (sessionDate < readingLimits.earliestSessionDate) return `is before ${readingLimits.earliestSessionDate}`;
  if (sessionDate > now.slice(0, 10)) return 'lies in the future';
  const session = calendar.sessionOn(sessionDate);
  if (session === null) {
    const reason = calendar.closureReason(sessionDate);
    return `is no session: the exchange was closed${reason === null ? '' : ` (${reason})`}`;
  }
  return session.closesAt > now ? 'is of a session that has not closed yet' : null;
}

type Prices = Pick<FileBar, 'close' | 'open' | 'high' | 'low'>;

/** Why four prices cannot be of one session, or null. */
export function rangeProblem({ close, open, high, low }: Prices): { column: keyof Prices; message: string } | null {
  const top = high === null ? null : toDecimal(high);
  const bottom = low === null ? null : toDecimal(low);
  if (top !== null && bottom !== null && top.lt(bottom)) {
    return { column: 'high', message: `the high ${high} is below the low ${low}` };
  }
  for (const [column, price] of [
    ['open', open],
    ['close', close],
  ] as const) {
    if (price === null) continue;
    const value = toDecimal(price);
    if (top !== null && value.gt(top)) return { column, message: `the ${column} ${price} is above the high ${high}` };
    if (bottom !== null && value.lt(bottom))
      return { column, message: `the ${column} ${price} is below the low ${low}` };
  }
  return null;
}

type RowResult = { readonly bar: FileBar } | { readonly column: string; readonly problem: string };

function readRow({ row, cells }: SourceRow, reading: BarsReading): RowResult {
  const { columns, headerCells, decimalMark } = reading;
  const filled = cells.findLastIndex((cell) => cellText(cell) !== '') + 1;
  if (filled > columns.length) {
    return { column: '', problem: `the row has ${filled} columns where the header has ${columns.length}` };
  }
  const cellOf = (column: Reading['columns'][number]) => {
    const index = columns.indexOf(column);
    return { cell: index < 0 ? undefined : cells[index], header: headerCells[index] ?? column };
  };
  const date = cellOf('date');
  if (date.cell === undefined || cellText(date.cell) === '')
    return { column: date.header, problem: 'the date is missing' };
  const readDate = readSessionDate(date.cell, reading.dateOrder);
  const dateProblem = 'problem' in readDate ? readDate.problem : sessionProblem(readDate.sessionDate, reading);
  if ('problem' in readDate || dateProblem !== null) {
    return { column: date.header, problem: `the date ${cellText(date.cell)} ${dateProblem ?? ''}` };
  }
  const prices: Record<keyof Prices, string | null> = { close: null, open: null, high: null, low: null };
  for (const column of ['close', 'open', 'high', 'low'] as const) {
    const { cell, header } = cellOf(column);
    if (cell === undefined || cellText(cell) === '') continue;
    const read = readPrice(cell, decimalMark);
    if ('problem' in read) return { column: header, problem: `the ${column} ${cellText(cell)} ${read.problem}` };
    prices[column] = read.price;
  }
  const { close } = prices;
  if (close === null) return { column: cellOf('close').header, problem: 'the close is missing' };
  const bar = { row, sessionDate: readDate.sessionDate, ...prices, close };
  const range = rangeProblem(bar);
  return range === null ? { bar } : { column: cellOf(range.column).header, problem: range.message };
}

const whatToDo = 'Fix the file or leave the row out.';

/** Reads every row below the header; a row that cannot be taken is named with its reason. */
export function readBars(
  rows: readonly SourceRow[],
  reading: BarsReading,
): { bars: FileBar[]; refused: RefusedRow[]; rowsRead: number } {
  const bars: FileBar[] = [];
  const refused: RefusedRow[] = [];
  const firstRowOf = new Map<string, number>();
  let rowsRead = 0;
  const refuse = (source: SourceRow, column: string, problem: string) => {
    const text = source.cells.map(cellText).join(' | ').slice(0, longestShownRow);
    refused.push({ row: source.row, text, column, message: `Row ${source.row}: ${problem}. ${whatToDo}` });
  };
  for (const source of rows) {
    if (isBlankRow(source)) continue;
    rowsRead += 1;
    const result = readRow(source, reading);
    if ('problem' in result) {
      refuse(source, result.column, result.problem);
      continue;
    }
    const { sessionDate } = result.bar;
    const firstRow = firstRowOf.get(sessionDate);
    if (firstRow !== undefined) {
      const column = reading.headerCells[reading.columns.indexOf('date')] ?? '';
      refuse(source, column, `the date ${sessionDate} stands in row ${firstRow} already`);
      continue;
    }
    firstRowOf.set(sessionDate, source.row);
    bars.push(result.bar);
  }
  return { bars, refused, rowsRead };
}
