import { Decimal, toDecimal, toDecimalText, toModelNumber } from '@/journal/money/decimal';
import { clusteredMean } from '@/journal/scoring/clustered-mean';
import { clusteredMeanInterval } from '@/journal/scoring/clustered-mean-interval';
import { casesToTellMean } from '@/journal/scoring/sample-size-needed';
import { grouped } from '@/server/scores/grouped';
import { sampled, type SampleOptions } from '@/server/scores/sampled';
import { effectiveCount, entryClusters } from '@/server/scores/score-clusters';
import { type EntryColumns } from '@/server/scores/score-columns';
import { type Scores } from '@/shared/scores/scores';

type Money = Scores['money'][number];
type Point = NonNullable<Money['figures']>['points'][number];
type Closed = EntryColumns & { readonly realisedProfit: string };

const MOST_POINTS = 200;

/** Expected and realised profit of closed entries, one report a currency; the most used first. */
export function moneyFigures(
  entries: readonly EntryColumns[],
  currencyOf: (underlyingId: string) => string,
  options: SampleOptions,
): Money[] {
  const closed = entries.flatMap((entry): Closed[] =>
    entry.realisedProfit === null ? [] : [{ ...entry, realisedProfit: entry.realisedProfit }],
  );
  const byCurrency = grouped(closed, ({ underlyingId }) => [currencyOf(underlyingId)]);
  return [...byCurrency]
    .sort(([one, some], [other, more]) => more.length - some.length || one.localeCompare(other, 'en'))
    .map(([currency, members]) => ({
      currency,
      ...sampled(members.length, options, () => figuresOf(members)),
    }));
}

function figuresOf(entries: readonly Closed[]): NonNullable<Money['figures']> {
  const profits = entries.map(({ realisedProfit }) => toModelNumber(realisedProfit));
  const clusters = entryClusters(entries);
  const estimate = clusteredMean(profits, clusters);
  const interval = clusteredMeanInterval(estimate);
  const spread =
    entries.length < 2
      ? 0
      : Math.sqrt(profits.reduce((sum, one) => sum + (one - estimate.mean) ** 2, 0) / (entries.length - 1));
  return {
    expected: entries.reduce((sum, { expectedMean }) => sum + expectedMean, 0),
    realised: total(entries.map(({ realisedProfit }) => realisedProfit)),
    points: thinned(pathOf(entries, profits)),
    mean: estimate.mean,
    standardDeviation: spread,
    standardError: estimate.standardError,
    low: interval?.low ?? null,
    high: interval?.high ?? null,
    effectiveCount: effectiveCount(profits, clusters),
    casesNeeded:
      estimate.mean !== 0 && spread > 0 ? casesToTellMean({ mean: estimate.mean, standardDeviation: spread }) : null,
    sources: sourcesOf(entries),
  };
}

/** Sums in the order of the sessions that ended them. */
function pathOf(entries: readonly Closed[], profits: readonly number[]): Point[] {
  const ordered = entries
    .map((entry, index) => ({
      sessionDate: entry.judgedSessionDate ?? entry.exitSessionDate,
      entry,
      profit: profits[index] ?? 0,
    }))
    .sort((one, other) => (one.sessionDate < other.sessionDate ? -1 : Number(one.sessionDate > other.sessionDate)));
  let [expected, realised, variance] = [0, 0, 0];
  return ordered.map(({ sessionDate, entry, profit }, index) => {
    expected += entry.expectedMean;
    realised += profit;
    variance += entry.expectedDeviation ** 2;
    return { sessionDate, entries: index + 1, expected, realised, deviation: Math.sqrt(variance) };
  });
}

function thinned(points: readonly Point[]): Point[] {
  const step = Math.max(1, (points.length - 1) / (MOST_POINTS - 1));
  return Array.from(
    { length: Math.min(points.length, MOST_POINTS) },
    (_, index) => points[Math.round(index * step)],
  ).filter((point) => point !== undefined);
}

/** What the profits of attributed entries came from; the parts add up to their sum exactly. */
function sourcesOf(entries: readonly Closed[]): NonNullable<Money['figures']>['sources'] {
  const attributed = entries.filter(({ profitFromMove }) => profitFromMove !== null);
  if (attributed.length === 0) return null;
  const sum = (part: (entry: Closed) => string | null) => total(attributed.flatMap((entry) => part(entry) ?? []));
  return {
    count: attributed.length,
    expected: attributed.reduce((all, { expectedMean }) => all + expectedMean, 0),
    move: sum(({ profitFromMove }) => profitFromMove),
    time: sum(({ profitFromTime }) => profitFromTime),
    volatility: sum(({ profitFromVolatility }) => profitFromVolatility),
    carry: sum(({ profitFromCarry }) => profitFromCarry),
    markResidual: sum(({ profitFromMarks }) => profitFromMarks),
    slippage: sum(({ profitFromSlippage }) => profitFromSlippage),
    fees: sum(({ profitFromFees }) => profitFromFees),
    realised: sum(({ realisedProfit }) => realisedProfit),
  };
}

const total = (amounts: readonly string[]): string =>
  toDecimalText(amounts.reduce((sum, amount) => sum.plus(toDecimal(amount)), new Decimal(0)));
