import fc from 'fast-check';
import { adjustBars, adjustCloses, adjustedLogReturns, adjustmentFactors } from '@/journal/returns/adjust-prices';
import { type CorporateAction } from '@/journal/returns/corporate-action';
import { logReturns } from '@/journal/returns/log-returns';

const SEED = 20261201;
const dates = ['2026-12-01', '2026-12-02', '2026-12-03', '2026-12-04', '2026-12-07', '2026-12-08'];
const closesOf = (...closes: number[]) => closes.map((close, at) => ({ sessionDate: dates[at] ?? '', close }));
const split = (exSessionDate: string, newShares: number, oldShares: number): CorporateAction => ({
  kind: 'split',
  exSessionDate,
  newShares,
  oldShares,
});
const dividend = (exSessionDate: string, amount: number): CorporateAction => ({
  kind: 'cashDividend',
  exSessionDate,
  amount,
});

describe('returns across splits and dividends, worked by hand', () => {
  it('are ln(102/100) where two shares came for one and each stands at 51', () => {
    expect(adjustedLogReturns(closesOf(100, 51), [split('2026-12-02', 2, 1)])).toEqual([Math.log(102 / 100)]);
  });

  it('are ln(99/100) where one share came for ten and stands at 990', () => {
    const [value] = adjustedLogReturns(closesOf(100, 990), [split('2026-12-02', 1, 10)]);
    expect(value).toBeCloseTo(Math.log(0.99), 15);
  });

  it('are ln(53.10/53.00) where a dividend of 0.60 left 52.50', () => {
    expect(adjustedLogReturns(closesOf(53, 52.5), [dividend('2026-12-02', 0.6)])).toEqual([Math.log(53.1 / 53)]);
  });

  it('add a special dividend and an ordinary one of the same session', () => {
    const special: CorporateAction = { kind: 'specialDividend', exSessionDate: '2026-12-02', amount: 4 };
    expect(adjustedLogReturns(closesOf(100, 95), [special, dividend('2026-12-02', 0.5)])).toEqual([
      Math.log(99.5 / 100),
    ]);
  });

  it('pay a dividend on the shares after the split of its session: three for two at 60, 1 on each', () => {
    const [value] = adjustedLogReturns(closesOf(90, 60), [dividend('2026-12-02', 1), split('2026-12-02', 3, 2)]);
    expect(value).toBeCloseTo(Math.log(91.5 / 90), 15);
  });

  it('have adjusted closes: half of 100 before two for one; 53 times 52.50/53.10 before 0.60', () => {
    expect(adjustCloses(closesOf(100, 104, 51), [split('2026-12-03', 2, 1)])).toEqual([50, 52, 51]);
    const [before, after] = adjustCloses(closesOf(53, 52.5), [dividend('2026-12-02', 0.6)]);
    expect(before).toBeCloseTo(52.4011299435, 10);
    expect(after).toBe(52.5);
  });

  it('take all four prices of a bar alike, and leave what else it carries', () => {
    const bars = [
      { sessionDate: '2026-12-01', open: 98, high: 104, low: 96, close: 100, row: 7 },
      { sessionDate: '2026-12-02', open: 50, high: 52, low: 49, close: 51, row: 8 },
    ];
    expect(adjustBars(bars, [split('2026-12-02', 2, 1)])).toEqual([
      { sessionDate: '2026-12-01', open: 49, high: 52, low: 48, close: 50, row: 7 },
      bars[1],
    ]);
  });
});

