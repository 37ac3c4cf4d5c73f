import { stringify } from 'csv-stringify/sync';
import { type Cell, type CellKind, type ExportTable } from '@/server/exports/export-column';
import { harmlessText } from '@/server/exports/harmless-text';

/** A table as CSV by RFC 4180, in UTF-8 with the mark that lets spreadsheets see it. */
export async function* writeCsv(table: ExportTable): AsyncGenerator<string> {
  yield `\uFEFF${lines([table.columns.map(({ header }) => harmlessText(header))])}`;
  for await (const rows of table.pages()) {
    yield lines(rows.map((row) => row.map((cell, index) => csvText(cell, table.columns[index]?.kind ?? 'text'))));
  }
}

const lines = (rows: readonly (readonly string[])[]) => stringify([...rows], { record_delimiter: '\r\n' });

function csvText(cell: Cell, kind: CellKind): string {
  if (cell === null) return '';
  if (cell instanceof Date) return cell.toISOString();
  if (typeof cell === 'boolean') return cell ? 'yes' : 'no';
  // Numbers by type stay numbers, with their minus.
  return kind === 'text' ? harmlessText(String(cell)) : String(cell);
}
