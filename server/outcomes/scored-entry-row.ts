import { structureKind } from '@/journal/contracts/structure-kind';
import { profitDeviation } from '@/journal/forecast/profit-deviation';
import { toModelNumber } from '@/journal/money/decimal';
import { type EntryOutcome } from '@/journal/outcome/entry-outcome';
import { horizonClass } from '@/journal/scoring/horizon-class';
import { instantMilliseconds } from '@/journal/sessions/instant';
import { sessionEndingAfter } from '@/journal/sessions/session-clock';
import { usOptionsCalendar } from '@/journal/sessions/us-options-calendar';
import { type EntryEntity } from '@/server/entries/entry-entity';
import { type ScoredEntryEntity } from '@/server/outcomes/scored-entry-entity';
import { type SealedPayload } from '@/server/seals/sealed-payload';

type Sealed = Pick<SealedPayload, 'input' | 'forecast'>;

/** What an entry brings to the scores, from its seal and its outcome. */
export function scoredEntryRow(
  entry: EntryEntity,
  { input, forecast }: Sealed,
  outcome: EntryOutcome,
): Omit<ScoredEntryEntity, 'id' | 'deskId'> {
  const { move, profit, sources, process } = outcome;
  const isClosed = profit?.isFinal === true;
  const parts = isClosed ? sources : null;
  const firstSessionDate = sessionEndingAfter(usOptionsCalendar, instantMilliseconds(input.spot.at)).date;
  const atEnd = forecast.atExit ?? forecast.atExpiry;
  return {
    entryId: entry.id,
    traderId: entry.traderId,
    underlyingId: entry.underlyingId,
    structureKind: structureKind(input.legs, toModelNumber(input.underlying.multiplier)),
    horizonClass: horizonClass({
      holdingSessions: forecast.sessions.holding,
      endsAtExpiry: forecast.atExit === null && forecast.expirySessionDate === firstSessionDate,
    }),
    tags: [...entry.plan.tags],
    firstSessionDate,
    exitSessionDate: forecast.exitSessionDate,
    judgedSessionDate: move?.sessionDate ?? null,
    isLateSeal: entry.isLateSeal,
    isTraded: profit !== null,
    volatilityMethod: volatilityMethod(input.volatility),
    moveDeviations: move?.inSigmas ?? null,
    movePlace: move?.percentile ?? null,
    volatilityRatio: move === null ? null : (outcome.realisedVolatility?.ratio ?? null),
    profitPlaceLow: profit?.percentileLow ?? null,
    profitPlaceHigh: profit?.percentileHigh ?? null,
    expectedMean: profit?.expectedMean ?? atEnd.mean.base,
    expectedDeviation: profitDeviation(atEnd),
    realisedProfit: isClosed ? profit.realised : null,
    profitFromMove: parts?.move ?? null,
    profitFromTime: parts?.time ?? null,
    profitFromVolatility: parts?.volatility ?? null,
    profitFromCarry: parts?.carry ?? null,
    profitFromMarks: parts?.markResidual ?? null,
    profitFromSlippage: parts?.slippage ?? null,
    profitFromFees: parts?.fees ?? null,
    isFollowed: process?.isFollowed ?? null,
    exitTag: process?.exitTag ?? null,
  };
}

/** How the volatility was estimated, in words that scores are cut by. */
function volatilityMethod({ source, window }: Sealed['input']['volatility']): string {
  if (source === 'window') return `${window ?? 0} sessions`;
  return source === 'ewma' ? 'exponentially weighted' : 'typed';
}