describe('an action', () => {
  const closes = closesOf(100, 101, 102);

  it('that falls between two sessions counts at the later', () => {
    const weekend = [
      { sessionDate: '2026-12-04', close: 100 },
      { sessionDate: '2026-12-07', close: 50 },
    ];
    expect(adjustedLogReturns(weekend, [split('2026-12-05', 2, 1)])).toEqual([0]);
  });

  it('up to the first session or after the last changes nothing', () => {
    const outside = [split('2026-12-01', 2, 1), dividend('2026-11-30', 1), split('2026-12-04', 5, 1)];
    expect(adjustCloses(closes, outside)).toEqual([100, 101, 102]);
  });

  it('of nothing changes nothing', () => {
    expect(adjustmentFactors(closes, [dividend('2026-12-02', 0), split('2026-12-03', 1, 1)])).toEqual([1, 1, 1]);
    expect(adjustCloses([], [])).toEqual([]);
  });

  it.each([
    [split('2026-12-02', 0, 1)],
    [split('2026-12-02', 2, 0)],
    [split('2026-12-02', Number.NaN, 1)],
    [split('2026-12-02', Infinity, 1)],
    [split('2026-12-02', 1e308, 1e-308)],
    [dividend('2026-12-02', -1)],
    [dividend('2026-12-02', Number.NaN)],
    [dividend('2026-12-02', Infinity)],
  ])('like %j is refused by its place in the list', (wrong) => {
    const run = () => adjustedLogReturns(closes, [split('2026-12-02', 2, 1), wrong]);
    expect(run).toThrow(
      expect.objectContaining({ code: 'action-invalid', details: expect.objectContaining({ index: 1 }) }),
    );
  });
});

describe('adjusted prices', () => {
  const anyClose = fc.double({ min: 0.01, max: 1e5, noNaN: true });
  const anyAction = fc.oneof(
    fc.record({
      kind: fc.constant('split' as const),
      exSessionDate: fc.constantFrom(...dates),
      newShares: fc.integer({ min: 1, max: 20 }),
      oldShares: fc.integer({ min: 1, max: 20 }),
    }),
    fc.record({
      kind: fc.constantFrom('cashDividend' as const, 'specialDividend' as const),
      exSessionDate: fc.constantFrom(...dates),
      amount: fc.double({ min: 0, max: 10, noNaN: true }),
    }),
  );

  it('have the adjusted returns, and the last close as it was traded, for any actions in any order', () => {
    fc.assert(
      fc.property(
        fc.array(anyClose, { minLength: 2, maxLength: 6 }),
        fc.array(anyAction, { maxLength: 6 }),
        (some, actions) => {
          const closes = closesOf(...some);
          const adjusted = adjustCloses(closes, actions);
          expect(adjusted.at(-1)).toBe(some.at(-1));
          const returns = adjustedLogReturns(closes, actions);
          for (const [at, value] of logReturns(adjusted).entries())
            expect(value).toBeCloseTo(returns[at] ?? Number.NaN, 11);
          expect(
            adjustedLogReturns(closes, [...actions].reverse()).every(
              (value, at) => Math.abs(value - (returns[at] ?? 9)) < 1e-12,
            ),
          ).toBe(true);
        },
      ),
      { seed: SEED },
    );
  });

  it('are the plain log returns without actions', () => {
    fc.assert(
      fc.property(fc.array(anyClose, { minLength: 2, maxLength: 6 }), (some) => {
        expect(adjustedLogReturns(closesOf(...some), [])).toEqual(logReturns(some));
      }),
      { seed: SEED },
    );
  });

  it.each([
    [closesOf(100), 'too-few-closes'],
    [closesOf(100, 0), 'close-invalid'],
    [closesOf(100, Number.NaN), 'close-invalid'],
    [[...closesOf(100, 101)].reverse(), 'session-dates-not-rising'],
    [[...closesOf(100), ...closesOf(100)], 'session-dates-not-rising'],
  ])('are refused from %j as %s', (closes, code) => {
    expect(() => adjustedLogReturns(closes, [])).toThrow(expect.objectContaining({ code }));
  });

  it('are refused where they leave the doubles', () => {
    const steep = [split('2026-12-02', 1e300, 1), split('2026-12-03', 1e300, 1)];
    const out = expect.objectContaining({ code: 'adjustment-out-of-range' });
    expect(() => adjustCloses(closesOf(1, 1, 1), steep)).toThrow(out);
    expect(() => adjustedLogReturns(closesOf(1, 1e300), [split('2026-12-02', 1e300, 1)])).toThrow(out);
  });

  it('are refused with a bar that does not hold together', () => {
    const bars = [{ sessionDate: '2026-12-01', open: 1, high: 1, low: 2, close: 1 }];
    expect(() => adjustBars(bars, [])).toThrow(expect.objectContaining({ code: 'bar-invalid' }));
  });
});
