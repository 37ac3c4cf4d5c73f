import { randomUUID } from 'node:crypto';
import { type DraftLeg, type DraftPlan } from '@/shared/entries/draft-plan';
import { newDraftPlan } from '@/shared/entries/new-draft-plan';
import { type TestPerson } from '@/tests/server/support/test-app';

export const expiry = '2026-12-18';
/** The sessions after that of the first bar, through the expiry. */
export const sessionsToExpiry = [
  '2026-12-10',
  '2026-12-11',
  '2026-12-14',
  '2026-12-15',
  '2026-12-16',
  '2026-12-17',
  expiry,
];
const presets = { name: 'Desk', currency: 'USD', ratePerYear: 0.04, overnightShare: 0.3, feePerContract: '0.65' };

export const shareFields = {
  symbol: 'HVYQ',
  name: 'Invented share',
  style: 'american',
  settlement: 'physical',
  settlementTime: 'pm',
  multiplier: '100',
  dividendYield: 0,
  currency: 'USD',
};
export const indexFields = {
  ...shareFields,
  symbol: 'ZZIX',
  name: 'Invented index',
  style: 'european',
  settlement: 'cash',
};

/** An underlying on the person's desk with one bar, of 2026-12-09. */
export async function addUnderlying(
  person: TestPerson,
  { fields = shareFields, close = '98.40' }: { fields?: typeof shareFields; close?: string } = {},
): Promise<string> {
  const id = randomUUID();
  await person
    .post('/underlyings')
    .send({ id, ...fields })
    .expect(201);
  await putBar(person, { underlyingId: id, date: '2026-12-09', close });
  return id;
}

export const putBar = (
  person: TestPerson,
  {
    underlyingId,
    date,
    close,
    settlement = null,
  }: { underlyingId: string; date: string; close: string; settlement?: string | null },
) =>
  person
    .put(`/underlyings/${underlyingId}/bars/${date}`)
    .send({ close, open: null, high: null, low: null, settlement })
    .expect(200);

/** A leg of one contract on the common expiry. */
export function leg(
  side: DraftLeg['side'],
  type: DraftLeg['type'],
  strikePrice: string,
  premium: string,
  quantity = '1',
): DraftLeg {
  return { id: randomUUID(), side, type, strikePrice, premium, quantity, expirySessionDate: expiry };
}

/** A plan that can be sealed: a bull put 97 / 95 under volatility typed by hand. */
export function completePlan(underlyingId: string, changes: Partial<DraftPlan> = {}): DraftPlan {
  return {
    ...newDraftPlan(underlyingId, { ...presets, version: 1 }),
    legs: [leg('sell', 'put', '97', '0.78'), leg('buy', 'put', '95', '0.30')],
    volatility: {
      source: 'typed',
      window: 21,
      lowPercent: '0.8',
      basePercent: '1',
      highPercent: '1.3',
      reason: 'Calm weeks lately.',
    },
    tags: ['calm'],
    idea: 'It stays above 97.',
    ...changes,
  };
}

/** A draft of the person's; gives its id. */
export async function addDraft(person: TestPerson, plan: DraftPlan): Promise<string> {
  const id = randomUUID();
  await person.post('/entries').send({ id, plan }).expect(201);
  return id;
}

/** A draft that is sealed at once; its version is 2 then. */
export async function addSealed(person: TestPerson, plan: DraftPlan): Promise<string> {
  const id = await addDraft(person, plan);
  await person.post(`/entries/${id}/seal`).set('If-Match', '1').expect(200);
  return id;
}

export interface TypedFill {
  readonly id: string;
  readonly kind: string;
  readonly instrument: object;
  readonly quantity: string;
  readonly price: string;
  readonly fees: string;
  readonly tradedAt: string;
  readonly timeZone: string;
}

export const option = (type: 'call' | 'put', strikePrice: string, underlyingSymbol = 'HVYQ') => ({
  kind: 'option',
  underlyingSymbol,
  expirySessionDate: expiry,
  type,
  strikePrice,
  multiplier: '100',
});
export const shares = { kind: 'stock', symbol: 'HVYQ', multiplier: '1' };

export function fill(
  kind: string,
  instrument: object,
  {
    quantity = '1',
    price,
    fees = '0',
    tradedAt,
  }: { quantity?: string; price: string; fees?: string; tradedAt: string },
): TypedFill {
  return { id: randomUUID(), kind, instrument, quantity, price, fees, tradedAt, timeZone: 'America/New_York' };
}
