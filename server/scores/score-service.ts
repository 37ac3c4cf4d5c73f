import { brierScore } from '@/journal/scoring/brier-score';
import { horizonClasses } from '@/journal/scoring/horizon-class';
import { toDecimal, toDecimalText } from '@/journal/money/decimal';
import { type DeskScope } from '@/server/database/desk-scope';
import { EntryEntity } from '@/server/entries/entry-entity';
import { EntryStore } from '@/server/entries/entry-store';
import { ScoredOddsEntity } from '@/server/outcomes/scored-odds-entity';
import { namesOnDesk } from '@/server/people/people-names';
import { moneyFigures } from '@/server/scores/money-figures';
import { lateFigures, marketFigures, oddsFigures } from '@/server/scores/odds-figures';
import { coverageFigures, moveFigures, profitPlaceFigures } from '@/server/scores/place-figures';
import { processFigures } from '@/server/scores/process-figures';
import { sampled } from '@/server/scores/sampled';
import { type ScoredCall } from '@/server/scores/score-clusters';
import { type EntryColumns, type OddsColumns, ScoreColumns } from '@/server/scores/score-columns';
import { scoreCuts } from '@/server/scores/score-cuts';
import { scoreSentence } from '@/server/scores/score-sentence';
import { volatilityFigures } from '@/server/scores/volatility-figures';
import { UnderlyingStore } from '@/server/underlyings/underlying-store';
import { type ScoreFilter } from '@/shared/scores/score-filter';
import { type ListedEntry, type Scores } from '@/shared/scores/scores';

const MOST_LISTED = 500;

/** Names that rows are shown with. */
interface Names {
  readonly underlyings: ReadonlyMap<string, { readonly symbol: string; readonly currency: string }>;
  readonly people: ReadonlyMap<string, string>;
}

/** Whether the odds come true and what became of the plans: one's own, or for a mentor those of their traders. */
export class ScoreService {
  async read(scope: DeskScope, filter: ScoreFilter = {}): Promise<Scores> {
    const traderIds = await readerOf(scope);
    const columns = new ScoreColumns(scope, traderIds);
    const [entries, odds, unanswered, combinations, underlyings, people] = await Promise.all([
      columns.entries(filter),
      columns.resolvedOdds(filter),
      columns.countUnanswered(filter),
      columns.combinations(),
      new UnderlyingStore(scope).list(),
      namesOnDesk(scope),
    ]);
    const names: Names = { underlyings: new Map(underlyings.map((each) => [each.id, each])), people };
    const byId = new Map(entries.map((entry) => [entry.entryId, entry]));
    const calls = odds.flatMap((one): ScoredCall[] => {
      const entry = byId.get(one.entryId);
      return entry === undefined ? [] : [{ odds: one, entry }];
    });
    const inTime = calls.filter(({ entry }) => !entry.isLateSeal);
    const judged = entries.filter(({ isLateSeal }) => !isLateSeal);
    const options = { evenIfFew: filter.evenIfFew === 'yes' };
    const whose = scope.actor.role === 'mentor' ? 'mentored' : 'own';
    const report = oddsFigures(inTime, options);
    const isSpoken = report.odds.sampleRule !== 'list-only';
    return {
      whose,
      sentence: scoreSentence(isSpoken ? report.bins : [], { count: inTime.length, whose, isSpoken }),
      choices: choicesOf(combinations, names),
      entryCount: judged.length,
      pendingCount: unanswered.pending,
      cannotTellCount: unanswered.cannotTell,
      odds: report.odds,
      late: lateFigures(
        calls.filter(({ entry }) => entry.isLateSeal),
        options,
      ),
      market: marketFigures(inTime, options),
      moves: moveFigures(judged, options),
      profits: profitPlaceFigures(judged, options),
      coverage: coverageFigures(judged, options),
      volatility: volatilityFigures(judged, options),
      money: moneyFigures(judged, (id) => names.underlyings.get(id)?.currency ?? 'XXX', options),
      process: processFigures(judged, options),
      cuts: scoreCuts(inTime, (id) => names.underlyings.get(id)?.symbol ?? '', options),
      ...(await listsOf(scope, { entries, calls, names })),
      resolvedCount: calls.length,
    };
  }

  /** How many odds are resolved and how they score, for the short view on Today. */
  async brief(scope: DeskScope): Promise<{ count: number; meanBrierScore: number | null }> {
    const { count, meanBrierScore } = await new ScoreColumns(scope, await readerOf(scope)).brief();
    return { count, meanBrierScore: sampled(count, { evenIfFew: false }, () => meanBrierScore).figures };
  }
}

/** Whose odds the caller looks at. */
async function readerOf(scope: DeskScope): Promise<string[]> {
  return scope.actor.role === 'mentor' ? new EntryStore(scope).mentoredTraderIds() : [scope.actor.personId];
}

