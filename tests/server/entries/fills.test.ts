import { randomUUID } from 'node:crypto';
import { type Entry } from '@/shared/entries/entry';
import {
  addSealed,
  addUnderlying,
  completePlan,
  fill,
  indexFields,
  leg,
  option,
  shares,
  type TypedFill,
} from '@/tests/server/support/journal';
import { startTestApp, type TestApp, type TestPerson } from '@/tests/server/support/test-app';

jest.setTimeout(60_000);

const sealedAt = '2026-12-09T22:00:00.000Z';
let app: TestApp;
let trader: TestPerson;
let shareId: string;
let indexId: string;
beforeAll(async () => {
  app = await startTestApp();
});
afterAll(async () => {
  await app.stop();
  expect(app.guard.offences).toEqual([]);
});
beforeEach(async () => {
  app.clock.set(sealedAt);
  trader = await app.person({ role: 'trader' });
  shareId = await addUnderlying(trader);
  indexId = await addUnderlying(trader, { fields: indexFields, close: '4000' });
});

/** An hour after the seal and later, in the order of the numbers. */
const at = (number: number) => new Date(Date.parse(sealedAt) + number * 60_000).toISOString();
const add = (entryId: string, typed: TypedFill) => trader.post(`/entries/${entryId}/fills`).send(typed);
const addAll = async (entryId: string, fills: readonly TypedFill[]): Promise<Entry> => {
  let last: Entry | null = null;
  for (const typed of fills) last = (await add(entryId, typed).expect(201)).body as Entry; // checked by the response schema
  if (last === null) throw new Error('No fill to add.');
  return last;
};
const sealed = (changes: Parameters<typeof completePlan>[1] = {}) => addSealed(trader, completePlan(shareId, changes));
const put97 = option('put', '97');
const put95 = option('put', '95');

describe('fills over HTTP, to the cent', () => {
  it('F1: bought twice, sold twice: 163.36 after 6.64 of fees', async () => {
    const id = await sealed();
    const call = option('call', '100');
    const entry = await addAll(id, [
      fill('buy', call, { quantity: '2', price: '1.20', fees: '1.30', tradedAt: at(1) }),
      fill('buy', call, { quantity: '3', price: '1.35', fees: '1.97', tradedAt: at(2) }),
      fill('sell', call, { quantity: '4', price: '1.80', fees: '2.71', tradedAt: at(3) }),
      fill('sell', call, { quantity: '1', price: '0.95', fees: '0.66', tradedAt: at(4) }),
    ]);
    expect(entry.row).toMatchObject({ realisedProfit: '163.36', state: 'closed' });
    expect(entry.outcome?.profit).toMatchObject({ realised: '163.36', fees: '6.64', isFinal: true });
    expect(entry.fills.map(({ cash }) => cash)).toEqual(['-241.3', '-406.97', '717.29', '94.34']);
  });

  it('F1 by first in, first out: 204.68 after the first sale', async () => {
    const id = await sealed();
    const call = option('call', '100');
    const entry = await addAll(id, [
      fill('buy', call, { quantity: '2', price: '1.20', fees: '1.30', tradedAt: at(1) }),
      fill('buy', call, { quantity: '3', price: '1.35', fees: '1.97', tradedAt: at(2) }),
      fill('sell', call, { quantity: '4', price: '1.80', fees: '2.71', tradedAt: at(3) }),
    ]);
    expect(entry.row).toMatchObject({ realisedProfit: '204.68', state: 'open' });
    expect(entry.outcome?.profit).toMatchObject({ isFinal: false });
  });

  it('F3: an assignment makes the shares at the strike; sold next day, 1.66 stays', async () => {
    const id = await sealed();
    const assigned = fill('assignment', put97, { price: '0', tradedAt: at(3) });
    const afterAssignment = await addAll(id, [
      fill('sell', put97, { price: '0.78', fees: '0.66', tradedAt: at(1) }),
      fill('buy', put95, { price: '0.30', fees: '0.66', tradedAt: at(2) }),
      assigned,
    ]);
    expect(afterAssignment.row.state).toBe('open');
    const made = afterAssignment.fills.filter(({ madeBy }) => madeBy !== null);
    expect(made).toEqual([
      expect.objectContaining({
        madeBy: assigned.id,
        kind: 'buy',
        instrument: shares,
        quantity: '100',
        price: '97',
        cash: '-9700',
      }),
    ]);
    const entry = await addAll(id, [
      fill('expiry', put95, { price: '0', tradedAt: at(4) }),
      fill('sell', shares, { quantity: '100', price: '96.55', fees: '0.02', tradedAt: at(5) }),
    ]);
    expect(entry.row).toMatchObject({ realisedProfit: '1.66', state: 'closed' });
  });

  it('F3: the shares of an assignment go only with it', async () => {
    const id = await sealed();
    const assigned = fill('assignment', put97, { price: '0', tradedAt: at(3) });
    const entry = await addAll(id, [fill('sell', put97, { price: '0.78', tradedAt: at(1) }), assigned]);
    const made = entry.fills.find(({ madeBy }) => madeBy !== null);
    await trader.delete(`/entries/${id}/fills/${made?.id}`).expect(409);
    const after = await trader.delete(`/entries/${id}/fills/${assigned.id}`).expect(200);
    expect(after.body.fills).toHaveLength(1);
  });

  it('F4: an iron condor settled in cash at 4058.40 loses 314.68', async () => {
    const legs = [
      leg('sell', 'call', '4050', '6.10'),
      leg('buy', 'call', '4070', '3.20'),
      leg('sell', 'put', '3950', '5.80'),
      leg('buy', 'put', '3930', '3.40'),
    ];
    const id = await addSealed(trader, completePlan(indexId, { legs }));
    const of = (type: 'call' | 'put', strike: string) => option(type, strike, 'ZZIX');
    const open = (kind: string, type: 'call' | 'put', strike: string, price: string) =>
      fill(kind, of(type, strike), { price, fees: '1.17', tradedAt: at(1) });
    const end = (type: 'call' | 'put', strike: string, price: string) =>
      fill('expiry', of(type, strike), { price, tradedAt: at(9) });
    const entry = await addAll(id, [
      open('sell', 'call', '4050', '6.10'),
      open('buy', 'call', '4070', '3.20'),
      open('sell', 'put', '3950', '5.80'),
      open('buy', 'put', '3930', '3.40'),
      end('call', '4050', '8.40'),
      end('call', '4070', '0'),
      end('put', '3950', '0'),
      end('put', '3930', '0'),
    ]);
    expect(entry.row).toMatchObject({ realisedProfit: '-314.68', state: 'closed' });
    expect(entry.outcome?.profit).toMatchObject({ fees: '4.68', isFinal: true });
  });

  it('keeps every digit of the largest and the smallest amounts', async () => {
    const id = await sealed();
    const entry = await addAll(id, [
      fill('buy', put97, { quantity: '3', price: '0.000000000001', fees: '0.000000000003', tradedAt: at(1) }),
      fill('sell', put97, { quantity: '3', price: '12345678901.123456789012', fees: '0', tradedAt: at(2) }),
    ]);
    expect(entry.fills[1]?.price).toBe('12345678901.123456789012');
    expect(entry.row.realisedProfit).toBe('3703703670337.037036703297');
  });
});

