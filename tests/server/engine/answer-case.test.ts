import { answerLine } from '@/server/engine/answer-case';
import { type EngineCommand } from '@/server/engine/commands/engine-command';
import { impliedCommand } from '@/server/engine/commands/implied-command';
import { lotsCommand } from '@/server/engine/commands/lots-command';
import { oddsCommand } from '@/server/engine/commands/odds-command';
import { priceCommand } from '@/server/engine/commands/price-command';
import { scoreCommand } from '@/server/engine/commands/score-command';
import { sessionsCommand } from '@/server/engine/commands/sessions-command';
import { symbolCommand } from '@/server/engine/commands/symbol-command';
import { volatilityCommand } from '@/server/engine/commands/volatility-command';

function resultOf(command: EngineCommand, input: unknown): Record<string, unknown> {
  const { text, isRefused } = answerLine(command, JSON.stringify(input), 1);
  expect(isRefused).toBe(false);
  return JSON.parse(text);
}

function errorOf(command: EngineCommand, input: unknown): { code: string; message: string; line: number } {
  const { text, isRefused } = answerLine(command, JSON.stringify(input), 7);
  expect(isRefused).toBe(true);
  return JSON.parse(text).error;
}

const option = {
  type: 'call',
  style: 'european',
  spot: 100,
  strike: 102,
  sessions: 10,
  years: 14 / 365,
  ratePerYear: 0.04,
  dividendYield: 0,
};

describe('price', () => {
  it('answers with price, Greeks and odds', () => {
    const value = resultOf(priceCommand, { ...option, dailyVolatility: 0.015 });
    expect(value.price).toBeCloseTo(1.12767, 5);
    expect(Object.keys(value).sort()).toEqual([
      'delta',
      'gamma',
      'oddsInTheMoney',
      'price',
      'rhoPerPercent',
      'thetaPerSession',
      'vegaPerDailyPoint',
    ]);
  });

  it('takes dividends off the spot', () => {
    const dividends = [{ years: 5 / 365, amount: 0.5 }];
    expect(resultOf(priceCommand, { ...option, dailyVolatility: 0.015, dividends }).price).toBeCloseTo(0.95804, 5);
  });

  it.each([
    { why: 'a spot of 0', change: { spot: 0 }, code: 'option-input-invalid' },
    { why: 'a field nobody knows', change: { volatility: 0.2 }, code: 'case-invalid' },
    { why: 'a number written as text', change: { strike: '102' }, code: 'case-invalid' },
    {
      why: 'dividends above the spot',
      change: { dividends: [{ years: 0.01, amount: 200 }] },
      code: 'dividends-exceed-spot',
    },
  ])('refuses $why as $code, naming the line', ({ change, code }) => {
    expect(errorOf(priceCommand, { ...option, dailyVolatility: 0.015, ...change })).toEqual(
      expect.objectContaining({ code, line: 7 }),
    );
  });

  it('names the field that is wrong', () => {
    expect(errorOf(priceCommand, option).message).toMatch(/^dailyVolatility: /);
  });
});

describe('american options', () => {
  const put = { ...option, type: 'put', style: 'american', sessions: 21, years: 30 / 365, ratePerYear: 0.05 };

  it('are priced with where, and whether, they are exercised now', () => {
    const value = resultOf(priceCommand, { ...put, dailyVolatility: 0.015 });
    expect(value.exerciseNow).toBe(false);
    expect(value.exerciseBoundary).toBeLessThan(100);
    expect(value.price).toBeGreaterThan(
      Number(resultOf(priceCommand, { ...put, style: 'european', dailyVolatility: 0.015 }).price),
    );
    const implied = resultOf(impliedCommand, { ...put, price: value.price });
    expect(implied.dailyVolatility).toBeCloseTo(0.015, 9);
  });

  it('take cash dividends in either model, the stock’s own fall by default', () => {
    const call = { ...put, type: 'call', dailyVolatility: 0.015, dividends: [{ years: 0.04, amount: 2 }] };
    const price = (dividendModel?: string) => Number(resultOf(priceCommand, { ...call, dividendModel }).price);
    expect(price()).toBe(price('spot'));
    expect(Math.abs(price('escrowed') - price('spot'))).toBeLessThan(0.1);
    expect(price('escrowed')).not.toBe(price('spot'));
  });
});

describe('implied', () => {
  it('finds the volatility that a price was made with', () => {
    const { price } = resultOf(priceCommand, { ...option, dailyVolatility: 0.015 });
    expect(resultOf(impliedCommand, { ...option, price }).dailyVolatility).toBeCloseTo(0.015, 14);
  });

  it('answers null and the broken bound for a price that no volatility gives', () => {
    expect(resultOf(impliedCommand, { ...option, price: 100.5 })).toEqual({
      dailyVolatility: null,
      bound: 'above-maximum',
      limit: 100,
    });
  });
});

