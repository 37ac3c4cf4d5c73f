import { DomainError } from '@/journal/errors/domain-error';

/**
 * Milliseconds since 1970 of an instant written in UTC, 'YYYY-MM-DDTHH:MM:SS.sssZ'.
 * @throws {DomainError} `instant-invalid` with the text.
 */
export function instantMilliseconds(instant: string): number {
  const time = /^\d{4}-\d{2}-\d{2}T\d{2}:\d{2}:\d{2}(\.\d{1,9})?Z$/.test(instant) ? Date.parse(instant) : Number.NaN;
  if (!Number.isFinite(time)) throw new DomainError('instant-invalid', { instant: instant.slice(0, 40) });
  return time;
}

/** The instant of milliseconds since 1970. */
export function instantOfMilliseconds(milliseconds: number): string {
  return new Date(milliseconds).toISOString();
}
