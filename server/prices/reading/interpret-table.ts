import { usOptionsCalendar } from '@/journal/sessions/us-options-calendar';
import { columnsFromHeader, findHeader, type BarColumn } from '@/server/prices/reading/find-header';
import { PriceFileError, readingInvalid, unreadable } from '@/server/prices/reading/price-file-error';
import { detectDecimalMark } from '@/server/prices/reading/price-text';
import { readBars, type FileBar, type RefusedRow } from '@/server/prices/reading/read-bars';
import { readingLimits } from '@/server/prices/reading/reading-limits';
import { detectDateOrder } from '@/server/prices/reading/session-date-text';
import {
  cellText,
  isBlankRow,
  type SourceCell,
  type SourceRow,
  type SourceTable,
} from '@/server/prices/reading/source-table';
import { type Reading, type ReadingQuestion } from '@/shared/prices/price-upload';

export type QuestionTopic = ReadingQuestion['about'];

/** A reading that was shown, and the questions about it that the person has answered. */
export interface SettledReading {
  readonly reading: Reading;
  readonly answered: readonly QuestionTopic[];
}

export interface PriceFileContent {
  readonly sheets: readonly string[];
  readonly headers: { text: string; samples: string[] }[];
  readonly reading: Reading;
  readonly answered: readonly QuestionTopic[];
  readonly questions: ReadingQuestion[];
  readonly rowsRead: number;
  readonly bars: FileBar[];
  readonly refused: RefusedRow[];
}

const samplesPerColumn = 3;

function headerOf(
  table: SourceTable,
  wanted: Reading | null,
): { index: number; columns: BarColumn[]; isCertain: boolean } {
  if (wanted !== null) {
    const index = table.rows.findIndex(({ row }) => row === wanted.headerRow);
    const row = table.rows[index];
    if (row === undefined || isBlankRow(row)) {
      throw readingInvalid(`Row ${wanted.headerRow} holds no header. Choose the row that names the columns.`);
    }
    return { index, ...columnsFromHeader(row) };
  }
  const found = findHeader(table.rows);
  if (found !== null) return found;
  const filled = table.rows.filter((row) => !isBlankRow(row)).length;
  throw unreadable(
    filled === 0
      ? 'The sheet is empty. Choose a file with a header and one row a session.'
      : `No header was found in the first ${readingLimits.headerSearchRows} rows. Add a first row that names the columns, such as: date, close.`,
  );
}

const cellsOf = (
  rows: readonly SourceRow[],
  columns: readonly BarColumn[],
  wanted: readonly BarColumn[],
): SourceCell[] => {
  const indexes = columns.flatMap((column, index) => (wanted.includes(column) ? [index] : []));
  return rows.flatMap(({ cells }) => indexes.flatMap((index) => cells[index] ?? []));
};

const columnQuestion = (column: 'date' | 'close', headers: PriceFileContent['headers']): ReadingQuestion => ({
  about: 'columns',
  question: column === 'date' ? 'Which column holds the date?' : 'Which column holds the closing price?',
  choices: headers.map(({ text, samples }, index) => ({
    value: `${column}:${index}`,
    label: text === '' ? `Column ${index + 1}` : text,
    example: samples[0] ?? '',
  })),
});

const dateOrderQuestion = (example: string): ReadingQuestion => ({
  about: 'dateOrder',
  question: `Is ${example} written with the day or with the month first? Every date in the file allows both.`,
  choices: [
    { value: 'day-month-year', label: 'Day first', example },
    { value: 'month-day-year', label: 'Month first', example },
  ],
});

const decimalMarkQuestion = (example: string): ReadingQuestion => {
  const digits = example.replace(/\D/g, '');
  const fraction = /[.,](\d+)$/.exec(example)?.[1] ?? '';
  const withDecimals = `${digits.slice(0, digits.length - fraction.length)}.${fraction}`;
  const mark = example.includes(',') ? 'comma' : 'point';
  const label = (value: 'point' | 'comma') => `${example} is ${value === mark ? withDecimals : digits}`;
  return {
    about: 'decimalMark',
    question: `Does the mark in ${example} part the decimals or the thousands?`,
    choices: [
      { value: mark, label: label(mark), example: withDecimals },
      {
        value: mark === 'comma' ? 'point' : 'comma',
        label: label(mark === 'comma' ? 'point' : 'comma'),
        example: digits,
      },
    ],
  };
};

const sheetQuestion = (sheets: readonly string[]): ReadingQuestion => ({
  about: 'sheet',
  question: 'Several sheets hold prices. Which one do you want to read?',
  choices: sheets.map((sheet) => ({ value: sheet, label: sheet, example: '' })),
});

const isSame = (a: unknown, b: unknown): boolean => JSON.stringify(a) === JSON.stringify(b);

