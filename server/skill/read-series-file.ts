import { CsvError, parse } from 'csv-parse/sync';

/** A column of closes of a file, oldest first, blanks left out. */
export interface CloseSeries {
  readonly series: string;
  readonly closes: readonly number[];
}

/** What a file of series is refused for: where, what, and what to do. */
export class SeriesFileError extends Error {}

/** Columns that say when a session was; the first column does so whatever its name. */
const clockColumns: ReadonlySet<string> = new Set(['session', 'time', 'date', 'index']);
/** Ways to write that there is no close. */
const blanks: ReadonlySet<string> = new Set(['', '.', '-', 'na', 'n/a', 'nan', 'null']);
const plainNumber = /^[+-]?(\d+\.?\d*|\.\d+)(e[+-]?\d+)?$/i;

/**
 * Reads a file laid out like the reference series: lines that start with # are remarks, then a header, then a line per session with its
 * date or number first and a close for each series. A session without a close of a series is left out of that series, so that its next
 * return spans the gap.
 * @throws {SeriesFileError} naming file, line and column.
 */
export function readSeriesFile(text: string, fileName: string): CloseSeries[] {
  const [header, ...rows] = readRows(text, fileName);
  if (header === undefined)
    throw new SeriesFileError(`${fileName}: the file is empty. Give a header and a line per session.`);
  const names = header.cells;
  const columns = names.flatMap((series, column) =>
    column === 0 || clockColumns.has(series.toLowerCase()) ? [] : [{ series, column }],
  );
  if (columns.length === 0)
    throw new SeriesFileError(
      `${fileName}, line ${header.line}: the header names no series. Separate columns by commas: a session column, then one a series.`,
    );
  for (const { series, column } of columns) {
    if (series === '')
      throw new SeriesFileError(
        `${fileName}, line ${header.line}, column ${column + 1}: the header is blank. Name it.`,
      );
    if (names.indexOf(series) !== column)
      throw new SeriesFileError(`${fileName}, line ${header.line}: two columns are named ${series}. Rename one.`);
  }
  for (const { line, cells } of rows) {
    if (cells.length > names.length)
      throw new SeriesFileError(
        `${fileName}, line ${line}: ${cells.length} cells where the header has ${names.length}. Write numbers without commas in them.`,
      );
  }
  return columns.map(({ series, column }) => ({
    series,
    closes: rows.flatMap(({ line, cells }) =>
      readClose(cells[column] ?? '', `${fileName}, line ${line}, column ${series}`),
    ),
  }));
}

interface Row {
  readonly line: number;
  readonly cells: readonly string[];
}

function readRows(text: string, fileName: string): Row[] {
  try {
    // Remarks are blanked rather than left out, so that the lines keep their numbers.
    const plain = text.replace(/^[ \t]*#.*$/gm, '');
    const rows: Row[] = [];
    parse(plain, {
      bom: true,
      trim: true,
      relax_column_count: true,
      skip_records_with_empty_values: true,
      skip_empty_lines: true,
      on_record: (cells: string[], { lines }) => {
        rows.push({ line: lines, cells });
        return null;
      },
    });
    return rows;
  } catch (error) {
    if (error instanceof CsvError) throw new SeriesFileError(`${fileName}: ${error.message}. Correct the line.`);
    throw error;
  }
}

/** The close, or none where the cell is blank. */
function readClose(cell: string, place: string): number[] {
  if (blanks.has(cell.toLowerCase())) return [];
  const close = plainNumber.test(cell) ? Number(cell) : Number.NaN;
  if (!Number.isFinite(close))
    throw new SeriesFileError(`${place}: "${cell}" is no number. Write it like 1234.5, or leave the cell blank.`);
  if (!(close > 0)) throw new SeriesFileError(`${place}: ${cell} is not above 0. Correct it, or leave the cell blank.`);
  return [close];
}
