interface Waiting {
  readonly personId: string;
  readonly start: () => void;
}

export class QueueFullError extends Error {}

/** Lets few demanding tasks run at a time, and of one person one; the others wait in order. */
export class TurnQueue {
  private readonly runningFor = new Set<string>();
  private readonly waiting: Waiting[] = [];

  constructor(private readonly limits: { readonly atOnce: number; readonly waiting: number }) {}

  /** @throws {QueueFullError} when too many wait already. */
  async run<T>(personId: string, task: () => Promise<T>): Promise<T> {
    await this.turn(personId);
    try {
      return await task();
    } finally {
      this.runningFor.delete(personId);
      this.startNext();
    }
  }

  private turn(personId: string): Promise<void> {
    if (this.waiting.length >= this.limits.waiting) return Promise.reject(new QueueFullError());
    return new Promise((resolve) => {
      this.waiting.push({ personId, start: resolve });
      this.startNext();
    });
  }

  private startNext(): void {
    if (this.runningFor.size >= this.limits.atOnce) return;
    const index = this.waiting.findIndex(({ personId }) => !this.runningFor.has(personId));
    const [next] = index < 0 ? [] : this.waiting.splice(index, 1);
    if (next === undefined) return;
    this.runningFor.add(next.personId);
    next.start();
  }
}
