import fc from 'fast-check';
import { DomainError } from '@/journal/errors/domain-error';
import { seededRandom } from '@/journal/random/seeded-random';
import { logReturns } from '@/journal/returns/log-returns';
import { overlappingVariance } from '@/journal/returns/overlapping-variance';
import { sampleStatistics } from '@/journal/returns/sample-statistics';
import { varianceRatio, varianceRatioOfAutocorrelations } from '@/journal/returns/variance-ratio';
import { indexCloses } from '@/tests/reference/index-closes';

const SEED = 20261201;
const worked = [1, -1, 2, -2, 1, 1, -1, 0].map((percent) => percent / 100);

describe('the variance ratio', () => {
  it('has the worked value and both its statistics, computed outside this project with Python', () => {
    const { ratio, plainZ, robustZ } = varianceRatio(worked, { sessions: 2 });
    expect(ratio).toBeCloseTo(0.3592, 4);
    expect(plainZ).toBeCloseTo(-1.812, 3);
    expect(robustZ).toBeCloseTo(-1.608, 3);
  });

  // Written out in numpy 2.4.6 and scipy 1.17.1: overlapping sums by convolution, θ lag by lag.
  it.each([
    ['DAX', 1859, 2, 0.9992404797771648, -0.03274756679780962, -0.025495910867999655, 0.9796594100831864],
    ['DAX', 1859, 10, 0.8991979365249074, -1.2872315971486352, -0.970296373490545, 0.3318987844232997],
    ['SMI', 1859, 2, 1.0479471699487475, 2.0672960422321918, 1.451484978588626, 0.146644862066898],
    ['SMI', 1859, 21, 0.9895446905482893, -0.08835373982564367, -0.07239894164282437, 0.9422844270328913],
    ['DAX', 250, 5, 0.9422679621847085, -0.41664509466905225, -0.34844346237258494, 0.7275071668708022],
    ['SMI', 250, 21, 0.8128383913441405, -0.5800095232269705, -0.5268625062276939, 0.5982890725048192],
  ])(
    'is that of numpy for %s, %i returns, over %i sessions',
    (series, count, sessions, ratio, plainZ, robustZ, pValue) => {
      const ours = varianceRatio(logReturns(indexCloses(series)).slice(-count), { sessions });
      expect(ours.ratio).toBeCloseTo(ratio, 11);
      expect(ours.plainZ).toBeCloseTo(plainZ, 9);
      expect(ours.robustZ).toBeCloseTo(robustZ, 9);
      expect(ours.pValue).toBeCloseTo(pValue, 9);
      expect(ours.isWarning).toBe(false);
    },
  );

  it('says how far from 1 it must be to be noticed: 0.55 for 60 returns over 5, 0.12 for 250 over 2', () => {
    const noise = (count: number) => Array.from({ length: count }, (_, at) => Math.sin(at * at));
    expect(varianceRatio(noise(60), { sessions: 5 }).leastNoticed).toBeCloseTo(0.55, 2);
    expect(varianceRatio(noise(250), { sessions: 2 }).leastNoticed).toBeCloseTo(0.12, 2);
  });

  it('warns of returns that turn back at once', () => {
    const random = seededRandom(5);
    const bounces = Array.from({ length: 400 }, () => random.normal());
    const { ratio, isWarning, interval } = varianceRatio(
      bounces.slice(1).map((value, at) => value - (bounces[at] ?? 0)),
      { sessions: 2 },
    );
    expect(ratio).toBeLessThan(0.7);
    expect(isWarning).toBe(true);
    expect(interval?.high).toBeLessThan(1);
  });

  it('does not change with the unit, nor with a mean added, for any sample', () => {
    const sample = fc.array(fc.double({ min: -0.2, max: 0.2, noNaN: true }), { minLength: 6, maxLength: 40 });
    fc.assert(
      fc.property(sample, fc.integer({ min: 2, max: 5 }), (returns, sessions) => {
        fc.pre(sampleStatistics(returns).standardDeviation > 1e-6);
        const { ratio } = varianceRatio(returns, { sessions });
        expect(ratio).toBeGreaterThanOrEqual(0);
        expect(
          varianceRatio(
            returns.map((value) => value * 2 ** 200),
            { sessions },
          ).ratio,
        ).toBeCloseTo(ratio, 9);
        expect(
          varianceRatio(
            returns.map((value) => value + 0.125),
            { sessions },
          ).ratio,
        ).toBeCloseTo(ratio, 6);
      }),
      { seed: SEED },
    );
  });

  it('holds its size of 5 % by the robust statistic under changing volatility, where the plain one fails', () => {
    const random = seededRandom(7);
    const trials = 1000;
    let [robust, plain] = [0, 0];
    for (let trial = 0; trial < trials; trial += 1) {
      let variance = 1;
      let value = 0;
      const returns = Array.from({ length: 500 }, () => {
        variance = 0.1 + 0.3 * value ** 2 + 0.6 * variance;
        value = Math.sqrt(variance) * random.normal();
        return value;
      });
      const { plainZ, isWarning } = varianceRatio(returns, { sessions: 2 });
      if (isWarning) robust += 1;
      if (Math.abs(plainZ) > 1.96) plain += 1;
    }
    // Four standard errors of a thousand trials at 5 % are 2.8 points.
    expect(robust / trials).toBeGreaterThan(0.022);
    expect(robust / trials).toBeLessThan(0.078);
    expect(plain / trials).toBeGreaterThan(0.1);
  });

  it('gives no robust statistic where large returns never follow each other', () => {
    expect(varianceRatio([1, 0, -1, 0], { sessions: 2 })).toMatchObject({
      robustZ: null,
      pValue: null,
      interval: null,
      isWarning: false,
    });
  });

  it.each([
    [[1, 1, 1], 2, 'returns-without-spread'],
    [[1, 2], 2, 'too-few-returns'],
    [[1, 2, 3], 1, 'horizon-invalid'],
    [[1, 2, 3], 2.5, 'horizon-invalid'],
    [[1, 2, Number.NaN], 2, 'value-invalid'],
    [[1, 2, 1e200], 2, 'value-invalid'],
  ])('refuses %j over %p as %s', (returns, sessions, code) => {
    expect(() => varianceRatio(returns, { sessions })).toThrow(expect.objectContaining({ code }));
  });

  it('refuses a confidence of 1', () => {
    expect(() => varianceRatio(worked, { sessions: 2, confidence: 1 })).toThrow(DomainError);
  });
});

