import { type Fill } from '@/journal/fills/fill';
import { makeForecast } from '@/journal/forecast/make-forecast';
import { type ForecastInput } from '@/journal/forecast/forecast-input';
import { type OutcomeBar } from '@/journal/outcome/entry-outcome';
import { resolveEntry } from '@/journal/outcome/resolve-entry';
import { volatilityRatioRange } from '@/journal/outcome/realised-volatility';
import { usOptionsCalendar } from '@/journal/sessions/us-options-calendar';
import { closeOf, longCall } from '@/tests/journal/forecast/plan-examples';
import { nothingNoted, outcomeBar as bar } from '@/tests/journal/outcome/outcome-bars';

const resolve = (input: ForecastInput, barsSince: OutcomeBar[], fills: Fill[] = []) =>
  resolveEntry(
    { input, forecast: makeForecast(input, usOptionsCalendar), barsSince, fills, ...nothingNoted(input) },
    usOptionsCalendar,
  );

function fillOf(
  input: ForecastInput,
  index: number,
  change: Pick<Fill, 'kind' | 'price' | 'fees' | 'tradedAt'> & { quantity: string },
): Fill {
  const leg = input.legs[index];
  if (leg === undefined) throw new Error('no such leg');
  const { type, strikePrice, expirySessionDate } = leg;
  const { symbol, multiplier } = input.underlying;
  return {
    id: `fill-${index}-${change.tradedAt}-${change.kind}`,
    instrument: { kind: 'option', underlyingSymbol: symbol, expirySessionDate, type, strikePrice, multiplier },
    sequence: index,
    ...change,
  };
}

describe('scenario 1, the same-day index call that settles at 4021.50', () => {
  // Worked outside this project: P&L +728.83, z 0.970, event yes, Brier .456.
  const input: ForecastInput = {
    ...longCall,
    underlying: { ...longCall.underlying, symbol: 'ZZIX' },
    spot: { price: '4000', at: '2026-12-09T17:30:00.000Z', source: 'typed' },
    legs: longCall.legs.map((leg) => ({
      ...leg,
      strikePrice: '4010',
      premium: '4.20',
      expirySessionDate: '2026-12-09',
    })),
    volatility: { ...longCall.volatility, low: 0.009, base: 0.009, high: 0.009 },
    feePerContract: '1.17',
  };
  const fills = [
    fillOf(input, 0, { kind: 'buy', quantity: '1', price: '4.20', fees: '1.17', tradedAt: '2026-12-09T17:31:00.000Z' }),
    fillOf(input, 0, {
      kind: 'expiry',
      quantity: '1',
      price: '11.50',
      fees: '0',
      tradedAt: '2026-12-09T21:00:00.000Z',
    }),
  ];
  const outcome = resolve(input, [bar('2026-12-09', 4021.5)], fills);

  it('makes 728.83 after fees', () => {
    expect(outcome.profit).toMatchObject({ realised: '728.83', fees: '1.17', isFinal: true, horizon: 'expiry' });
  });

  it('moved 0.970 sigmas', () => {
    expect(outcome.move?.inSigmas).toBeCloseTo(0.97, 2);
    expect(outcome.move?.sessionDate).toBe('2026-12-09');
  });

  it('scores the 32.5% call that came true with 0.456', () => {
    expect(outcome.odds[0]).toMatchObject({ happened: true });
    expect(outcome.odds[0]?.brierScore).toBeCloseTo(0.456, 3);
    expect(outcome.isComplete).toBe(true);
  });
});