describe('volatility', () => {
  const closes = [50, 50.5, 49.75, 50.25, 51, 50.4];

  it('estimates from closes, or from the closes of bars, with an interval', () => {
    const fromCloses = resultOf(volatilityCommand, { closes, method: 'close' });
    expect(fromCloses.dailyVolatility).toBeCloseTo(0.013872, 6);
    expect(fromCloses).toEqual(expect.objectContaining({ confidence: 0.95, sessions: 5 }));
    const bars = closes.map((close) => [close, close + 1, close - 1, close]);
    expect(resultOf(volatilityCommand, { bars, method: 'close' })).toEqual(fromCloses);
  });

  it('uses the latest returns of a window', () => {
    const lastThree = resultOf(volatilityCommand, { closes, method: 'close', window: 3 });
    expect(lastThree).toEqual(resultOf(volatilityCommand, { closes: closes.slice(-4), method: 'close' }));
  });

  it('estimates from the ranges of bars', () => {
    // Worked values computed outside this project with Python.
    const bars = [[50.1, 51, 49.8, 50.7]];
    const volatilityBy = (method: string) => resultOf(volatilityCommand, { bars, method }).dailyVolatility;
    expect(volatilityBy('parkinson')).toBeCloseTo(0.0143, 6);
    expect(volatilityBy('garmanKlass')).toBeCloseTo(0.015124, 6);
    expect(volatilityBy('rogersSatchell')).toBeCloseTo(0.014581, 6);
  });

  it('weighs squared returns by lambda', () => {
    // One return of 1.5 % and then one of 2.4 %: 0.94 and 0.06 of their squares.
    const prices = [100, 100 * Math.exp(0.015), 100 * Math.exp(0.039)];
    expect(resultOf(volatilityCommand, { closes: prices, method: 'ewma', lambda: 0.94 }).dailyVolatility).toBeCloseTo(
      0.015686,
      6,
    );
  });

  it.each([
    { input: { closes, method: 'parkinson' }, code: 'bars-missing' },
    { input: { bars: [[50, 49, 48, 49]], method: 'parkinson' }, code: 'bar-invalid' },
    { input: { bars: [[50, 51, 48, 49]], method: 'yangZhang' }, code: 'too-few-bars' },
    { input: { closes, method: 'close', window: 6 }, code: 'too-few-returns' },
    { input: { closes: [50], method: 'close' }, code: 'too-few-returns' },
    { input: { closes: [50, -1, 50], method: 'close' }, code: 'close-invalid' },
    { input: { method: 'close' }, code: 'case-invalid' },
    { input: { closes, bars: [], method: 'close' }, code: 'case-invalid' },
  ])('refuses $input as $code', ({ input, code }) => {
    expect(errorOf(volatilityCommand, input).code).toBe(code);
  });
});

describe('odds', () => {
  it('answers above, below and touch', () => {
    const question = { spot: 100, level: 102, dailyVolatility: 0.015, sessions: 10, driftPerSession: 0 };
    const { above, below, touch } = resultOf(oddsCommand, question);
    expect(above).toBeCloseTo(0.3382, 4);
    expect(below).toBeCloseTo(0.6618, 4);
    expect(touch).toBeCloseTo(0.6763, 4);
  });

  it('refuses sessions below 0', () => {
    const question = { spot: 100, level: 102, dailyVolatility: 0.015, sessions: -1, driftPerSession: 0 };
    expect(errorOf(oddsCommand, question).code).toBe('sessions-invalid');
  });
});

describe('odds of more than one level', () => {
  const question = { spot: 100, level: 104, dailyVolatility: 0.015, sessions: 10, driftPerSession: 0 };

  it('says which of two levels is touched first, whichever is named first', () => {
    const { touchFirst } = resultOf(oddsCommand, { ...question, otherLevel: 97 });
    const { touchFirst: turned } = resultOf(oddsCommand, { ...question, level: 97, otherLevel: 104 });
    expect(touchFirst).toMatchObject({ neither: expect.closeTo(Number(Object(turned).neither), 12) });
    expect(Object(touchFirst).level).toBeCloseTo(Object(turned).otherLevel, 12);
    expect(Object(touchFirst).level + Object(touchFirst).otherLevel + Object(touchFirst).neither).toBeCloseTo(1, 12);
  });

  it('adds a touch seen at closes only, and the fatter law of an estimated volatility', () => {
    const { touch, touchAtCloses, above, student } = resultOf(oddsCommand, { ...question, closes: 10, returns: 20 });
    expect(touchAtCloses).toBeLessThan(Number(touch));
    expect(Object(student).above).toBeGreaterThan(Number(above));
  });
});

describe('symbol', () => {
  const fields = { root: 'ZQXW', expirySessionDate: '2025-01-17', type: 'call', strikePrice: '12.5' };

  it('reads a symbol and writes it from its fields', () => {
    const both = { symbol: 'ZQXW  250117C00012500', ...fields };
    expect(resultOf(symbolCommand, { symbol: both.symbol })).toEqual(both);
    expect(resultOf(symbolCommand, fields)).toEqual(both);
  });

  it('refuses a symbol of 20 characters and a root of seven', () => {
    expect(errorOf(symbolCommand, { symbol: 'ZQXW  250117C0001250' }).code).toBe('symbol-malformed');
    expect(errorOf(symbolCommand, { ...fields, root: 'ZQXWKVY' }).code).toBe('symbol-field-invalid');
  });
});

