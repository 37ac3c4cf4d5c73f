import { Store, type SessionData } from 'express-session';
import { type DataSource } from 'typeorm';
import { SessionEntity } from '@/server/account/session-entity';
import { secretDigest } from '@/server/runtime/secrets';
import { type Clock } from '@/server/runtime/clock';

const HOUR = 3_600_000;
/** An idle session ends after eight hours, any session after seven days. */
export const sessionLimits = { idleMs: 8 * HOUR, absoluteMs: 7 * 24 * HOUR } as const;

type Done<T> = (error: unknown, value?: T) => void;

/**
 * Sessions in the database. Ids are stored as digests. An ended session leaves a tombstone, and writing updates only living
 * rows, so that a request still in flight cannot bring a session back after sign-out.
 */
export class SessionStore extends Store {
  constructor(
    private readonly dataSource: DataSource,
    private readonly clock: Clock,
  ) {
    super();
  }

  override get(id: string, done: Done<SessionData | null>): void {
    settle(this.read(id), done);
  }

  override set(id: string, session: SessionData, done: Done<void> = () => undefined): void {
    settle(this.write(id, session), done);
  }

  /** Only the end moves: the content a request read may be older than what another has written since. */
  override touch(id: string, _: SessionData, done: Done<void> = () => undefined): void {
    settle(
      this.prolong(id).then(() => undefined),
      done,
    );
  }

  override destroy(id: string, done: Done<void> = () => undefined): void {
    settle(this.end(id), done);
  }

  /** Forgets sessions that ended a day and longer ago. */
  async clean(): Promise<void> {
    const before = new Date(this.clock.now().getTime() - 24 * HOUR);
    await this.rows().createQueryBuilder().delete().where('ends_at < :before', { before }).execute();
  }

  private rows() {
    return this.dataSource.getRepository(SessionEntity);
  }

  private async read(id: string): Promise<SessionData | null> {
    const row = await this.rows().findOneBy({ digest: secretDigest(id) });
    if (row === null || row.endedAt !== null || row.endsAt <= this.clock.now()) return null;
    const content: SessionData = JSON.parse(row.content);
    return content;
  }

  private async write(id: string, session: SessionData): Promise<void> {
    const digest = secretDigest(id);
    const content = JSON.stringify(session);
    const personId = session.passport?.user.personId ?? null;
    // Two steps instead of an upsert: the update leaves tombstones alone, the insert is ignored where one lies.
    if (await this.prolong(id, { content, personId })) return;
    const startedAt = this.clock.now();
    await this.rows()
      .createQueryBuilder()
      .insert()
      .orIgnore()
      .values({ digest, personId, content, startedAt, endsAt: this.idleEnd(), endedAt: null })
      .execute();
  }

  /** Moves the end of a living session, never beyond seven days from its start; gives whether there was one. */
  private async prolong(
    id: string,
    changes: Partial<Pick<SessionEntity, 'content' | 'personId'>> = {},
  ): Promise<boolean> {
    const updated = await this.rows()
      .createQueryBuilder()
      .update()
      .set({ ...changes, endsAt: () => 'LEAST(:idleEnd, TIMESTAMPADD(SECOND, :absoluteSeconds, started_at))' })
      .where('digest = :digest AND ended_at IS NULL')
      .setParameters({
        digest: secretDigest(id),
        idleEnd: this.idleEnd(),
        absoluteSeconds: sessionLimits.absoluteMs / 1000,
      })
      .execute();
    return updated.affected !== 0;
  }

  private idleEnd(): Date {
    return new Date(this.clock.now().getTime() + sessionLimits.idleMs);
  }

  private async end(id: string): Promise<void> {
    const now = this.clock.now();
    const digest = secretDigest(id);
    await this.rows()
      .createQueryBuilder()
      .insert()
      .orIgnore()
      .values({ digest, personId: null, content: '{}', startedAt: now, endsAt: now, endedAt: now })
      .execute();
    await this.rows().update({ digest }, { endedAt: now, content: '{}' });
  }
}

function settle<T>(promise: Promise<T>, done: Done<T>): void {
  promise.then(
    (value) => done(null, value),
    (error: unknown) => done(error),
  );
}
