import { nextSession } from '@/journal/sessions/exchange-calendar';
import { latestCloseAt, sessionInProgress } from '@/journal/sessions/session-clock';
import { usOptionsCalendar } from '@/journal/sessions/us-options-calendar';
import { type DeskScope } from '@/server/database/desk-scope';
import { type EntryService } from '@/server/entries/entry-service';
import { type Clock } from '@/server/runtime/clock';
import { type ScoreService } from '@/server/scores/score-service';
import { todayTasks } from '@/server/today/today-tasks';
import { type UnderlyingService } from '@/server/underlyings/underlying-service';
import { journalRoles } from '@/shared/contract/roles';
import { type EntryRow } from '@/shared/entries/entry';
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
    const states = ['draft', 'sealed', 'open', 'closed', 'abandoned'] as const;
    const lists = await Promise.all(states.map((state) => entries.list(scope, { state, limit: MOST_LOOKED_AT })));
    const rows = lists.flatMap((list) => list.entries);
    const running = rows
      .filter(
        (row) => row.state === 'open' || (row.state === 'sealed' && (row.exitSessionDate ?? '') > lastClosed.date),
      )
      .sort(byExit);
    const brief = await scores.brief(scope);
    const own = rows.filter((row) => row.trader.id === scope.actor.personId);
    return {
      now,
      session: { sessionDate: session.date, isOver: current === null },
      nextSession: { sessionDate: next.date, kind: next.kind },
      tasks: journalRoles.includes(scope.actor.role)
        ? todayTasks({
            lastSessionDate: lastClosed.date,
            nextSessionDate: next.date,
            own,
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
