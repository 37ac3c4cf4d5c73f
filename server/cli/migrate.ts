import { migrate } from '@/server/database/migrate';

/** Brings the database up to date: needs MIGRATION_DATABASE_URL and APPLICATION_ACCOUNT (name@host). */
async function main(): Promise<void> {
  const { MIGRATION_DATABASE_URL: url, APPLICATION_ACCOUNT: applicationAccount } = process.env;
  if (url === undefined || applicationAccount === undefined)
    throw new Error('Set MIGRATION_DATABASE_URL and APPLICATION_ACCOUNT (name@host).');
  const { applied } = await migrate({ url, applicationAccount });
  if (applied > 0) process.stdout.write(`${applied} migrations applied\n`);
}

main().catch((error: unknown) => {
  process.stderr.write(`${error instanceof Error ? error.message : String(error)}\n`);
  process.exit(1);
});
