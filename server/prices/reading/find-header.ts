import { closeRank, headerMeaning, type HeaderMeaning } from '@/server/prices/reading/header-words';
import { readingLimits } from '@/server/prices/reading/reading-limits';
import { cellText, isBlankRow, type SourceRow } from '@/server/prices/reading/source-table';
import { type Reading } from '@/shared/prices/price-upload';

export type BarColumn = Reading['columns'][number];

export interface FoundHeader {
  /** Index into the rows. */
  readonly index: number;
  readonly columns: BarColumn[];
  /** False while the date or the close is not named, or named twice alike. */
  readonly isCertain: boolean;
}

const meaningsOf = (row: SourceRow): (HeaderMeaning | null)[] =>
  row.cells.map((cell) => (cell.kind === 'text' ? headerMeaning(cell.text) : null));

/** The meaning of each column from the words of its header, and whether they leave no doubt. */
export function columnsFromHeader(row: SourceRow): { columns: BarColumn[]; isCertain: boolean } {
  const meanings = meaningsOf(row);
  const columns: BarColumn[] = meanings.map(() => 'ignore');
  let isCertain = true;
  let chosenCloseRank: number = closeRank.close;
  for (const column of ['date', 'open', 'high', 'low', 'close'] as const) {
    const ranks = meanings.filter((meaning) => meaning?.column === column).map((meaning) => meaning?.rank ?? 0);
    const best = Math.min(...ranks);
    const index = meanings.findIndex((meaning) => meaning?.column === column && meaning.rank === best);
    if (index >= 0) columns[index] = column;
    if (column === 'close') chosenCloseRank = best;
    const isNeeded = column === 'date' || column === 'close';
    if (ranks.filter((rank) => rank === best).length > 1 || (isNeeded && index < 0)) isCertain = false;
  }
  // A settlement value or an adjusted close does not belong to the range of the raw trades beside it.
  if (chosenCloseRank >= closeRank.settlement && Number.isFinite(chosenCloseRank)) {
    for (const [index, column] of columns.entries()) {
      if (column === 'open' || column === 'high' || column === 'low') columns[index] = 'ignore';
    }
  }
  return { columns, isCertain };
}

const namesBoth = (columns: readonly BarColumn[]): boolean => columns.includes('date') && columns.includes('close');

/** A row of words only: it could be a header in a language we have no words for. */
const looksLikeHeader = (row: SourceRow): boolean => {
  const texts = row.cells.map(cellText).filter((text) => text !== '');
  return texts.length >= 2 && texts.every((text) => /\p{L}/u.test(text) && !/\d{2}/.test(text));
};

/** The header among the first rows: one that names date and close, else the one that names most, else a row of words. */
export function findHeader(rows: readonly SourceRow[]): FoundHeader | null {
  const searched = rows.slice(0, readingLimits.headerSearchRows);
  const read = searched.map((row, index) => ({ row, index, ...columnsFromHeader(row) }));
  const full = read.find(({ columns }) => namesBoth(columns));
  if (full !== undefined) return full;
  const partial = read.find(
    ({ row, columns }) => (columns.includes('date') || columns.includes('close')) && looksLikeHeader(row),
  );
  const words = partial ?? read.find(({ row }) => !isBlankRow(row) && looksLikeHeader(row));
  return words === undefined ? null : { ...words, isCertain: false };
}

/** How well rows split this way look like a price table: 2 for date and close named, 1 for one of them, 0 for neither. */
export function headerScore(rows: readonly SourceRow[]): 0 | 1 | 2 {
  const header = findHeader(rows);
  if (header === null) return 0;
  if (namesBoth(header.columns)) return 2;
  return header.columns.includes('date') || header.columns.includes('close') ? 1 : 0;
}
