import { randomBytes } from 'node:crypto';
import { createConnection } from 'mysql2/promise';
import { migrate } from '@/server/database/migrate';

export interface TestDatabase {
  readonly name: string;
  /** As the application sees it. */
  readonly applicationUrl: string;
  readonly migrationUrl: string;
  readonly drop: () => Promise<void>;
}

function setting(name: string): string {
  const value = process.env[name];
  if (value === undefined)
    throw new Error(
      `${name} is not set: run server tests through \`npm test\` or \`node scripts/test.mjs --only server\`.`,
    );
  return value;
}

/** An own, migrated database for one test file, on the MariaDB the test script started. */
export async function createTestDatabase({ isMigrated = true }: { isMigrated?: boolean } = {}): Promise<TestDatabase> {
  const name = `brierbook_test_${randomBytes(6).toString('hex')}`;
  const migrationUrl = `${setting('BRIERBOOK_TEST_MIGRATION_URL')}${name}`;
  const statement = async (sql: string) => {
    const connection = await createConnection(setting('BRIERBOOK_TEST_MIGRATION_URL'));
    await connection.query(sql);
    await connection.end();
  };
  await statement(`CREATE DATABASE ${name} CHARACTER SET utf8mb4 COLLATE utf8mb4_unicode_ci`);
  if (isMigrated)
    await migrate({ url: migrationUrl, applicationAccount: setting('BRIERBOOK_TEST_APPLICATION_ACCOUNT') });
  return {
    name,
    migrationUrl,
    applicationUrl: `${setting('BRIERBOOK_TEST_APPLICATION_URL')}${name}`,
    drop: () => statement(`DROP DATABASE ${name}`),
  };
}
