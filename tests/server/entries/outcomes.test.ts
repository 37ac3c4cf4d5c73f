import { comeBack, entryOf } from '@/tests/server/support/come-back';
import {
  addDraft,
  addSealed,
  addUnderlying,
  completePlan,
  expiry,
  fill,
  indexFields,
  option,
  putBar,
  sessionsToExpiry,
} from '@/tests/server/support/journal';
import { startTestApp, type TestApp, type TestPerson } from '@/tests/server/support/test-app';

jest.setTimeout(60_000);

let app: TestApp;
beforeAll(async () => {
  app = await startTestApp();
});
afterAll(async () => {
  await app.stop();
  expect(app.guard.offences).toEqual([]);
});
beforeEach(() => app.clock.set('2026-12-09T22:00:00.000Z'));

const link = (mentor: TestPerson, trader: TestPerson, revokedAt: string | null = null) =>
  app.dataSource.query(
    'INSERT INTO mentorship (id, desk_id, mentor_id, trader_id, accepted_at, revoked_at) VALUES (UUID(), ?, ?, ?, NOW(6), ?)',
    [trader.deskId, mentor.id, trader.id, revokedAt],
  );

describe('an outcome', () => {
  it('appears as the bars come, waits for the last one, and is scored then', async () => {
    const before = await app.person({ role: 'trader' });
    const underlyingId = await addUnderlying(before);
    const id = await addSealed(before, completePlan(underlyingId, { stopPrice: '97' }));
    expect(await entryOf(before, id)).toMatchObject({ outcome: { isComplete: false, move: null } });
    const trader = await comeBack(app, before, '2026-12-18T22:00:00.000Z');
    for (const [index, date] of sessionsToExpiry.slice(0, -1).entries())
      await putBar(trader, { underlyingId, date, close: String(98 + index / 10) });
    const waiting = await entryOf(trader, id);
    expect(waiting.outcome).toMatchObject({ isComplete: false, move: null, moveSoFar: { sessionDate: '2026-12-17' } });
    expect(waiting.outcome?.odds.every(({ brierScore }) => brierScore === null)).toBe(true);
    expect((await trader.get('/scores').expect(200)).body).toMatchObject({ odds: { count: 0 }, resolved: [] });

    await putBar(trader, { underlyingId, date: expiry, close: '98.9' });
    const { outcome, row } = await entryOf(trader, id);
    expect(outcome).toMatchObject({ isComplete: true, move: { sessionDate: expiry, endPrice: 98.9 } });
    expect(row.strip?.landed).toBe(outcome?.move?.inSigmas);
    const answered = outcome?.odds.map(({ odds, happened }) => [odds.event.kind, happened]) ?? [];
    expect(answered).toEqual(
      expect.arrayContaining([
        ['in-the-money', false],
        ['profit-at-expiry', true],
        ['touch-stop', false],
      ]),
    );
    for (const { odds, happened, brierScore } of outcome?.odds ?? [])
      expect(brierScore).toBeCloseTo((odds.probability.base - (happened === true ? 1 : 0)) ** 2, 12);

    const { body: scores } = await trader.get('/scores').expect(200);
    expect(scores).toMatchObject({
      odds: { count: outcome?.odds.length, sampleRule: 'list-only', figures: null },
      late: { count: 0 },
      pendingCount: 0,
      moves: { count: 1 },
    });
    expect(scores.entries).toMatchObject([
      { entryId: id, moveDeviations: outcome?.move?.inSigmas, volatilityMethod: 'typed', realisedProfit: null },
    ]);
    expect(scores.resolved[0]).toMatchObject({ entryId: id, symbol: 'HVYQ', isLateSeal: false });
    const { body: today } = await trader.get('/today').expect(200);
    expect(today).toMatchObject({
      resolvedOddsCount: outcome?.odds.length,
      session: { sessionDate: expiry, isOver: true },
    });
  });

  it('of options settled from openings waits past the last close for the settlement value', async () => {
    const before = await app.person({ role: 'trader' });
    const underlyingId = await addUnderlying(before, { fields: { ...indexFields, settlementTime: 'am' } });
    const id = await addSealed(before, completePlan(underlyingId));
    const trader = await comeBack(app, before, '2026-12-18T22:00:00.000Z');
    for (const date of sessionsToExpiry) await putBar(trader, { underlyingId, date, close: '98' });
    const waitsFor = `the settlement value of ${expiry}`;
    expect((await entryOf(trader, id)).outcome).toMatchObject({
      isComplete: false,
      move: null,
      moveWaitsFor: waitsFor,
      moveSoFar: { sessionDate: '2026-12-17', sessions: 6 },
      odds: expect.arrayContaining([expect.objectContaining({ happened: null, waitsFor })]),
    });
    await putBar(trader, { underlyingId, date: expiry, close: '98', settlement: '96.5' });
    const { outcome } = await entryOf(trader, id);
    expect(outcome).toMatchObject({ isComplete: true, moveWaitsFor: null });
    expect(outcome?.move).toMatchObject({ endPrice: 96.5, pricedBy: 'settlement' });
    expect(outcome?.move?.sessions).toBeCloseTo(6.3, 9);
  });

  it('is computed again when a bar is corrected', async () => {
    const before = await app.person({ role: 'trader' });
    const underlyingId = await addUnderlying(before);
    const id = await addSealed(before, completePlan(underlyingId));
    const trader = await comeBack(app, before, '2026-12-18T22:00:00.000Z');
    for (const date of sessionsToExpiry) await putBar(trader, { underlyingId, date, close: '98' });
    const inTheMoney = async () =>
      (await entryOf(trader, id)).outcome?.odds
        .filter(({ odds }) => odds.event.kind === 'in-the-money')
        .map(({ happened }) => happened);
    expect(await inTheMoney()).toEqual([false, false]);
    await putBar(trader, { underlyingId, date: expiry, close: '96' });
    expect(await inTheMoney()).toEqual([true, false]);
  });

  it('of a late seal counts apart from the scored ones', async () => {
    const before = await app.person({ role: 'trader' });
    const underlyingId = await addUnderlying(before);
    const id = await addSealed(before, completePlan(underlyingId));
    const early = fill('sell', option('put', '97'), { price: '0.78', tradedAt: '2026-12-09T20:00:00.000Z' });
    await before.post(`/entries/${id}/fills`).send(early).expect(201);
    const trader = await comeBack(app, before, '2026-12-18T22:00:00.000Z');
    for (const date of sessionsToExpiry) await putBar(trader, { underlyingId, date, close: '98' });
    const { body } = await trader.get('/scores').expect(200);
    expect(body.odds.count).toBe(0);
    expect(body.late.count).toBeGreaterThan(0);
  });

  it('is still scored for a plan that was given up', async () => {
    const before = await app.person({ role: 'trader' });
    const underlyingId = await addUnderlying(before);
    const id = await addSealed(before, completePlan(underlyingId));
    await before.post(`/entries/${id}/abandon`).set('If-Match', '2').expect(200);
    const trader = await comeBack(app, before, '2026-12-18T22:00:00.000Z');
    for (const date of sessionsToExpiry) await putBar(trader, { underlyingId, date, close: '98' });
    expect((await trader.get('/scores').expect(200)).body.odds.count).toBeGreaterThan(0);
  });
});