describe('the variance over several sessions', () => {
  it('is the sample variance for one', () => {
    fc.assert(
      fc.property(fc.array(fc.double({ min: -1, max: 1, noNaN: true }), { minLength: 2, maxLength: 30 }), (returns) => {
        expect(overlappingVariance(returns, 1)).toBeCloseTo(sampleStatistics(returns).standardDeviation ** 2, 13);
      }),
      { seed: SEED },
    );
  });

  it('is unbiased for independent returns', () => {
    const random = seededRandom(9);
    let total = 0;
    for (let trial = 0; trial < 4000; trial += 1) {
      total += overlappingVariance(
        Array.from({ length: 30 }, () => random.normal()),
        10,
      );
    }
    // One estimate scatters by about 0.75, so the mean of 4,000 by 0.012.
    expect(Math.abs(total / 4000 - 1)).toBeLessThan(0.04);
  });
});

describe('the variance ratio of autocorrelations', () => {
  it('is 0.8512 over 5 sessions where each return takes back a tenth of the last (worked outside this project)', () => {
    const autocorrelations = [1, 2, 3, 4].map((lag) => (-0.1) ** lag);
    expect(varianceRatioOfAutocorrelations(autocorrelations, 5)).toBeCloseTo(0.8512, 4);
  });

  it('makes 1.5 % a session over ten sessions 4.50 % where the ratio is 0.90', () => {
    expect(0.015 * Math.sqrt(10 * varianceRatioOfAutocorrelations([-0.1], 2))).toBeCloseTo(0.045, 4);
  });

  it('is 1 for one session and leaves out later lags', () => {
    expect(varianceRatioOfAutocorrelations([0.5, 0.5], 1)).toBe(1);
    expect(varianceRatioOfAutocorrelations([0.5, 0.9], 2)).toBe(1.5);
  });

  it('refuses what is no correlation, naming the lag', () => {
    const run = () => varianceRatioOfAutocorrelations([0.1, 1.1], 3);
    expect(run).toThrow(
      expect.objectContaining({ code: 'autocorrelation-out-of-range', details: { lag: 2, autocorrelation: 1.1 } }),
    );
  });
});