describe('scenario 3, the bull put that was bought back at half', () => {
  // Worked outside this project: WUVZ 60, 1.3 %, 21 sessions; sold 57 put, bought 55 put, credit 0.52, bought back 0.26, fees 1.32 each way:
  // +23.36; expiry 58.10, 57 put in the money 20.3 %, event no, Brier .0412.
  const input: ForecastInput = {
    ...longCall,
    underlying: { ...longCall.underlying, symbol: 'WUVZ' },
    spot: { price: '60', at: closeOf('2026-10-21'), source: 'bar' },
    legs: [
      {
        id: 'short',
        side: 'sell',
        type: 'put',
        strikePrice: '57',
        expirySessionDate: '2026-11-19',
        quantity: 1,
        premium: '1.12',
      },
      {
        id: 'long',
        side: 'buy',
        type: 'put',
        strikePrice: '55',
        expirySessionDate: '2026-11-19',
        quantity: 1,
        premium: '0.60',
      },
    ],
    volatility: { ...longCall.volatility, low: 0.013, base: 0.013, high: 0.013 },
    feePerContract: '0.66',
    stopPrice: '57',
  };
  const at = '2026-11-06T18:00:00.000Z';
  const fills = [
    fillOf(input, 0, {
      kind: 'sell',
      quantity: '1',
      price: '1.12',
      fees: '0.66',
      tradedAt: '2026-10-22T14:00:00.000Z',
    }),
    fillOf(input, 1, { kind: 'buy', quantity: '1', price: '0.60', fees: '0.66', tradedAt: '2026-10-22T14:00:00.000Z' }),
    fillOf(input, 0, { kind: 'buy', quantity: '1', price: '0.41', fees: '0.66', tradedAt: at }),
    fillOf(input, 1, { kind: 'sell', quantity: '1', price: '0.15', fees: '0.66', tradedAt: at }),
  ];

  it('states 20.3% in the money, 83.7% profit, mean +24.09, 39.9% for a touch of 57 and at most 149.32 to lose', () => {
    const forecast = makeForecast(input, usOptionsCalendar);
    expect(forecast.sessions.toExpiry).toBe(21);
    expect(forecast.odds[0]?.probability.base).toBeCloseTo(0.203, 3);
    expect(forecast.atExpiry.oddsOfProfit.base).toBeCloseTo(0.837, 3);
    expect(forecast.atExpiry.mean.base).toBeCloseTo(24.09, 2);
    expect(forecast.odds.find(({ key }) => key === 'touch-stop')?.probability.base).toBeCloseTo(0.399, 3);
    expect(forecast.cost.modelValue.base / -100).toBeCloseTo(0.2659, 4);
    expect(forecast.ends.greatestLoss).toBeCloseTo(-149.32, 2);
    expect(forecast.ends.oddsOfGreatestLoss).toBeCloseTo(0.076, 3);
  });

  it('is flat at +23.36 while the odds still wait for expiry', () => {
    const early = resolve(input, [bar('2026-11-06', 59)], fills);
    expect(early.profit).toMatchObject({ realised: '23.36', isFinal: true });
    expect(early.odds[0]).toMatchObject({ happened: null, waitsFor: 'the close of 2026-11-19' });
    expect(early.isComplete).toBe(false);
  });

  it('resolves the put at expiry although the trade was closed before, with Brier .0412', () => {
    const late = resolve(input, [bar('2026-11-06', 59), bar('2026-11-19', 58.1)], fills);
    expect(late.odds[0]).toMatchObject({ happened: false });
    expect(late.odds[0]?.brierScore).toBeCloseTo(0.0412, 4);
    expect(late.move?.sessionDate).toBe('2026-11-06');
  });
});

describe('test D, five calls sold after three sessions', () => {
  // By hand: 5 × 100 × (1.75 − 1.10) − 6.65 = 318.35; ln(102.5 / 100) / (0.015·√3) = 0.95.
  const input: ForecastInput = {
    ...longCall,
    legs: longCall.legs.map((leg) => ({ ...leg, quantity: 5, premium: '1.08' })),
    holding: { kind: 'sessions', sessions: 3 },
    feePerContract: '0.665',
    targetPrice: '102.40',
    stopPrice: '98.50',
  };
  const fills = [
    fillOf(input, 0, { kind: 'buy', quantity: '5', price: '1.10', fees: '3.33', tradedAt: '2026-12-10T15:00:00.000Z' }),
    fillOf(input, 0, {
      kind: 'sell',
      quantity: '5',
      price: '1.75',
      fees: '3.32',
      tradedAt: '2026-12-14T20:58:00.000Z',
    }),
  ];
  const closes = [bar('2026-12-10', 100.8), bar('2026-12-11', 101.6), bar('2026-12-14', 102.5)];
  const outcome = resolve(input, closes, fills);

  it('realises 318.35, in the upper fifth of its forecast', () => {
    expect(outcome.profit?.realised).toBe('318.35');
    expect(outcome.profit?.percentileLow).toBeCloseTo(0.804, 3);
  });

  it('landed at +0.95 sigmas after 3 sessions', () => {
    expect(outcome.move?.inSigmas).toBeCloseTo(0.95, 2);
    expect(outcome.move?.sessions).toBe(3);
  });

  it('resolves exit, target and stop, and leaves expiry open', () => {
    expect(Object.fromEntries(outcome.odds.map(({ odds, happened }) => [odds.key.split(':')[0], happened]))).toEqual({
      'in-the-money': null,
      'profit-at-expiry': null,
      'profit-at-exit': true,
      'touch-target': true,
      'touch-stop': false,
    });
  });
});

