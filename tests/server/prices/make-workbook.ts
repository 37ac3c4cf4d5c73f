import { Workbook, type Worksheet } from 'exceljs';

/** The bytes of a workbook whose sheets are filled by the given functions. */
export async function makeWorkbook(
  sheets: Record<string, (sheet: Worksheet) => void>,
  change: (workbook: Workbook) => void = () => undefined,
): Promise<Buffer> {
  const workbook = new Workbook();
  for (const [name, fill] of Object.entries(sheets)) fill(workbook.addWorksheet(name));
  change(workbook);
  return Buffer.from(await workbook.xlsx.writeBuffer());
}

/** A day as worksheets hold it. */
export const day = (date: string): Date => new Date(`${date}T00:00:00Z`);
