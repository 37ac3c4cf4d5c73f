import { type Entry } from '@/shared/entries/entry';
import { type OutcomeStep } from '@/shared/entries/outcome-history';
import { comeBack, entryOf } from '@/tests/server/support/come-back';
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
import { startTestApp, type TestApp } from '@/tests/server/support/test-app';

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

const lastStep = ({ history }: Entry): OutcomeStep => {
  const step = history.at(-1);
  if (step === undefined) throw new Error('The outcome has no history.');
  return step;
};
const changeOf = (step: OutcomeStep, kind: string) => step.changes.filter((change) => change.kind === kind);

describe('the history of an outcome', () => {
  it('is empty at the seal, and keeps the first answers with the bar that brought them', async () => {
    const before = await app.person({ role: 'trader' });
    const underlyingId = await addUnderlying(before);
    const id = await addSealed(before, completePlan(underlyingId));
    expect((await entryOf(before, id)).history).toEqual([]);
    const trader = await comeBack(app, before, '2026-12-18T22:00:00.000Z');
    for (const date of sessionsToExpiry.slice(0, -1)) await putBar(trader, { underlyingId, date, close: '98' });
    // A running move that goes on to the next session is no change.
    expect((await entryOf(trader, id)).history).toEqual([]);
    await putBar(trader, { underlyingId, date: expiry, close: '98.9' });
    const entry = await entryOf(trader, id);
    expect(entry.history).toHaveLength(1);
    expect(lastStep(entry)).toMatchObject({
      at: '2026-12-18T22:00:00.000Z',
      cause: { kind: 'bar', prices: [{ sessionDate: expiry, field: 'close', before: null, after: '98.9' }] },
    });
    expect(changeOf(lastStep(entry), 'odds')).toHaveLength(entry.outcome?.odds.length ?? 0);
    expect(changeOf(lastStep(entry), 'completeness')).toEqual([{ kind: 'completeness', before: false, after: true }]);
  });

  it('shows a corrected close with the move and the answers before and after, and leaves the seal as it is', async () => {
    const before = await app.person({ role: 'trader' });
    const underlyingId = await addUnderlying(before);
    const id = await addSealed(before, completePlan(underlyingId));
    const trader = await comeBack(app, before, '2026-12-18T22:00:00.000Z');
    for (const date of sessionsToExpiry) await putBar(trader, { underlyingId, date, close: '98' });
    const first = await entryOf(trader, id);
    const later = await comeBack(app, before, '2026-12-19T15:00:00.000Z');
    await putBar(later, { underlyingId, date: expiry, close: '96' });
    const entry = await entryOf(later, id);
    expect(entry.history).toHaveLength(2);
    const step = lastStep(entry);
    expect(step).toMatchObject({
      at: '2026-12-19T15:00:00.000Z',
      cause: { kind: 'bar', prices: [{ sessionDate: expiry, field: 'close', before: '98', after: '96' }] },
    });
    expect(changeOf(step, 'move')).toMatchObject([
      {
        before: { endPrice: 98, inSigmas: first.outcome?.move?.inSigmas },
        after: { endPrice: 96, inSigmas: entry.outcome?.move?.inSigmas },
      },
    ]);
    expect(changeOf(step, 'odds')).toContainEqual(
      expect.objectContaining({ statement: '97 put in the money', before: false, after: true }),
    );
    expect(entry.sealed).toEqual(first.sealed);
    const { body: scores } = await later.get('/scores').expect(200);
    expect(scores.resolved).toContainEqual(
      expect.objectContaining({ statement: '97 put in the money', happened: true }),
    );
  });

  it('shows a correction uploaded in a file as it shows a typed one', async () => {
    const before = await app.person({ role: 'trader' });
    const underlyingId = await addUnderlying(before);
    const id = await addSealed(before, completePlan(underlyingId));
    const trader = await comeBack(app, before, '2026-12-11T22:00:00.000Z');
    const upload = async (text: string) => {
      const file = await trader
        .post(`/underlyings/${underlyingId}/price-uploads`)
        .attach('file', Buffer.from(`Date,Close\n${text}`), 'closes.csv')
        .expect(201);
      await trader.post(`/price-uploads/${file.body.id}/commit`).expect(200);
    };
    await upload('2026-12-10,98.10\n2026-12-11,98.60\n');
    await upload('2026-12-11,98.20\n');
    const entry = await entryOf(trader, id);
    expect(entry.history).toHaveLength(1);
    expect(lastStep(entry)).toMatchObject({
      cause: { kind: 'bar', prices: [{ sessionDate: '2026-12-11', field: 'close', before: '98.6', after: '98.2' }] },
      changes: [{ kind: 'move', before: { endPrice: 98.6, isFinal: false }, after: { endPrice: 98.2 } }],
    });
  });

  it('shows a fill that was taken out and the profit that is not known without it', async () => {
    const before = await app.person({ role: 'trader' });
    const underlyingId = await addUnderlying(before);
    const id = await addSealed(before, completePlan(underlyingId));
    const trader = await comeBack(app, before, '2026-12-11T22:00:00.000Z');
    for (const date of sessionsToExpiry.slice(0, 2)) await putBar(trader, { underlyingId, date, close: '98' });
    const add = (kind: string, price: string, tradedAt: string) =>
      trader
        .post(`/entries/${id}/fills`)
        .send(fill(kind, option('put', '97'), { price, tradedAt }))
        .expect(201);
    await add('sell', '0.78', '2026-12-10T15:00:00.000Z');
    const closing = await add('buy', '0.40', '2026-12-11T15:00:00.000Z');
    const closed: Entry = closing.body;
    expect(closed.row.state).toBe('closed');
    expect(changeOf(lastStep(closed), 'profit')).toEqual([{ kind: 'profit', before: null, after: '38' }]);

    const bought = closed.fills.find(({ kind }) => kind === 'buy');
    const { body: reopened } = await trader.delete(`/entries/${id}/fills/${bought?.id ?? ''}`).expect(200);
    expect(reopened.row.state).toBe('open');
    expect(lastStep(reopened)).toMatchObject({
      cause: {
        kind: 'fill',
        act: 'taken-out',
        fill: { kind: 'buy', contract: `${expiry} 97 put`, quantity: '1', price: '0.4' },
      },
    });
    expect(changeOf(lastStep(reopened), 'profit')).toEqual([{ kind: 'profit', before: '38', after: null }]);
    expect(reopened.outcome.profit).toMatchObject({ isFinal: false });

    const { body: corrected } = await add('buy', '0.45', '2026-12-11T15:00:00.000Z');
    expect(changeOf(lastStep(corrected), 'profit')).toEqual([{ kind: 'profit', before: null, after: '33' }]);
    expect(corrected.row.realisedProfit).toBe('33');
    expect(corrected.sealed).toEqual(closed.sealed);
  });

  it('shows a settlement value that came after three days, and what it answered', async () => {
    const before = await app.person({ role: 'trader' });
    const underlyingId = await addUnderlying(before, { fields: { ...indexFields, settlementTime: 'am' } });
    const id = await addSealed(before, completePlan(underlyingId));
    const evening = await comeBack(app, before, '2026-12-18T22:00:00.000Z');
    for (const date of sessionsToExpiry) await putBar(evening, { underlyingId, date, close: '98' });
    const waiting = await entryOf(evening, id);
    expect(waiting.outcome).toMatchObject({ isComplete: false, moveWaitsFor: `the settlement value of ${expiry}` });
    const trader = await comeBack(app, before, '2026-12-21T22:00:00.000Z');
    await putBar(trader, { underlyingId, date: expiry, close: '98', settlement: '96.5' });
    const entry = await entryOf(trader, id);
    const step = lastStep(entry);
    expect(step).toMatchObject({
      at: '2026-12-21T22:00:00.000Z',
      cause: {
        kind: 'settlement',
        prices: [{ sessionDate: expiry, field: 'settlement', before: null, after: '96.5' }],
      },
    });
    expect(changeOf(step, 'odds')).toContainEqual(
      expect.objectContaining({ statement: '97 put in the money', before: null, after: true }),
    );
    expect(entry.outcome?.isComplete).toBe(true);
    expect(entry.sealed).toEqual(waiting.sealed);
  });

  it('does not grow when the same prices are stored again', async () => {
    const before = await app.person({ role: 'trader' });
    const underlyingId = await addUnderlying(before);
    const id = await addSealed(before, completePlan(underlyingId));
    const trader = await comeBack(app, before, '2026-12-18T22:00:00.000Z');
    for (const date of [...sessionsToExpiry, ...sessionsToExpiry])
      await putBar(trader, { underlyingId, date, close: '98' });
    expect((await entryOf(trader, id)).history).toHaveLength(1);
  });
});
