import { usOptionsCalendar } from '@/journal/sessions/us-options-calendar';
import { type DeskScope } from '@/server/database/desk-scope';
import { BarStore } from '@/server/prices/bar-store';
import { UnderlyingStore } from '@/server/underlyings/underlying-store';
import { type DraftPlan } from '@/shared/entries/draft-plan';
import { type PlanReading, readPlan } from '@/shared/entries/read-plan';
import { type Underlying } from '@/shared/underlyings/underlying';

/** As many bars as the client's preview works on, so that both see the same closes. */
const BARS = 520;

export interface LoadedPlan {
  readonly underlying: Underlying;
  readonly reading: PlanReading;
  readonly closes: readonly { readonly sessionDate: string; readonly close: string }[];
}

/** Reads a draft against the desk's own prices. @throws {NotFoundError} for an underlying that is not the desk's. */
export async function loadPlan(scope: DeskScope, draft: DraftPlan): Promise<LoadedPlan> {
  const underlying = await new UnderlyingStore(scope).get(draft.underlyingId);
  const bars = await new BarStore(scope).newest(draft.underlyingId, BARS);
  const reading = readPlan({ draft, underlying, bars, calendar: usOptionsCalendar });
  return { underlying, reading, closes: bars.map(({ sessionDate, close }) => ({ sessionDate, close })) };
}
