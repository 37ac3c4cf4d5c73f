import { seededRandom } from '@/journal/random/seeded-random';
import { logReturns } from '@/journal/returns/log-returns';
import { varianceRatio } from '@/journal/returns/variance-ratio';
import { closeDailyVolatility } from '@/journal/volatility/close-daily-volatility';
import { placeAmong, placeInOwnYear } from '@/journal/volatility/place-in-own-year';
import { volatilityByHorizon } from '@/journal/volatility/volatility-by-horizon';
import { indexCloses } from '@/tests/reference/index-closes';

const closes = indexCloses('SMI');

describe('volatility by horizon', () => {
  const horizons = volatilityByHorizon(closes);

  it('is given for 1, 2, 3, 5, 10 and 21 sessions', () => {
    expect(horizons.map(({ sessions }) => sessions)).toEqual([1, 2, 3, 5, 10, 21]);
  });

  it('is the sample deviation for one session, on the line of the square root of time', () => {
    const expected = closeDailyVolatility(logReturns(closes).slice(-63), { mean: 'sample' });
    expect(horizons[0]?.deviation).toBeCloseTo(expected, 15);
    expect(horizons[0]?.squareRootOfTime).toBe(horizons[0]?.deviation);
    expect(horizons[4]?.squareRootOfTime).toBeCloseTo(expected * Math.sqrt(10), 15);
  });

  it('leaves the line by the variance ratio of the same returns', () => {
    const returns = logReturns(closes).slice(-63);
    for (const { sessions, varianceRatio: ours } of horizons.slice(1)) {
      expect(ours).toBeCloseTo(varianceRatio(returns, { sessions }).ratio, 12);
    }
  });

  it('stands among the 252 windows of the past year, the present one last', () => {
    for (const { deviation, past } of horizons) {
      expect(past?.count).toBe(252);
      expect(past?.current).toBe(deviation);
    }
    // One session over 63 returns is what the place in its own year shows.
    expect(horizons[0]?.past?.percentile).toBe(placeInOwnYear(closes, 63)?.percentile);
  });

  it('has no place among fewer than 20 windows', () => {
    const [first] = volatilityByHorizon(closes.slice(0, 64 + 18), { horizons: [1] });
    expect(first?.past).toBeNull();
    expect(volatilityByHorizon(closes.slice(0, 64 + 19), { horizons: [1] })[0]?.past?.count).toBe(20);
  });

  it('is on average on the line for independent returns', () => {
    const random = seededRandom(31);
    let place = 100;
    const walk = Array.from({ length: 7001 }, () => (place *= Math.exp(0.01 * random.normal())));
    for (const { varianceRatio: ratio } of volatilityByHorizon(walk, { window: 7000 })) {
      // The standard error of the ratio over 21 sessions is about 0.063 with 7,000 returns.
      expect(Math.abs(ratio - 1)).toBeLessThan(0.19);
    }
  });

  it('is 0 on the line for closes that never change', () => {
    const [, two] = volatilityByHorizon(new Array<number>(64).fill(5));
    expect(two).toMatchObject({ deviation: 0, squareRootOfTime: 0, varianceRatio: 1 });
  });

  it.each([
    [{ window: 21 }, 'window-invalid'],
    [{ window: 1, horizons: [1] }, 'window-invalid'],
    [{ window: 63.5 }, 'window-invalid'],
    [{ window: 1860 }, 'too-few-returns'],
    [{ horizons: [0] }, 'horizon-invalid'],
    [{ horizons: [1.5] }, 'horizon-invalid'],
  ])('refuses %j as %s', (options, code) => {
    expect(() => volatilityByHorizon(closes, options)).toThrow(expect.objectContaining({ code }));
  });
});

describe('the place among past values', () => {
  it('gives the quantiles and the share at or below the last', () => {
    const values = Array.from({ length: 21 }, (_, at) => (at * 8) % 21);
    expect(placeAmong(values)).toEqual({
      percentile: (100 * 14) / 21,
      fifthPercentile: 1,
      lowerQuartile: 5,
      median: 10,
      upperQuartile: 15,
      ninetyFifthPercentile: 19,
      lowest: 0,
      highest: 20,
      current: 13,
      count: 21,
    });
  });

  it('is none for nothing', () => {
    expect(placeAmong([])).toBeNull();
  });
});
