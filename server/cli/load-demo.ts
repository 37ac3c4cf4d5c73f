import { createDataSource } from '@/server/database/data-source';
import { demoDesk, demoPeople } from '@/server/demo/demo-scenario';
import { loadDemo } from '@/server/demo/load-demo';
import { systemClock } from '@/server/runtime/clock';
import { readConfiguration } from '@/server/runtime/configuration';

/** Loads the demo desk into an empty development database; with --sign-ins prints who can sign in to it. */
async function main(): Promise<void> {
  if (process.argv.includes('--sign-ins')) {
    const lines = demoPeople.map(({ role, email }) => `  ${role.padEnd(7)} ${email}`);
    process.stdout.write(`Demo desk "${demoDesk.name}", password "${demoDesk.password}":\n${lines.join('\n')}\n`);
    return;
  }
  const configuration = readConfiguration(process.env);
  const dataSource = createDataSource(configuration.DATABASE_URL);
  await dataSource.initialize();
  try {
    const isLoaded = await loadDemo({ configuration, dataSource, now: systemClock.now() });
    if (isLoaded) process.stdout.write('The demo desk is loaded.\n');
  } finally {
    await dataSource.destroy();
  }
}

main().catch((error: unknown) => {
  process.stderr.write(`${error instanceof Error ? (error.stack ?? error.message) : String(error)}\n`);
  process.exit(1);
});
