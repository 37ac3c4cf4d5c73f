import { Router } from 'express';
import { type DataSource } from 'typeorm';

export interface Readiness {
  /** False once the server has been asked to stop. */
  isAccepting: boolean;
}

/** Whether the process lives, and whether it can do its work; neither tells versions or addresses. */
export function healthRouter(dataSource: DataSource, readiness: Readiness): Router {
  const router = Router();
  router.get('/healthz', (_, response) => void response.json({ status: 'up' }));
  router.get('/readyz', async (_, response) => {
    const isReady = readiness.isAccepting && (await isDatabaseReady(dataSource));
    response.status(isReady ? 200 : 503).json({ status: isReady ? 'ready' : 'not ready' });
  });
  return router;
}

async function isDatabaseReady(dataSource: DataSource): Promise<boolean> {
  try {
    await dataSource.query('SELECT 1');
    return !(await dataSource.showMigrations());
  } catch {
    return false; // not reachable is the answer, not a failure of the question
  }
}