describe('an impossible fill', () => {
  const cases: readonly (readonly [string, string, () => TypedFill[]])[] = [
    [
      'more expire than are open',
      'quantity',
      () => [
        fill('sell', put97, { price: '1', tradedAt: at(1) }),
        fill('expiry', put97, { quantity: '2', price: '0', tradedAt: at(2) }),
      ],
    ],
    [
      'a long option is assigned',
      'kind',
      () => [
        fill('buy', put97, { price: '1', tradedAt: at(1) }),
        fill('assignment', put97, { price: '0', tradedAt: at(2) }),
      ],
    ],
    [
      'a short option is exercised',
      'kind',
      () => [
        fill('sell', put97, { price: '1', tradedAt: at(1) }),
        fill('exercise', put97, { price: '0', tradedAt: at(2) }),
      ],
    ],
    [
      'shares expire',
      'contract',
      () => [
        fill('buy', shares, { quantity: '100', price: '97', tradedAt: at(1) }),
        fill('expiry', shares, { quantity: '100', price: '0', tradedAt: at(2) }),
      ],
    ],
    [
      'another underlying is traded',
      'contract',
      () => [fill('sell', option('put', '97', 'XJKO'), { price: '1', tradedAt: at(1) })],
    ],
    [
      'the time is two days ahead',
      'date',
      () => [fill('sell', put97, { price: '1', tradedAt: '2026-12-11T22:00:00.001Z' })],
    ],
    [
      'an option with delivery expires at a price',
      'price',
      () => [
        fill('sell', put97, { price: '1', tradedAt: at(1) }),
        fill('expiry', put97, { price: '0.80', tradedAt: at(2) }),
      ],
    ],
    ['an option nobody holds expires', 'quantity', () => [fill('expiry', put97, { price: '0', tradedAt: at(1) })]],
  ];
  it.each(cases)('is refused with a sentence and its field, and stores nothing: %s', async (_, field, typed) => {
    const id = await sealed();
    const fills = typed();
    for (const [index, one] of fills.entries()) {
      if (index < fills.length - 1) await add(id, one).expect(201);
      else {
        const answer = await add(id, one).expect(422);
        expect(answer.body.error.code).toBe('fill-impossible');
        expect(answer.body.error.problems).toEqual([{ field, message: expect.stringMatching(/^[A-Z].+\.$/) }]);
      }
    }
    expect((await trader.get(`/entries/${id}`)).body.fills).toHaveLength(fills.length - 1);
  });

  it('is also one whose removal leaves the rest impossible', async () => {
    const id = await sealed();
    const sold = fill('sell', put97, { price: '1', tradedAt: at(1) });
    await addAll(id, [sold, fill('expiry', put97, { price: '0', tradedAt: at(2) })]);
    await trader.delete(`/entries/${id}/fills/${sold.id}`).expect(422);
  });
});

