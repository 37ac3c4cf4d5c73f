import { entryKeyColumns } from '@/server/exports/entry-columns';
import { type ExportColumn } from '@/server/exports/export-column';
import { type EntryOutcome } from '@/journal/outcome/entry-outcome';
import { type EntryRow } from '@/shared/entries/entry';

export interface ExportedOutcome {
  readonly row: EntryRow;
  readonly outcome: EntryOutcome;
}

export const outcomeColumns: readonly ExportColumn<ExportedOutcome>[] = [
  ...entryKeyColumns,
  {
    header: 'Judged in',
    kind: 'sessionDate',
    meaning: 'Session whose price ended the move',
    of: ({ outcome }) => outcome.move?.sessionDate ?? null,
  },
  {
    header: 'Sessions',
    kind: 'number',
    meaning: 'Of the move, on the session clock',
    of: ({ outcome }) => outcome.move?.sessions ?? null,
  },
  {
    header: 'Start price',
    kind: 'number',
    meaning: 'Of the underlying at the seal',
    of: ({ outcome }) => outcome.move?.startPrice ?? null,
  },
  {
    header: 'End price',
    kind: 'number',
    meaning: 'Of the underlying at the end of the move',
    of: ({ outcome }) => outcome.move?.endPrice ?? null,
  },
  {
    header: 'Log return',
    kind: 'fraction',
    meaning: 'ln(end / start)',
    of: ({ outcome }) => outcome.move?.logReturn ?? null,
  },
  {
    header: 'Move in deviations',
    kind: 'number',
    meaning: 'Of the sealed forecast',
    of: ({ outcome }) => outcome.move?.inSigmas ?? null,
  },
  {
    header: 'Place of the move',
    kind: 'fraction',
    meaning: 'In the sealed distribution, 0 to 100%',
    of: ({ outcome }) => outcome.move?.percentile ?? null,
  },
  {
    header: 'Realised volatility',
    kind: 'fraction',
    meaning: 'Of a session over the hold, zero mean',
    of: ({ outcome }) => outcome.realisedVolatility?.dailyVolatility ?? null,
  },
  {
    header: 'Realised to planned',
    kind: 'number',
    meaning: 'Ratio of the volatilities',
    of: ({ outcome }) => outcome.realisedVolatility?.ratio ?? null,
  },
  {
    header: 'Realised profit',
    kind: 'decimal',
    meaning: 'After fees, in the currency',
    of: ({ outcome }) => outcome.profit?.realised ?? null,
  },
  { header: 'Fees', kind: 'decimal', meaning: 'Of all fills', of: ({ outcome }) => outcome.profit?.fees ?? null },
  {
    header: 'Final',
    kind: 'yesNo',
    meaning: 'The position is flat',
    of: ({ outcome }) => outcome.profit?.isFinal ?? null,
  },
  {
    header: 'Expected mean',
    kind: 'number',
    meaning: 'Of the sealed profit distribution it is compared with',
    of: ({ outcome }) => outcome.profit?.expectedMean ?? null,
  },
  {
    header: 'Place of the profit, from',
    kind: 'fraction',
    meaning: 'In the sealed distribution; an interval where amounts have odds of their own',
    of: ({ outcome }) => outcome.profit?.percentileLow ?? null,
  },
  {
    header: 'Place of the profit, to',
    kind: 'fraction',
    meaning: 'In the sealed distribution',
    of: ({ outcome }) => outcome.profit?.percentileHigh ?? null,
  },
  { header: 'Complete', kind: 'yesNo', meaning: 'No answer is waited for', of: ({ outcome }) => outcome.isComplete },
];
