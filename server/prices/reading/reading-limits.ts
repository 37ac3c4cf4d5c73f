import { priceFileLimits } from '@/shared/prices/price-upload-endpoints';

/** What one price file may hold; every figure is named in the message that refuses. */
export const readingLimits = {
  ...priceFileLimits,
  columns: 100,
  cellCharacters: 4_096,
  recordCharacters: 65_536,
  /** Rows above the table in which the header is looked for. */
  headerSearchRows: 20,
  workbookEntries: 200,
  workbookInflatedBytes: 50 * 1024 * 1024,
  workbookRatio: 100,
  /** Below this, a high ratio is harmless and common (styles, themes). */
  workbookRatioFromBytes: 1024 * 1024,
  /** Rows without a close before this date are no daily bars of listed options' underlyings. */
  earliestSessionDate: '1990-01-01',
  decimals: 12,
  integerDigits: 18,
} as const;
