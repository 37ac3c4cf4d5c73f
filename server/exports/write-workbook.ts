import { once } from 'node:events';
import { PassThrough } from 'node:stream';
import { type CellValue } from 'exceljs';
import { type Cell, type CellKind, type ExportColumn, type ExportTable } from '@/server/exports/export-column';
import { harmlessText } from '@/server/exports/harmless-text';

const numberFormats: Partial<Record<CellKind, string>> = {
  decimal: '#,##0.00######',
  number: '0.0000####',
  fraction: '0.00%',
  sessionDate: 'yyyy-mm-dd',
  instant: 'yyyy-mm-dd hh:mm:ss',
};
const widths: Record<CellKind, number> = {
  text: 24,
  decimal: 14,
  number: 14,
  fraction: 12,
  sessionDate: 12,
  instant: 20,
  yesNo: 8,
};

/** Tables as a workbook: a sheet each with its head frozen, and a last one that says what each column means. */
export function writeWorkbook(tables: readonly ExportTable[]): PassThrough {
  const stream = new PassThrough();
  fill(stream, tables).catch((error: unknown) =>
    stream.destroy(error instanceof Error ? error : new Error(String(error))),
  );
  return stream;
}

async function fill(stream: PassThrough, tables: readonly ExportTable[]): Promise<void> {
  const { default: Excel } = await import('exceljs'); // large: loaded only where a workbook is written
  const workbook = new Excel.stream.xlsx.WorkbookWriter({ stream, useStyles: true, useSharedStrings: false });
  workbook.creator = 'Brierbook';
  for (const table of [...tables, meaningsOf(tables)]) {
    const sheet = workbook.addWorksheet(table.name, { views: [{ state: 'frozen', ySplit: 1 }] });
    sheet.columns = table.columns.map(({ header, kind }) => ({
      header,
      width: Math.max(widths[kind], header.length + 2),
      style: { numFmt: numberFormats[kind] ?? '@' },
    }));
    sheet.getRow(1).font = { bold: true };
    sheet.getRow(1).commit();
    for await (const rows of table.pages()) {
      for (const row of rows) {
        sheet.addRow(row.map((cell, index) => cellValue(cell, table.columns[index]?.kind ?? 'text'))).commit();
      }
      if (stream.writableNeedDrain) await once(stream, 'drain');
    }
    sheet.commit();
  }
  await workbook.commit();
}

interface Meaning {
  readonly table: string;
  readonly column: string;
  readonly meaning: string;
}
const meaningColumns: readonly ExportColumn<Meaning>[] = [
  { header: 'Sheet', kind: 'text', meaning: '', of: ({ table }) => table },
  { header: 'Column', kind: 'text', meaning: '', of: ({ column }) => column },
  { header: 'What it means', kind: 'text', meaning: '', of: ({ meaning }) => meaning },
];

function meaningsOf(tables: readonly ExportTable[]): ExportTable {
  const rows = tables.flatMap((table) =>
    table.columns.map(({ header, meaning }) =>
      meaningColumns.map(({ of }) => of({ table: table.name, column: header, meaning })),
    ),
  );
  return {
    name: 'columns',
    columns: meaningColumns,
    pages: async function* () {
      yield rows;
    },
  };
}

function cellValue(cell: Cell, kind: CellKind): CellValue {
  if (cell === null) return null;
  if (typeof cell === 'boolean') return cell ? 'yes' : 'no';
  if (kind === 'sessionDate') return new Date(`${String(cell)}T00:00:00Z`);
  // A cell of a sheet is a double: decimals keep fifteen digits there, and all of them in CSV and JSON.
  if (kind === 'decimal') return Number(cell);
  return typeof cell === 'string' ? harmlessText(cell) : cell;
}
