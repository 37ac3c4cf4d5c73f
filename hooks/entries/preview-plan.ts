import { DomainError } from '@/journal/errors/domain-error';
import { type Forecast } from '@/journal/forecast/forecast';
import { type ForecastInput } from '@/journal/forecast/forecast-input';
import { makeForecast } from '@/journal/forecast/make-forecast';
import { usOptionsCalendar } from '@/journal/sessions/us-options-calendar';
import { type DraftPlan } from '@/shared/entries/draft-plan';
import { type PlanProblem } from '@/shared/entries/plan-problem';
import { planProblemOf } from '@/shared/entries/plan-problem-of';
import { readPlan } from '@/shared/entries/read-plan';
import { type UnderlyingDetail } from '@/shared/underlyings/underlying-endpoints';

export type PlanPreview =
  | { readonly kind: 'ready'; readonly input: ForecastInput; readonly forecast: Forecast }
  | { readonly kind: 'incomplete'; readonly problems: readonly PlanProblem[] };

/** The forecast of a draft as it stands, by the same engine and the same rules as the server's, or what it lacks. */
export function previewPlan(draft: DraftPlan, { underlying, bars }: UnderlyingDetail): PlanPreview {
  const reading = readPlan({ draft, underlying, bars, calendar: usOptionsCalendar });
  if (reading.kind === 'incomplete') return reading;
  try {
    return { kind: 'ready', input: reading.input, forecast: makeForecast(reading.input, usOptionsCalendar) };
  } catch (error) {
    if (!(error instanceof DomainError)) throw error;
    return { kind: 'incomplete', problems: [planProblemOf(error)] };
  }
}
