/** One cell as the file holds it: text to be read, or a value the workbook already typed. */
export type SourceCell =
  | { readonly kind: 'text'; readonly text: string }
  /** A plain decimal number with a point. */
  | { readonly kind: 'number'; readonly text: string }
  /** YYYY-MM-DD. */
  | { readonly kind: 'date'; readonly text: string }
  /** What the workbook shows for a failed formula, such as #N/A. */
  | { readonly kind: 'error'; readonly text: string };

export interface SourceRow {
  /** 1-based line of a text file or row of a worksheet, where it starts. */
  readonly row: number;
  readonly cells: readonly SourceCell[];
}

export interface SourceTable {
  /** Visible worksheets in their order; empty for text files. */
  readonly sheets: readonly string[];
  /** The worksheet the rows come from; null for text files. */
  readonly sheet: string | null;
  /** Worksheets that look like price tables; more than one leaves a choice. */
  readonly candidateSheets: readonly string[];
  readonly rows: readonly SourceRow[];
}

export const cellText = (cell: SourceCell | undefined): string => cell?.text.trim() ?? '';

export const isBlankRow = (row: SourceRow): boolean => row.cells.every((cell) => cellText(cell) === '');
