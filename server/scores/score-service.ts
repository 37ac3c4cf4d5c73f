import { meanBrierScore, brierScore } from '@/journal/scoring/brier-score';
import { scoringSummary } from '@/journal/scoring/scoring-summary';
import { type DeskScope } from '@/server/database/desk-scope';
import { EntryStore } from '@/server/entries/entry-store';
import { EntryEntity } from '@/server/entries/entry-entity';
import { type EntryDescriber } from '@/server/entries/describe-entry';
import { type ScoredOddsEntity } from '@/server/outcomes/scored-odds-entity';
import { ScoredOddsStore } from '@/server/outcomes/scored-odds-store';
import { scoreSentence } from '@/server/scores/score-sentence';
import { type Scores } from '@/shared/scores/score-endpoints';

const MOST_LISTED = 500;

/** Whether the odds come true: one's own, or for a mentor those of their traders. */
export class ScoreService {
  constructor(private readonly describer: EntryDescriber) {}

  async read(scope: DeskScope): Promise<Scores> {
    const traderIds = await readerOf(scope);
    const store = new ScoredOddsStore(scope);
    const [inTime, late, pendingCount] = await Promise.all([
      store.listResolved(traderIds, { isLateSeal: false }),
      store.listResolved(traderIds, { isLateSeal: true }),
      store.countPending(traderIds),
    ]);
    const forecasts = inTime.map(({ probability }) => probability);
    const outcomes = inTime.map(({ happened }) => happened === true);
    const { sampleRule, scores } = scoringSummary(forecasts, outcomes);
    return {
      resolved: await this.describe(scope, [...inTime, ...late].slice(0, MOST_LISTED)),
      count: inTime.length,
      lateCount: late.length,
      pendingCount,
      sampleRule,
      summary:
        scores === null
          ? null
          : {
              meanBrierScore: scores.meanBrierScore,
              marketMeanBrierScore: marketBrier(inTime),
              meanLogScore: scores.meanLogScore,
              baseRate: scores.baseRate,
              // Nearly every forecast is distinct, so the parts are those of the ten bins.
              reliability: scores.binned.reliability,
              resolution: scores.binned.resolution,
              uncertainty: scores.binned.uncertainty,
              bins: scores.curve.bins.map(({ forecast, observed, count, consistentLow, consistentHigh }) => ({
                forecast,
                observed,
                count,
                low: consistentLow,
                high: consistentHigh,
              })),
              curve: scores.curve.points.map(({ probability, observed }) => ({ forecast: probability, observed })),
              sentence: scoreSentence(scores.curve.bins, {
                count: inTime.length,
                whose: scope.actor.role === 'mentor' ? 'mentored' : 'own',
              }),
            },
    };
  }

  /** How many odds are resolved and how they score, for the short view on Today. */
  async brief(scope: DeskScope): Promise<{ count: number; meanBrierScore: number | null }> {
    const odds = await new ScoredOddsStore(scope).listResolved(await readerOf(scope), { isLateSeal: false });
    const { sampleRule } = scoringSummary(
      odds.map(({ probability }) => probability),
      odds.map(({ happened }) => happened === true),
    );
    const mean =
      sampleRule === 'list-only'
        ? null
        : meanBrierScore(
            odds.map(({ probability }) => probability),
            odds.map(({ happened }) => happened === true),
          );
    return { count: odds.length, meanBrierScore: mean };
  }

  private async describe(scope: DeskScope, odds: readonly ScoredOddsEntity[]): Promise<Scores['resolved']> {
    const ids = [...new Set(odds.map(({ entryId }) => entryId))];
    const entries =
      ids.length === 0
        ? []
        : await scope.repository(EntryEntity).query('entry').andWhere('entry.id IN (:...ids)', { ids }).getMany();
    const rows = new Map((await this.describer.rows(scope, entries)).map((row) => [row.id, row]));
    return odds.map((item) => {
      const row = rows.get(item.entryId);
      const happened = item.happened === true;
      return {
        entryId: item.entryId,
        symbol: row?.underlying.symbol ?? '',
        structureName: row?.structureName ?? '',
        traderName: row?.trader.displayName ?? '',
        key: item.oddsKey,
        statement: item.statement,
        dueSessionDate: item.dueSessionDate,
        probability: item.probability,
        marketImplied: item.marketImplied,
        happened,
        brierScore: brierScore(item.probability, happened),
        isLateSeal: item.isLateSeal,
      };
    });
  }
}

/** Whose odds the caller looks at. */
async function readerOf(scope: DeskScope): Promise<string[]> {
  return scope.actor.role === 'mentor' ? new EntryStore(scope).mentoredTraderIds() : [scope.actor.personId];
}

function marketBrier(odds: readonly ScoredOddsEntity[]): number | null {
  const stated = odds.flatMap(({ marketImplied, happened }) =>
    marketImplied === null ? [] : [{ marketImplied, happened: happened === true }],
  );
  if (stated.length === 0) return null;
  return meanBrierScore(
    stated.map(({ marketImplied }) => marketImplied),
    stated.map(({ happened }) => happened),
  );
}
