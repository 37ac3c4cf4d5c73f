import { randomUUID } from 'node:crypto';
import { addDraft, addSealed, addUnderlying, completePlan, fill, leg, option } from '@/tests/server/support/journal';
import { startTestApp, type TestApp, type TestPerson } from '@/tests/server/support/test-app';

jest.setTimeout(60_000);

let app: TestApp;
let trader: TestPerson;
let underlyingId: string;
beforeAll(async () => {
  app = await startTestApp();
  trader = await app.person({ role: 'trader' });
  underlyingId = await addUnderlying(trader);
});
afterAll(async () => {
  await app.stop();
  expect(app.guard.offences).toEqual([]);
});

const plan = (changes: Parameters<typeof completePlan>[1] = {}) => completePlan(underlyingId, changes);
const save = (id: string, version: number | string, body: object, person = trader) =>
  person.put(`/entries/${id}/plan`).set('If-Match', String(version)).send(body);
const seal = (id: string, version: number) => trader.post(`/entries/${id}/seal`).set('If-Match', String(version));
const entryRows = () => app.dataSource.query('SELECT COUNT(*) AS number FROM entry');

describe('a draft', () => {
  it('is started once, however often and at once the same request comes', async () => {
    const body = { id: randomUUID(), plan: plan() };
    const answers = await Promise.all(Array.from({ length: 8 }, () => trader.post('/entries').send(body)));
    expect(answers.map(({ status }) => status)).toEqual(answers.map(() => 201));
    expect(new Set(answers.map((answer) => JSON.stringify(answer.body))).size).toBe(1);
    const again = await trader.post('/entries').send(body).expect(201);
    expect(again.body).toMatchObject({ plan: body.plan, row: { version: 1, state: 'draft', tags: ['calm'] } });
  });

  it('is kept as typed, complete or not, and counts its versions', async () => {
    const id = await addDraft(trader, plan({ legs: [] }));
    const half = plan({ legs: [leg('sell', 'put', '9x', '')], targetPrice: 'about 101', idea: ' Ωmega\n"quoted" 🜁 ' });
    const answer = await save(id, 1, half).expect(200);
    expect(answer.body).toMatchObject({
      plan: half,
      row: { version: 2, structureName: 'unfinished plan', strip: null },
    });
    expect((await save(id, 2, plan()).expect(200)).body.row).toMatchObject({
      version: 3,
      structureName: 'bull put 97 / 95',
      expirySessionDate: '2026-12-18',
    });
    expect((await trader.get(`/entries/${id}`).expect(200)).body.plan.legs).toHaveLength(2);
  });

  it('refuses a stale version with the entry as it stands', async () => {
    const id = await addDraft(trader, plan());
    await save(id, 1, plan({ idea: 'first' })).expect(200);
    const answer = await save(id, 1, plan({ idea: 'second' })).expect(409);
    expect(answer.body.error).toMatchObject({
      code: 'changed-elsewhere',
      current: { plan: { idea: 'first' }, row: { version: 2 } },
    });
    await seal(id, 1).expect(409);
    await trader.delete(`/entries/${id}`).set('If-Match', '1').expect(409);
  });

  it('refuses an underlying of another desk', async () => {
    const stranger = await app.person({ role: 'trader' });
    const foreign = await addUnderlying(stranger);
    await trader
      .post('/entries')
      .send({ id: randomUUID(), plan: completePlan(foreign) })
      .expect(404);
    const id = await addDraft(trader, plan());
    await save(id, 1, completePlan(foreign)).expect(404);
  });

  it('is won by exactly one of two edits at once, a hundred times; the loser is shown what stands', async () => {
    for (let round = 0; round < 100; round += 1) {
      const id = await addDraft(trader, plan());
      const [left, right] = await Promise.all([
        save(id, 1, plan({ idea: 'left', exitRule: 'left' })),
        save(id, 1, plan({ idea: 'right', exitRule: 'right' })),
      ]);
      expect([left.status, right.status].sort()).toEqual([200, 409]);
      const winner = left.status === 200 ? 'left' : 'right';
      const { body } = await trader.get(`/entries/${id}`).expect(200);
      expect(body).toMatchObject({ plan: { idea: winner, exitRule: winner }, row: { version: 2 } });
      expect((left.status === 409 ? left : right).body.error.current).toEqual(body);
    }
  });

  it('is one of thirty saved at once, though the server holds ten connections', async () => {
    const ids = await Promise.all(Array.from({ length: 30 }, () => addDraft(trader, plan())));
    const answers = await Promise.all(ids.map((id) => save(id, 1, plan({ idea: id }))));
    expect(answers.map(({ status }) => status)).toEqual(ids.map(() => 200));
  });

  it('is discarded, with a note in the trail, and then is gone', async () => {
    const id = await addDraft(trader, plan());
    const before = await entryRows();
    await trader.delete(`/entries/${id}`).set('If-Match', '1').expect(204);
    await trader.get(`/entries/${id}`).expect(404);
    expect(Number((await entryRows())[0].number)).toBe(Number(before[0].number) - 1);
    const trail = await app.dataSource.query('SELECT action FROM audit_event WHERE subject_id = ?', [id]);
    expect(trail).toEqual([{ action: 'draft-discarded' }]);
  });

  it('takes no fill, no lesson and is not abandoned', async () => {
    const id = await addDraft(trader, plan());
    const sold = fill('sell', option('put', '97'), { price: '0.78', tradedAt: '2026-12-09T22:00:00.000Z' });
    await trader.post(`/entries/${id}/fills`).send(sold).expect(409);
    await trader.put(`/entries/${id}/lesson`).set('If-Match', '1').send({ lesson: 'x' }).expect(409);
    await trader.post(`/entries/${id}/abandon`).set('If-Match', '1').expect(409);
  });

  it.each([
    ['no leg', { legs: [] }, 'legs'],
    ['a strike that is no number', { legs: [leg('sell', 'put', 'x', '1')] }, 'legs.0.strikePrice'],
    ['no premium', { legs: [leg('sell', 'put', '97', '')] }, 'legs.0.premium'],
    ['half a contract', { legs: [leg('sell', 'put', '97', '1', '0.5')] }, 'legs.0.quantity'],
    [
      'a Saturday',
      { legs: [{ ...leg('sell', 'put', '97', '1'), expirySessionDate: '2026-12-19' }] },
      'legs.0.expirySessionDate',
    ],
    ['no holding period', { holding: 'sessions' as const, holdingSessions: '' }, 'holdingSessions'],
    ['a rate of 900 percent', { ratePercent: '900' }, 'ratePercent'],
    ['no overnight share', { overnightSharePercent: '' }, 'overnightSharePercent'],
    ['a target that is no number', { targetPrice: 'high' }, 'targetPrice'],
    ['a stop below 0', { stopPrice: '-1' }, 'stopPrice'],
  ])('with %s is not sealed, and the field is named', async (_, changes, field) => {
    const id = await addDraft(trader, plan(changes));
    const answer = await seal(id, 1).expect(422);
    expect(answer.body.error.code).toBe('plan-incomplete');
    expect(answer.body.error.problems.map((problem: { field: string }) => problem.field)).toContain(field);
    expect((await trader.get(`/entries/${id}`)).body.row).toMatchObject({ state: 'draft', version: 1 });
  });

  it('whose options have expired is not sealed', async () => {
    const id = await addDraft(trader, plan());
    app.clock.set('2026-12-18T21:00:00.000Z');
    const late = await app.anonymous.post('/account/sign-in').send({ email: trader.email, password: trader.password });
    expect(late.status).toBe(200);
    const cookie = late.get('Set-Cookie')?.[0]?.split(';')[0] ?? '';
    await trader.post(`/entries/${id}/seal`).set({ 'If-Match': '1', Cookie: cookie }).expect(422);
    app.clock.set('2026-12-09T22:00:00.000Z');
  });

  it.each([
    ['of before the last close', '2026-12-09T20:59:59.999Z', 'spotPrice'],
    ['of a time to come', '2026-12-09T22:05:00.001Z', 'spotAt'],
  ])('made from a price %s is not sealed: its answer could be known', async (_, spotAt, field) => {
    const id = await addDraft(trader, plan({ spotPrice: '98.40', spotAt }));
    const { body } = await seal(id, 1).expect(422);
    expect(body.error.problems).toEqual([{ field, message: expect.stringContaining('Type the price of now') }]);
    expect((await trader.get(`/entries/${id}`)).body.row.state).toBe('draft');
  });

  it('made from a stored close is not sealed once a later session has closed', async () => {
    const older = await app.person({ role: 'trader' });
    const id = await addDraft(older, completePlan(await addUnderlying(older)));
    app.clock.set('2026-12-10T21:00:00.000Z');
    const answer = await app.anonymous.post('/account/sign-in').send({ email: older.email, password: older.password });
    const cookie = answer.get('Set-Cookie')?.[0]?.split(';')[0] ?? '';
    const { body } = await older.post(`/entries/${id}/seal`).set({ 'If-Match': '1', Cookie: cookie }).expect(422);
    expect(body.error.problems).toEqual([
      { field: 'spotPrice', message: expect.stringContaining('add the last close') },
    ]);
    app.clock.set('2026-12-09T22:00:00.000Z');
  });

  it.each(['2026-12-09T21:00:00.000Z', '2026-12-09T22:05:00.000Z'])(
    'made from the price of the last close or of now is sealed (%s)',
    async (spotAt) => {
      await seal(await addDraft(trader, plan({ spotPrice: '98.40', spotAt })), 1).expect(200);
    },
  );
});

