import { makeForecast } from '@/journal/forecast/make-forecast';
import { DomainError } from '@/journal/errors/domain-error';
import { usOptionsCalendar as calendar } from '@/journal/sessions/us-options-calendar';
import { type DraftPlan } from '@/shared/entries/draft-plan';
import { newDraftPlan } from '@/shared/entries/new-draft-plan';
import { planProblemOf } from '@/shared/entries/plan-problem-of';
import { readPlan } from '@/shared/entries/read-plan';
import { type Underlying } from '@/shared/underlyings/underlying';
import { sessionDatesEnding } from '@/tests/e2e/support/index-series';

const underlying: Underlying = {
  id: '01940000-0000-7000-8000-000000000001',
  version: 1,
  symbol: 'JQVO',
  name: '',
  style: 'european',
  settlement: 'cash',
  settlementTime: 'pm',
  multiplier: '100',
  dividendYield: 0,
  currency: 'USD',
};
const bars = sessionDatesEnding('2026-12-09', 60).map((sessionDate, index) => ({
  sessionDate,
  close: (100 + 2 * Math.sin(index)).toFixed(2),
}));
const settings = {
  name: 'Desk',
  currency: 'USD',
  ratePerYear: 0.04,
  overnightShare: 0.3,
  feePerContract: '0.65',
  version: 1,
};
const leg = {
  id: '01940000-0000-7000-8000-00000000000a',
  side: 'buy',
  type: 'call',
  strikePrice: '102',
  expirySessionDate: '2026-12-23',
  quantity: '1',
  premium: '1.20',
} as const;
const draft: DraftPlan = { ...newDraftPlan(underlying.id, settings), legs: [leg] };

const read = (change: Partial<DraftPlan>, known = bars) =>
  readPlan({ draft: { ...draft, ...change }, underlying, bars: known, calendar });
function problemsOf(change: Partial<DraftPlan>, known = bars): Record<string, string> {
  const reading = read(change, known);
  return reading.kind === 'complete'
    ? {}
    : Object.fromEntries(reading.problems.map(({ field, message }) => [field, message]));
}
const withLeg = (change: Partial<DraftPlan['legs'][number]>): Partial<DraftPlan> => ({ legs: [{ ...leg, ...change }] });

