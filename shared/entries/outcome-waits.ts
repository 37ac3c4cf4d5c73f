import { type EntryOutcome } from '@/journal/outcome/entry-outcome';
import { instantMilliseconds } from '@/journal/sessions/instant';
import { sessionEndingAfter } from '@/journal/sessions/session-clock';
import { usOptionsCalendar } from '@/journal/sessions/us-options-calendar';

/** One thing an outcome cannot be told without. */
export interface OutcomeWait {
  /** "the close of 2026-12-18". */
  readonly what: string;
  /** What brings it: the bars of the session, its settlement value, or a fill. */
  readonly mend: 'bars' | 'settlement' | 'fill';
  /** The session it belongs to. */
  readonly sessionDate: string;
  /** True once it could be there. */
  readonly isDue: boolean;
}

interface Facts {
  readonly outcome: Pick<EntryOutcome, 'odds' | 'moveWaitsFor' | 'profit' | 'sources'> | null;
  readonly expirySessionDate: string | null;
  readonly lastFillAt: string | null;
  /** Session whose close has passed last. */
  readonly lastClosedSessionDate: string;
}

/**
 * What the outcome of a sealed entry waits for, soonest first: closes and settlement values that its answers and its move need, a
 * fill that ends a position whose options have expired, and the closes that tell where a realised profit came from.
 * Common practice; never throws.
 */
export function outcomeWaits(facts: Facts): OutcomeWait[] {
  const { outcome, lastClosedSessionDate } = facts;
  if (outcome === null) return [];
  const texts = new Set([
    ...outcome.odds.flatMap(({ waitsFor }) => (waitsFor === null ? [] : [waitsFor])),
    ...(outcome.moveWaitsFor === null ? [] : [outcome.moveWaitsFor]),
  ]);
  const waits = [...[...texts].flatMap((what) => priceWait(what)), ...fillWait(facts), ...sourceWait(facts)].map(
    (wait) => ({ ...wait, isDue: wait.sessionDate <= lastClosedSessionDate }),
  );
  const isFirst = (wait: OutcomeWait, index: number) => waits.findIndex(({ what }) => what === wait.what) === index;
  return waits.filter(isFirst).sort((left, right) => left.sessionDate.localeCompare(right.sessionDate));
}

type Undated = Omit<OutcomeWait, 'isDue'>;

function priceWait(what: string): Undated[] {
  const sessionDate = /\d{4}-\d{2}-\d{2}/.exec(what)?.[0];
  if (sessionDate === undefined) return [];
  return [{ what, sessionDate, mend: what.startsWith('the settlement value') ? 'settlement' : 'bars' }];
}

function fillWait({ outcome, expirySessionDate, lastClosedSessionDate }: Facts): Undated[] {
  const isOpen = outcome?.profit?.isFinal === false;
  if (!isOpen || expirySessionDate === null || expirySessionDate > lastClosedSessionDate) return [];
  return [
    { what: 'the fill, expiry or exercise that ended the position', mend: 'fill', sessionDate: expirySessionDate },
  ];
}

function sourceWait({ outcome, lastFillAt }: Facts): Undated[] {
  const isUntold = outcome?.profit?.isFinal === true && outcome.sources === null;
  if (!isUntold || lastFillAt === null) return [];
  // A fill booked at the very close belongs to the session that closes then.
  const { date } = sessionEndingAfter(usOptionsCalendar, instantMilliseconds(lastFillAt) - 1);
  return [{ what: 'the close of each session with a fill', mend: 'bars', sessionDate: date }];
}
