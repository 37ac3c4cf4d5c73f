import { type EntryRow } from '@/shared/entries/entry';
import { type ListedUnderlying } from '@/shared/underlyings/underlying-endpoints';
import { type OutcomeWait } from '@/shared/entries/outcome-waits';
import { type TodayTask } from '@/shared/today/today-endpoints';

/** An entry and one thing it waits for. */
export interface Waiting {
  readonly row: EntryRow;
  readonly wait: OutcomeWait;
}

export interface TodayFacts {
  /** Session whose close has passed last. */
  readonly lastSessionDate: string;
  readonly nextSessionDate: string;
  readonly own: readonly EntryRow[];
  /** What own entries wait for although it could be there. */
  readonly waits: readonly Waiting[];
  /** How many odds of an entry have their answer, by its id. */
  readonly answers: ReadonlyMap<string, { readonly known: number; readonly of: number }>;
  readonly isWeekToReview: boolean;
  readonly underlyings: readonly ListedUnderlying[];
}

/** A line; only one about a closed entry names its profit. */
type Line = Omit<TodayTask, 'profit'> & Partial<Pick<TodayTask, 'profit'>>;

/** What needs a trader, in the order it must be done. */
export function todayTasks(facts: TodayFacts): TodayTask[] {
  const tasks = [
    ...expiries(facts),
    ...untraded(facts),
    ...missingPrices(facts),
    ...missingValues(facts),
    ...lessons(facts),
    ...weeks(facts),
    ...drafts(facts),
  ].map((task): TodayTask => ({ profit: null, ...task }));
  return tasks.length > 0 ? tasks : starts(facts).map((task) => ({ ...task, profit: null }));
}

const nameOf = ({ underlying, structureName }: EntryRow) => `${underlying.symbol} ${structureName}`;

function expiries({ own, lastSessionDate, nextSessionDate }: TodayFacts): Line[] {
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
        target: { kind: 'entry', entryId: row.id, section: isPast ? 'fills' : 'seal' },
      };
    });
}

function untraded({ own, lastSessionDate }: TodayFacts): Line[] {
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

/** Bars that end too early, with what they hold up. */
function missingPrices({ own, underlyings, waits }: TodayFacts): Line[] {
  return underlyings
    .filter(({ underlying, sessionsBehind, lastBar }) => {
      const isUsed = own.some(
        (row) =>
          row.underlying.id === underlying.id &&
          (row.state === 'sealed' || row.state === 'open' || row.state === 'abandoned'),
      );
      const isAwaited = waits.some(({ row, wait }) => row.underlying.id === underlying.id && wait.mend === 'bars');
      return (isUsed || isAwaited) && (sessionsBehind > 0 || lastBar === null);
    })
    .map(({ underlying, lastBar, sessionsBehind }) => {
      const waiting = waits.filter(({ row, wait }) => row.underlying.id === underlying.id && wait.mend === 'bars');
      return {
        kind: 'missing-prices',
        group: 'from-today',
        title:
          lastBar === null
            ? `${underlying.symbol} has no bars`
            : `${underlying.symbol} stops at ${lastBar.sessionDate}`,
        why: `${sessionsBehind === 1 ? 'One session is' : `${sessionsBehind} sessions are`} missing${resolves(waiting)}.`,
        action: 'Add the bars',
        target: { kind: 'underlying', underlyingId: underlying.id, sessionDate: null },
      };
    });
}

/** Closes and settlement values that are missing although later bars are there: each holds up what could be resolved now. */
function missingValues({ underlyings, waits }: TodayFacts): Line[] {
  const lines = new Map<string, Waiting[]>();
  for (const waiting of waits) {
    const { row, wait } = waiting;
    const lastBar = underlyings.find(({ underlying }) => underlying.id === row.underlying.id)?.lastBar;
    const isTold = lastBar == null || wait.sessionDate > lastBar.sessionDate; // by the line about the missing bars
    if (wait.mend === 'fill' || (wait.mend === 'bars' && isTold)) continue;
    const key = `${row.underlying.id} ${wait.what}`;
    lines.set(key, [...(lines.get(key) ?? []), waiting]);
  }
  return [...lines.values()].flatMap((waiting) => {
    const [first] = waiting;
    if (first === undefined) return [];
    const { row, wait } = first;
    return [
      {
        kind: wait.mend === 'settlement' ? 'missing-settlement' : 'missing-prices',
        group: 'from-today',
        title: `${row.underlying.symbol} lacks ${wait.what}`,
        why: `All else is there${resolves(waiting)}.`,
        action: wait.mend === 'settlement' ? 'Type the value' : 'Type the bar',
        target: { kind: 'underlying', underlyingId: row.underlying.id, sessionDate: wait.sessionDate },
      },
    ];
  });
}

/** "; two entries wait for it: bull put 97 / 95, long 102 call". */
function resolves(waiting: readonly Waiting[]): string {
  const names = [...new Map(waiting.map(({ row }) => [row.id, row.structureName])).values()];
  if (names.length === 0) return '';
  const shown = names.slice(0, 2).join(', ');
  return `; ${names.length === 1 ? 'one entry waits' : `${names.length} entries wait`}: ${shown}${names.length > 2 ? ' and more' : ''}`;
}

function lessons({ own, answers }: TodayFacts): Line[] {
  return own
    .filter((row) => row.needsLesson)
    .map((row) => ({
      kind: 'write-lesson',
      group: 'from-today',
      title: `${nameOf(row)} is closed`,
      profit: row.realisedProfit === null ? null : { realised: row.realisedProfit, currency: row.underlying.currency },
      why: `${answered(answers.get(row.id))} The lesson is still blank.`,
      action: 'Write the lesson',
      target: { kind: 'entry', entryId: row.id, section: 'lesson' },
    }));
}

function weeks({ isWeekToReview }: TodayFacts): Line[] {
  if (!isWeekToReview) return [];
  return [
    {
      kind: 'weekly-review',
      group: 'when-ready',
      title: 'The week is over',
      why: 'Look back at it, and take one rule to keep, change or drop.',
      action: 'Review the week',
      target: { kind: 'weekly-review' },
    },
  ];
}

function answered(answers: { known: number; of: number } | undefined): string {
  if (answers === undefined || answers.known === 0) return 'no odds are answered yet.';
  return answers.known === answers.of
    ? 'all odds are answered.'
    : `${answers.known} of ${answers.of} odds are answered.`;
}

function drafts({ own }: TodayFacts): Line[] {
  return own
    .filter((row) => row.state === 'draft')
    .map((row) => ({
      kind: 'seal-draft',
      group: 'when-ready',
      title: `${nameOf(row)} is a draft`,
      why: 'Odds count only when they are sealed before the first fill.',
      action: 'Go on planning',
      target: { kind: 'entry', entryId: row.id, section: 'seal' },
    }));
}

function starts({ own, underlyings }: TodayFacts): Line[] {
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
