import { randomUUID } from 'node:crypto';
import { startTestApp, type TestApp, type TestPerson } from '@/tests/server/support/test-app';

const now = '2026-12-09T22:00:00.000Z';
const fields = {
  symbol: 'HVYQ',
  name: 'Invented share',
  style: 'american',
  settlement: 'physical',
  settlementTime: 'pm',
  multiplier: '100',
  dividendYield: 0,
  currency: 'USD',
};

let app: TestApp;
let trader: TestPerson;

beforeAll(async () => {
  app = await startTestApp();
});
afterAll(async () => {
  await app.stop();
  expect(app.guard.offences).toEqual([]); // no statement on a desk's table went without the desk
});
beforeEach(async () => {
  app.clock.set(now);
  trader = await app.person({ role: 'trader' });
});

const create = (id: string, changes: object = {}, person = trader) =>
  person.post('/underlyings').send({ id, ...fields, ...changes });
const typeBar = (id: string, date: string, changes: object = {}, person = trader) =>
  person
    .put(`/underlyings/${id}/bars/${date}`)
    .send({ close: '10', open: null, high: null, low: null, settlement: null, ...changes });

describe('an underlying', () => {
  it('is added once, however often the same request comes', async () => {
    const id = randomUUID();
    const first = await create(id).expect(201);
    expect(first.body).toEqual({ id, version: 1, ...fields });
    expect((await create(id).expect(201)).body).toEqual(first.body);
    expect((await trader.get('/underlyings').expect(200)).body.underlyings).toHaveLength(1);
  });

  it('is refused when its symbol is taken on the desk, or its id with other details', async () => {
    const id = randomUUID();
    await create(id).expect(201);
    const taken = await create(randomUUID()).expect(409);
    expect(taken.body.error).toMatchObject({ code: 'symbol-taken', problems: [{ field: 'symbol' }] });
    expect((await create(id, { name: 'Another' }).expect(409)).body.error.code).toBe('already-exists');
  });

  it('may have the symbol of another desk, and is not found there', async () => {
    const id = randomUUID();
    await create(id).expect(201);
    const stranger = await app.person({ role: 'trader' });
    await create(randomUUID(), {}, stranger).expect(201);
    await stranger.get(`/underlyings/${id}`).expect(404);
    await stranger.patch(`/underlyings/${id}`).set('If-Match', '1').send(fields).expect(404);
    await typeBar(id, '2026-01-05', {}, stranger).expect(404);
  });

  it('is changed from the version it was read at; a stale change gets the row as it stands', async () => {
    const id = randomUUID();
    await create(id).expect(201);
    const change = (version: string, name: string) =>
      trader
        .patch(`/underlyings/${id}`)
        .set('If-Match', version)
        .send({ ...fields, name });
    expect((await change('1', 'First').expect(200)).body).toMatchObject({ version: 2, name: 'First' });
    const stale = await change('1', 'Second').expect(409);
    expect(stale.body.error).toMatchObject({ code: 'changed-elsewhere', current: { version: 2, name: 'First' } });
    await trader.patch(`/underlyings/${id}`).send(fields).expect(428);
  });

  it('refuses what cannot be: a multiplier of 0, a small symbol, an unknown field, a number for money', async () => {
    await create(randomUUID(), { multiplier: '0' }).expect(400);
    await create(randomUUID(), { symbol: 'hvyq' }).expect(400);
    await create(randomUUID(), { owner: 'x' }).expect(400);
    await create(randomUUID(), { multiplier: 100 }).expect(400);
    expect((await trader.get('/underlyings')).body.underlyings).toEqual([]);
  });

  it('is read by a mentor of the desk and written by none', async () => {
    const id = randomUUID();
    await create(id).expect(201);
    const mentor = await app.person({ role: 'mentor', deskOf: trader });
    await mentor.get(`/underlyings/${id}`).expect(200);
    await create(randomUUID(), { symbol: 'ZZIX' }, mentor).expect(403);
    await typeBar(id, '2026-01-05', {}, mentor).expect(403);
  });
});

