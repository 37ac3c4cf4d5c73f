import { logReturns } from '@/journal/returns/log-returns';
import { closeDailyVolatility } from '@/journal/volatility/close-daily-volatility';
import { estimateCloseVolatility } from '@/journal/volatility/estimate-close-volatility';
import { ewmaDailyVolatility } from '@/journal/volatility/ewma-daily-volatility';
import reference from '@/tests/reference/data/window_vol.json';
import { indexCloses } from '@/tests/reference/index-closes';
import { expectWithin } from '@/tests/reference/reference-file';

const RELATIVE = 1e-11; // as the file states
const cases = reference.groups.flatMap((group) => group.cases);
const near = (actual: number, expected: number) => expectWithin(actual, expected, RELATIVE * expected);

describe.each(cases)('daily volatility of $series at session $session (R 4.2.2, TTR 0.24.3)', (one) => {
  const closes = indexCloses(one.series).slice(0, one.session);
  const returns = logReturns(closes);

  it.each(Object.entries(one.sd))('has the sample deviation of the last %s returns', (window, expected) => {
    near(estimateCloseVolatility(closes, { kind: 'close', window: Number(window) }).dailyVolatility, expected);
  });

  it.each(Object.entries(one.rms))('has the zero-mean deviation of the last %s returns', (window, expected) => {
    near(closeDailyVolatility(returns.slice(-Number(window)), { mean: 'zero' }), expected);
    const method = { kind: 'close', window: Number(window), mean: 'zero' } as const;
    near(estimateCloseVolatility(closes, method).dailyVolatility, expected);
  });

  it('has the weighted volatility started at the first squared return', () => {
    near(estimateCloseVolatility(closes, { kind: 'ewma', lambda: 0.94 }).dailyVolatility, one.ewma_first);
  });

  it('has the weighted volatility started at the mean of 21 squared returns', () => {
    near(ewmaDailyVolatility(returns, { lambda: 0.94, start: { kind: 'firstSquares', count: 21 } }), one.ewma_seed21);
  });

  it('has the weighted volatility of the last 74 returns with weights that sum to 1', () => {
    const start = { kind: 'lastReturns', count: 74 } as const;
    near(ewmaDailyVolatility(returns, { lambda: 0.94, start }), one.ewma_trunc74);
    near(estimateCloseVolatility(closes, { kind: 'ewma', lambda: 0.94, start }).dailyVolatility, one.ewma_trunc74);
  });
});