function choicesOf(
  combinations: Awaited<ReturnType<ScoreColumns['combinations']>>,
  { underlyings, people }: Names,
): Scores['choices'] {
  const distinct = (values: readonly string[]) =>
    [...new Set(values)].sort((one, other) => one.localeCompare(other, 'en'));
  const held = new Set(combinations.map(({ horizonClass }) => horizonClass));
  return {
    traders: distinct(combinations.map(({ traderId }) => traderId)).map((id) => ({
      id,
      displayName: people.get(id) ?? 'former member',
    })),
    underlyings: distinct(combinations.map(({ underlyingId }) => underlyingId))
      .map((id) => ({ id, symbol: underlyings.get(id)?.symbol ?? '' }))
      .sort((one, other) => one.symbol.localeCompare(other.symbol, 'en')),
    structureKinds: distinct(combinations.map(({ structureKind }) => structureKind)),
    horizonClasses: horizonClasses.filter((name) => held.has(name)),
    tags: distinct(combinations.flatMap(({ tags }) => tags)),
  };
}

interface Listed {
  readonly entries: readonly EntryColumns[];
  readonly calls: readonly ScoredCall[];
  readonly names: Names;
}

/** The newest rows behind the figures, with the words that only lists need. */
async function listsOf(
  scope: DeskScope,
  { entries, calls, names }: Listed,
): Promise<Pick<Scores, 'resolved' | 'entries'>> {
  const newestCalls = calls.slice(-MOST_LISTED).reverse();
  const newestEntries = entries.slice(-MOST_LISTED).reverse();
  const ids = [...new Set([...newestEntries, ...newestCalls.map(({ entry }) => entry)].map(({ entryId }) => entryId))];
  const [structures, statements] = await Promise.all([structureNames(scope, ids), statementsOf(scope, newestCalls)]);
  const shown = (entry: EntryColumns) => ({
    entryId: entry.entryId,
    symbol: names.underlyings.get(entry.underlyingId)?.symbol ?? '',
    structureName: structures.get(entry.entryId) ?? entry.structureKind,
    traderName: names.people.get(entry.traderId) ?? 'former member',
    isLateSeal: entry.isLateSeal,
  });
  return {
    resolved: newestCalls.map(({ entry, odds }) => ({
      ...shown(entry),
      key: odds.oddsKey,
      statement: statements.get(statementKey(odds)) ?? '',
      dueSessionDate: odds.dueSessionDate,
      probability: odds.probability,
      marketImplied: odds.marketImplied,
      happened: odds.happened,
      brierScore: brierScore(odds.probability, odds.happened),
    })),
    entries: newestEntries.map((entry): ListedEntry => ({
      ...shown(entry),
      currency: names.underlyings.get(entry.underlyingId)?.currency ?? 'XXX',
      exitSessionDate: entry.exitSessionDate,
      volatilityMethod: entry.volatilityMethod,
      moveDeviations: entry.moveDeviations,
      movePlace: entry.movePlace,
      volatilityRatio: entry.volatilityRatio,
      profitPlaceLow: entry.profitPlaceLow,
      profitPlaceHigh: entry.profitPlaceHigh,
      expectedMean: entry.expectedMean,
      realisedProfit: entry.realisedProfit === null ? null : toDecimalText(toDecimal(entry.realisedProfit)),
      isFollowed: entry.isFollowed,
      exitTag: entry.exitTag,
    })),
  };
}

async function structureNames(scope: DeskScope, ids: readonly string[]): Promise<Map<string, string>> {
  if (ids.length === 0) return new Map();
  const rows = await scope
    .repository(EntryEntity)
    .query('entry')
    .andWhere('entry.id IN (:...ids)', { ids })
    .select(['entry.id AS id', 'entry.structureName AS name'])
    .getRawMany<{ id: string; name: string }>();
  return new Map(rows.map(({ id, name }) => [id, name]));
}

const statementKey = ({ entryId, oddsKey }: Pick<OddsColumns, 'entryId' | 'oddsKey'>) => `${entryId} ${oddsKey}`;

async function statementsOf(scope: DeskScope, calls: readonly ScoredCall[]): Promise<Map<string, string>> {
  if (calls.length === 0) return new Map();
  const rows = await scope
    .repository(ScoredOddsEntity)
    .query('odds')
    .andWhere('odds.entryId IN (:...ids)', { ids: [...new Set(calls.map(({ odds }) => odds.entryId))] })
    .select(['odds.entryId AS entryId', 'odds.oddsKey AS oddsKey', 'odds.statement AS statement'])
    .getRawMany<{ entryId: string; oddsKey: string; statement: string }>();
  return new Map(rows.map((row) => [statementKey(row), row.statement]));
}
