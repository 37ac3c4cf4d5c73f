import { type Today, type TodayTask } from '@/shared/today/today-endpoints';
import { comeBack } from '@/tests/server/support/come-back';
import {
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

const tasksOf = async (person: TestPerson): Promise<TodayTask[]> => {
  const today: Today = (await person.get('/today').expect(200)).body;
  return today.tasks;
};
const afterExpiry = '2026-12-18T22:00:00.000Z';

describe('Today after the close', () => {
  it('says which entries the missing bars hold up, and leads to the upload', async () => {
    const before = await app.person({ role: 'trader' });
    const underlyingId = await addUnderlying(before);
    await addSealed(before, completePlan(underlyingId));
    const trader = await comeBack(app, before, '2026-12-11T22:00:00.000Z');
    expect(await tasksOf(trader)).toContainEqual({
      kind: 'missing-prices',
      group: 'from-today',
      title: 'HVYQ stops at 2026-12-09',
      why: '2 sessions are missing.',
      profit: null,
      action: 'Add the bars',
      target: { kind: 'underlying', underlyingId, sessionDate: null },
    });
    const later = await comeBack(app, before, afterExpiry);
    expect(await tasksOf(later)).toContainEqual(
      expect.objectContaining({ why: '7 sessions are missing; one entry waits: bull put 97 / 95.' }),
    );
  });

  it('names a close that is missing between others, and leads to where it is typed', async () => {
    const before = await app.person({ role: 'trader' });
    const underlyingId = await addUnderlying(before);
    await addSealed(before, completePlan(underlyingId, { stopPrice: '97' }));
    const trader = await comeBack(app, before, afterExpiry);
    for (const date of sessionsToExpiry.filter((session) => session !== '2026-12-15'))
      await putBar(trader, { underlyingId, date, close: '98' });
    expect(await tasksOf(trader)).toContainEqual(
      expect.objectContaining({
        kind: 'missing-prices',
        title: 'HVYQ lacks the close of 2026-12-15',
        action: 'Type the bar',
        target: { kind: 'underlying', underlyingId, sessionDate: '2026-12-15' },
      }),
    );
    await putBar(trader, { underlyingId, date: '2026-12-15', close: '98' });
    expect((await tasksOf(trader)).filter(({ kind }) => kind === 'missing-prices')).toEqual([]);
  });

  it('names a settlement value that is missing, and leads to where it is typed', async () => {
    const before = await app.person({ role: 'trader' });
    const underlyingId = await addUnderlying(before, { fields: { ...indexFields, settlementTime: 'am' } });
    await addSealed(before, completePlan(underlyingId));
    const trader = await comeBack(app, before, afterExpiry);
    for (const date of sessionsToExpiry) await putBar(trader, { underlyingId, date, close: '98' });
    expect(await tasksOf(trader)).toContainEqual({
      kind: 'missing-settlement',
      group: 'from-today',
      title: `ZZIX lacks the settlement value of ${expiry}`,
      why: 'All else is there; one entry waits: bull put 97 / 95.',
      profit: null,
      action: 'Type the value',
      target: { kind: 'underlying', underlyingId, sessionDate: expiry },
    });
    await putBar(trader, { underlyingId, date: expiry, close: '98', settlement: '96.5' });
    expect((await tasksOf(trader)).map(({ kind }) => kind)).not.toContain('missing-settlement');
  });

  it('asks for the fill that closes an expired position, and for the lesson of a closed one with its profit', async () => {
    const before = await app.person({ role: 'trader' });
    const underlyingId = await addUnderlying(before);
    const id = await addSealed(before, completePlan(underlyingId));
    const trader = await comeBack(app, before, afterExpiry);
    for (const date of sessionsToExpiry) await putBar(trader, { underlyingId, date, close: '98' });
    const add = (kind: string, price: string, tradedAt: string) =>
      trader
        .post(`/entries/${id}/fills`)
        .send(fill(kind, option('put', '97'), { price, tradedAt }))
        .expect(201);
    await add('sell', '0.78', '2026-12-10T15:00:00.000Z');
    expect(await tasksOf(trader)).toContainEqual(
      expect.objectContaining({
        kind: 'past-expiry',
        action: 'Close it out',
        target: { kind: 'entry', entryId: id, section: 'fills' },
      }),
    );
    const { body } = await add('expiry', '0', '2026-12-18T21:00:00.000Z');
    expect(body.row.state).toBe('closed');
    expect(await tasksOf(trader)).toContainEqual({
      kind: 'write-lesson',
      group: 'from-today',
      title: 'HVYQ bull put 97 / 95 is closed',
      why: 'all odds are answered. The lesson is still blank.',
      profit: { realised: '78', currency: 'USD' },
      action: 'Write the lesson',
      target: { kind: 'entry', entryId: id, section: 'lesson' },
    });
  });
});
