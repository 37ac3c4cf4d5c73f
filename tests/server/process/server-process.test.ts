import { randomUUID } from 'node:crypto';
import { createConnection, type Connection } from 'mysql2/promise';
import { apiRoot, requestHeader } from '@/shared/contract/request-headers';
import { serverProcesses, type ServerProcesses, statusOf, until } from '@/tests/server/support/server-process';
import { createTestDatabase, type TestDatabase } from '@/tests/server/support/test-database';

jest.setTimeout(60_000);

let database: TestDatabase;
let owner: Connection;
let processes: ServerProcesses;

beforeEach(async () => {
  database = await createTestDatabase();
  processes = serverProcesses(database);
  owner = await createConnection(database.migrationUrl);
});
afterEach(async () => {
  processes.endAll();
  await owner.end();
  await database.drop();
});

const signUp = (origin: string, email: string) =>
  fetch(`${origin}${apiRoot}/account/sign-up`, {
    method: 'POST',
    headers: { 'Content-Type': 'application/json', Origin: origin, [requestHeader.name]: requestHeader.value },
    body: JSON.stringify({ email, password: 'ten thousand grey pebbles', displayName: 'Ada', timeZone: 'UTC' }),
  }).then(
    ({ status }) => status,
    () => 0,
  );
/** Sign-ups that hang on a lock we hold, so that they are under way for as long as the test wants. */
async function holdSignUps(origin: string, emails: readonly string[]): Promise<Promise<number>[]> {
  await owner.query('LOCK TABLES `user` WRITE');
  const answers = emails.map((email) => signUp(origin, email));
  const watcher = await createConnection(database.applicationUrl); // an account sees its own threads
  await until(async () => {
    const [rows] = await watcher.query(
      "SELECT COUNT(*) AS number FROM information_schema.PROCESSLIST WHERE DB = ? AND STATE LIKE 'Waiting for table metadata lock'",
      [database.name],
    );
    const [row] = rows as { number: string | number }[]; // a SELECT gives rows
    return Number(row?.number) === emails.length;
  });
  await watcher.end();
  return answers;
}
const emailsOf = (number: number) => Array.from({ length: number }, () => `${randomUUID()}@example.org`);

describe('the server process', () => {
  it('on SIGTERM answers every request under way, keeps what it said it kept, takes no new ones and exits 0', async () => {
    const server = await processes.launchReady();
    const emails = emailsOf(6);
    const answers = await holdSignUps(server.origin, emails);
    server.child.kill('SIGTERM');
    await until(async () => (await statusOf(`${server.origin}/readyz`)) !== 200);
    expect(await statusOf(`${server.origin}/healthz`)).toBe(0);
    await owner.query('UNLOCK TABLES');
    expect(await Promise.all(answers)).toEqual(emails.map(() => 201));
    expect(await server.ended).toBe(0);
    const [rows] = await owner.query('SELECT email FROM `user`');
    expect((rows as { email: string }[]).map(({ email }) => email).sort()).toEqual([...emails].sort());
  });

  it('on a second signal ends at once with 1', async () => {
    const server = await processes.launchReady();
    const answers = await holdSignUps(server.origin, emailsOf(1));
    server.child.kill('SIGTERM');
    await until(async () => (await statusOf(`${server.origin}/readyz`)) !== 200);
    server.child.kill('SIGTERM');
    expect(await server.ended).toBe(1);
    expect(await Promise.all(answers)).toEqual([0]);
    await owner.query('UNLOCK TABLES');
  });

  it('is not ready while a migration is missing, and says no more than that', async () => {
    const server = await processes.launchReady();
    await owner.query('DELETE FROM migration ORDER BY id DESC LIMIT 1');
    const answer = await fetch(`${server.origin}/readyz`);
    expect([answer.status, await answer.json()]).toEqual([503, { status: 'not ready' }]);
    expect(await statusOf(`${server.origin}/healthz`)).toBe(200);
  });

  it.each([
    [
      'a database account that may change tables',
      () => ({ DATABASE_URL: database.migrationUrl }),
      'right to change tables',
    ],
    ['a database that is not there', () => ({ DATABASE_URL: 'mysql://nobody:x@127.0.0.1:9/none' }), 'ECONNREFUSED'],
    ['a short secret', () => ({ SESSION_SECRET: 'short' }), 'SESSION_SECRET'],
    ['another time zone', () => ({ TZ: 'America/New_York' }), 'TZ=UTC'],
    ['production over plain http', () => ({ NODE_ENV: 'production' }), 'PUBLIC_ORIGIN'],
  ] as const)('refuses to start with %s and names it', async (_, changes, said) => {
    const server = await processes.launch(changes());
    expect(await server.ended).toBe(1);
    expect(server.output()).toContain(said);
    expect(server.output()).not.toContain(new URL(database.applicationUrl).password);
  });

  it('names nobody in its log but by number', async () => {
    const server = await processes.launchReady({ changes: { LOG_LEVEL: 'debug' } });
    const [email = ''] = emailsOf(1);
    expect(await signUp(server.origin, email)).toBe(201);
    server.child.kill('SIGTERM');
    expect(await server.ended).toBe(0);
    expect(server.output()).toContain('/account/sign-up');
    for (const word of [email, 'pebbles', '__Host-brierbook', 'Ada']) expect(server.output()).not.toContain(word);
  });
});
