import { latestCloseAt } from '@/journal/sessions/session-clock';
import { addDays } from '@/journal/sessions/session-date';
import { usOptionsCalendar } from '@/journal/sessions/us-options-calendar';
import { type DeskScope } from '@/server/database/desk-scope';
import { isDuplicate } from '@/server/database/transaction';
import { type EntryDescriber } from '@/server/entries/describe-entry';
import { EntryStore } from '@/server/entries/entry-store';
import { ConflictError } from '@/server/errors/conflict-error';
import { NotFoundError } from '@/server/errors/not-found-error';
import { namesOnDesk } from '@/server/people/people-names';
import { readWeek } from '@/server/reviews/read-week';
import { type WeeklyReviewEntity } from '@/server/reviews/weekly-review-entity';
import { WeeklyReviewStore } from '@/server/reviews/weekly-review-store';
import { type Clock } from '@/server/runtime/clock';
import { journalRoles } from '@/shared/contract/roles';
import { sessionWeek } from '@/shared/reviews/session-week';
import { type ReviewedWeek, type WeeklyReview } from '@/shared/reviews/weekly-review-endpoints';

type Written = Pick<WeeklyReview, 'action' | 'rule' | 'evidence' | 'followedLast'>;
type Reader = ReviewedWeek['traders'][number];

/** A week looked back at: what happened, and the one rule taken from it. */
export class WeeklyReviewService {
  constructor(private readonly dependencies: { readonly clock: Clock; readonly describer: EntryDescriber }) {}

  async read(
    scope: DeskScope,
    { week, traderId }: { week?: string | undefined; traderId?: string | undefined },
  ): Promise<ReviewedWeek> {
    const traders = await readableTraders(scope);
    const trader = traderId === undefined ? traders[0] : traders.find(({ id }) => id === traderId);
    if (trader === undefined && traderId !== undefined) throw new NotFoundError();
    return this.view(scope, { date: week ?? this.lastClosed(), trader: trader ?? null, traders });
  }

  /** Writes the rule of a week; the same id again gives the week as it is. */
  async create(
    scope: DeskScope,
    { id, week, ...written }: Written & { id: string; week: string },
  ): Promise<ReviewedWeek> {
    const store = new WeeklyReviewStore(scope);
    const { startSessionDate } = sessionWeek(week);
    const known = await store.findById(id);
    if (known?.traderId === scope.actor.personId) return this.read(scope, { week: known.weekStartSessionDate });
    try {
      await store.insert({
        id,
        traderId: scope.actor.personId,
        version: 1,
        weekStartSessionDate: startSessionDate,
        ...trimmed(written),
        savedAt: this.dependencies.clock.now(),
      });
    } catch (error) {
      if (!isDuplicate(error)) throw error;
      throw new ConflictError(
        'already-exists',
        'This week has its rule already.',
        [],
        await this.read(scope, { week: startSessionDate }),
      );
    }
    return this.read(scope, { week: startSessionDate });
  }

  async edit(
    scope: DeskScope,
    { id, version, written }: { id: string; version: number; written: Written },
  ): Promise<ReviewedWeek> {
    const store = new WeeklyReviewStore(scope);
    const { weekStartSessionDate } = await store.getOwn(id);
    const changes = { ...trimmed(written), savedAt: this.dependencies.clock.now() };
    const isWritten = await store.replace({ id, version }, changes);
    const current = await this.read(scope, { week: weekStartSessionDate });
    if (!isWritten) throw new ConflictError('changed-elsewhere', 'This review was changed elsewhere.', [], current);
    return current;
  }

  private lastClosed(): string {
    return latestCloseAt({ calendar: usOptionsCalendar, at: this.dependencies.clock.now().toISOString() }).date;
  }

  private async view(
    scope: DeskScope,
    { date, trader, traders }: { date: string; trader: Reader | null; traders: Reader[] },
  ): Promise<ReviewedWeek> {
    const week = sessionWeek(date);
    const { startSessionDate, endSessionDate } = week;
    const next = sessionWeek(addDays(startSessionDate, 7));
    const shared = {
      week: {
        startSessionDate,
        endSessionDate,
        isOver: endSessionDate <= this.lastClosed(),
        previous: sessionWeek(addDays(startSessionDate, -7)).startSessionDate,
        next: next.from <= this.dependencies.clock.now().toISOString() ? next.startSessionDate : null,
      },
      trader,
      traders,
      isOwn: trader?.id === scope.actor.personId,
    };
    if (trader === null) return { ...shared, ...nothing };
    const store = new WeeklyReviewStore(scope);
    const place = { traderId: trader.id, weekStartSessionDate: startSessionDate };
    return {
      ...shared,
      ...(await readWeek(scope, { traderId: trader.id, week, describer: this.dependencies.describer })),
      review: described(await store.find(place)),
      lastRule: described(await store.findLastBefore(place)),
    };
  }
}

const nothing = {
  sealed: [],
  closed: [],
  odds: [],
  meanBrierScore: null,
  process: [],
  profit: [],
  review: null,
  lastRule: null,
};

/** The reader, if they keep a journal, then the traders they mentor. */
async function readableTraders(scope: DeskScope): Promise<Reader[]> {
  const names = await namesOnDesk(scope);
  const own = journalRoles.includes(scope.actor.role) ? [scope.actor.personId] : [];
  const ids = [...own, ...(await new EntryStore(scope).mentoredTraderIds())];
  return ids.map((id) => ({ id, displayName: names.get(id) ?? '' }));
}

const trimmed = ({ action, rule, evidence, followedLast }: Written): Written => ({
  action,
  rule: rule.trim(),
  evidence: evidence.trim(),
  followedLast,
});

function described(row: WeeklyReviewEntity | null): WeeklyReview | null {
  if (row === null) return null;
  const { id, version, weekStartSessionDate, action, rule, evidence, followedLast, savedAt } = row;
  return { id, version, weekStartSessionDate, action, rule, evidence, followedLast, savedAt: savedAt.toISOString() };
}
