import { DomainError } from '@/journal/errors/domain-error';
import { type Forecast } from '@/journal/forecast/forecast';
import { type ForecastInput } from '@/journal/forecast/forecast-input';
import { makeForecast } from '@/journal/forecast/make-forecast';
import { toModelNumber } from '@/journal/money/decimal';
import { secondOpinion } from '@/journal/pricing/second-opinion';
import { usOptionsCalendar } from '@/journal/sessions/us-options-calendar';
import { AuditLog } from '@/server/database/audit-log';
import { type DeskScope } from '@/server/database/desk-scope';
import { forecastSummary } from '@/server/entries/draft-summary';
import { type EntryEntity } from '@/server/entries/entry-entity';
import { assertDraft, EntryStore } from '@/server/entries/entry-store';
import { loadPlan } from '@/server/entries/plan-loader';
import { ApiFailure } from '@/server/errors/api-failure';
import { type OutcomeService } from '@/server/outcomes/outcome-service';
import { type Clock } from '@/server/runtime/clock';
import { type Ids } from '@/server/runtime/ids';
import { newSalt } from '@/server/runtime/secrets';
import { refuseUntimely } from '@/server/seals/refuse-untimely';
import { SealStore } from '@/server/seals/seal-store';
import { payloadText } from '@/server/seals/sealed-payload';
import { UnderlyingStore } from '@/server/underlyings/underlying-store';
import { forecastInputSchema } from '@/shared/entries/forecast-schema';
import { planProblemOf } from '@/shared/entries/plan-problem-of';

interface Dependencies {
  readonly clock: Clock;
  readonly ids: Ids;
  readonly outcomes: OutcomeService;
}
export interface SealRequest {
  readonly entryId: string;
  readonly version: number;
  readonly requestId: string;
}

/** Freezes plans: recomputed here, checked by a second implementation, stored in the trader's chain. */
export class SealService {
  constructor(private readonly dependencies: Dependencies) {}

  seal(scope: DeskScope, { entryId, version, requestId }: SealRequest): Promise<EntryEntity> {
    const { clock, ids, outcomes } = this.dependencies;
    return scope.inTransaction(async (inner) => {
      const seals = new SealStore(inner);
      await seals.awaitTurn(inner.actor.personId);
      const entries = new EntryStore(inner);
      const entry = await entries.getOwn(entryId, { locked: true });
      assertDraft(entry);
      if (entry.version !== version) {
        throw new ApiFailure('changed-elsewhere', 'This plan was changed since you looked at it.');
      }
      // A bar that is being stored comes before the seal, or finds the entry sealed.
      await new UnderlyingStore(inner).hold(entry.underlyingId);
      const { reading, closes } = await loadPlan(inner, entry.plan);
      if (reading.kind === 'incomplete')
        throw new ApiFailure('plan-incomplete', 'The plan is not complete.', reading.problems);
      const { input } = reading;
      refuseUnsealable(input);
      const forecast = forecastOrRefusal(input);
      refuseDisagreement(input, forecast);
      const sealedAt = clock.now();
      refuseUntimely(input, sealedAt);

      const used = closes.filter(
        ({ sessionDate }) =>
          input.volatility.lastSessionDate !== null && sessionDate <= input.volatility.lastSessionDate,
      );
      await seals.append({
        forecastId: ids.next(),
        contentId: ids.next(),
        traderId: entry.traderId,
        entryId,
        sealedAt,
        salt: newSalt(),
        text: payloadText({ plan: entry.plan, input, forecast, closes: used }),
        engineVersion: forecast.engineVersion,
      });
      await entries.replace(
        { id: entryId, version },
        {
          ...forecastSummary(input, forecast),
          structureName: forecast.structureName.slice(0, 120),
          state: 'sealed',
          sealedAt,
        },
      );
      await new AuditLog(inner, { clock, ids, requestId }).note('entry-sealed', entryId, {
        engineVersion: forecast.engineVersion,
      });
      await outcomes.recompute(inner, entryId, { kind: 'seal' });
      return entries.getOwn(entryId);
    });
  }
}

function forecastOrRefusal(input: ForecastInput): Forecast {
  try {
    return makeForecast(input, usOptionsCalendar);
  } catch (error) {
    if (!(error instanceof DomainError)) throw error;
    throw new ApiFailure('plan-incomplete', 'The plan cannot be computed.', [planProblemOf(error)]);
  }
}

/** What cannot be read back from the seal is not sealed: numbers written in a way the stored form does not know, such as -0. */
function refuseUnsealable(input: ForecastInput): void {
  const result = forecastInputSchema.safeParse(input);
  if (result.success) return;
  const fields: Readonly<Record<string, string>> = { 'spot.at': 'spotAt', 'spot.price': 'spotPrice' };
  const problems = result.error.issues.map(({ path, message }) => {
    const field = path.join('.');
    return { field: fields[field] ?? field, message };
  });
  throw new ApiFailure('plan-incomplete', 'The plan is not written in a way that can be sealed.', problems);
}

/** Each European leg is priced again by code that shares nothing with ours; beyond its known accuracy nothing is sealed. */
function refuseDisagreement(input: ForecastInput, forecast: Forecast): void {
  const problems = input.legs.flatMap((leg, index) => {
    const opinion = secondOpinion({
      type: leg.type,
      spotPrice: toModelNumber(input.spot.price),
      strikePrice: toModelNumber(leg.strikePrice),
      dailyVolatility: input.volatility.base,
      sessions: forecast.sessions.toExpiry,
      years: forecast.years.toExpiry,
      ratePerYear: input.ratePerYear,
      dividendYield: input.underlying.dividendYield,
    });
    const what = `Leg ${index + 1}: the two engines differ by ${Math.abs(opinion.difference).toPrecision(3)} a share.`;
    return opinion.agrees ? [] : [{ field: `legs.${index}`, message: what }];
  });
  if (problems.length > 0)
    throw new ApiFailure('engines-disagree', 'Sealing is refused: the two engines do not agree.', problems);
}
