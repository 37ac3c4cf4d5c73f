import { execFile } from 'node:child_process';
import path from 'node:path';
import { createConnection, type Connection, type RowDataPacket } from 'mysql2/promise';
import { migrations } from '@/server/database/migrations/all-migrations';
import { createTestDatabase, type TestDatabase } from '@/tests/server/support/test-database';

jest.setTimeout(240_000);

const root = path.resolve(__dirname, '../../..');
const account = process.env.BRIERBOOK_TEST_APPLICATION_ACCOUNT ?? '';
type Point = 'sent' | 'done' | 'noted';

/** The built migration command in a process of its own; gives the signal that ended it, null when it came to its end. */
function migrateInProcess(
  { migrationUrl }: TestDatabase,
  kill: { inMigration: number; at: Point } | null,
): Promise<NodeJS.Signals | null> {
  const hook = ['--import', path.join(root, 'tests/server/support/kill-in-migration.mjs')];
  const settings = kill === null ? {} : { KILL_IN_MIGRATION: String(kill.inMigration), KILL_AT: kill.at };
  return new Promise((resolve, reject) => {
    execFile(
      process.execPath,
      [...(kill === null ? [] : hook), path.join(root, 'build/server/cli/migrate.js')],
      {
        cwd: root,
        env: {
          PATH: process.env.PATH,
          MIGRATION_DATABASE_URL: migrationUrl,
          APPLICATION_ACCOUNT: account,
          ...settings,
        },
      },
      (error, _, complaint) => {
        if (error === null) resolve(null);
        else if (error.signal) resolve(error.signal);
        else reject(new Error(complaint));
      },
    );
  });
}

/** Everything the schema is made of: tables as the database would write them, triggers, rights, and the notes. */
async function schemaOf(database: TestDatabase): Promise<string> {
  const owner = await createConnection(database.migrationUrl);
  const application = await createConnection(database.applicationUrl);
  try {
    const ask = async (connection: Connection, sql: string) => (await connection.query<RowDataPacket[]>(sql))[0];
    const tables = await ask(
      owner,
      'SELECT TABLE_NAME AS name FROM information_schema.TABLES WHERE TABLE_SCHEMA = DATABASE() ORDER BY 1',
    );
    const written = [];
    for (const { name } of tables) written.push(await ask(owner, `SHOW CREATE TABLE \`${String(name)}\``));
    const triggers = await ask(
      owner,
      `SELECT TRIGGER_NAME, EVENT_OBJECT_TABLE, EVENT_MANIPULATION, ACTION_TIMING, ACTION_STATEMENT
       FROM information_schema.TRIGGERS WHERE TRIGGER_SCHEMA = DATABASE() ORDER BY 1`,
    );
    const grants = (await ask(application, 'SHOW GRANTS'))
      .flatMap((grant) => Object.values(grant).map(String))
      .filter((grant) => grant.includes(database.name))
      .map((grant) => grant.replaceAll(database.name, 'DATABASE'))
      .sort();
    const notes = await ask(owner, 'SELECT timestamp, name FROM migration ORDER BY id');
    const text = JSON.stringify({ written, triggers, grants, notes }, null, 1);
    return text.replace(/ AUTO_INCREMENT=\d+/g, ''); // a note that was not kept used up a number
  } finally {
    await owner.end();
    await application.end();
  }
}

describe('a migration that is killed', () => {
  let whole: string;
  beforeAll(async () => {
    const database = await createTestDatabase({ isMigrated: false });
    expect(await migrateInProcess(database, null)).toBeNull();
    whole = await schemaOf(database);
    await database.drop();
  });

  it.each([
    ['while its statement is on the way', 'sent'],
    ['between its statement and its note', 'done'],
    ['between its note and the commit', 'noted'],
  ] as const)('%s, each in its turn, is finished by the run after it: the same schema in the end', async (_, at) => {
    const database = await createTestDatabase({ isMigrated: false });
    try {
      const notes = async () => {
        const owner = await createConnection(database.migrationUrl);
        const [[row]] = await owner.query<RowDataPacket[]>('SELECT COUNT(*) AS number FROM migration');
        await owner.end();
        return Number(row?.number);
      };
      let kills = 0;
      for (let kept = 0; kept < migrations.length; kept = await notes()) {
        // The run before was killed within the first of those that are left; this one finishes it and is killed in the next.
        const inMigration = kills === 0 || at === 'noted' ? 1 : 2;
        const signal = await migrateInProcess(database, { inMigration, at });
        if (signal === null) break;
        expect(signal).toBe('SIGKILL');
        kills += 1;
      }
      expect(kills).toBe(migrations.length);
      expect(await migrateInProcess(database, null)).toBeNull();
      expect(await schemaOf(database)).toBe(whole);
    } finally {
      await database.drop();
    }
  });
});