describe('the list of underlyings', () => {
  it('shows an underlying without bars as such', async () => {
    await create(randomUUID()).expect(201);
    const [listed] = (await trader.get('/underlyings').expect(200)).body.underlyings;
    expect(listed).toMatchObject({
      barCount: 0,
      lastBar: null,
      previousClose: null,
      sessionsBehind: 0,
      volatility: null,
    });
  });

  it('shows last bar, close before it, sessions behind, and volatility once there are enough bars', async () => {
    const id = randomUUID();
    await create(id).expect(201);
    const dates = sessionsOfAutumn();
    const rows = dates.map((date, index) => `${date},${100 + (index % 7)}`);
    const shown = await trader
      .post(`/underlyings/${id}/price-uploads`)
      .attach('file', Buffer.from(`date,close\n${rows.join('\n')}\n`), 'prices.csv')
      .expect(201);
    expect(shown.body.refused).toEqual([]);
    await trader.post(`/price-uploads/${shown.body.id}/commit`).expect(200);
    await create(randomUUID(), { symbol: 'ZZIX' }).expect(201);
    const { underlyings } = (await trader.get('/underlyings').expect(200)).body;
    expect(underlyings.map((item: { underlying: { symbol: string } }) => item.underlying.symbol)).toEqual([
      'HVYQ',
      'ZZIX',
    ]);
    expect(underlyings[0]).toMatchObject({
      barCount: dates.length,
      lastBar: {
        sessionDate: '2026-12-04',
        close: String(100 + ((dates.length - 1) % 7)),
        source: 'upload',
        storedAt: now,
      },
      previousClose: String(100 + ((dates.length - 2) % 7)),
      sessionsBehind: 3,
    });
    expect(underlyings[0].volatility.dailyVolatility).toBeGreaterThan(0);
    expect(underlyings[0].volatility.lowest).toBeLessThanOrEqual(underlyings[0].volatility.dailyVolatility);
  });
});

/** Weekdays from 1 September to 4 December 2026 without Labor Day and Thanksgiving. */
function sessionsOfAutumn(): string[] {
  const dates: string[] = [];
  for (let time = Date.UTC(2026, 8, 1); time <= Date.UTC(2026, 11, 4); time += 86_400_000) {
    const day = new Date(time);
    const date = day.toISOString().slice(0, 10);
    if (day.getUTCDay() % 6 !== 0 && date !== '2026-09-07' && date !== '2026-11-26') dates.push(date);
  }
  return dates;
}

describe('a typed bar', () => {
  let id: string;
  beforeEach(async () => {
    id = randomUUID();
    await create(id).expect(201);
  });

  it('is stored exactly, and the same again changes nothing, not even its time', async () => {
    const prices = { close: '10.123456789012', open: '10.0', high: '11.50', low: '9', settlement: '10.2' };
    const stored = await typeBar(id, '2026-01-05', prices).expect(200);
    expect(stored.body).toEqual({
      sessionDate: '2026-01-05',
      close: '10.123456789012',
      open: '10',
      high: '11.5',
      low: '9',
      settlement: '10.2',
      source: 'typed',
      storedAt: now,
    });
    app.clock.set('2026-12-09T22:05:00.000Z');
    expect((await typeBar(id, '2026-01-05', { ...prices, open: '10' }).expect(200)).body).toEqual(stored.body);
    expect((await trader.get(`/underlyings/${id}`)).body.bars).toEqual([stored.body]);
  });

  it('replaces the bar of its session', async () => {
    await typeBar(id, '2026-01-05', { high: '12' }).expect(200);
    await typeBar(id, '2026-01-05', { close: '11' }).expect(200);
    const { bars, barCount } = (await trader.get(`/underlyings/${id}`)).body;
    expect([barCount, bars[0].close, bars[0].high]).toEqual([1, '11', null]);
  });

  it.each([
    ['2026-01-10', /no session.*weekend/],
    ['2026-12-25', /future/],
    ['2026-12-10', /future/],
    ['1989-12-29', /before 1990/],
  ])('is refused on %s, saying why', async (date, message) => {
    const refused = await typeBar(id, date).expect(400);
    expect(refused.body.error.problems).toEqual([{ field: 'sessionDate', message: expect.stringMatching(message) }]);
  });

  it('is refused before its session has closed', async () => {
    app.clock.set('2026-12-09T20:59:00.000Z');
    await typeBar(id, '2026-12-09').expect(400);
    app.clock.set('2026-12-09T21:00:00.000Z');
    await typeBar(id, '2026-12-09').expect(200);
  });

  it('is refused with a date that does not exist, a price of 0, or prices of no one session', async () => {
    await typeBar(id, '2026-02-30').expect(400);
    await typeBar(id, '2026-01-05', { close: '0' }).expect(400);
    await typeBar(id, '2026-01-05', { close: '-1' }).expect(400);
    const range = await typeBar(id, '2026-01-05', { high: '9' }).expect(400);
    expect(range.body.error.problems).toEqual([
      { field: 'close', message: expect.stringMatching(/the close 10 is above the high 9/) },
    ]);
  });
});
