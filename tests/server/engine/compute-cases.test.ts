import { EngineService } from '@/server/engine/engine-service';
import { startTestApp, type TestApp, type TestPerson } from '@/tests/server/support/test-app';

const call = { type: 'call', spot: 100, strike: 102, sessions: 10, years: 14 / 365, ratePerYear: 0.04 };

describe('the headless engine over HTTP', () => {
  let app: TestApp;
  let trader: TestPerson;

  beforeAll(async () => {
    app = await startTestApp();
    trader = await app.person({ role: 'trader' });
  });

  afterAll(() => app.stop());

  it('answers each case by itself, in order', async () => {
    const cases = [{ ...call, dailyVolatility: 0.015 }, { ...call, dailyVolatility: -1 }, 7];
    const { body } = await trader.post('/engine/price').send({ cases }).expect(200);
    expect(body.answers).toEqual([
      { result: expect.objectContaining({ price: expect.closeTo(1.12767, 5), delta: expect.closeTo(0.35889, 5) }) },
      { error: expect.objectContaining({ line: 2 }) },
      { error: expect.objectContaining({ code: 'case-invalid', line: 3 }) },
    ]);
  });

  it('says Infinity where a score is infinite', async () => {
    const { body } = await trader
      .post('/engine/score')
      .send({ cases: [{ forecasts: [0, 0.5], outcomes: [1, 1] }] })
      .expect(200);
    expect(body.answers[0].result.logScore).toBe('Infinity');
  });

  it('refuses an unknown command, no cases and more than 500', async () => {
    await trader
      .post('/engine/guess')
      .send({ cases: [call] })
      .expect(400);
    await trader.post('/engine/price').send({ cases: [] }).expect(400);
    await trader
      .post('/engine/symbol')
      .send({ cases: new Array<number>(501).fill(0) })
      .expect(400);
  });

  it('is for people who are signed in', async () => {
    await app.anonymous
      .post('/engine/price')
      .send({ cases: [call] })
      .expect(401);
  });
});

describe('EngineService', () => {
  it('ends a batch that takes too long, and answers the next', async () => {
    const hasty = new EngineService(0);
    const patient = new EngineService();
    const task = { command: 'symbol' as const, cases: [{ symbol: 'ZQXA  261218C00052500' }] };
    try {
      await expect(hasty.compute('person', task)).rejects.toMatchObject({ code: 'too-large' });
      await expect(patient.compute('person', task)).resolves.toMatchObject({ answers: [{ result: { type: 'call' } }] });
    } finally {
      await Promise.all([hasty.close(), patient.close()]);
    }
  });
});
