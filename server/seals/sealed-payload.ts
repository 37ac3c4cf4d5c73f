import { type Forecast } from '@/journal/forecast/forecast';
import { type ForecastInput } from '@/journal/forecast/forecast-input';
import { fromCanonicalText, type SealedValue, toCanonicalText } from '@/server/seals/canonical-text';
import { type DraftPlan, draftPlanSchema } from '@/shared/entries/draft-plan';
import { forecastInputSchema, forecastSchema } from '@/shared/entries/forecast-schema';

/** Everything a seal freezes: the plan in the trader's words, the inputs with the closes they rest on, and every output. */
export interface SealedPayload {
  readonly plan: DraftPlan;
  readonly input: ForecastInput;
  readonly closes: readonly { readonly sessionDate: string; readonly close: string }[];
  readonly forecast: Forecast;
}

export function payloadText({ plan, input, closes, forecast }: SealedPayload): string {
  // A round trip through JSON drops what JSON has no word for; the schemas allow nothing else.
  const plain: SealedValue = JSON.parse(JSON.stringify({ plan, input, closes, forecast }));
  return toCanonicalText(plain);
}

/** Reads a payload back. @throws {TypeError} when it is not what was sealed. */
export function payloadOf(text: string): Omit<SealedPayload, 'closes'> {
  const value = fromCanonicalText(text);
  if (value === null || typeof value !== 'object' || !('plan' in value))
    throw new TypeError('This is no sealed payload.');
  return {
    plan: draftPlanSchema.parse(value.plan),
    input: forecastInputSchema.parse(value.input),
    forecast: forecastSchema.parse(value.forecast),
  };
}
