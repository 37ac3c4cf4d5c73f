import { randomUUID } from 'node:crypto';
import { type ReviewedWeek } from '@/shared/reviews/weekly-review-endpoints';
import { type Today } from '@/shared/today/today-endpoints';
import { comeBack } from '@/tests/server/support/come-back';
import {
  addSealed,
  addUnderlying,
  completePlan,
  expiry,
  fill,
  option,
  putBar,
  sessionsToExpiry,
} from '@/tests/server/support/journal';
import { startTestApp, type TestApp, type TestPerson } from '@/tests/server/support/test-app';

jest.setTimeout(60_000);

const rule = { action: 'keep', rule: 'Seal before the first fill.', evidence: 'Three of three.', followedLast: null };
let app: TestApp;
beforeAll(async () => {
  app = await startTestApp();
});
afterAll(async () => {
  await app.stop();
  expect(app.guard.offences).toEqual([]);
});
beforeEach(() => app.clock.set('2026-12-09T22:00:00.000Z'));

const weekOf = async (person: TestPerson, query = ''): Promise<ReviewedWeek> =>
  (await person.get(`/weekly-review${query}`).expect(200)).body;
const link = (mentor: TestPerson, trader: TestPerson) =>
  app.dataSource.query(
    'INSERT INTO mentorship (id, desk_id, mentor_id, trader_id, accepted_at, revoked_at) VALUES (UUID(), ?, ?, ?, NOW(6), NULL)',
    [trader.deskId, mentor.id, trader.id],
  );

/** A bull put sealed on 9 December and bought back in the week after, with its bars. */
async function tradedWeek(): Promise<{ before: TestPerson; trader: TestPerson; entryId: string }> {
  const before = await app.person({ role: 'trader' });
  const underlyingId = await addUnderlying(before);
  const entryId = await addSealed(before, completePlan(underlyingId));
  const trader = await comeBack(app, before, '2026-12-19T15:00:00.000Z');
  for (const date of sessionsToExpiry) await putBar(trader, { underlyingId, date, close: '98' });
  const add = (kind: string, price: string, tradedAt: string) =>
    trader
      .post(`/entries/${entryId}/fills`)
      .send(fill(kind, option('put', '97'), { price, tradedAt }))
      .expect(201);
  await add('sell', '0.78', '2026-12-10T15:00:00.000Z');
  await add('buy', '0.40', '2026-12-15T15:00:00.000Z');
  return { before, trader, entryId };
}

describe('a week looked back at', () => {
  it('gathers what was sealed, closed and answered in it, with counts and no rate', async () => {
    const { trader, entryId } = await tradedWeek();
    const first = await weekOf(trader, '?week=2026-12-09');
    expect(first.week).toEqual({
      startSessionDate: '2026-12-07',
      endSessionDate: '2026-12-11',
      isOver: true,
      previous: '2026-11-30',
      next: '2026-12-14',
    });
    expect(first.sealed.map(({ id }) => id)).toEqual([entryId]);
    expect([first.closed, first.odds, first.profit]).toEqual([[], [], []]);

    const second = await weekOf(trader);
    expect(second.week).toMatchObject({ startSessionDate: '2026-12-14', isOver: true, next: null });
    expect(second.sealed).toEqual([]);
    expect(second.closed.map(({ id }) => id)).toEqual([entryId]);
    expect(second.odds.length).toBeGreaterThan(2);
    expect(second.odds[0]).toMatchObject({
      entryId,
      entryName: 'HVYQ bull put 97 / 95',
      happened: expect.any(Boolean),
    });
    for (const { probability, happened, brierScore } of second.odds)
      expect(brierScore).toBeCloseTo((probability - (happened ? 1 : 0)) ** 2, 12);
    expect(second.meanBrierScore).toBeNull();
    expect(second.process.find(({ mark }) => mark === 'sealed-before-fill')).toMatchObject({ kept: 1, of: 1 });
    expect(second.profit).toMatchObject([{ currency: 'USD', count: 1, realised: '38' }]);
  });

  it('is empty where nothing happened', async () => {
    const trader = await app.person({ role: 'trader' });
    expect(await weekOf(trader, '?week=2026-07-01')).toMatchObject({
      week: { startSessionDate: '2026-06-29', endSessionDate: '2026-07-02' }, // 3 July is a holiday that year
      sealed: [],
      closed: [],
      odds: [],
      profit: [],
      review: null,
      lastRule: null,
    });
  });
});

