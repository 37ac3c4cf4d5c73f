import { type ExportColumn } from '@/server/exports/export-column';
import { type ExportedEntry } from '@/server/exports/entry-pages';
import { type EntryRow } from '@/shared/entries/entry';

/** What ties the rows of every table to their entry. */
export const entryKeyColumns: readonly ExportColumn<{ readonly row: EntryRow }>[] = [
  { header: 'Entry', kind: 'text', meaning: 'Id of the entry; the same in every sheet', of: ({ row }) => row.id },
  { header: 'Trader', kind: 'text', meaning: 'Whose entry it is', of: ({ row }) => row.trader.displayName },
  { header: 'Underlying', kind: 'text', meaning: 'Its symbol', of: ({ row }) => row.underlying.symbol },
  {
    header: 'Structure',
    kind: 'text',
    meaning: 'By its name in the trade, with strikes',
    of: ({ row }) => row.structureName,
  },
];

const instant = (text: string | null) => (text === null ? null : new Date(text));

export const entryColumns: readonly ExportColumn<ExportedEntry>[] = [
  ...entryKeyColumns,
  {
    header: 'State',
    kind: 'text',
    meaning: 'draft, sealed, open, closed, reviewed or abandoned',
    of: ({ row }) => row.state,
  },
  { header: 'Tags', kind: 'text', meaning: 'Separated by commas', of: ({ row }) => row.tags.join(', ') },
  { header: 'Created', kind: 'instant', meaning: 'UTC', of: ({ row }) => new Date(row.createdAt) },
  { header: 'Sealed', kind: 'instant', meaning: 'UTC; empty for a draft', of: ({ row }) => instant(row.sealedAt) },
  {
    header: 'Sealed late',
    kind: 'yesNo',
    meaning: 'After its first fill: kept apart from the scores',
    of: ({ row }) => row.isLateSeal,
  },
  { header: 'First fill', kind: 'instant', meaning: 'UTC', of: ({ row }) => instant(row.firstFillAt) },
  { header: 'Last fill', kind: 'instant', meaning: 'UTC', of: ({ row }) => instant(row.lastFillAt) },
  {
    header: 'Planned exit',
    kind: 'sessionDate',
    meaning: 'Session of the exchange',
    of: ({ row }) => row.exitSessionDate,
  },
  { header: 'Expiry', kind: 'sessionDate', meaning: 'Session of the exchange', of: ({ row }) => row.expirySessionDate },
  {
    header: 'Holding sessions',
    kind: 'number',
    meaning: 'Planned, on the session clock',
    of: ({ row }) => row.holdingSessions,
  },
  {
    header: 'Expected mean',
    kind: 'number',
    meaning: 'Of the sealed profit distribution, in the currency',
    of: ({ row }) => row.expectedMean,
  },
  {
    header: 'Realised profit',
    kind: 'decimal',
    meaning: 'After fees, in the currency; final once the position is flat',
    of: ({ row }) => row.realisedProfit,
  },
  { header: 'Currency', kind: 'text', meaning: 'ISO 4217', of: ({ row }) => row.underlying.currency },
  { header: 'Idea', kind: 'text', meaning: 'In the trader’s words', of: ({ entity }) => entity.plan.idea },
  { header: 'Exit rule', kind: 'text', meaning: 'In the trader’s words', of: ({ entity }) => entity.plan.exitRule },
  { header: 'Lesson', kind: 'text', meaning: 'Written after the close', of: ({ entity }) => entity.lesson },
];
