import { startTestApp, type TestApp, type TestPerson } from '@/tests/server/support/test-app';

const start = Date.parse('2026-12-09T22:00:00.000Z');
jest.setTimeout(60_000);

let app: TestApp;
let person: TestPerson;
beforeEach(async () => {
  app = await startTestApp(); // afresh, since the throttle also counts by address
  app.clock.set(new Date(start).toISOString());
  person = await app.person({ role: 'trader' });
});
afterEach(() => app.stop());

const at = (seconds: number) => app.clock.set(new Date(start + seconds * 1_000).toISOString());
const attempt = async (password: string, email = person.email) =>
  (await app.anonymous.post('/account/sign-in').send({ email, password })).status;
const fail = async (times: number, email = person.email) => {
  const statuses: number[] = [];
  for (let round = 0; round < times; round += 1) statuses.push(await attempt('a wrong password here', email));
  return statuses;
};

describe('signing in', () => {
  it('answers an unknown account as it answers a wrong password', async () => {
    const ask = async (email: string) => {
      const { status, body } = await app.anonymous
        .post('/account/sign-in')
        .send({ email, password: 'wrong, of course' });
      return { status, error: { ...body.error, requestId: '' } };
    };
    expect(await ask('nobody@example.org')).toEqual(await ask(person.email));
  });

  it('waits after five failures, longer each time, also for the right password', async () => {
    expect(await fail(6)).toEqual([401, 401, 401, 401, 401, 401]);
    expect(await attempt(person.password)).toBe(429);
    at(1);
    expect(await fail(1)).toEqual([401]); // the seventh doubles the wait
    at(2.9);
    expect(await attempt(person.password)).toBe(429);
    at(3);
    expect(await attempt(person.password)).toBe(200);
    expect(await fail(5)).toEqual([401, 401, 401, 401, 401]); // and one starts afresh
    expect(await attempt(person.password)).toBe(200);
  });

  it('says when to come back', async () => {
    await fail(6);
    const answer = await app.anonymous
      .post('/account/sign-in')
      .send({ email: person.email, password: person.password })
      .expect(429);
    expect(Number(answer.get('Retry-After'))).toBeGreaterThan(0);
  });

  it('lets an address fail twenty times in a quarter of an hour, whatever the accounts', async () => {
    for (let number = 0; number < 20; number += 1) expect(await fail(1, `person-${number}@example.org`)).toEqual([401]);
    expect(await attempt(person.password)).toBe(429);
    at(15 * 60 - 1);
    expect(await attempt(person.password)).toBe(429);
    at(15 * 60 + 1);
    expect(await attempt(person.password)).toBe(200);
  });

  it('does not let requests at once past the limit', async () => {
    const answers = await Promise.all(Array.from({ length: 12 }, () => attempt('a wrong password here')));
    expect(answers.every((status) => status === 401 || status === 429 || status === 503)).toBe(true);
    const [row] = await app.dataSource.query('SELECT MAX(failures) AS most FROM login_throttle');
    expect(Number(row.most)).toBe(answers.filter((status) => status === 401).length);
  });
});