describe('the rule of a week', () => {
  it('is kept, found again, and asked about the week after', async () => {
    const trader = await app.person({ role: 'trader' });
    const id = randomUUID();
    const { body } = await trader
      .post('/weekly-reviews')
      .send({ id, week: '2026-12-02', ...rule })
      .expect(201);
    expect(body.review).toMatchObject({ id, version: 1, weekStartSessionDate: '2026-11-30', ...rule });
    await trader
      .post('/weekly-reviews')
      .send({ id, week: '2026-12-02', ...rule, rule: 'Another' })
      .expect(201);
    expect((await weekOf(trader, '?week=2026-12-02')).review).toMatchObject({ version: 1, rule: rule.rule });
    const next = await weekOf(trader);
    expect(next).toMatchObject({ review: null, lastRule: { id, rule: rule.rule } });
    const after = await trader
      .post('/weekly-reviews')
      .send({ id: randomUUID(), week: '2026-12-09', ...rule, action: 'change', followedLast: 'partly' })
      .expect(201);
    expect(after.body).toMatchObject({ review: { action: 'change', followedLast: 'partly' }, lastRule: { id } });
  });

  it('is one a week, and is rewritten from the version that was seen only', async () => {
    const trader = await app.person({ role: 'trader' });
    const id = randomUUID();
    await trader
      .post('/weekly-reviews')
      .send({ id, week: '2026-12-07', ...rule })
      .expect(201);
    const twice = await trader
      .post('/weekly-reviews')
      .send({ id: randomUUID(), week: '2026-12-09', ...rule })
      .expect(409);
    expect(twice.body.error).toMatchObject({ code: 'already-exists', current: { review: { id } } });
    const write = (version: string, text: string) =>
      trader
        .put(`/weekly-reviews/${id}`)
        .set('If-Match', version)
        .send({ ...rule, rule: text });
    expect((await write('1', 'Size first.').expect(200)).body.review).toMatchObject({
      version: 2,
      rule: 'Size first.',
    });
    const stale = await write('1', 'Something else.').expect(409);
    expect(stale.body.error).toMatchObject({
      code: 'changed-elsewhere',
      current: { review: { version: 2, rule: 'Size first.' } },
    });
  });

  it('needs its words and its evidence', async () => {
    const trader = await app.person({ role: 'trader' });
    const send = (changes: object) =>
      trader.post('/weekly-reviews').send({ id: randomUUID(), week: '2026-12-07', ...rule, ...changes });
    expect((await send({ rule: '  ' }).expect(400)).body.error.problems).toMatchObject([{ field: 'rule' }]);
    expect((await send({ evidence: '' }).expect(400)).body.error.problems).toMatchObject([{ field: 'evidence' }]);
    await send({ week: '1999-01-04' }).expect(400);
  });

  it('is read by the trader and the mentors linked to them, and by nobody else', async () => {
    const { before, trader } = await tradedWeek();
    const mentor = await app.person({ role: 'mentor', deskOf: before });
    const other = await app.person({ role: 'trader', deskOf: before });
    const id = randomUUID();
    await trader
      .post('/weekly-reviews')
      .send({ id, week: expiry, ...rule })
      .expect(201);
    expect(await weekOf(mentor)).toMatchObject({ trader: null, traders: [], review: null, closed: [] });
    await mentor.get(`/weekly-review?traderId=${before.id}`).expect(404);
    await link(mentor, before);
    expect(await weekOf(mentor)).toMatchObject({ trader: { id: before.id }, isOwn: false, review: { id } });
    expect((await weekOf(mentor)).closed).toHaveLength(1);
    await other.get(`/weekly-review?traderId=${before.id}`).expect(404);
    await other.put(`/weekly-reviews/${id}`).set('If-Match', '1').send(rule).expect(404);
    await mentor.put(`/weekly-reviews/${id}`).set('If-Match', '1').send(rule).expect(403);
  });

  it('is asked for on Today once the week is over, until it is written', async () => {
    const { trader } = await tradedWeek();
    const asks = async () => {
      const today: Today = (await trader.get('/today').expect(200)).body;
      return today.tasks.filter(({ kind }) => kind === 'weekly-review').length;
    };
    expect(await asks()).toBe(1);
    await trader
      .post('/weekly-reviews')
      .send({ id: randomUUID(), week: expiry, ...rule })
      .expect(201);
    expect(await asks()).toBe(0);
  });
});
