import { DomainError } from '@/journal/errors/domain-error';

/**
 * Milliseconds since 1970 of an instant written in UTC, 'YYYY-MM-DDTHH:MM:SS.sssZ'.
 * @throws {DomainError} `instant-invalid` with the text.
 */
export function instantMilliseconds(instant: string): number {
  const time = /^\d{4}-\d{2}-\d{2}T\d{2}:\d{2}:\d{2}(\.\d{1,9})?Z$/.test(instant) ? Date.parse(instant) : Number.NaN;
  // Date.parse reads 30 February as 2 March and 24:00 as the next day.
  const isWritten = Number.isFinite(time) && new Date(time).toISOString().startsWith(instant.slice(0, 19));
  if (!isWritten) throw new DomainError('instant-invalid', { instant: instant.slice(0, 40) });
  return time;
}

const YEAR_0 = Date.parse('0000-01-01T00:00:00Z');
const YEAR_10000 = Date.parse('9999-12-31T23:59:59.999Z') + 1;

/**
 * The instant of milliseconds since 1970, years 0 to 9999.
 * @throws {DomainError} `instant-out-of-range`.
 */
export function instantOfMilliseconds(milliseconds: number): string {
  const isValid = milliseconds >= YEAR_0 && milliseconds < YEAR_10000;
  if (!isValid) throw new DomainError('instant-out-of-range', { milliseconds });
  return new Date(milliseconds).toISOString();
}
