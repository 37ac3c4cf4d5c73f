import { filterReturns } from '@/journal/odds/filter-returns';
import { resampleStandardised } from '@/journal/odds/resample-standardised';
import { resampledOdds } from '@/journal/odds/resampled-odds';
import { resampleTotalReturns } from '@/journal/odds/resample-total-returns';
import { sampledOdds } from '@/journal/odds/sampled-odds';
import { seededRandom } from '@/journal/random/seeded-random';
import { drawFrom } from '@/tests/journal/any-input/draw';
import { verdictOn } from '@/tests/journal/any-input/answers-cleanly';
import { runs } from '@/tests/journal/deep-runs';

const even = [-0.02, -0.01, 0, 0.01, 0.02];
const request = { logReturns: even, sessions: 2, paths: 100_000, seed: 20261201, blockLength: 1 };
const source = (() => {
  const random = seededRandom(3);
  return Array.from({ length: 250 }, () => 0.012 * random.normal() + 0.001);
})();
const varianceOf = (values: Float64Array) =>
  values.reduce((sum, value) => sum + value * value, 0) / values.length -
  (values.reduce((sum, value) => sum + value, 0) / values.length) ** 2;

describe('odds by drawing past returns anew', () => {
  it.each(['moving', 'stationary'] as const)('has 6 in 25 of two draws of ±2, ±1, 0 %% making 2 %% (%s)', (method) => {
    const paths = resampleTotalReturns({ ...request, method });
    const { probability, monteCarloError } = resampledOdds({
      paths,
      spotPrice: 100,
      event: { kind: 'above', level: 100 * Math.exp(0.02 - 1e-9) },
    });
    expect(Math.abs(probability - 0.24)).toBeLessThanOrEqual(4 * monteCarloError);
    expect(monteCarloError).toBeCloseTo(Math.sqrt((probability * (1 - probability)) / 100_000), 12);
    expect(paths.sourceReturns).toBe(5);
  });

  it('has 1 in 4 of more than 1.98 % from four standardised returns at a volatility of 2 %', () => {
    const paths = resampleStandardised({
      standardised: [-1.5, -0.5, 0.5, 1.5],
      dailyVolatility: 0.02,
      lambda: 0.94,
      sessions: 1,
      paths: 100_000,
      seed: 5,
    });
    const event = { kind: 'above', level: 100 * Math.exp(0.0198) } as const;
    const { probability, monteCarloError } = resampledOdds({ paths, spotPrice: 100, event });
    expect(Math.abs(probability - 0.25)).toBeLessThanOrEqual(4 * monteCarloError);
  });

  it('raises the volatility after a large draw and lowers it after a small one', () => {
    const paths = resampleStandardised({
      standardised: [2],
      dailyVolatility: 0.02,
      lambda: 0.94,
      sessions: 2,
      paths: 1,
      seed: 1,
    });
    expect(paths.totalLogReturns[0]).toBeCloseTo(0.04 * (1 + Math.sqrt(0.94 + 0.06 * 4)), 15);
  });

  it('standardises by the volatility expected before the return was known', () => {
    const { standardised, dailyVolatility } = filterReturns([0.01, -0.03], { lambda: 0.9 });
    const start = (0.0001 + 0.0009) / 2;
    const second = 0.9 * start + 0.1 * 0.0001;
    expect(standardised[0]).toBeCloseTo(0.01 / Math.sqrt(start), 13);
    expect(standardised[1]).toBeCloseTo(-0.03 / Math.sqrt(second), 13);
    expect(dailyVolatility).toBeCloseTo(Math.sqrt(0.9 * second + 0.1 * 0.0009), 15);
  });

  it('draws a moving block of the whole source as it was', () => {
    const logReturns = [0.01, 0.02, -0.04, 0.03];
    const { totalLogReturns, maxLogAtCloses, minLogAtCloses } = resampleTotalReturns({
      logReturns,
      sessions: 4,
      paths: 5,
      seed: 1,
      method: 'moving',
      blockLength: 4,
      removeMean: false,
    });
    for (const [index, total] of totalLogReturns.entries()) {
      expect(total).toBeCloseTo(0.02, 15);
      expect(maxLogAtCloses[index]).toBeCloseTo(0.03, 15);
      expect(minLogAtCloses[index]).toBeCloseTo(-0.01, 15);
    }
  });

  it('keeps the autocorrelation of neighbours in blocks and loses it without', () => {
    const alternating = Array.from({ length: 200 }, (_, index) => (index % 2 === 0 ? 0.01 : -0.01));
    const spread = (blockLength: number) =>
      varianceOf(
        resampleTotalReturns({ ...request, logReturns: alternating, sessions: 20, paths: 5000, blockLength })
          .totalLogReturns,
      );
    expect(spread(20)).toBeLessThan(spread(1) / 4);
  });

  it('spreads variance by sessions, the fraction of one included', () => {
    const wanted = varianceOf(Float64Array.from(source));
    const { totalLogReturns } = resampleTotalReturns({
      ...request,
      logReturns: source,
      sessions: 2.25,
      paths: 200_000,
    });
    expect(varianceOf(totalLogReturns) / (wanted * 2.25)).toBeCloseTo(1, 1);
    const half = resampleTotalReturns({ ...request, logReturns: [0.02, -0.02], sessions: 0.25, paths: 10 });
    for (const total of half.totalLogReturns) expect(Math.abs(total)).toBeCloseTo(0.01, 15);
  });

  it('takes the mean out unless told, and adds a drift by sessions', () => {
    const constant = { ...request, logReturns: [0.01, 0.01, 0.01], sessions: 1.5, paths: 3 };
    expect(resampleTotalReturns(constant).totalLogReturns[0]).toBeCloseTo(0, 15);
    expect(resampleTotalReturns({ ...constant, logDriftPerSession: 0.002 }).totalLogReturns[0]).toBeCloseTo(0.003, 15);
    const kept = resampleTotalReturns({ ...constant, removeMean: false });
    expect(kept.totalLogReturns[0]).toBeCloseTo(0.01 + 0.01 * Math.SQRT1_2, 15);
  });

  it.each(['moving', 'stationary', 'filtered'] as const)(
    'gives the same paths for the same seed, others for another (%s)',
    (method) => {
      const ask = (seed: number) =>
        resampleTotalReturns({ logReturns: source, sessions: 21, paths: 200, seed, method }).totalLogReturns;
      expect(ask(1)).toEqual(ask(1));
      expect(ask(1)).not.toEqual(ask(2));
    },
  );

  it('touches at closes at least as often as it finishes beyond, and sides sum to 1', () => {
    const paths = resampleTotalReturns({ logReturns: source, sessions: 10, paths: 5000, seed: 9 });
    const ask = (event: Parameters<typeof resampledOdds>[0]['event']) =>
      resampledOdds({ paths, spotPrice: 100, event }).probability;
    for (const level of [94, 98, 103, 106]) {
      const beyond = ask({ kind: level > 100 ? 'above' : 'below', level });
      expect(ask({ kind: 'touch-at-closes', level })).toBeGreaterThanOrEqual(beyond);
    }
    const parts = ask({ kind: 'below', level: 98 }) + ask({ kind: 'between', lowerLevel: 98, upperLevel: 103 });
    expect(parts + ask({ kind: 'above', level: 103 })).toBeCloseTo(1, 12);
    expect(ask({ kind: 'touch-at-closes', level: 100 })).toBe(1);
  });

  it('never calls what no path did impossible, nor what all did certain', () => {
    expect(sampledOdds({ hits: 0, paths: 10_000 }).bound).toEqual({ kind: 'below', probability: 1e-4 });
    expect(sampledOdds({ hits: 10_000, paths: 10_000 }).bound).toEqual({ kind: 'above', probability: 0.9999 });
    expect(sampledOdds({ hits: 3000, paths: 10_000 })).toMatchObject({ bound: null, probability: 0.3 });
    expect(sampledOdds({ hits: 3000, paths: 10_000 }).monteCarloError).toBeCloseTo(0.0046, 4);
  });

  it.each([
    [{ sessions: 0 }, 'sessions-out-of-range'],
    [{ sessions: NaN }, 'sessions-out-of-range'],
    [{ paths: 1.5 }, 'paths-out-of-range'],
    [{ blockLength: 6 }, 'block-length-out-of-range'],
    [{ logReturns: [0.01] }, 'too-few-returns'],
    [{ logReturns: [0.01, NaN] }, 'return-invalid'],
    [{ seed: 0.5 }, 'seed-invalid'],
    [{ logDriftPerSession: NaN }, 'drift-invalid'],
    [{ method: 'filtered', lambda: 1 }, 'lambda-out-of-range'],
    [{ method: 'filtered', logReturns: [0, 0, 0] }, 'filter-volatility-zero'],
  ] as const)('refuses %j as %s', (change, code) => {
    expect(() => resampleTotalReturns({ ...request, ...change })).toThrow(expect.objectContaining({ code }));
  });

  it('gives numbers or a documented error for any input', () => {
    const draw = drawFrom(seededRandom(20261201));
    for (let run = 0; run < runs(2000, 100_000); run += 1) {
      const question = {
        logReturns: draw.list(8, () => draw.number(-0.05, 0.05)),
        sessions: draw.oneOf([1, 2.3, 1e-9, 5e-324, 0, NaN, Infinity, draw.number(0, 20)]),
        paths: draw.oneOf([1, 3, 20, 0, NaN]),
        seed: run,
        method: draw.oneOf(['moving', 'stationary', 'filtered'] as const),
        blockLength: draw.oneOf([1, 2, 5, 0, NaN]),
        removeMean: draw.oneOf([true, false]),
        lambda: draw.number(0.8, 0.99),
        logDriftPerSession: draw.number(-0.01, 0.01),
      };
      const level = draw.number(90, 110);
      const verdict = verdictOn(() => {
        const paths = resampleTotalReturns(question);
        return [
          paths,
          resampledOdds({ paths, spotPrice: draw.number(99, 101), event: { kind: 'touch-at-closes', level } }),
        ];
      });
      expect(verdict).not.toMatchObject({ kind: 'flawed' });
    }
  });
});
