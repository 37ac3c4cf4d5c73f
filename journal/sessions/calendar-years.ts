import { instantMilliseconds } from '@/journal/sessions/instant';

const MILLISECONDS_A_YEAR = 365 * 86_400_000;

/**
 * Calendar years between two instants, for interest and dividends.
 * @param from instant. @param to instant, not earlier.
 * @returns years of 365 days, fractions included; 0 when `to` is not later.
 * @throws {DomainError} `instant-invalid`.
 * @see actual/365 (fixed), ISDA definitions; common practice for listed options.
 */
export function calendarYears(from: string, to: string): number {
  return Math.max(0, (instantMilliseconds(to) - instantMilliseconds(from)) / MILLISECONDS_A_YEAR);
}
