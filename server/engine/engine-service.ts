import { Piscina } from 'piscina';
import { z } from 'zod';
import { type EngineTask } from '@/server/engine/engine-worker';
import { ApiFailure } from '@/server/errors/api-failure';
import { bundledWorker } from '@/server/runtime/bundled-worker';
import { QueueFullError, TurnQueue } from '@/server/runtime/turn-queue';
import { engineAnswersSchema, type EngineAnswers } from '@/shared/engine/engine-endpoints';

const LONGEST_MS = 20_000;
const linesSchema = z.array(z.strictObject({ text: z.string(), isRefused: z.boolean() }));

/** The headless engine for people who are signed in: in a thread with a time limit, one batch of a person at a time. */
export class EngineService {
  private readonly queue = new TurnQueue({ atOnce: 1, waiting: 10 });
  private readonly pool: Piscina;

  constructor(private readonly longestMs = LONGEST_MS) {
    this.pool = new Piscina({
      filename: bundledWorker('engine/engine-worker.js').href,
      minThreads: 0,
      maxThreads: 1,
      idleTimeout: 60_000,
      resourceLimits: { maxOldGenerationSizeMb: 256 },
    });
  }

  async compute(personId: string, task: EngineTask): Promise<EngineAnswers> {
    const lines = linesSchema.parse(await this.inTurn(personId, task));
    const answers = lines.map(({ text, isRefused }): unknown => {
      const parsed: unknown = JSON.parse(text);
      return isRefused ? parsed : { result: parsed };
    });
    return engineAnswersSchema.parse({ answers });
  }

  close(): Promise<void> {
    return this.pool.destroy();
  }

  private async inTurn(personId: string, task: EngineTask): Promise<unknown> {
    try {
      return await this.queue.run(personId, () => this.pool.run(task, { signal: AbortSignal.timeout(this.longestMs) }));
    } catch (error) {
      if (error instanceof QueueFullError) throw new ApiFailure('unavailable', 'Many batches wait already.');
      if (error instanceof Error && error.name === 'AbortError') {
        throw new ApiFailure('too-large', `These cases take more than ${this.longestMs / 1000} seconds.`);
      }
      throw error;
    }
  }
}