/** The questions a person's reading answers: those whose value it changed, or all when it confirms what was shown. */
export function answeredBy(wanted: Reading, shown: SettledReading): QuestionTopic[] {
  const topics: readonly QuestionTopic[] = ['dateOrder', 'columns', 'sheet', 'decimalMark'];
  const changed = topics.filter((topic) => !isSame(wanted[topic], shown.reading[topic]));
  if (changed.includes('sheet')) return ['sheet'];
  const isConfirmed = changed.length === 0 && wanted.headerRow === shown.reading.headerRow;
  return isConfirmed ? [...topics] : [...new Set([...shown.answered, ...changed])];
}

/**
 * Reads a table as bars. Without `wanted` everything is found from the table; with it, what the person chose holds, and
 * what they left as it was shown is found again where their choice moved the ground under it.
 */
export function interpretTable(
  table: SourceTable,
  { wanted, shown, now }: { wanted: Reading | null; shown: SettledReading | null; now: string },
): PriceFileContent {
  const answered = wanted !== null && shown !== null ? answeredBy(wanted, shown) : [];
  const chosen = wanted !== null && wanted.sheet === (shown?.reading.sheet ?? wanted.sheet) ? wanted : null;
  const header = headerOf(table, chosen);
  const headerRow = table.rows[header.index];
  if (headerRow === undefined)
    throw unreadable('The sheet is empty. Choose a file with a header and one row a session.');
  const width = header.columns.length;
  if (width > readingLimits.columns) {
    throw new PriceFileError(
      'too-large',
      `The header has ${width} columns; at most ${readingLimits.columns} are read. Remove the others.`,
    );
  }
  const rows = table.rows.slice(header.index + 1);
  const filled = rows.filter((row) => !isBlankRow(row));
  if (filled.length === 0) {
    throw unreadable(
      `Row ${headerRow.row} is a header and nothing stands below it. Choose a file with one row a session.`,
    );
  }
  if (filled.length > readingLimits.rows) {
    throw new PriceFileError(
      'too-large',
      `The file has ${filled.length} rows; at most ${readingLimits.rows} are read from one file. Split it.`,
    );
  }
  const headers = headerRow.cells.map((cell, index) => ({
    text: cellText(cell).slice(0, 120),
    samples: filled.slice(0, samplesPerColumn).map((row) => cellText(row.cells[index]).slice(0, 40)),
  }));

  const keepsColumns =
    chosen !== null && (chosen.headerRow === shown?.reading.headerRow || answered.includes('columns'));
  if (keepsColumns && chosen.columns.length !== width) {
    throw readingInvalid(
      `The header in row ${headerRow.row} has ${width} columns, and ${chosen.columns.length} meanings were given. Choose one for each.`,
    );
  }
  const columns = keepsColumns ? chosen.columns : header.columns;
  const twice = (['date', 'open', 'high', 'low', 'close'] as const).find(
    (column) => columns.indexOf(column) !== columns.lastIndexOf(column),
  );
  if (twice !== undefined) throw readingInvalid(`Two columns are marked as ${twice}. Choose one of them.`);

  const dates = detectDateOrder(cellsOf(filled, columns, ['date']));
  const marks = detectDecimalMark(cellsOf(filled, columns, ['open', 'high', 'low', 'close']));
  const dateOrder = chosen !== null && answered.includes('dateOrder') ? (chosen.dateOrder ?? dates.order) : dates.order;
  const decimalMark = chosen !== null && answered.includes('decimalMark') ? chosen.decimalMark : marks.mark;

  const questions: ReadingQuestion[] = [];
  if (table.candidateSheets.length > 1 && !answered.includes('sheet'))
    questions.push(sheetQuestion(table.candidateSheets));
  const isSettled = header.isCertain || answered.includes('columns');
  for (const column of ['date', 'close'] as const) {
    if (!columns.includes(column)) questions.push(columnQuestion(column, headers));
  }
  if (!isSettled && columns.includes('date') && columns.includes('close'))
    questions.push(columnQuestion('close', headers));
  if (dateOrder === null && columns.includes('date')) questions.push(dateOrderQuestion(dates.example));
  if (!marks.isCertain && !answered.includes('decimalMark')) questions.push(decimalMarkQuestion(marks.example));

  const reading: Reading = {
    sheet: table.sheet,
    headerRow: headerRow.row,
    columns: [...columns],
    dateOrder,
    decimalMark,
  };
  const isReadable = dateOrder !== null && columns.includes('date') && columns.includes('close');
  const headerCells = headers.map(({ text }) => text);
  const read = isReadable
    ? readBars(rows, { headerCells, columns, dateOrder, decimalMark, calendar: usOptionsCalendar, now })
    : { bars: [], refused: [], rowsRead: filled.length };
  return { sheets: table.sheets, headers, reading, answered, questions, ...read };
}
