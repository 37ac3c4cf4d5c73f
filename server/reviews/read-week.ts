import { type EntryOutcome } from '@/journal/outcome/entry-outcome';
import { toDecimal, toDecimalText } from '@/journal/money/decimal';
import { brierScore, meanBrierScore } from '@/journal/scoring/brier-score';
import { scoringSummary } from '@/journal/scoring/scoring-summary';
import { type DeskScope } from '@/server/database/desk-scope';
import { type EntryDescriber } from '@/server/entries/describe-entry';
import { EntryEntity } from '@/server/entries/entry-entity';
import { OutcomeStore } from '@/server/outcomes/outcome-store';
import { ScoredOddsEntity } from '@/server/outcomes/scored-odds-entity';
import { type EntryRow } from '@/shared/entries/entry';
import { processMarkNames, type ReviewedWeek } from '@/shared/reviews/weekly-review-endpoints';
import { type SessionWeek } from '@/shared/reviews/session-week';

const MOST_ENTRIES = 200;
const MOST_ODDS = 1_000;

interface Question {
  readonly traderId: string;
  readonly week: SessionWeek;
  readonly describer: EntryDescriber;
}
type Gathered = Pick<ReviewedWeek, 'sealed' | 'closed' | 'odds' | 'meanBrierScore' | 'process' | 'profit'>;

/** What a trader sealed, closed and learned the answer of in a week. */
export async function readWeek(scope: DeskScope, { traderId, week, describer }: Question): Promise<Gathered> {
  const [sealed, closed, scored] = await Promise.all([
    entriesOf(scope, traderId).andWhere('entry.sealedAt >= :from AND entry.sealedAt < :before', week).getMany(),
    entriesOf(scope, traderId)
      .andWhere("entry.state IN ('closed', 'reviewed')")
      .andWhere('entry.lastFillAt >= :from AND entry.lastFillAt < :before', week)
      .getMany(),
    answeredOdds(scope, traderId, week),
  ]);
  const ids = [...new Set(scored.map(({ entryId }) => entryId))];
  const named = ids.length === 0 ? [] : await scope.repository(EntryEntity).find(ids.map((id) => ({ id })));
  const rows = new Map((await describer.rows(scope, [...sealed, ...closed, ...named])).map((row) => [row.id, row]));
  const rowsOf = (entries: readonly EntryEntity[]) => entries.flatMap(({ id }) => rows.get(id) ?? []);
  const outcomes = await new OutcomeStore(scope).listOf(closed.map(({ id }) => id));
  return {
    sealed: rowsOf(sealed),
    closed: rowsOf(closed),
    odds: scored.map(({ entryId, oddsKey, statement, probability, marketImplied, happened }) => ({
      entryId,
      key: oddsKey,
      entryName: nameOf(rows.get(entryId)),
      statement,
      probability,
      marketImplied,
      happened: happened === true,
      brierScore: brierScore(probability, happened === true),
    })),
    meanBrierScore: meanScore(scored),
    process: processCounts(outcomes.map(({ outcome }) => outcome)),
    profit: profits(rowsOf(closed)),
  };
}

function entriesOf(scope: DeskScope, traderId: string) {
  return scope
    .repository(EntryEntity)
    .query('entry')
    .andWhere('entry.traderId = :traderId', { traderId })
    .orderBy('entry.id')
    .take(MOST_ENTRIES);
}

function answeredOdds(scope: DeskScope, traderId: string, week: SessionWeek): Promise<ScoredOddsEntity[]> {
  return scope
    .repository(ScoredOddsEntity)
    .query('odds')
    .andWhere('odds.traderId = :traderId', { traderId })
    .andWhere('odds.happened IS NOT NULL')
    .andWhere('odds.isLateSeal = 0')
    .andWhere('odds.dueSessionDate BETWEEN :startSessionDate AND :endSessionDate', week)
    .orderBy('odds.dueSessionDate')
    .addOrderBy('odds.id')
    .take(MOST_ODDS)
    .getMany();
}

const nameOf = (row: EntryRow | undefined): string =>
  row === undefined ? '' : `${row.underlying.symbol} ${row.structureName}`;

function meanScore(scored: readonly ScoredOddsEntity[]): number | null {
  const forecasts = scored.map(({ probability }) => probability);
  const outcomes = scored.map(({ happened }) => happened === true);
  return scoringSummary(forecasts, outcomes).sampleRule === 'list-only' ? null : meanBrierScore(forecasts, outcomes);
}

function processCounts(outcomes: readonly EntryOutcome[]): Gathered['process'] {
  const marks = outcomes.flatMap(({ process }) =>
    process === null
      ? []
      : [
          {
            'sealed-before-fill': process.isSealedBeforeFill,
            size: process.size.isWithin,
            limit: process.limit?.isWithin ?? null,
            exit: process.exitTag === null ? null : process.exitTag !== 'unplanned',
          },
        ],
  );
  return processMarkNames.map((mark) => {
    const known = marks.map((kept) => kept[mark]).filter((kept) => kept !== null);
    return { mark, kept: known.filter((kept) => kept).length, of: known.length };
  });
}

function profits(closed: readonly EntryRow[]): Gathered['profit'] {
  const currencies = [...new Set(closed.map(({ underlying }) => underlying.currency))];
  return currencies.map((currency) => {
    const rows = closed.filter(({ underlying }) => underlying.currency === currency);
    const realised = rows.reduce((sum, row) => sum.plus(row.realisedProfit ?? '0'), toDecimal('0'));
    return {
      currency,
      count: rows.length,
      expectedMean: rows.reduce((sum, row) => sum + (row.expectedMean ?? 0), 0),
      realised: toDecimalText(realised),
    };
  });
}
