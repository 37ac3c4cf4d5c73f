import { type SourceCell } from '@/server/prices/reading/source-table';
import { isSessionDate } from '@/journal/sessions/session-date';
import { type Reading } from '@/shared/prices/price-upload';

export type DateOrder = NonNullable<Reading['dateOrder']>;

type DateParts =
  | { readonly kind: 'fixed'; readonly year: string; readonly month: string; readonly day: string }
  | {
      readonly kind: 'numeric';
      readonly first: string;
      readonly second: string;
      readonly year: string;
      readonly isDotted: boolean;
    }
  | { readonly kind: 'none'; readonly problem: string };

const monthNames: ReadonlyMap<string, number> = new Map(
  [
    ['jan', 'january', 'januar', 'janner', 'janv', 'janvier'],
    ['feb', 'february', 'februar', 'fev', 'fevr', 'fevrier'],
    ['mar', 'march', 'marz', 'mrz', 'mars'],
    ['apr', 'april', 'avr', 'avril'],
    ['may', 'mai'],
    ['jun', 'june', 'juni', 'juin'],
    ['jul', 'july', 'juli', 'juil', 'juillet'],
    ['aug', 'august', 'aout'],
    ['sep', 'sept', 'september', 'septembre'],
    ['oct', 'october', 'okt', 'oktober', 'octobre'],
    ['nov', 'november', 'novembre'],
    ['dec', 'december', 'dez', 'dezember', 'decembre'],
  ].flatMap((names, index) => names.map((name) => [name, index + 1] as const)),
);

const monthNumber = (name: string): string | null => {
  const plain = name.normalize('NFKD').replace(/\p{M}/gu, '').replace(/\.$/, '').toLowerCase();
  const month = monthNames.get(plain);
  return month === undefined ? null : String(month);
};

/** Midnight, with or without an offset: spreadsheets and scripts append it to plain dates. */
const midnight = /[T ]0?0:00(:00(\.0+)?)?( ?(Z|UTC|[+-]\d{2}:?\d{2}))?$/;
const timeOfDay = /[T ]\d{1,2}:\d{2}/;

const yearFirst = /^(\d{4})([-/.])(\d{1,2})\2(\d{1,2})$/;
const compact = /^(\d{4})(\d{2})(\d{2})$/;
const yearLast = /^(\d{1,2})([-/.])(\d{1,2})\2(\d{4})$/;
const shortYear = /^\d{1,2}([-/.])\d{1,2}\1\d{2}$|^\d{1,2}[- ./]\p{L}+\.?[- ./,]+\d{2}$/u;
const dayMonthName = /^(\d{1,2})\.?[- /]?(\p{L}+\.?)[- /,]*(\d{4})$/u;
const monthNameDay = /^(\p{L}+\.?)[- /]?(\d{1,2}),? ?[- /]?(\d{4})$/u;

function splitDate(cell: SourceCell): DateParts {
  const written = cell.text.trim();
  if (cell.kind === 'error') return { kind: 'none', problem: 'is an error of the worksheet, not a date' };
  const text = written.replace(midnight, '');
  const yearFound = yearFirst.exec(text);
  if (yearFound !== null) return fixed(yearFound[1], yearFound[3], yearFound[4]);
  const digits = compact.exec(text);
  if (digits !== null) return fixed(digits[1], digits[2], digits[3]);
  if (cell.kind === 'number') {
    return { kind: 'none', problem: 'is a number, not a date. In the spreadsheet, format the column as a date' };
  }
  const numeric = yearLast.exec(text);
  if (numeric !== null) {
    const [, first = '', mark, second = '', year = ''] = numeric;
    return { kind: 'numeric', first, second, year, isDotted: mark === '.' };
  }
  const named = dayMonthName.exec(text);
  const namedMonth = monthNumber(named?.[2] ?? '');
  if (named !== null && namedMonth !== null) return fixed(named[3], namedMonth, named[1]);
  const american = monthNameDay.exec(text);
  const americanMonth = monthNumber(american?.[1] ?? '');
  if (american !== null && americanMonth !== null) return fixed(american[3], americanMonth, american[2]);
  if (shortYear.test(text)) return { kind: 'none', problem: 'has a year of two digits. Write four' };
  if (timeOfDay.test(text)) return { kind: 'none', problem: 'has a time of day. A daily bar has a date alone' };
  return { kind: 'none', problem: 'is not a date' };
}

const fixed = (year = '', month = '', day = ''): DateParts => ({ kind: 'fixed', year, month, day });

const assemble = (year: string, month: string, day: string): string =>
  `${year}-${month.padStart(2, '0')}-${day.padStart(2, '0')}`;

export type ReadDate = { readonly sessionDate: string } | { readonly problem: string };

/** Reads a date; one written with its year first, a month in words or dots needs no order. */
export function readSessionDate(cell: SourceCell, order: DateOrder): ReadDate {
  const parts = splitDate(cell);
  if (parts.kind === 'none') return { problem: parts.problem };
  const isMonthFirst = parts.kind === 'numeric' && !parts.isDotted && order === 'month-day-year';
  const sessionDate =
    parts.kind === 'fixed'
      ? assemble(parts.year, parts.month, parts.day)
      : assemble(parts.year, isMonthFirst ? parts.first : parts.second, isMonthFirst ? parts.second : parts.first);
  return isSessionDate(sessionDate) ? { sessionDate } : { problem: 'does not exist' };
}

/** The order of day and month that the dates allow; null with an example when every one of them allows both. */
export function detectDateOrder(cells: readonly SourceCell[]): { order: DateOrder | null; example: string } {
  let dayFirst = 0;
  let monthFirst = 0;
  let open: string | null = null;
  for (const cell of cells) {
    const parts = splitDate(cell);
    if (parts.kind !== 'numeric') continue;
    if (parts.isDotted || Number(parts.first) > 12) dayFirst += 1;
    else if (Number(parts.second) > 12) monthFirst += 1;
    else open ??= cell.text.trim();
  }
  if (dayFirst + monthFirst > 0)
    return { order: dayFirst >= monthFirst ? 'day-month-year' : 'month-day-year', example: '' };
  return open === null ? { order: 'year-month-day', example: '' } : { order: null, example: open };
}
