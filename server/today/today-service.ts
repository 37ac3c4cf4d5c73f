import { type EntryOutcome } from '@/journal/outcome/entry-outcome';
import { nextSession } from '@/journal/sessions/exchange-calendar';
import { latestCloseAt, sessionInProgress } from '@/journal/sessions/session-clock';
import { usOptionsCalendar } from '@/journal/sessions/us-options-calendar';
import { type DeskScope } from '@/server/database/desk-scope';
import { type EntryService } from '@/server/entries/entry-service';
import { OutcomeStore } from '@/server/outcomes/outcome-store';
import { WeeklyReviewStore } from '@/server/reviews/weekly-review-store';
import { type Clock } from '@/server/runtime/clock';
import { type ScoreService } from '@/server/scores/score-service';
import { todayTasks, type Waiting } from '@/server/today/today-tasks';
import { type UnderlyingService } from '@/server/underlyings/underlying-service';
import { journalRoles } from '@/shared/contract/roles';
import { type EntryRow } from '@/shared/entries/entry';
import { outcomeWaits } from '@/shared/entries/outcome-waits';
import { sessionWeek } from '@/shared/reviews/session-week';
import { type Today } from '@/shared/today/today-endpoints';

interface Dependencies {
  readonly clock: Clock;
  readonly entries: EntryService;
  readonly underlyings: UnderlyingService;
  readonly scores: ScoreService;
}
const MOST_LOOKED_AT = 200;
const MOST_RUNNING = 5;

/** What needs the reader now, and what is running. */
export class TodayService {
  constructor(private readonly dependencies: Dependencies) {}

  async read(scope: DeskScope): Promise<Today> {
    const { clock, entries, underlyings, scores } = this.dependencies;
    const now = clock.now().toISOString();
    const calendar = usOptionsCalendar;
    const current = sessionInProgress({ calendar, at: now });
    const lastClosed = latestCloseAt({ calendar, at: now });
    const session = current ?? lastClosed;
    const next = nextSession(calendar, session.date);
    const states = ['draft', 'sealed', 'open', 'closed', 'abandoned', 'reviewed'] as const;
    const lists = await Promise.all(states.map((state) => entries.list(scope, { state, limit: MOST_LOOKED_AT })));
    const rows = lists.flatMap((list) => list.entries);
    const running = rows
      .filter(
        (row) => row.state === 'open' || (row.state === 'sealed' && (row.exitSessionDate ?? '') > lastClosed.date),
      )
      .sort(byExit);
    const brief = await scores.brief(scope);
    const own = rows.filter((row) => row.trader.id === scope.actor.personId);
    const outcomes = await outcomesOf(scope, own);
    return {
      now,
      session: { sessionDate: session.date, isOver: current === null },
      nextSession: { sessionDate: next.date, kind: next.kind },
      tasks: journalRoles.includes(scope.actor.role)
        ? todayTasks({
            lastSessionDate: lastClosed.date,
            nextSessionDate: next.date,
            own,
            waits: waitsOf(own, outcomes, lastClosed.date),
            isWeekToReview: await isWeekToReview(scope, own, lastClosed.date),
            answers: new Map([...outcomes].map(([id, outcome]) => [id, answersOf(outcome)])),
            underlyings: await underlyings.list(scope),
          })
        : [],
      running: running.slice(0, MOST_RUNNING),
      runningCount: running.length,
      resolvedOddsCount: brief.count,
      meanBrierScore: brief.meanBrierScore,
    };
  }
}

function byExit(left: EntryRow, right: EntryRow): number {
  return (left.exitSessionDate ?? '').localeCompare(right.exitSessionDate ?? '');
}

type Outcomes = ReadonlyMap<string, EntryOutcome>;

/** The outcomes that are not complete, and those of entries whose lesson is not written. */
async function outcomesOf(scope: DeskScope, own: readonly EntryRow[]): Promise<Outcomes> {
  const sealed = own.filter(({ state }) => state !== 'draft').map(({ id }) => id);
  const blank = own.filter(({ needsLesson }) => needsLesson).map(({ id }) => id);
  const rows = await new OutcomeStore(scope).listIncompleteOf(sealed, { orAnyOf: blank });
  return new Map(rows.map(({ entryId, outcome }) => [entryId, outcome]));
}

function waitsOf(own: readonly EntryRow[], outcomes: Outcomes, lastClosedSessionDate: string): Waiting[] {
  return own.flatMap((row) =>
    outcomeWaits({
      outcome: outcomes.get(row.id) ?? null,
      expirySessionDate: row.expirySessionDate,
      lastFillAt: row.lastFillAt,
      lastClosedSessionDate,
    })
      .filter(({ isDue }) => isDue)
      .map((wait) => ({ row, wait })),
  );
}

function answersOf({ odds }: EntryOutcome): { known: number; of: number } {
  return { known: odds.filter(({ happened }) => happened !== null).length, of: odds.length };
}

/** Whether the week of a closed session is over, had something in it, and its rule is not written. */
async function isWeekToReview(scope: DeskScope, own: readonly EntryRow[], lastClosed: string): Promise<boolean> {
  const { startSessionDate, endSessionDate, from, before } = sessionWeek(lastClosed);
  const isInWeek = (instant: string | null) => instant !== null && instant >= from && instant < before;
  if (lastClosed !== endSessionDate) return false;
  if (!own.some(({ sealedAt, lastFillAt }) => isInWeek(sealedAt) || isInWeek(lastFillAt))) return false;
  const place = { traderId: scope.actor.personId, weekStartSessionDate: startSessionDate };
  return (await new WeeklyReviewStore(scope).find(place)) === null;
}
