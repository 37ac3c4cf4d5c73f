import { Piscina } from 'piscina';
import { ApiFailure } from '@/server/errors/api-failure';
import { type PasswordTask } from '@/server/account/password-hash-worker';
import { bundledWorker } from '@/server/runtime/bundled-worker';
import { pepperedPassword } from '@/server/runtime/secrets';

const MOST_AT_ONCE = 2;
const MOST_WAITING = 10;

export interface HashSettings {
  readonly pepper: string;
  readonly cost: number;
}

/**
 * Hashes passwords with bcrypt over a peppered SHA-384, in threads, a few at a time; more are refused, not queued without end.
 */
export class PasswordHasher {
  private readonly pool: Piscina;
  private dummyHash: Promise<string> | null = null;

  constructor(private readonly settings: HashSettings) {
    this.pool = new Piscina({
      filename: bundledWorker('account/password-hash-worker.js').href,
      maxThreads: MOST_AT_ONCE,
      minThreads: 1,
      maxQueue: MOST_WAITING,
    });
  }

  async hash(password: string): Promise<string> {
    const made = await this.run({ kind: 'hash', material: this.material(password), cost: this.settings.cost });
    if (typeof made !== 'string') throw new TypeError('A hash is text.');
    return made;
  }

  /** Compares with a hash, or with one nobody knows the password of, so that an unknown account takes as long as a known one. */
  async matches(password: string, hash: string | null): Promise<boolean> {
    this.dummyHash ??= this.hash('no account has this password');
    const isMatch = await this.run({
      kind: 'compare',
      material: this.material(password),
      hash: hash ?? (await this.dummyHash),
    });
    return hash !== null && isMatch === true;
  }

  /** Whether a stored hash was made with weaker settings than today's. */
  isOutdated(hash: string): boolean {
    return Number(/^\$2[aby]\$(\d{2})\$/.exec(hash)?.[1] ?? 0) < this.settings.cost;
  }

  close(): Promise<void> {
    return this.pool.destroy();
  }

  private material(password: string): string {
    return pepperedPassword(password, this.settings.pepper);
  }

  private async run(task: PasswordTask): Promise<string | boolean> {
    if (this.pool.queueSize >= MOST_WAITING) {
      throw new ApiFailure('unavailable', 'Many people are signing in at this moment.');
    }
    const result: unknown = await this.pool.run(task);
    if (typeof result !== 'string' && typeof result !== 'boolean')
      throw new TypeError('A password task gives text or a truth value.');
    return result;
  }
}