describe('the list of entries', () => {
  it('is paged without loss or repetition, newest first, and narrowed by state, tag and words', async () => {
    const person = await app.person({ role: 'trader' });
    const own = await addUnderlying(person);
    for (let number = 0; number < 7; number += 1)
      await addDraft(
        person,
        completePlan(own, { tags: number % 2 === 0 ? ['even', 'a"b%'] : ['odd'], idea: `idea ${number}` }),
      );
    await addSealed(person, completePlan(own, { tags: [] }));
    const list = async (query: string) => (await person.get(`/entries?${query}`).expect(200)).body;
    const seen: string[] = [];
    for (let after = ''; ;) {
      const page = await list(`limit=3${after}`);
      seen.push(...page.entries.map(({ id }: { id: string }) => id));
      if (page.next === null) break;
      after = `&after=${page.next}`;
    }
    expect(new Set(seen).size).toBe(8);
    expect(seen).toEqual([...seen].sort().reverse());
    const number = async (query: string) => (await list(query)).entries.length;
    expect(await number('state=sealed')).toBe(1);
    expect(await number('tag=even')).toBe(4);
    expect(await number(`tag=${encodeURIComponent('a"b%')}`)).toBe(4);
    expect(await number('tag=eve')).toBe(0);
    expect(await number('search=idea 3')).toBe(1);
    expect(await number('search=%25')).toBe(4);
    expect(await number('search=_')).toBe(0);
    expect(await number(`underlyingId=${underlyingId}`)).toBe(0);
  });
});
