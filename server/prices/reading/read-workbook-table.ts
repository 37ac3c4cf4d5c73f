import { type CellValue, type Workbook, type Worksheet } from 'exceljs';
import { toDecimal } from '@/journal/money/decimal';
import { headerScore } from '@/server/prices/reading/find-header';
import { inspectWorkbook } from '@/server/prices/reading/inspect-workbook';
import { PriceFileError, readingInvalid, unreadable } from '@/server/prices/reading/price-file-error';
import { readingLimits } from '@/server/prices/reading/reading-limits';
import { type SourceCell, type SourceRow, type SourceTable } from '@/server/prices/reading/source-table';

/** A worksheet keeps doubles of which 15 digits are good; what lies beyond is noise of the binary form. */
const goodDigits = 15;

export const numberText = (value: number): string | null =>
  Number.isFinite(value) ? toDecimal(expand(value)).toFixed() : null;

const expand = (value: number): string => {
  const [mantissa = '', exponent = '0'] = value.toExponential(goodDigits - 1).split('e');
  const isNegative = mantissa.startsWith('-');
  const digits = mantissa.replace(/[-.]/g, '');
  const point = 1 + Number(exponent);
  const text =
    point <= 0
      ? `0.${'0'.repeat(-point)}${digits}`
      : point >= digits.length
        ? digits.padEnd(point, '0')
        : `${digits.slice(0, point)}.${digits.slice(point)}`;
  return isNegative ? `-${text}` : text;
};

const dayText = (value: Date): SourceCell => {
  const text = Number.isNaN(value.getTime()) ? '' : value.toISOString();
  if (text === '') return { kind: 'error', text: '#VALUE!' };
  const [day = '', time = ''] = text.split('T');
  return time === '00:00:00.000Z' ? { kind: 'date', text: day } : { kind: 'text', text: `${day} ${time.slice(0, 8)}` };
};

function sourceCell(value: CellValue): SourceCell {
  if (value === null || value === undefined) return { kind: 'text', text: '' };
  if (typeof value === 'string') return { kind: 'text', text: value };
  if (typeof value === 'boolean') return { kind: 'text', text: value ? 'TRUE' : 'FALSE' };
  if (typeof value === 'number') {
    const text = numberText(value);
    return text === null ? { kind: 'error', text: '#NUM!' } : { kind: 'number', text };
  }
  if (value instanceof Date) return dayText(value);
  if ('error' in value) return { kind: 'error', text: value.error };
  if ('richText' in value) return { kind: 'text', text: value.richText.map(({ text }) => text).join('') };
  if ('hyperlink' in value) return { kind: 'text', text: String(value.text) };
  if ('formula' in value || 'sharedFormula' in value) {
    // Only what the spreadsheet last calculated is used; a formula without a result is an empty cell.
    return value.result === undefined ? { kind: 'text', text: '' } : sourceCell(value.result);
  }
  return { kind: 'text', text: '' };
}

function rowsOf(sheet: Worksheet, mostRows: number): SourceRow[] {
  const rows: SourceRow[] = [];
  sheet.eachRow({ includeEmpty: false }, (row, rowNumber) => {
    if (rows.length >= mostRows) return;
    const cells: SourceCell[] = [];
    row.eachCell({ includeEmpty: false }, (cell, columnNumber) => {
      if (columnNumber > readingLimits.columns) {
        throw new PriceFileError(
          'too-large',
          `Row ${rowNumber}: a value stands in column ${columnNumber}; at most ${readingLimits.columns} columns are read. Remove what lies beyond.`,
        );
      }
      while (cells.length < columnNumber - 1) cells.push({ kind: 'text', text: '' });
      const read = sourceCell(cell.value);
      if (read.text.length > readingLimits.cellCharacters) {
        throw new PriceFileError(
          'too-large',
          `Row ${rowNumber}: a cell holds more than ${readingLimits.cellCharacters} characters. Shorten it or remove the column.`,
        );
      }
      cells.push(read);
    });
    rows.push({ row: rowNumber, cells });
  });
  return rows;
}

async function loadWorkbook(bytes: Buffer): Promise<Workbook> {
  const { default: Excel } = await import('exceljs'); // large: loaded only where a workbook is read
  const workbook = new Excel.Workbook();
  try {
    // exceljs types its argument by an older Buffer; the value is the same.
    await workbook.xlsx.load(bytes as unknown as Parameters<typeof workbook.xlsx.load>[0]);
  } catch {
    throw unreadable('The workbook is damaged or incomplete. Open it in a spreadsheet and save it again as XLSX.');
  }
  return workbook;
}

/** The rows of one worksheet: the one asked for, else the first that looks like prices. Hidden sheets are left out. */
export async function readWorkbookTable(bytes: Buffer, wantedSheet: string | null): Promise<SourceTable> {
  await inspectWorkbook(bytes);
  const workbook = await loadWorkbook(bytes);
  const visible = workbook.worksheets.filter((sheet) => sheet.state === 'visible');
  const candidates = visible.filter((sheet) => headerScore(rowsOf(sheet, readingLimits.headerSearchRows)) === 2);
  const sheet =
    wantedSheet === null
      ? (candidates[0] ?? visible.find(({ actualRowCount }) => actualRowCount > 0))
      : visible.find(({ name }) => name === wantedSheet);
  if (sheet === undefined) {
    throw wantedSheet === null
      ? unreadable('The workbook has no sheet with values. Choose one with a header and one row a session.')
      : readingInvalid(
          `The workbook has no sheet "${wantedSheet}". Choose one of: ${visible.map(({ name }) => name).join(', ')}.`,
        );
  }
  const sheets = visible.map(({ name }) => name);
  const candidateSheets = candidates.map(({ name }) => name);
  return { sheets, sheet: sheet.name, candidateSheets, rows: rowsOf(sheet, Infinity) };
}