describe('a trade still open at its planned exit', () => {
  const input: ForecastInput = { ...longCall, holding: { kind: 'sessions', sessions: 3 } };
  const closes = [
    bar('2026-12-10', 100),
    bar('2026-12-11', 99),
    bar('2026-12-14', 98),
    bar('2026-12-15', 103),
    bar('2026-12-16', 106),
  ];
  const soldAt = (tradedAt: string) => [
    fillOf(input, 0, { kind: 'buy', quantity: '1', fees: '0.65', price: '1.20', tradedAt: '2026-12-10T15:00:00.000Z' }),
    fillOf(input, 0, { kind: 'sell', quantity: '1', fees: '0.65', price: '4.40', tradedAt }),
  ];
  const answerOf = (fills: Parameters<typeof resolve>[2]) =>
    resolve(input, closes, fills).odds.find(({ odds }) => odds.key === 'profit-at-exit')?.happened;

  it('keeps the answer of that close, whatever it is sold for later', () => {
    expect(answerOf(soldAt('2026-12-10T15:00:00.000Z').slice(0, 1))).toBe(false);
    expect(answerOf(soldAt('2026-12-16T20:00:00.000Z'))).toBe(false);
  });

  it('is answered by its own profit when it was sold on the day of the exit', () => {
    expect(answerOf(soldAt('2026-12-14T20:58:00.000Z'))).toBe(true);
  });
});

describe('the range that chance alone allows the realised volatility', () => {
  const closes = [bar('2026-12-10', 100.8), bar('2026-12-11', 101.6), bar('2026-12-14', 102.5)];
  const rangeOf = (volatility: Partial<ForecastInput['volatility']>) => {
    const input = { ...longCall, volatility: { ...longCall.volatility, ...volatility } };
    const { ratioLow, ratioHigh } = resolve(input, closes).realisedVolatility ?? {};
    return [ratioLow, ratioHigh];
  };

  it('rests on the returns of a window less one, and on the effective returns of a weighted estimate', () => {
    const from = (degreesOfFreedom: number) =>
      Object.values(volatilityRatioRange({ returnsRealised: 3, degreesOfFreedom }));
    expect(rangeOf({})).toEqual(from(19));
    expect(rangeOf({ source: 'ewma', window: null, lambda: 0.94 })).toEqual(from((1 + 0.94) / (1 - 0.94)));
  });

  it('is not there for a typed volatility, of whose source nothing is known', () => {
    expect(rangeOf({ source: 'typed', window: null })).toEqual([null, null]);
  });
});

describe('what is not known', () => {
  it('waits for the first missing close before saying that a level was not touched', () => {
    const input: ForecastInput = { ...longCall, targetPrice: '120' };
    const outcome = resolve(input, [bar('2026-12-10', 100), bar('2026-12-14', 101)]);
    expect(outcome.odds.find(({ odds }) => odds.key === 'touch-target')).toMatchObject({
      happened: null,
      waitsFor: 'the close of 2026-12-11',
    });
  });

  it('sees a touch by the high of a session whose close came back', () => {
    const input: ForecastInput = { ...longCall, targetPrice: '103' };
    const outcome = resolve(input, [bar('2026-12-10', 100, { high: 103.2, low: 99 })]);
    expect(outcome.odds.find(({ odds }) => odds.key === 'touch-target')).toMatchObject({
      happened: true,
      monitoredBy: 'range',
    });
  });

  it('waits for the settlement value of options settled from openings', () => {
    const input: ForecastInput = { ...longCall, underlying: { ...longCall.underlying, settlementTime: 'am' } };
    expect(resolve(input, [bar('2026-12-23', 103)]).odds[0]).toMatchObject({
      happened: null,
      waitsFor: 'the settlement value of 2026-12-23',
    });
    expect(resolve(input, [bar('2026-12-23', 101, { settlement: 103 })]).odds[0]).toMatchObject({ happened: true });
  });

  it('resolves a plan that was never traded', () => {
    const outcome = resolve(longCall, [bar('2026-12-23', 101)]);
    expect(outcome.profit).toBeNull();
    expect(outcome.odds.map(({ happened }) => happened)).toEqual([false, false]);
    expect(outcome.isComplete).toBe(true);
  });
});
