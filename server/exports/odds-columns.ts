import { brierScore } from '@/journal/scoring/brier-score';
import { entryKeyColumns } from '@/server/exports/entry-columns';
import { type ExportColumn } from '@/server/exports/export-column';
import { type ScoredOddsEntity } from '@/server/outcomes/scored-odds-entity';
import { type EntryRow } from '@/shared/entries/entry';

export interface ExportedOdds {
  readonly row: EntryRow;
  readonly odds: ScoredOddsEntity;
}

export const oddsColumns: readonly ExportColumn<ExportedOdds>[] = [
  ...entryKeyColumns,
  { header: 'Statement', kind: 'text', meaning: 'What was said to happen', of: ({ odds }) => odds.statement },
  { header: 'Due', kind: 'sessionDate', meaning: 'Session that answers it', of: ({ odds }) => odds.dueSessionDate },
  { header: 'Odds', kind: 'fraction', meaning: 'As sealed, under base volatility', of: ({ odds }) => odds.probability },
  {
    header: 'Market-implied',
    kind: 'fraction',
    meaning: 'From the planned premiums; empty where none is implied',
    of: ({ odds }) => odds.marketImplied,
  },
  { header: 'Happened', kind: 'yesNo', meaning: 'Empty while it is not known', of: ({ odds }) => odds.happened },
  {
    header: 'Brier score',
    kind: 'number',
    meaning: '(odds − what happened)²; 0 is best',
    of: ({ odds }) => (odds.happened === null ? null : brierScore(odds.probability, odds.happened)),
  },
  {
    header: 'Brier score, market',
    kind: 'number',
    meaning: 'The same of the market-implied odds',
    of: ({ odds: { marketImplied, happened } }) =>
      happened === null || marketImplied === null ? null : brierScore(marketImplied, happened),
  },
  { header: 'Sealed late', kind: 'yesNo', meaning: 'Kept apart from the scores', of: ({ odds }) => odds.isLateSeal },
];
