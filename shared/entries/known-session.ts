import { DomainError } from '@/journal/errors/domain-error';
import { type ExchangeCalendar } from '@/journal/sessions/exchange-calendar';

/** The session on a date a person typed: null on a closed day, undefined for a date the calendar does not reach. */
export function knownSession(
  calendar: ExchangeCalendar,
  date: string,
): ReturnType<ExchangeCalendar['sessionOn']> | undefined {
  try {
    return calendar.sessionOn(date);
  } catch (error) {
    if (error instanceof DomainError && error.code === 'outside-calendar') return undefined;
    throw error;
  }
}