describe('a mentor', () => {
  it('sees sealed entries of the traders linked to them, never drafts, and nobody else’s', async () => {
    const trader = await app.person({ role: 'trader' });
    const unlinked = await app.person({ role: 'trader', deskOf: trader });
    const former = await app.person({ role: 'trader', deskOf: trader });
    const mentor = await app.person({ role: 'mentor', deskOf: trader });
    await link(mentor, trader);
    await link(mentor, former, '2026-12-01 00:00:00');
    const underlyingId = await addUnderlying(trader);
    const plan = completePlan(underlyingId);
    const sealed = await addSealed(trader, plan);
    const hidden = [await addDraft(trader, plan), await addSealed(unlinked, plan), await addSealed(former, plan)];
    const listed = (await mentor.get('/entries').expect(200)).body.entries.map(({ id }: { id: string }) => id);
    expect(listed).toEqual([sealed]);
    expect(await entryOf(mentor, sealed)).toMatchObject({ isOwn: false, row: { needsLesson: false } });
    for (const id of hidden) await mentor.get(`/entries/${id}`).expect(404);
    const writes = [
      mentor.put(`/entries/${sealed}/plan`).set('If-Match', '2').send(plan),
      mentor.post(`/entries/${sealed}/abandon`).set('If-Match', '2'),
      mentor.put(`/entries/${sealed}/lesson`).set('If-Match', '2').send({ lesson: 'x' }),
    ];
    for (const write of writes) expect((await write).status).toBe(403);
  });

  it('sees nothing from the next request on once the link is revoked', async () => {
    const trader = await app.person({ role: 'trader' });
    const mentor = await app.person({ role: 'mentor', deskOf: trader });
    await link(mentor, trader);
    const id = await addSealed(trader, completePlan(await addUnderlying(trader)));
    await mentor.get(`/entries/${id}`).expect(200);
    await app.dataSource.query('UPDATE mentorship SET revoked_at = NOW(6) WHERE mentor_id = ?', [mentor.id]);
    await mentor.get(`/entries/${id}`).expect(404);
    expect((await mentor.get('/entries')).body.entries).toEqual([]);
  });

  it('is the only other reader: a colleague without a link sees nothing', async () => {
    const trader = await app.person({ role: 'trader' });
    const colleague = await app.person({ role: 'lead', deskOf: trader });
    const id = await addSealed(trader, completePlan(await addUnderlying(trader)));
    await colleague.get(`/entries/${id}`).expect(404);
  });
});

describe('the day’s page', () => {
  it('answers in every role, on an empty desk and with work to do', async () => {
    const trader = await app.person({ role: 'trader' });
    const empty = (await trader.get('/today').expect(200)).body;
    expect(empty).toMatchObject({ runningCount: 0, resolvedOddsCount: 0, meanBrierScore: null });
    expect(empty.tasks.length).toBeGreaterThan(0);
    const underlyingId = await addUnderlying(trader);
    await addDraft(trader, completePlan(underlyingId));
    await addSealed(trader, completePlan(underlyingId));
    const busy = (await trader.get('/today').expect(200)).body;
    expect(busy).toMatchObject({
      runningCount: 1,
      now: '2026-12-09T22:00:00.000Z',
      nextSession: { sessionDate: '2026-12-10' },
    });
    expect(busy.tasks.map(({ kind }: { kind: string }) => kind)).toContain('seal-draft');
    const mentor = await app.person({ role: 'mentor', deskOf: trader });
    expect((await mentor.get('/today').expect(200)).body.runningCount).toBe(0);
  });
});
