import { createServer } from 'node:http';
import { createApp } from '@/server/app';
import { checkDatabase } from '@/server/database/check-database';
import { createDataSource } from '@/server/database/data-source';
import { systemClock } from '@/server/runtime/clock';
import { readConfiguration } from '@/server/runtime/configuration';
import { systemIds } from '@/server/runtime/ids';
import { superviseProcess } from '@/server/runtime/lifecycle';
import { createLogger } from '@/server/runtime/logger';

async function start(): Promise<void> {
  const configuration = readConfiguration(process.env);
  if (process.env.TZ !== 'UTC') throw new Error('Start the server with TZ=UTC.');
  const logger = createLogger(configuration.LOG_LEVEL);
  const dataSource = createDataSource(configuration.DATABASE_URL);
  await dataSource.initialize();
  await checkDatabase(dataSource);
  const { app, readiness, close } = createApp({
    configuration,
    dataSource,
    clock: systemClock,
    ids: systemIds,
    logger,
  });
  const server = createServer(
    { headersTimeout: 10_000, requestTimeout: 120_000, connectionsCheckingInterval: 2_000 },
    app,
  );
  superviseProcess({
    server,
    readiness,
    logger,
    close: async () => {
      await close();
      await dataSource.destroy();
    },
  });
  server.listen(configuration.PORT, configuration.HOST, () => logger.info({ port: configuration.PORT }, 'listening'));
}

start().catch((error: unknown) => {
  process.stderr.write(`${error instanceof Error ? error.message : String(error)}\n`);
  process.exit(1);
});