describe('readPlan', () => {
  it('reads a plan with the desk’s presets as a forecast’s input', () => {
    const reading = read({});
    expect(reading).toMatchObject({
      kind: 'complete',
      input: {
        spot: { price: bars.at(-1)?.close, at: '2026-12-09T21:00:00.000Z', source: 'bar' },
        holding: { kind: 'toExpiry' },
        volatility: { source: 'window', window: 21, lastSessionDate: '2026-12-09' },
        drift: { kind: 'zeroReturn' },
        ratePerYear: 0.04,
        overnightShare: 0.3,
        feePerContract: '0.65',
      },
    });
    if (reading.kind === 'complete') expect(makeForecast(reading.input, calendar).structureName).toBe('long 102 call');
  });

  it.each<[string, Partial<DraftPlan>, string, RegExp]>([
    ['a plan without legs', { legs: [] }, 'legs', /Add a call or a put/],
    ['a strike of 0', withLeg({ strikePrice: '0' }), 'legs.0.strikePrice', /Leg 1: the strike must be above 0/],
    ['a strike in letters', withLeg({ strikePrice: 'ten' }), 'legs.0.strikePrice', /not a number/],
    ['a decimal comma', withLeg({ premium: '1,20' }), 'legs.0.premium', /Write it like 12\.5/],
    ['half a contract', withLeg({ quantity: '0.5' }), 'legs.0.quantity', /whole number/],
    ['no expiry', withLeg({ expirySessionDate: '' }), 'legs.0.expirySessionDate', /Choose a date/],
    [
      'an expiry on a holiday',
      withLeg({ expirySessionDate: '2026-12-25' }),
      'legs.0.expirySessionDate',
      /no session \(Christmas Day\)/,
    ],
    ['an expiry on a Saturday', withLeg({ expirySessionDate: '2026-12-12' }), 'legs.0.expirySessionDate', /weekend/],
    [
      'an expiry in the past',
      withLeg({ expirySessionDate: '2026-12-08' }),
      'legs.0.expirySessionDate',
      /Choose a later expiry/,
    ],
    [
      'two expiries',
      { legs: [leg, { ...leg, id: '01940000-0000-7000-8000-00000000000b', expirySessionDate: '2026-12-18' }] },
      'legs.1.expirySessionDate',
      /one expiry/,
    ],
    ['a hold of no number', { holding: 'sessions', holdingSessions: '' }, 'holdingSessions', /missing/],
    ['a negative target', { targetPrice: '-1' }, 'targetPrice', /above 0/],
    [
      'a stop where the price is',
      { spotPrice: '101', spotAt: '2026-12-09T21:00:00.000Z', stopPrice: '101.0' },
      'stopPrice',
      /already/,
    ],
    ['an overnight share above 100%', { overnightSharePercent: '101' }, 'overnightSharePercent', /100 or less/],
    ['a price without its time', { spotPrice: '101' }, 'spotAt', /when/],
    [
      'a window longer than the bars',
      { volatility: { ...draft.volatility, window: 252 } },
      'volatility.source',
      /59 returns, 252 are needed/,
    ],
    [
      'a typed volatility without a reason',
      { volatility: { ...draft.volatility, source: 'typed', lowPercent: '1', basePercent: '1.5', highPercent: '2' } },
      'volatility.reason',
      /reason/,
    ],
    [
      'typed volatilities out of order',
      {
        volatility: {
          ...draft.volatility,
          source: 'typed',
          lowPercent: '3',
          basePercent: '1.5',
          highPercent: '2',
          reason: 'x',
        },
      },
      'volatility.lowPercent',
      /must not be above/,
    ],
    [
      'an own view without a reason',
      { drift: { kind: 'ownView', expectedReturnPercent: '2', reason: ' ' } },
      'drift.reason',
      /reason/,
    ],
  ])('names %s with its field and what to do', (_, change, field, message) => {
    expect(problemsOf(change)[field]).toMatch(message);
  });

  it('asks for prices when there are none', () => {
    expect(problemsOf({}, [])['spotPrice']).toMatch(/Upload its bars, or type its price/);
  });

  it('names every problem at once', () => {
    expect(Object.keys(problemsOf({ ...withLeg({ strikePrice: '', premium: 'x' }), ratePercent: '' })).sort()).toEqual([
      'legs.0.premium',
      'legs.0.strikePrice',
      'ratePercent',
    ]);
  });

  it('uses only closes that were known at the moment of a typed price', () => {
    const early = read({ spotPrice: '101', spotAt: '2026-12-08T17:00:00.000Z' });
    expect(early).toMatchObject({ kind: 'complete', input: { volatility: { lastSessionDate: '2026-12-07' } } });
  });

  it('spreads an own view over the sessions of the hold', () => {
    const view = { kind: 'ownView', expectedReturnPercent: '2', reason: 'a break of the range' } as const;
    expect(read({ drift: view })).toMatchObject({
      input: { drift: { expectedLogReturnPerSession: Math.log1p(0.02) / 10 } },
    });
    expect(read({ drift: view, holding: 'sessions', holdingSessions: '4' })).toMatchObject({
      input: { drift: { expectedLogReturnPerSession: Math.log1p(0.02) / 4 } },
    });
  });
});

describe('planProblemOf', () => {
  it.each([
    'legs-of-several-expiries',
    'expiry-in-the-past',
    'holding-beyond-expiry',
    'holding-not-positive',
    'volatility-order',
    'strike-not-positive',
  ])('has its own words and field for %s', (code) => {
    const { field, message } = planProblemOf(new DomainError(code, { legIndex: 1, toExpiry: 10 }));
    expect(field).not.toBe('');
    expect(message).not.toContain(code);
  });

  it('says which code it has no words for', () => {
    expect(planProblemOf(new DomainError('something-new')).message).toContain('something-new');
  });
});
