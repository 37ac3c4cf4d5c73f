import { type Fill } from '@/journal/fills/fill';
import { makeForecast } from '@/journal/forecast/make-forecast';
import { type ForecastInput } from '@/journal/forecast/forecast-input';
import { type OutcomeQuestion } from '@/journal/outcome/entry-outcome';
import { resolveEntry } from '@/journal/outcome/resolve-entry';
import { usOptionsCalendar } from '@/journal/sessions/us-options-calendar';
import { longCall } from '@/tests/journal/forecast/plan-examples';
import { nothingNoted, outcomeBar } from '@/tests/journal/outcome/outcome-bars';

// A call on 102 over ten sessions, bought by five and sold after three: worked out outside this project with Python.
const spotAt = '2026-12-04T21:00:00.000Z';
const closes = [
  ['2026-12-07', 100.8],
  ['2026-12-08', 101.3],
  ['2026-12-09', 102.5],
] as const;
const plan: ForecastInput = {
  ...longCall,
  spot: { price: '100', at: spotAt, source: 'bar' },
  legs: longCall.legs.map((leg) => ({ ...leg, quantity: 5, premium: '1.08', expirySessionDate: '2026-12-18' })),
  holding: { kind: 'sessions', sessions: 3 },
  targetPrice: '102.4',
  stopPrice: '98.5',
};
const instrument: Fill['instrument'] = {
  kind: 'option',
  underlyingSymbol: plan.underlying.symbol,
  expirySessionDate: '2026-12-18',
  type: 'call',
  strikePrice: plan.legs[0]?.strikePrice ?? '',
  multiplier: plan.underlying.multiplier,
};
const bought: Fill = {
  id: 'in',
  kind: 'buy',
  instrument,
  quantity: '5',
  price: '1.10',
  fees: '3.33',
  tradedAt: spotAt,
  sequence: 1,
};
const sold: Fill = {
  ...bought,
  id: 'out',
  kind: 'sell',
  price: '1.75',
  fees: '3.32',
  tradedAt: '2026-12-09T21:00:00.000Z',
};
const resolve = (changes: Partial<OutcomeQuestion> = {}) =>
  resolveEntry(
    {
      input: plan,
      forecast: makeForecast(plan, usOptionsCalendar),
      barsSince: closes.map(([date, close]) => outcomeBar(date, close)),
      fills: [bought, sold],
      ...nothingNoted(plan),
      ...changes,
    },
    usOptionsCalendar,
  );

describe('where a profit came from', () => {
  it('is told by move, time, volatility, marks, slippage and fees, which add up to the cent', () => {
    const marks = new Map([
      ['in', { underlyingPrice: '100', midPrice: '1.08' }],
      ['out', { underlyingPrice: '102.50', midPrice: '1.77' }],
    ]);
    const { sources, profit } = resolve({ marks });
    expect(sources).toMatchObject({
      slippage: '-20',
      fees: '-6.65',
      realisedProfit: '318.35',
      isSlippageKnown: true,
      underlyingFrom: 'noted',
    });
    expect(profit?.realised).toBe('318.35');
    const { move, time, volatility, carry, markResidual } = sources ?? {};
    const parts = [move, time, volatility, carry, markResidual].map(Number);
    // The volatilities implied by the mids move a cent or two between the model's parts: 349.40 of model change less 4.40 of marks.
    expect(parts.reduce((sum, part) => sum + part, 0)).toBeCloseTo(345, 10);
    expect(Number(move)).toBeCloseTo(548.4, -1);
    expect(Number(time)).toBeCloseTo(-143.4, -1);
  });

  it('takes the closes of the fills’ sessions where nothing was noted, and says so', () => {
    const { sources } = resolve();
    expect(sources).toMatchObject({
      slippage: '0',
      underlyingFrom: 'close',
      isSlippageKnown: false,
      realisedProfit: '318.35',
    });
  });

  it('waits while the position is open, or the close of a fill’s session is not there', () => {
    expect(resolve({ fills: [bought] }).sources).toBeNull();
    expect(resolve({ barsSince: [outcomeBar('2026-12-07', 100.8)] }).sources).toBeNull();
  });

  it('loses nothing to slippage at expiry', () => {
    const expired: Fill = { ...sold, kind: 'expiry', price: '0', fees: '0', tradedAt: '2026-12-18T21:00:00.000Z' };
    const barsSince = [outcomeBar('2026-12-18', 101)];
    const marks = new Map([['in', { underlyingPrice: '100', midPrice: '1.08' }]]);
    const { sources } = resolve({ fills: [bought, expired], barsSince, marks });
    expect(sources).toMatchObject({ slippage: '-10', fees: '-3.33', realisedProfit: '-553.33', isSlippageKnown: true });
  });
});

describe('an option that ended on its expiry day', () => {
  it('is valued by the settlement value, not by the close, and leaves no residual', () => {
    const ended: Fill = { ...sold, kind: 'expiry', price: '1.00', fees: '0', tradedAt: '2026-12-18T21:00:00.000Z' };
    const marks = new Map([['in', { underlyingPrice: '100', midPrice: '1.08' }]]);
    const barsSince = [outcomeBar('2026-12-18', 99, { settlement: 103 })];
    const { sources } = resolve({ fills: [bought, ended], barsSince, marks });
    expect(sources).toMatchObject({
      volatility: '0',
      markResidual: '0',
      realisedProfit: '-53.33',
      underlyingFrom: 'noted',
    });
  });
});

describe('how the plan was carried out', () => {
  it('is sealed before the fill, within size, over the planned price and left by the target', () => {
    expect(resolve().process).toMatchObject({
      isSealedBeforeFill: true,
      size: { isWithin: true },
      limit: { netPremium: '550', limit: '540', beyond: '10', isWithin: false },
      exitTag: 'target',
      isFollowed: false,
    });
  });

  it('is left by time in the planned session, and unplanned before it', () => {
    const flat = closes.map(([date]) => outcomeBar(date, 100.2));
    expect(resolve({ barsSince: flat }).process?.exitTag).toBe('time');
    const early: Fill = { ...sold, tradedAt: '2026-12-07T20:00:00.000Z' };
    expect(resolve({ barsSince: flat, fills: [bought, early] }).process?.exitTag).toBe('unplanned');
  });

  it('notices more contracts than planned, and a seal after the fill', () => {
    const more = { ...bought, quantity: '6' };
    const { process } = resolve({ fills: [more], sealedAt: '2026-12-04T21:00:01.000Z' });
    expect(process).toMatchObject({
      isSealedBeforeFill: false,
      size: { isWithin: false },
      exitTag: null,
      isFollowed: null,
    });
  });

  it('says nothing without fills', () => {
    expect(resolve({ fills: [] }).process).toBeNull();
  });
});
