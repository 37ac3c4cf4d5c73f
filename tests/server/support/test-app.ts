import { randomUUID } from 'node:crypto';
import { type Express } from 'express';
import supertest, { type Test } from 'supertest';
import { DataSource } from 'typeorm';
import { createApp } from '@/server/app';
import { createDataSource } from '@/server/database/data-source';
import { boundedDriver } from '@/server/database/pool';
import { MembershipEntity } from '@/server/people/membership-entity';
import { emailKeyOf, PeopleStore } from '@/server/people/people-store';
import { PasswordHasher } from '@/server/account/password-hasher';
import { type Configuration, readConfiguration } from '@/server/runtime/configuration';
import { systemIds } from '@/server/runtime/ids';
import { createLogger } from '@/server/runtime/logger';
import { apiRoot, requestHeader } from '@/shared/contract/request-headers';
import { type Role } from '@/shared/contract/roles';
import { StatementGuard } from '@/tests/server/support/statement-guard';
import { createTestDatabase, type TestDatabase } from '@/tests/server/support/test-database';

export const testOrigin = 'http://localhost:8080';
const password = 'quiet bramble lantern';

type Call = (path: string) => Test;
/** Someone signed in, with the calls they can make. */
export interface TestPerson {
  readonly id: string;
  readonly deskId: string;
  readonly email: string;
  readonly password: string;
  readonly cookie: string;
  readonly get: Call;
  readonly post: Call;
  readonly put: Call;
  readonly patch: Call;
  readonly delete: Call;
}

export interface TestApp {
  readonly app: Express;
  readonly clock: { readonly now: () => Date; readonly set: (instant: string) => void };
  readonly configuration: Configuration;
  readonly dataSource: DataSource;
  readonly database: TestDatabase;
  readonly guard: StatementGuard;
  /** Makes a person on a desk of their own, or on someone else's, and signs them in. */
  readonly person: (wanted: { role: Role; deskOf?: TestPerson }) => Promise<TestPerson>;
  /** Calls as nobody, from our own pages. */
  readonly anonymous: Pick<TestPerson, 'get' | 'post' | 'put' | 'patch' | 'delete'>;
  readonly stop: () => Promise<void>;
}

export function testConfiguration(databaseUrl: string, changes: Record<string, string> = {}): Configuration {
  return readConfiguration({
    NODE_ENV: 'test',
    PUBLIC_ORIGIN: testOrigin,
    DATABASE_URL: databaseUrl,
    SESSION_SECRET: 'a session secret for tests, 32 and more',
    PASSWORD_PEPPER: 'a password pepper for tests, 32 and more',
    BCRYPT_COST: '4',
    OPEN_SIGN_UP: 'yes',
    LOG_LEVEL: 'silent',
    WEB_ROOT: 'tests/server/support/web-root',
    ...changes,
  });
}

/** The real application on a database of its own, with a clock the test sets and, if wanted, a driver it can disturb. */
export async function startTestApp(
  changes: Record<string, string> = {},
  { driver = boundedDriver }: { driver?: typeof boundedDriver } = {},
): Promise<TestApp> {
  const database = await createTestDatabase();
  const configuration = testConfiguration(database.applicationUrl, changes);
  const guard = new StatementGuard();
  const { options } = createDataSource(configuration.DATABASE_URL);
  const dataSource = new DataSource(Object.assign(options, { driver, logger: guard, logging: ['query'] }));
  await dataSource.initialize();
  let now = new Date('2026-12-09T22:00:00.000Z');
  const clock = { now: () => now, set: (instant: string) => void (now = new Date(instant)) };
  const { app, close } = createApp({
    configuration,
    dataSource,
    clock,
    ids: systemIds,
    logger: createLogger('silent'),
  });
  const hasher = new PasswordHasher({ pepper: configuration.PASSWORD_PEPPER, cost: configuration.BCRYPT_COST });
  const passwordHash = await hasher.hash(password);

  const person = async ({ role, deskOf }: { role: Role; deskOf?: TestPerson }): Promise<TestPerson> => {
    const id = randomUUID();
    const deskId = deskOf?.deskId ?? randomUUID();
    const email = `${id}@example.org`;
    const createdAt = clock.now();
    await new PeopleStore(dataSource).inTransaction(async (store, manager) => {
      await store.addPerson({
        id,
        email,
        emailKey: emailKeyOf(email),
        displayName: `${role} ${id.slice(0, 4)}`,
        timeZone: 'UTC',
        passwordHash,
        sessionEpoch: 0,
        disabledAt: null,
        createdAt,
      });
      const membership = { id: randomUUID(), deskId, personId: id, role, createdAt };
      if (deskOf === undefined) {
        const presets = { currency: 'USD', ratePerYear: 0.04, overnightShare: 0.3, feePerContract: '0.65' };
        await store.addDesk(
          { id: deskId, version: 1, name: `Desk ${id.slice(0, 4)}`, createdAt, ...presets },
          membership,
        );
      } else {
        await manager.insert(MembershipEntity, membership);
      }
    });
    const answer = await callsOf(app, null).post('/account/sign-in').send({ email, password }).expect(200);
    const cookie = cookieOf(answer.get('Set-Cookie'));
    return { id, deskId, email, password, cookie, ...callsOf(app, cookie) };
  };
  return {
    app,
    clock,
    configuration,
    dataSource,
    database,
    guard,
    person,
    anonymous: callsOf(app, null),
    stop: async () => {
      await close();
      await hasher.close();
      await dataSource.destroy();
      await database.drop();
    },
  };
}

/** The session cookie of an answer, as a browser would send it back. */
export function cookieOf(setCookie: readonly string[] | undefined): string {
  const cookie = setCookie?.find((text) => text.startsWith('__Host-brierbook='))?.split(';')[0];
  if (cookie === undefined) throw new Error('The answer sets no session cookie.');
  return cookie;
}

/** Calls as our own pages make them, to the application in this process or to the origin of another. */
export function callsOf(
  app: Express | string,
  cookie: string | null,
): Pick<TestPerson, 'get' | 'post' | 'put' | 'patch' | 'delete'> {
  const call =
    (method: 'get' | 'post' | 'put' | 'patch' | 'delete'): Call =>
    (path) => {
      const test = supertest(app)[method](`${apiRoot}${path}`).set('Sec-Fetch-Site', 'same-origin');
      if (method !== 'get') test.set(requestHeader.name, requestHeader.value);
      return cookie === null ? test : test.set('Cookie', cookie);
    };
  return { get: call('get'), post: call('post'), put: call('put'), patch: call('patch'), delete: call('delete') };
}
