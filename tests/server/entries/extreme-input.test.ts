import { randomUUID } from 'node:crypto';
import { type DraftPlan } from '@/shared/entries/draft-plan';
import { addSealed, addUnderlying, completePlan, fill, leg, option } from '@/tests/server/support/journal';
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
afterAll(() => app.stop());

const numbers = [
  '1e2',
  '1e400',
  '+97',
  '97.',
  '.5',
  '0x61',
  ' 97 ',
  '97,5',
  '−97',
  '-0',
  '0.0000000000001',
  '0.000000000001',
  '999999999999999999',
  '9999999999999999999',
  '9'.repeat(40),
  'Infinity',
  'NaN',
  '１２',
  '1_000',
];
const texts = ['\ud800', 'a\u0000b', '\u2028', '🜁'.repeat(2_000), '"\\/\b', 'é'];
const dates = [
  '0001-01-01',
  '1899-12-29',
  '2026-12-25',
  '2029-12-31',
  '2035-06-15',
  '2099-12-31',
  '9999-12-31',
  '-000001-01-01',
  'soon',
];
const instants = [
  'yesterday',
  '2026-12-09',
  '0001-01-01T00:00:00.000Z',
  '9999-12-31T23:59:59.999Z',
  '2026-12-09T21:00:00.000+05:00',
  '2026-12-09T21:00:00Z',
];

type Change = readonly [string, string, (base: DraftPlan) => Partial<DraftPlan>];
const legChange = (change: object) => () => ({ legs: [{ ...leg('sell', 'put', '97', '0.78'), ...change }] });
const changes: readonly Change[] = [
  ...numbers.flatMap((text): Change[] => [
    ['strike', text, legChange({ strikePrice: text })],
    ['premium', text, legChange({ premium: text })],
    ['quantity', text, legChange({ quantity: text })],
    ['spot', text, () => ({ spotPrice: text, spotAt: '2026-12-09T21:00:00.000Z' })],
    ['holding', text, () => ({ holding: 'sessions', holdingSessions: text })],
    [
      'volatility',
      text,
      ({ volatility }) => ({ volatility: { ...volatility, basePercent: text, lowPercent: text, highPercent: text } }),
    ],
    ['view', text, () => ({ drift: { kind: 'ownView', expectedReturnPercent: text, reason: 'x' } })],
    ['rate', text, () => ({ ratePercent: text })],
    ['fee', text, () => ({ feePerContract: text })],
    ['target', text, () => ({ targetPrice: text })],
    ['stop', text, () => ({ stopPrice: text })],
  ]),
  ...texts.flatMap((text): Change[] => [
    ['idea', text, () => ({ idea: text })],
    ['exit rule', text, () => ({ exitRule: text })],
    ['tag', text, () => ({ tags: [text.slice(0, 40)] })],
  ]),
  ...dates.map((text): Change => ['expiry', text, legChange({ expirySessionDate: text })]),
  ...instants.map((text): Change => ['spot time', text, () => ({ spotPrice: '98', spotAt: text })]),
];

describe('a plan with extreme input', () => {
  it('is kept as a draft or refused, sealed and read again or refused, and nothing fails', async () => {
    const failures: unknown[] = [];
    let sealed = 0;
    for (const [field, text, change] of changes) {
      const base = completePlan(underlyingId);
      const id = randomUUID();
      const note = (step: string, { status, body }: { status: number; body: unknown }) => {
        if (status >= 500) failures.push([field, text.slice(0, 45), step, status, body]);
        return status < 300;
      };
      const isKept = note('create', await trader.post('/entries').send({ id, plan: { ...base, ...change(base) } }));
      if (!isKept) continue;
      if (!note('seal', await trader.post(`/entries/${id}/seal`).set('If-Match', '1'))) continue;
      sealed += 1;
      note('read', await trader.get(`/entries/${id}`));
    }
    expect(failures).toEqual([]);
    expect(sealed).toBeGreaterThan(20);
    for (const path of ['/entries?limit=200', '/today', '/scores']) await trader.get(path).expect(200);
  });
});

describe('a fill with extreme input', () => {
  const largest = `${'9'.repeat(18)}.${'9'.repeat(12)}`;
  it.each([
    ['the largest amounts', { quantity: largest, price: largest, fees: largest }],
    ['the largest fees taken', { fees: `-${largest}` }],
    ['the smallest amounts', { quantity: '0.000000000001', price: '0.000000000001' }],
    ['the year 1', { tradedAt: '0001-01-01T00:00:00.000Z' }],
    ['the year 0', { tradedAt: '0000-01-01T00:00:00.000Z' }],
    ['the year 1969', { tradedAt: '1969-12-31T23:59:59.999Z' }],
    ['a huge strike', { instrument: option('put', largest) }],
    ['a huge multiplier', { instrument: { ...option('put', '97'), multiplier: largest } }],
    ['a symbol of 10,000 letters', { instrument: option('put', '97', 'A'.repeat(10_000)) }],
  ])('is taken or refused, and nothing fails: %s', async (_, changed) => {
    const id = await addSealed(trader, completePlan(underlyingId));
    const typed = {
      ...fill('sell', option('put', '97'), { price: '0.78', tradedAt: '2026-12-09T22:00:00.000Z' }),
      ...changed,
    };
    const answer = await trader.post(`/entries/${id}/fills`).send(typed);
    expect([201, 400, 422]).toContain(answer.status);
    await trader.get(`/entries/${id}`).expect(200);
  });
});

describe('a bar with extreme input', () => {
  it.each(['0001-01-01', '0999-12-31', '1850-01-01', '2026-12-25', '2035-06-15', '9999-12-31'])(
    'is taken or refused, and lists go on: %s',
    async (date) => {
      const own = await app.person({ role: 'trader' });
      const id = await addUnderlying(own);
      const answer = await own
        .put(`/underlyings/${id}/bars/${date}`)
        .send({ close: '98', open: null, high: null, low: null, settlement: null });
      expect([answer.status < 500, answer.status]).toEqual([true, answer.status]);
      for (const path of ['/underlyings', `/underlyings/${id}`, '/today']) await own.get(path).expect(200);
    },
  );

  it('changes while fills come in: every request is answered well', async () => {
    const own = await app.person({ role: 'trader' });
    const id = await addUnderlying(own);
    const entries = [];
    for (let number = 0; number < 4; number += 1) entries.push(await addSealed(own, completePlan(id)));
    const answers = await Promise.all([
      ...Array.from({ length: 12 }, (_, index) =>
        own
          .put(`/underlyings/${id}/bars/2026-11-${String(index + 10)}`)
          .send({ close: '98', open: null, high: null, low: null, settlement: null }),
      ),
      ...entries.flatMap((entryId) =>
        [1, 2, 3].map((minute) =>
          own
            .post(`/entries/${entryId}/fills`)
            .send(fill('sell', option('put', '97'), { price: '1', tradedAt: `2026-12-09T22:0${minute}:00.000Z` })),
        ),
      ),
    ]);
    expect(answers.map(({ status }) => status).filter((status) => status >= 500)).toEqual([]);
  });
});
