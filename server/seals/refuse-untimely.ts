import { type ForecastInput } from '@/journal/forecast/forecast-input';
import { latestCloseAt } from '@/journal/sessions/session-clock';
import { instantMilliseconds } from '@/journal/sessions/instant';
import { usOptionsCalendar } from '@/journal/sessions/us-options-calendar';
import { ApiFailure } from '@/server/errors/api-failure';

/** Clocks of browsers may be so much ahead of ours. */
const MOST_AHEAD_MS = 5 * 60_000;

/**
 * A forecast is made before its answer is known: not after the options have settled, and from a price after which no
 * session has closed.
 * @throws {ApiFailure} `plan-incomplete`, naming the field.
 */
export function refuseUntimely(input: ForecastInput, now: Date): void {
  const refuse = (field: string, message: string) => new ApiFailure('plan-incomplete', message, [{ field, message }]);
  if (hasSettled(input, now))
    throw refuse('legs.0.expirySessionDate', 'The options have expired already. Choose a later expiry.');
  const seenAt = instantMilliseconds(input.spot.at);
  if (seenAt > now.getTime() + MOST_AHEAD_MS)
    throw refuse('spotAt', 'The time at which the price was seen is in the future. Type the price of now.');
  const { closesAt } = latestCloseAt({ calendar: usOptionsCalendar, at: now.toISOString() });
  if (seenAt < instantMilliseconds(closesAt))
    throw refuse(
      'spotPrice',
      'A session has closed since this price was seen. Type the price of now, or add the last close.',
    );
}

function hasSettled({ legs, underlying }: ForecastInput, now: Date): boolean {
  const session = usOptionsCalendar.sessionOn(legs[0]?.expirySessionDate ?? '');
  const endsAt = underlying.settlementTime === 'am' ? session?.opensAt : session?.closesAt;
  return endsAt === undefined || now.toISOString() >= endsAt;
}
