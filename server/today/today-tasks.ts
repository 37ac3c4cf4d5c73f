import { type EntryRow } from '@/shared/entries/entry';
import { type ListedUnderlying } from '@/shared/underlyings/underlying-endpoints';
import { type TodayTask } from '@/shared/today/today-endpoints';

export interface TodayFacts {
  /** Session whose close has passed last. */
  readonly lastSessionDate: string;
  readonly nextSessionDate: string;
  readonly own: readonly EntryRow[];
  readonly underlyings: readonly ListedUnderlying[];
}

/** What needs a trader, in the order it must be done. */
export function todayTasks(facts: TodayFacts): TodayTask[] {
  const tasks = [...expiries(facts), ...untraded(facts), ...missingPrices(facts), ...lessons(facts), ...drafts(facts)];
  return tasks.length > 0 ? tasks : starts(facts);
}

const nameOf = ({ underlying, structureName }: EntryRow) => `${underlying.symbol} ${structureName}`;

function expiries({ own, lastSessionDate, nextSessionDate }: TodayFacts): TodayTask[] {
  return own
    .filter((row) => row.state === 'open' && row.expirySessionDate !== null && row.expirySessionDate <= nextSessionDate)
    .map((row) => {
      const isPast = row.expirySessionDate !== null && row.expirySessionDate <= lastSessionDate;
      return {
        kind: isPast ? 'past-expiry' : 'expiring',
        group: isPast ? 'from-today' : 'before-next-open',
        title: isPast ? `${nameOf(row)} has expired` : `${nameOf(row)} expires at the next session`,
        why: isPast
          ? 'Its position is still open here. Add the expiry, exercise or assignment.'
          : 'Decide for each leg: close it, let it expire, or exercise.',
        action: isPast ? 'Close it out' : 'Look at the plan',
        target: { kind: 'entry', entryId: row.id, section: isPast ? 'fills' : 'plan' },
      };
    });
}

function untraded({ own, lastSessionDate }: TodayFacts): TodayTask[] {
  return own
    .filter((row) => row.state === 'sealed' && row.exitSessionDate !== null && row.exitSessionDate <= lastSessionDate)
    .map((row) => ({
      kind: 'untraded',
      group: 'from-today',
      title: `${nameOf(row)} has no fills`,
      why: 'Its planned exit has passed. Add the fills, or say that it was not traded; its odds are scored either way.',
      action: 'Settle it',
      target: { kind: 'entry', entryId: row.id, section: 'fills' },
    }));
}

function missingPrices({ own, underlyings }: TodayFacts): TodayTask[] {
  return underlyings
    .filter(({ underlying, sessionsBehind, lastBar }) => {
      const isUsed = own.some(
        (row) =>
          row.underlying.id === underlying.id &&
          (row.state === 'sealed' || row.state === 'open' || row.state === 'abandoned'),
      );
      return isUsed && (sessionsBehind > 0 || lastBar === null);
    })
    .map(({ underlying, lastBar, sessionsBehind }) => ({
      kind: 'missing-prices',
      group: 'from-today',
      title:
        lastBar === null ? `${underlying.symbol} has no bars` : `${underlying.symbol} stops at ${lastBar.sessionDate}`,
      why: `${sessionsBehind === 1 ? 'One session is' : `${sessionsBehind} sessions are`} missing; outcomes wait for ${sessionsBehind === 1 ? 'it' : 'them'}.`,
      action: 'Add the bars',
      target: { kind: 'underlying', underlyingId: underlying.id },
    }));
}

function lessons({ own }: TodayFacts): TodayTask[] {
  return own
    .filter((row) => row.needsLesson)
    .map((row) => ({
      kind: 'write-lesson',
      group: 'from-today',
      title: `${nameOf(row)} is closed`,
      why: 'See where it landed, then write what it taught.',
      action: 'Write the lesson',
      target: { kind: 'entry', entryId: row.id, section: 'lesson' },
    }));
}

function drafts({ own }: TodayFacts): TodayTask[] {
  return own
    .filter((row) => row.state === 'draft')
    .map((row) => ({
      kind: 'seal-draft',
      group: 'when-ready',
      title: `${nameOf(row)} is a draft`,
      why: 'Odds count only when they are sealed before the first fill.',
      action: 'Go on planning',
      target: { kind: 'entry', entryId: row.id, section: 'plan' },
    }));
}

function starts({ own, underlyings }: TodayFacts): TodayTask[] {
  if (underlyings.length === 0) {
    return [
      {
        kind: 'start',
        group: 'when-ready',
        title: 'Add the first underlying',
        why: 'Brierbook starts from how much something moves. Upload its daily closes.',
        action: 'Add an underlying',
        target: { kind: 'new-underlying' },
      },
    ];
  }
  if (own.length > 0) return [];
  return [
    {
      kind: 'start',
      group: 'when-ready',
      title: 'Plan the first trade',
      why: 'Write the odds down before it, and see after the close what happened.',
      action: 'Plan a trade',
      target: { kind: 'new-plan' },
    },
  ];
}
