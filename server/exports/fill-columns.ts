import { entryKeyColumns } from '@/server/exports/entry-columns';
import { type ExportColumn } from '@/server/exports/export-column';
import { type StoredFill } from '@/server/fills/fill-store';
import { type EntryRow } from '@/shared/entries/entry';

export interface ExportedFill {
  readonly row: EntryRow;
  readonly stored: StoredFill;
  /** Cash in (positive) or out, after fees; decimal text. */
  readonly cash: string;
}
type Option = Extract<StoredFill['fill']['instrument'], { kind: 'option' }>;

const ofOption =
  <Value>(pick: (option: Option) => Value) =>
  ({ stored: { fill } }: ExportedFill): Value | null =>
    fill.instrument.kind === 'option' ? pick(fill.instrument) : null;

export const fillColumns: readonly ExportColumn<ExportedFill>[] = [
  ...entryKeyColumns,
  { header: 'Fill', kind: 'text', meaning: 'Id of the fill', of: ({ stored }) => stored.fill.id },
  {
    header: 'Kind',
    kind: 'text',
    meaning: 'buy, sell, expiry, assignment or exercise',
    of: ({ stored }) => stored.fill.kind,
  },
  { header: 'Traded', kind: 'instant', meaning: 'UTC', of: ({ stored }) => new Date(stored.fill.tradedAt) },
  { header: 'Zone', kind: 'text', meaning: 'Time zone the time was written in', of: ({ stored }) => stored.timeZone },
  {
    header: 'Instrument',
    kind: 'text',
    meaning: 'Symbol of the underlying, or of the shares',
    of: ({ stored: { fill } }) =>
      fill.instrument.kind === 'option' ? fill.instrument.underlyingSymbol : fill.instrument.symbol,
  },
  { header: 'Type', kind: 'text', meaning: 'call or put; empty for shares', of: ofOption(({ type }) => type) },
  {
    header: 'Strike',
    kind: 'decimal',
    meaning: 'In the currency a share',
    of: ofOption(({ strikePrice }) => strikePrice),
  },
  {
    header: 'Expiry',
    kind: 'sessionDate',
    meaning: 'Session of the exchange',
    of: ofOption(({ expirySessionDate }) => expirySessionDate),
  },
  {
    header: 'Multiplier',
    kind: 'decimal',
    meaning: 'Shares a contract',
    of: ({ stored }) => stored.fill.instrument.multiplier,
  },
  {
    header: 'Quantity',
    kind: 'decimal',
    meaning: 'Contracts or shares, unsigned',
    of: ({ stored }) => stored.fill.quantity,
  },
  { header: 'Price', kind: 'decimal', meaning: 'In the currency a share', of: ({ stored }) => stored.fill.price },
  {
    header: 'Fees',
    kind: 'decimal',
    meaning: 'In the currency, all of the fill',
    of: ({ stored }) => stored.fill.fees,
  },
  {
    header: 'Underlying then',
    kind: 'decimal',
    meaning: 'Price of the underlying at the time, where it was noted',
    of: ({ stored }) => stored.underlyingPrice,
  },
  {
    header: 'Mid then',
    kind: 'decimal',
    meaning: 'Middle of bid and ask when it was decided, where it was noted',
    of: ({ stored }) => stored.midPrice,
  },
  {
    header: 'Underlying then',
    kind: 'decimal',
    meaning: 'Price of the underlying at the time, where it was noted',
    of: ({ stored }) => stored.underlyingPrice,
  },
  {
    header: 'Mid then',
    kind: 'decimal',
    meaning: 'Middle of bid and ask when it was decided, where it was noted',
    of: ({ stored }) => stored.midPrice,
  },
  { header: 'Cash', kind: 'decimal', meaning: 'In (positive) or out, after fees', of: ({ cash }) => cash },
];