describe('sessions', () => {
  it('counts sessions after one date through another', () => {
    expect(resultOf(sessionsCommand, { from: '2015-06-30', to: '2015-07-06' })).toEqual({ sessions: 3 });
  });

  it('runs the session clock between instants', () => {
    const question = { from: '2026-12-01T18:00:00.000Z', to: '2026-12-03T21:00:00.000Z' };
    expect(resultOf(sessionsCommand, question).sessions).toBeCloseTo(2.3231, 4);
  });

  it('refuses a date beside an instant and a text that is neither', () => {
    expect(errorOf(sessionsCommand, { from: '2026-12-01', to: '2026-12-03T21:00:00.000Z' }).code).toBe(
      'date-and-instant-mixed',
    );
    expect(errorOf(sessionsCommand, { from: 'yesterday', to: 'today' }).code).toBe('instant-invalid');
  });
});

describe('lots', () => {
  it('carries what is held through a two-for-one split', () => {
    const stock = { kind: 'stock', symbol: 'XJKO' };
    const trade = (id: string, kind: string, quantity: string, price: string, tradedAt: string) => ({
      id,
      kind,
      instrument: stock,
      quantity,
      price,
      tradedAt,
    });
    const lots = resultOf(lotsCommand, {
      method: 'fifo',
      fills: [
        trade('1', 'buy', '100', '50', '2026-12-01T15:00:00.000Z'),
        trade('2', 'sell', '200', '26', '2026-12-03T15:00:00.000Z'),
      ],
      changes: [
        {
          id: 'split',
          changedAt: '2026-12-02T14:00:00.000Z',
          from: stock,
          to: stock,
          oldQuantity: '1',
          newQuantity: '2',
        },
      ],
    });
    expect(lots).toMatchObject({ realisedProfit: '200', open: [] });
  });

  const instrument = { kind: 'stock', symbol: 'ZQXA' };
  const fills = [
    {
      id: 'f1',
      kind: 'buy',
      instrument,
      quantity: '100',
      price: '10',
      fees: '1',
      tradedAt: '2026-12-01T15:00:00.000Z',
    },
    {
      id: 'f2',
      kind: 'buy',
      instrument,
      quantity: '100',
      price: '12',
      fees: '1',
      tradedAt: '2026-12-01T16:00:00.000Z',
    },
    {
      id: 'f3',
      kind: 'sell',
      instrument,
      quantity: '100',
      price: '13',
      fees: '1',
      tradedAt: '2026-12-01T17:00:00.000Z',
    },
  ];

  it.each([
    { method: 'fifo', realisedProfit: '298' },
    { method: 'lifo', realisedProfit: '98' },
    { method: 'average', realisedProfit: '198' },
  ])('matches by $method for a profit of $realisedProfit', ({ method, realisedProfit }) => {
    const { closed, open, ...sums } = resultOf(lotsCommand, { fills, method });
    expect(closed).toHaveLength(1);
    expect(open).toHaveLength(1);
    expect(sums).toEqual({ realisedProfit, fees: '3', cashFlow: '-903' });
  });

  it('refuses a quantity written as a number, and one of 0', () => {
    const withQuantity = (quantity: unknown) => ({ fills: [{ ...fills[0], quantity }], method: 'fifo' });
    expect(errorOf(lotsCommand, withQuantity(100)).code).toBe('case-invalid');
    expect(errorOf(lotsCommand, withQuantity('0')).code).toBe('quantity-not-positive');
  });
});

describe('score', () => {
  it('answers with Murphy terms that sum to the Brier score', () => {
    const forecasts = [0.3, 0.3, 0.3, 0.3, 0.5, 0.5, 0.5, 0.5, 0.7, 0.7, 0.7, 0.7];
    const outcomes = [1, 1, 0, 0, 1, 1, 0, 0, 1, 1, 1, 0];
    const { brier, reliability, resolution, uncertainty, calibratedCurve } = resultOf(scoreCommand, {
      forecasts,
      outcomes,
    });
    expect(brier).toBeCloseTo(0.2433, 4);
    expect(reliability).toBeCloseTo(0.0142, 4);
    expect(resolution).toBeCloseTo(0.0139, 4);
    expect(uncertainty).toBeCloseTo(0.2431, 4);
    expect(calibratedCurve).toHaveLength(3);
  });

  it('says Infinity for the log score of a certainty that failed, which JSON has no number for', () => {
    expect(resultOf(scoreCommand, { forecasts: [0, 0.5], outcomes: [true, false] }).logScore).toBe('Infinity');
  });

  it('refuses lists of different length', () => {
    expect(errorOf(scoreCommand, { forecasts: [0.5], outcomes: [] }).code).toBe('outcomes-not-matching');
  });
});

describe('any command', () => {
  it.each(['nonsense', '', '{"type":', 'null', '[]', '5'])('refuses the line %j and names it', (line) => {
    const { text, isRefused } = answerLine(priceCommand, line, 3);
    expect(isRefused).toBe(true);
    expect(JSON.parse(text).error.line).toBe(3);
    expect(text).not.toContain('\n');
  });
});
