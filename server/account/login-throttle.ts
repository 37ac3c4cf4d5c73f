import { type DataSource } from 'typeorm';
import { LoginThrottleEntity } from '@/server/account/login-throttle-entity';
import { ApiFailure } from '@/server/errors/api-failure';
import { type Clock } from '@/server/runtime/clock';
import { secretDigest } from '@/server/runtime/secrets';

const WINDOW_MS = 15 * 60_000;
const FREE_FAILURES = 5;
const MOST_PER_ADDRESS = 20;

/** Slows guessing: after five failures an account waits 1 s, 2 s, 4 s … up to 15 min; an address may fail 20 times in 15 min. */
export class LoginThrottle {
  constructor(
    private readonly dataSource: DataSource,
    private readonly clock: Clock,
  ) {}

  /** @throws {ApiFailure} `too-many-requests` while the account or the address has to wait. */
  async check({ emailKey, address }: LoginAttempt): Promise<void> {
    const now = this.clock.now();
    const rows = await this.dataSource
      .getRepository(LoginThrottleEntity)
      .findBy([{ keyDigest: accountKey(emailKey) }, { keyDigest: addressKey(address) }]);
    if (rows.some((row) => row.blockedUntil > now)) {
      throw new ApiFailure('too-many-requests', 'Too many attempts to sign in.');
    }
  }

  async failed({ emailKey, address }: LoginAttempt): Promise<void> {
    await this.count(accountKey(emailKey), (failures) =>
      failures <= FREE_FAILURES ? 0 : Math.min(WINDOW_MS, 1000 * 2 ** (failures - FREE_FAILURES - 1)),
    );
    await this.count(addressKey(address), (failures) => (failures < MOST_PER_ADDRESS ? 0 : WINDOW_MS));
  }

  /** Signed in: the account starts afresh; the address keeps its count. */
  async succeeded({ emailKey }: LoginAttempt): Promise<void> {
    await this.dataSource.getRepository(LoginThrottleEntity).delete({ keyDigest: accountKey(emailKey) });
  }

  private async count(keyDigest: string, delayAfter: (failures: number) => number): Promise<void> {
    const now = this.clock.now();
    const rows = this.dataSource.getRepository(LoginThrottleEntity);
    const windowEndsAt = new Date(now.getTime() + WINDOW_MS);
    await rows
      .createQueryBuilder()
      .insert()
      .orIgnore()
      .values({ keyDigest, failures: 0, blockedUntil: now, windowEndsAt })
      .execute();
    await rows
      .createQueryBuilder()
      .update()
      .set({ failures: () => 'IF(window_ends_at < :now, 1, failures + 1)', windowEndsAt })
      .where('key_digest = :keyDigest', { keyDigest })
      .setParameter('now', now)
      .execute();
    const row = await rows.findOneByOrFail({ keyDigest });
    await rows.update({ keyDigest }, { blockedUntil: new Date(now.getTime() + delayAfter(row.failures)) });
  }
}

export interface LoginAttempt {
  readonly emailKey: string;
  readonly address: string;
}
const accountKey = (emailKey: string) => secretDigest(`account ${emailKey}`);
const addressKey = (address: string) => secretDigest(`address ${address}`);
