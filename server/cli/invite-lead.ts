import { InvitationEntity } from '@/server/account/invitation-entity';
import { createDataSource } from '@/server/database/data-source';
import { systemClock } from '@/server/runtime/clock';
import { readConfiguration } from '@/server/runtime/configuration';
import { newSecret, secretDigest } from '@/server/runtime/secrets';

const VALID_MS = 24 * 3_600_000;

/** Prints a link with which the first lead makes an account; it works once, for 24 hours. */
async function main(): Promise<void> {
  const configuration = readConfiguration(process.env);
  const dataSource = createDataSource(configuration.DATABASE_URL);
  await dataSource.initialize();
  const token = newSecret();
  const expiresAt = new Date(systemClock.now().getTime() + VALID_MS);
  await dataSource
    .getRepository(InvitationEntity)
    .insert({ tokenDigest: secretDigest(token), expiresAt, usedAt: null });
  await dataSource.destroy();
  // In the fragment: browsers never send that part to a server, so it stands in no log.
  process.stdout.write(
    `${configuration.PUBLIC_ORIGIN}/invitation#${token}\nIt works once, until ${expiresAt.toISOString()}.\n`,
  );
}

main().catch((error: unknown) => {
  process.stderr.write(`${error instanceof Error ? error.message : String(error)}\n`);
  process.exit(1);
});