describe('a fill', () => {
  it('is added once, however often and at once the same request comes', async () => {
    const id = await sealed();
    const typed = fill('sell', put97, { price: '0.78', tradedAt: at(1) });
    const answers = await Promise.all([add(id, typed), add(id, typed), add(id, typed)]);
    expect(answers.map(({ status }) => status)).toEqual([201, 201, 201]);
    expect((await add(id, typed).expect(201)).body.fills).toHaveLength(1);
  });

  it('is refused under an id that another entry or another desk has', async () => {
    const [first, second] = [await sealed(), await sealed()];
    const typed = fill('sell', put97, { price: '0.78', tradedAt: at(1) });
    await add(first, typed).expect(201);
    await add(second, typed).expect(404);
    const stranger = await app.person({ role: 'trader' });
    const theirs = await addSealed(stranger, completePlan(await addUnderlying(stranger)));
    await stranger.post(`/entries/${theirs}/fills`).send(typed).expect(409);
  });

  it('before the seal makes the seal late, and taking it out makes it timely again', async () => {
    const id = await sealed();
    const early = fill('sell', put97, { price: '0.78', tradedAt: '2026-12-09T21:59:59.999Z' });
    const late = (await add(id, early).expect(201)).body;
    expect([late.row.isLateSeal, late.sealed.receipt.isLate]).toEqual([true, true]);
    const timely = (await trader.delete(`/entries/${id}/fills/${early.id}`).expect(200)).body;
    expect(timely.row).toMatchObject({ isLateSeal: false, state: 'sealed', firstFillAt: null });
    const trail: { action: string; details: string }[] = await app.dataSource.query(
      'SELECT action, details FROM audit_event WHERE subject_id = ? ORDER BY at, action',
      [early.id],
    );
    expect(trail.map(({ action }) => action)).toEqual(['fill-added', 'fill-removed']);
    expect(JSON.stringify(trail)).toContain('0.78');
  });

  it('that is not there is not found', async () => {
    const id = await sealed();
    await trader.delete(`/entries/${id}/fills/${randomUUID()}`).expect(404);
  });
});

describe('an entry', () => {
  it('goes from sealed to open to closed to reviewed, and back as far as its fills and lesson do', async () => {
    const id = await sealed();
    const states: string[] = [];
    const note = ({ body }: { body: Entry }) => {
      states.push(body.row.state);
      return body;
    };
    const sold = fill('sell', put97, { price: '0.78', tradedAt: at(1) });
    const bought = fill('buy', put97, { price: '0.40', tradedAt: at(2) });
    note(await add(id, sold).expect(201));
    const closed = note(await add(id, bought).expect(201));
    expect(closed.row).toMatchObject({ needsLesson: true, firstFillAt: at(1), lastFillAt: at(2) });
    const teach = (lesson: string, version: number) =>
      trader.put(`/entries/${id}/lesson`).set('If-Match', String(version)).send({ lesson });
    const reviewed = note(await teach('Wait.', closed.row.version).expect(200));
    await teach('Stale.', closed.row.version).expect(409);
    note(await teach(' ', reviewed.row.version).expect(200));
    note(await trader.delete(`/entries/${id}/fills/${bought.id}`).expect(200));
    note(await trader.delete(`/entries/${id}/fills/${sold.id}`).expect(200));
    expect(states).toEqual(['open', 'closed', 'reviewed', 'closed', 'open', 'sealed']);
  });

  it('is abandoned only before its first fill, and takes none afterwards', async () => {
    const traded = await sealed();
    await add(traded, fill('sell', put97, { price: '0.78', tradedAt: at(1) })).expect(201);
    const refused = await trader.post(`/entries/${traded}/abandon`).set('If-Match', '3').expect(409);
    expect(refused.body.error.code).toBe('fills-exist');
    const id = await sealed();
    expect((await trader.post(`/entries/${id}/abandon`).set('If-Match', '2').expect(200)).body.row.state).toBe(
      'abandoned',
    );
    await add(id, fill('sell', put97, { price: '0.78', tradedAt: at(1) })).expect(409);
    await trader.post(`/entries/${id}/abandon`).set('If-Match', '2').expect(409);
  });

  it('counts every one of ten fills added at once', async () => {
    const id = await sealed();
    const fills = Array.from({ length: 10 }, (_, index) =>
      fill('sell', put97, { price: '1', tradedAt: at(index + 1) }),
    );
    const answers = await Promise.all(fills.map((typed) => add(id, typed)));
    expect(answers.map(({ status }) => status)).toEqual(fills.map(() => 201));
    const { body } = await trader.get(`/entries/${id}`).expect(200);
    expect(
      body.fills.map(({ sequence }: { sequence: number }) => sequence).sort((a: number, b: number) => a - b),
    ).toEqual(fills.map((_, index) => index + 1));
  });
});
