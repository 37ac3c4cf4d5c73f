import { structureName } from '@/journal/contracts/structure-name';
import { DomainError } from '@/journal/errors/domain-error';
import { type Forecast } from '@/journal/forecast/forecast';
import { type ForecastInput } from '@/journal/forecast/forecast-input';
import { makeForecast } from '@/journal/forecast/make-forecast';
import { stripMarks } from '@/journal/forecast/strip-marks';
import { usOptionsCalendar } from '@/journal/sessions/us-options-calendar';
import { type EntryChanges } from '@/server/entries/entry-store';
import { type LoadedPlan } from '@/server/entries/plan-loader';
import { type DraftPlan } from '@/shared/entries/draft-plan';

/** What a list shows of a plan: filled as far as the draft allows. */
export function draftSummary(draft: DraftPlan, { underlying, reading }: LoadedPlan): EntryChanges {
  const forecast = reading.kind === 'complete' ? forecastOrNull(reading.input) : null;
  const name = forecast?.structureName ?? partialName(draft);
  return {
    structureName: name.slice(0, 120),
    searchText: [underlying.symbol, underlying.name, name, ...draft.tags, draft.idea].join(' ').slice(0, 12_000),
    ...(forecast === null || reading.kind !== 'complete' ? emptySummary : forecastSummary(reading.input, forecast)),
  };
}

const emptySummary = {
  strip: null,
  expirySessionDate: null,
  exitSessionDate: null,
  holdingSessions: null,
  expectedMean: null,
};

/** The figures of a forecast that lists show. */
export function forecastSummary(input: ForecastInput, forecast: Forecast) {
  const { strikes, breakEvens, target, stop } = stripMarks(input, forecast);
  return {
    strip: { strikes: [...strikes], breakEvens: [...breakEvens], target, stop, landed: null, now: null },
    expirySessionDate: forecast.expirySessionDate,
    exitSessionDate: forecast.exitSessionDate,
    holdingSessions: forecast.sessions.holding,
    expectedMean: (forecast.atExit ?? forecast.atExpiry).mean.base,
  };
}

function forecastOrNull(input: ForecastInput): Forecast | null {
  try {
    return makeForecast(input, usOptionsCalendar);
  } catch (error) {
    if (error instanceof DomainError) return null; // a draft may be impossible for a while; the planner says why
    throw error;
  }
}

/** A name for legs that are not complete yet. */
function partialName(draft: DraftPlan): string {
  const complete = draft.legs.flatMap((leg) =>
    /^\d+(\.\d+)?$/.test(leg.strikePrice) && Number(leg.strikePrice) > 0
      ? [{ ...leg, quantity: Math.max(1, Math.trunc(Number(leg.quantity)) || 1) }]
      : [],
  );
  return complete.length === draft.legs.length ? structureName(complete) : 'unfinished plan';
}
