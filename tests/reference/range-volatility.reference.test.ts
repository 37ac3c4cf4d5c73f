import { readFileSync } from 'node:fs';
import path from 'node:path';
import { type PriceBar } from '@/journal/returns/price-bar';
import { annualizedVolatility } from '@/journal/volatility/annualized-volatility';
import { estimateVolatility } from '@/journal/volatility/estimate-volatility';
import { type VolatilityMethod } from '@/journal/volatility/volatility-method';
import reference from '@/tests/reference/data/range_vol.json';
import { casesOf, expectWithin, numberOf } from '@/tests/reference/reference-file';

const RELATIVE = 1e-9; // as the file states

const bars: PriceBar[] = readFileSync(path.join(__dirname, 'data/ttrc_rows_1_150.csv'), 'utf8')
  .split('\n')
  .filter((line) => /^\d/.test(line))
  .map((line) => {
    const [, , open, high, low, close] = line.split(',').map(Number);
    return { open: Number(open), high: Number(high), low: Number(low), close: Number(close) };
  });

/** The package's name of an estimator and its window of n bars, as ours. A window of n closes there holds n − 1 returns. */
function methodOf(estimator: unknown, n: number): VolatilityMethod {
  switch (estimator) {
    case 'parkinson':
      return { kind: 'parkinson', window: n };
    case 'garman_klass':
      return { kind: 'garmanKlass', window: n };
    case 'rogers_satchell':
      return { kind: 'rogersSatchell', window: n };
    case 'gk_yz':
      return { kind: 'garmanKlassYangZhang', window: n };
    case 'yang_zhang':
      return { kind: 'yangZhang', window: n };
    case 'close':
      return { kind: 'close', window: n - 1 };
    case 'close_mean0':
      return { kind: 'close', window: n - 1, mean: 'zero' };
    default:
      throw new Error(`no estimator ${String(estimator)}`);
  }
}

describe('volatility of bars against R’s TTR 0.24.3', () => {
  it('reads the 150 bars of the file', () => {
    expect(bars).toHaveLength(150);
  });

  it.each(casesOf(reference, 'ttr'))('has the value of $estimator over $n bars to row $row', (one) => {
    const n = numberOf(one, 'n');
    const { dailyVolatility } = estimateVolatility(
      { bars: bars.slice(0, numberOf(one, 'row')) },
      methodOf(one.estimator, n),
    );
    // With zero mean the package still divides by one less than its returns.
    const ours = one.estimator === 'close_mean0' ? dailyVolatility * Math.sqrt((n - 1) / (n - 2)) : dailyVolatility;
    expectWithin(ours, numberOf(one, 'daily'), RELATIVE * numberOf(one, 'daily'));
    expectWithin(annualizedVolatility(ours), numberOf(one, 'annualised'), RELATIVE * numberOf(one, 'annualised'));
  });
});
