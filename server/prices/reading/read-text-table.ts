import { CsvError, parse } from 'csv-parse/sync';
import { decodeText } from '@/server/prices/reading/decode-text';
import { headerScore } from '@/server/prices/reading/find-header';
import { PriceFileError, unreadable } from '@/server/prices/reading/price-file-error';
import { readingLimits } from '@/server/prices/reading/reading-limits';
import { type SourceRow, type SourceTable } from '@/server/prices/reading/source-table';

const delimiters = [',', ';', '\t', '|'] as const;

const countLines = (text: string): number => {
  let count = 1;
  for (let at = text.indexOf('\n'); at >= 0; at = text.indexOf('\n', at + 1)) count += 1;
  return count;
};

function refuseTooLarge(text: string): void {
  const lines = countLines(text);
  // Blank lines and lines above the header are not rows; a margin of a thousand is left for them.
  if (lines > readingLimits.rows + 1_000) {
    throw new PriceFileError(
      'too-large',
      `The file has ${lines} lines; at most ${readingLimits.rows} rows are read from one file. Split it.`,
    );
  }
  let start = 0;
  for (let line = 1; start <= text.length; line += 1) {
    const found = text.indexOf('\n', start);
    const end = found < 0 ? text.length : found;
    if (end - start > readingLimits.recordCharacters) {
      throw new PriceFileError(
        'too-large',
        `Row ${line}: the line is longer than ${readingLimits.recordCharacters} characters. Check that the file has one session a line.`,
      );
    }
    start = end + 1;
  }
}

const quoteProblems: ReadonlyMap<string, string> = new Map([
  ['CSV_QUOTE_NOT_CLOSED', 'a quote mark opens and is never closed. Close it or remove it.'],
  ['CSV_INVALID_CLOSING_QUOTE', 'text follows a closing quote mark. Remove the text or the quote marks.'],
  ['INVALID_OPENING_QUOTE', 'a quote mark stands inside a value. Remove it.'],
]);

function splitRows(text: string, delimiter: string, { isProbe }: { isProbe: boolean }): SourceRow[] {
  const rows: SourceRow[] = [];
  let nextRow = 1;
  try {
    parse(text, {
      delimiter,
      record_delimiter: '\n',
      relax_column_count: true,
      relax_quotes: isProbe,
      max_record_size: readingLimits.recordCharacters,
      ...(isProbe ? { to: readingLimits.headerSearchRows } : {}),
      on_record: (record: string[], { lines }) => {
        rows.push({ row: nextRow, cells: record.map((cell) => ({ kind: 'text', text: cell })) });
        nextRow = lines + 1;
        return null; // the rows are kept above, with their lines
      },
    });
  } catch (error) {
    if (isProbe && error instanceof CsvError) return rows;
    if (!(error instanceof CsvError)) throw error;
    const problem = quoteProblems.get(error.code) ?? 'the line cannot be split into columns. Check its quote marks.';
    throw unreadable(`Row ${nextRow}: ${problem}`);
  }
  return rows;
}

/** The delimiter under which the header reads best; among equals the one that gives most columns. */
function detectDelimiter(text: string): string {
  const probe = text.slice(0, 2 * readingLimits.recordCharacters);
  const scored = delimiters.map((delimiter) => {
    const rows = splitRows(probe, delimiter, { isProbe: true });
    return { delimiter, score: headerScore(rows), columns: Math.max(0, ...rows.map(({ cells }) => cells.length)) };
  });
  scored.sort((a, b) => b.score - a.score || b.columns - a.columns);
  return scored[0]?.delimiter ?? ',';
}

/** The rows of a text file, with the line each starts on. */
export function readTextTable(bytes: Uint8Array): SourceTable {
  const text = decodeText(bytes).replace(/\r\n?/g, '\n');
  refuseTooLarge(text);
  const rows = splitRows(text, detectDelimiter(text), { isProbe: false });
  return { sheets: [], sheet: null, candidateSheets: [], rows };
}
