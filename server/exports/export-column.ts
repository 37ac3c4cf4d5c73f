/** Decimals come as text with every digit, session dates as 'YYYY-MM-DD', instants as dates. */
export type Cell = string | number | boolean | Date | null;

export type CellKind = 'text' | 'decimal' | 'number' | 'fraction' | 'sessionDate' | 'instant' | 'yesNo';

export interface ExportColumn<Row> {
  readonly header: string;
  readonly kind: CellKind;
  /** Unit and meaning, for the sheet that explains the columns. */
  readonly meaning: string;
  readonly of: (row: Row) => Cell;
}

/** One row of a table, ready for any format: cells in the order of the table's columns. */
export interface ExportTable {
  readonly name: string;
  readonly columns: readonly Omit<ExportColumn<never>, 'of'>[];
  /** Rows in pages, so that no format holds them all. */
  readonly pages: () => AsyncIterable<readonly (readonly Cell[])[]>;
}

/** Ties columns to the source of their rows. */
export function exportTable<Row>(
  name: string,
  columns: readonly ExportColumn<Row>[],
  pages: () => AsyncIterable<readonly Row[]>,
): ExportTable {
  return {
    name,
    columns,
    pages: async function* () {
      for await (const page of pages()) yield page.map((row) => columns.map(({ of }) => of(row)));
    },
  };
}
