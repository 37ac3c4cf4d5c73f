import { randomUUID } from 'node:crypto';
import { MembershipEntity } from '@/server/people/membership-entity';
import { PersonEntity } from '@/server/people/person-entity';
import { callsOf, cookieOf, startTestApp, type TestApp, type TestPerson } from '@/tests/server/support/test-app';

const start = '2026-12-09T22:00:00.000Z';
jest.setTimeout(60_000);

let app: TestApp;
beforeAll(async () => {
  app = await startTestApp();
});
afterAll(() => app.stop());
beforeEach(() => app.clock.set(start));

const at = (hours: number) => app.clock.set(new Date(Date.parse(start) + hours * 3_600_000).toISOString());
const signIn = (person: Pick<TestPerson, 'email' | 'password'>, cookie: string | null = null) =>
  callsOf(app.app, cookie).post('/account/sign-in').send({ email: person.email, password: person.password });
const isAlive = async (cookie: string) => (await callsOf(app.app, cookie).get('/account/me')).status === 200;
const idOf = (cookie: string) =>
  decodeURIComponent(cookie.split('=')[1] ?? '')
    .replace(/^s:/, '')
    .split('.')[0] ?? '';

describe('a session', () => {
  it('gets a new id at sign-in, and the id from before is dead', async () => {
    const person = await app.person({ role: 'trader' });
    const again = await signIn(person, person.cookie).expect(200);
    const cookie = cookieOf(again.get('Set-Cookie'));
    expect(idOf(cookie)).not.toBe(idOf(person.cookie));
    expect(await isAlive(person.cookie)).toBe(false);
    expect(await isAlive(cookie)).toBe(true);
  });

  it('never takes over an id that someone made up', async () => {
    const person = await app.person({ role: 'trader' });
    for (const made of ['__Host-brierbook=chosen-by-someone', '__Host-brierbook=s%3Achosen.signature']) {
      const answer = await signIn(person, made).expect(200);
      expect(cookieOf(answer.get('Set-Cookie'))).not.toContain('chosen');
    }
  });

  it('is stored under a digest of its id, so that nothing in the table works as a cookie', async () => {
    const { cookie } = await app.person({ role: 'trader' });
    expect(idOf(cookie)).toMatch(/^[\w-]{32,}$/);
    const rows: Record<string, unknown>[] = await app.dataSource.query('SELECT * FROM `session`');
    expect(rows.length).toBeGreaterThan(0);
    expect(JSON.stringify(rows)).not.toContain(idOf(cookie));
    for (const value of rows.flatMap((row) => Object.values(row)).filter((cell) => typeof cell === 'string'))
      expect(await isAlive(`__Host-brierbook=${encodeURIComponent(value)}`)).toBe(false);
  });

  it('sits in a cookie that is secure, unreadable by scripts, same-site, for this host and short', async () => {
    const person = await app.person({ role: 'trader' });
    const [cookie = ''] = (await signIn(person).expect(200)).get('Set-Cookie') ?? [];
    const [pair = '', ...flags] = cookie.split('; ');
    expect(pair).toMatch(/^__Host-brierbook=/);
    expect(flags.map((flag) => flag.split('=')[0]).sort()).toEqual([
      'Expires',
      'HttpOnly',
      'Path',
      'SameSite',
      'Secure',
    ]);
    expect(flags).toEqual(expect.arrayContaining(['Path=/', 'SameSite=Lax']));
    expect(cookie.length).toBeLessThan(4_096);
  });

  it('is not begun for those who only look', async () => {
    const answer = await app.anonymous.get('/account/me').expect(401);
    expect(answer.get('Set-Cookie')).toBeUndefined();
  });

  it('ends after eight hours without a request and lives on with one', async () => {
    const { cookie } = await app.person({ role: 'trader' });
    at(7.9);
    expect(await isAlive(cookie)).toBe(true);
    at(15.8);
    expect(await isAlive(cookie)).toBe(true);
    at(23.81);
    expect(await isAlive(cookie)).toBe(false);
  });

  it('ends after seven days however busy', async () => {
    const { cookie } = await app.person({ role: 'trader' });
    for (let hours = 7; hours < 168; hours += 7) {
      at(hours);
      expect([hours, await isAlive(cookie)]).toEqual([hours, true]);
    }
    at(167.99);
    expect(await isAlive(cookie)).toBe(true);
    at(168);
    expect(await isAlive(cookie)).toBe(false);
  });
});

