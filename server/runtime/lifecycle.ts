import { type Server } from 'node:http';
import { describeFailure } from '@/server/database/describe-failure';
import { type Readiness } from '@/server/http/health';
import { type Logger } from '@/server/runtime/logger';

const GRACE_MS = 10_000;
const SWEEP_MS = 50;

interface Lifecycle {
  readonly server: Server;
  readonly readiness: Readiness;
  readonly logger: Logger;
  /** Closes what the server holds, once the last request is answered. */
  readonly close: () => Promise<void>;
}

/**
 * Ends the process well: on the first signal it takes no more connections and finishes what runs, for ten seconds at most;
 * a second signal ends it at once. What nobody caught is logged and ends it too, since its state is then unknown.
 */
export function superviseProcess({ server, readiness, logger, close }: Lifecycle): void {
  let isStopping = false;
  const stop = async (status: number) => {
    if (isStopping) process.exit(1);
    isStopping = true;
    readiness.isAccepting = false;
    // Browsers keep connections open for later: each is closed as soon as its last answer is out.
    server.prependListener('request', (_, response) => response.setHeader('Connection', 'close'));
    const closed = new Promise<void>((resolve) => server.close(() => resolve()));
    const sweep = setInterval(() => server.closeIdleConnections(), SWEEP_MS);
    const cut = setTimeout(() => server.closeAllConnections(), GRACE_MS);
    await closed;
    clearInterval(sweep);
    clearTimeout(cut);
    await close();
    logger.info('stopped');
    process.exit(status);
  };
  process.on('SIGTERM', () => void stop(0));
  process.on('SIGINT', () => void stop(0));
  for (const event of ['uncaughtException', 'unhandledRejection'] as const) {
    process.on(event, (error: unknown) => {
      logger.fatal({ error: describeFailure(error) }, event);
      process.exit(1);
    });
  }
}
