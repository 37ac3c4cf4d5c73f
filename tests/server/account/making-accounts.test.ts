import { randomUUID } from 'node:crypto';
import { InvitationEntity } from '@/server/account/invitation-entity';
import { newSecret, secretDigest } from '@/server/runtime/secrets';
import { callsOf, cookieOf, startTestApp, type TestApp } from '@/tests/server/support/test-app';

const start = '2026-12-09T22:00:00.000Z';
jest.setTimeout(60_000);

let app: TestApp;
beforeAll(async () => {
  app = await startTestApp();
});
afterAll(async () => {
  await app.stop();
});
beforeEach(() => app.clock.set(start));

const newcomer = (changes: object = {}) => ({
  email: `${randomUUID()}@example.org`,
  password: 'ten thousand grey pebbles',
  displayName: 'Ada Quill',
  timeZone: 'Europe/Zurich',
  ...changes,
});
const signUp = (changes: object = {}) => app.anonymous.post('/account/sign-up').send(newcomer(changes));
const count = async (table: string) =>
  Number((await app.dataSource.query(`SELECT COUNT(*) AS number FROM \`${table}\``))[0].number);

describe('sign-up', () => {
  it('makes a desk of one that its person leads, and signs in', async () => {
    const answer = await signUp().expect(201);
    expect(answer.body.desk).toMatchObject({ role: 'lead', settings: { name: 'Desk of Ada Quill', version: 1 } });
    const { get } = callsOf(app.app, cookieOf(answer.get('Set-Cookie')));
    const { body } = await get('/desk').expect(200);
    expect(body.members).toEqual([{ personId: answer.body.person.id, displayName: 'Ada Quill', role: 'lead' }]);
    expect((await get('/account/me').expect(200)).body).toEqual(answer.body);
  });

  it('takes the longest name, though the desk’s name then has no room for all of it', async () => {
    const displayName = 'Ä'.repeat(120);
    const { body } = await signUp({ displayName }).expect(201);
    expect(body.desk.settings.name).toBe(`Desk of ${displayName}`.slice(0, 120));
  });

  it('refuses an e-mail that is taken, however it is written, and makes nothing', async () => {
    const email = `Vera.${randomUUID()}@example.org`;
    await signUp({ email }).expect(201);
    const before = [await count('user'), await count('desk'), await count('membership')];
    const answer = await signUp({ email: email.toUpperCase().replace('EXAMPLE.ORG', 'example.org') }).expect(409);
    expect(answer.body.error).toMatchObject({ code: 'email-taken', problems: [{ field: 'email' }] });
    expect([await count('user'), await count('desk'), await count('membership')]).toEqual(before);
  });

  it('gives one account to two requests at once', async () => {
    const email = `${randomUUID()}@example.org`;
    const answers = await Promise.all([signUp({ email }), signUp({ email })]);
    expect(answers.map(({ status }) => status).sort()).toEqual([201, 409]);
  });

  it.each([
    ['fourteen chars', 'short'],
    ['passwordpassword', 'common'],
    ['aaaaaaaaaaaaaaaaaaaa', 'one letter'],
    ['Ada Quill Ada Quill', 'the name'],
  ])('refuses the password "%s" (%s)', async (password) => {
    const answer = await signUp({ password }).expect(400);
    expect(answer.body.error.problems).toEqual([expect.objectContaining({ field: 'password' })]);
  });

  it('takes any characters in a password exactly as typed', async () => {
    const person = newcomer({ password: '  ünïcode 🜁 spaces at both ends  ' });
    await app.anonymous.post('/account/sign-up').send(person).expect(201);
    const signIn = (password: string) => app.anonymous.post('/account/sign-in').send({ email: person.email, password });
    await signIn(person.password).expect(200);
    await signIn(person.password.trim()).expect(401);
  });

  it('stores the password as a salted hash only', async () => {
    const person = newcomer();
    await app.anonymous.post('/account/sign-up').send(person).expect(201);
    const [row] = await app.dataSource.query('SELECT * FROM `user` WHERE email = ?', [person.email]);
    expect(row.password_hash).toMatch(/^\$2b\$04\$.{53}$/);
    expect(JSON.stringify(row)).not.toContain(person.password);
  });

  it('can be closed; then accounts are made by invitation', async () => {
    const closed = await startTestApp({ OPEN_SIGN_UP: 'no' });
    try {
      await closed.anonymous.post('/account/sign-up').send(newcomer()).expect(403);
      expect(await closed.dataSource.query('SELECT id FROM `user`')).toEqual([]);
    } finally {
      await closed.stop();
    }
  });
});

describe('an invitation', () => {
  const invite = async () => {
    const token = newSecret();
    await app.dataSource.getRepository(InvitationEntity).insert({
      tokenDigest: secretDigest(token),
      expiresAt: new Date(Date.parse(start) + 24 * 3_600_000),
      usedAt: null,
    });
    return token;
  };
  const accept = (token: string) =>
    app.anonymous.post('/account/accept-invitation').send({ ...newcomer(), token, deskName: 'North desk' });

  it('makes a lead once; a second use makes nothing', async () => {
    const token = await invite();
    const answer = await accept(token).expect(201);
    expect(answer.body.desk).toMatchObject({ role: 'lead', settings: { name: 'North desk' } });
    const people = await count('user');
    expect((await accept(token).expect(410)).body.error.code).toBe('invitation-invalid');
    expect(await count('user')).toBe(people);
  });

  it('works for one of two at once', async () => {
    const token = await invite();
    const answers = await Promise.all([accept(token), accept(token)]);
    expect(answers.map(({ status }) => status).sort()).toEqual([201, 410]);
  });

  it('ends after 24 hours', async () => {
    const token = await invite();
    app.clock.set('2026-12-10T22:00:00.000Z');
    await accept(token).expect(410);
    app.clock.set('2026-12-10T21:59:59.999Z');
    await accept(token).expect(201);
  });

  it('is kept as a digest that does not work itself', async () => {
    const token = await invite();
    const rows = await app.dataSource.query('SELECT * FROM invitation');
    expect(JSON.stringify(rows)).not.toContain(token);
    await accept(secretDigest(token)).expect(410);
  });

  it('stays good after a taken e-mail', async () => {
    const token = await invite();
    const person = newcomer();
    await app.anonymous.post('/account/sign-up').send(person).expect(201);
    const post = (body: object) => app.anonymous.post('/account/accept-invitation').send(body);
    await post({ ...person, token, deskName: 'Desk' }).expect(409);
    await accept(token).expect(201);
  });
});