describe('sign-out', () => {
  it('beats every request in flight, a hundred times', async () => {
    const person = await app.person({ role: 'trader' });
    let alive = 0;
    for (let round = 0; round < 100; round += 1) {
      const cookie = cookieOf((await signIn(person).expect(200)).get('Set-Cookie'));
      const calls = callsOf(app.app, cookie);
      const answers = await Promise.all([
        calls.patch('/account/profile').send({ displayName: `Ada ${round}`, timeZone: 'UTC' }),
        calls.post('/account/active-desk').send({ deskId: person.deskId }),
        calls.post('/account/sign-out').expect(204),
        calls.get('/account/me'),
        calls.post('/account/active-desk').send({ deskId: person.deskId }),
      ]);
      expect(answers.filter(({ status }) => status >= 500)).toEqual([]);
      if (await isAlive(cookie)) alive += 1;
    }
    expect(alive).toBe(0);
  });
});

describe('rights', () => {
  const sessionsOf = async (person: TestPerson) => {
    const cookies = [person.cookie];
    while (cookies.length < 10) cookies.push(cookieOf((await signIn(person).expect(200)).get('Set-Cookie')));
    return cookies.map((cookie) => callsOf(app.app, cookie));
  };
  const statuses = async (sessions: Awaited<ReturnType<typeof sessionsOf>>, path: string) =>
    new Set((await Promise.all(sessions.map(({ get }) => get(path)))).map(({ status }) => status));

  it('end for all ten sessions of a person who is disabled, on their next request', async () => {
    const person = await app.person({ role: 'trader' });
    const sessions = await sessionsOf(person);
    expect(await statuses(sessions, '/desk')).toEqual(new Set([200]));
    await app.dataSource.getRepository(PersonEntity).update({ id: person.id }, { disabledAt: new Date(start) });
    expect(await statuses(sessions, '/desk')).toEqual(new Set([401]));
    await signIn(person).expect(401);
  });

  it('end for all ten sessions when the person’s session epoch is raised', async () => {
    const person = await app.person({ role: 'trader' });
    const sessions = await sessionsOf(person);
    await app.dataSource.getRepository(PersonEntity).update({ id: person.id }, { sessionEpoch: 1 });
    expect(await statuses(sessions, '/account/me')).toEqual(new Set([401]));
  });

  it('follow a new role at once', async () => {
    const lead = await app.person({ role: 'lead' });
    const sessions = await sessionsOf(lead);
    const edit = (index: number) =>
      sessions[index]?.patch('/desk/settings').set('If-Match', '1').send({
        name: 'Desk',
        currency: 'USD',
        ratePerYear: 0.04,
        overnightShare: 0.3,
        feePerContract: '0.65',
      });
    const memberships = app.dataSource.getRepository(MembershipEntity);
    await memberships.update({ deskId: lead.deskId, personId: lead.id }, { role: 'mentor' });
    for (let index = 0; index < 10; index += 1) expect((await edit(index))?.status).toBe(403);
    await memberships.update({ deskId: lead.deskId, personId: lead.id }, { role: 'lead' });
    expect((await edit(3))?.status).toBe(200);
  });

  it('end with the place on the desk, without failure', async () => {
    const person = await app.person({ role: 'trader' });
    const sessions = await sessionsOf(person);
    await app.dataSource.getRepository(MembershipEntity).delete({ deskId: person.deskId, personId: person.id });
    expect(await statuses(sessions, '/desk')).toEqual(new Set([403]));
    expect(await statuses(sessions, '/account/me')).toEqual(new Set([403]));
  });
});

describe('someone on two desks', () => {
  it('works on the one they chose, in their role there, and on no desk of others', async () => {
    const person = await app.person({ role: 'lead' });
    const host = await app.person({ role: 'lead' });
    await app.dataSource.getRepository(MembershipEntity).insert({
      id: randomUUID(),
      deskId: host.deskId,
      personId: person.id,
      role: 'mentor',
      createdAt: new Date('2027-01-01T00:00:00.000Z'),
    });
    expect((await person.get('/account/me').expect(200)).body.desk).toMatchObject({ id: person.deskId, role: 'lead' });
    const switchTo = (deskId: string) => person.post('/account/active-desk').send({ deskId });
    expect((await switchTo(host.deskId).expect(200)).body.desk).toMatchObject({ id: host.deskId, role: 'mentor' });
    expect((await person.get('/account/me').expect(200)).body).toMatchObject({ desk: { id: host.deskId } });
    await person.post('/entries').send({}).expect(403);
    const stranger = await app.person({ role: 'lead' });
    await switchTo(stranger.deskId).expect(404);
    expect((await person.get('/account/me')).body.desks.map(({ role }: { role: string }) => role)).toEqual([
      'lead',
      'mentor',
    ]);
    await app.dataSource.getRepository(MembershipEntity).delete({ deskId: host.deskId, personId: person.id });
    expect((await person.get('/account/me').expect(200)).body.desk.id).toBe(person.deskId);
  });
});
