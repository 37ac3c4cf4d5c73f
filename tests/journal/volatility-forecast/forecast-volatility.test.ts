import { forecastMethods, forecastMethodExplanations } from '@/journal/volatility-forecast/forecast-method';
import { forecastVolatility } from '@/journal/volatility-forecast/forecast-volatility';
import { garchReturns } from '@/tests/journal/volatility-forecast/invented-series';

const logReturns = garchReturns(800, 5, { deviation: 0.01, reaction: 0.08, persistence: 0.97, degrees: 6 });

describe.each(forecastMethods)('forecast by %s', (method) => {
  const forecast = forecastVolatility({ logReturns, horizonSessions: 5, method });

  it('is a proper law with its interval about the volatility', () => {
    const { density } = forecast;
    expect(forecast.dailyVolatility * Math.sqrt(5)).toBeCloseTo(forecast.totalDeviation, 12);
    expect(forecast.lowDailyVolatility).toBeLessThan(forecast.dailyVolatility);
    expect(forecast.highDailyVolatility).toBeGreaterThan(forecast.dailyVolatility);
    for (const probability of [0.001, 0.16, 0.5, 0.84, 0.999])
      expect(density.cdf(density.quantile(probability))).toBeCloseTo(probability, 9);
  });

  it('has a density that is the slope of its distribution function', () => {
    const { density } = forecast;
    for (const x of [-0.05, -0.01, 0.003, 0.04]) {
      const slope = (density.cdf(x + 1e-5) - density.cdf(x - 1e-5)) / 2e-5;
      expect(Math.exp(density.logDensity(x)) / slope).toBeCloseTo(1, 4);
    }
  });

  it('scales with the returns, and is the same when asked again', () => {
    const tripled = forecastVolatility({
      logReturns: logReturns.map((value) => 3 * value),
      horizonSessions: 5,
      method,
    });
    expect(tripled.dailyVolatility / forecast.dailyVolatility).toBeCloseTo(3, 6);
    expect(forecastVolatility({ logReturns, horizonSessions: 5, method }).totalDeviation).toBe(forecast.totalDeviation);
  });

  it('has a total deviation that grows with the horizon, fractions too', () => {
    const deviations = [0.25, 1, 1.5, 2, 21].map(
      (horizonSessions) => forecastVolatility({ logReturns, horizonSessions, method }).totalDeviation,
    );
    expect([...deviations].sort((left, right) => left - right)).toEqual(deviations);
  });

  it('keeps a finite law through a crash, and through half a year without a move', () => {
    const odd = [...logReturns.slice(0, 300), ...new Array<number>(126).fill(0), -0.6, ...logReturns.slice(427)];
    for (const horizonSessions of [1, 21]) {
      const { density, dailyVolatility } = forecastVolatility({ logReturns: odd, horizonSessions, method });
      expect(dailyVolatility).toBeGreaterThan(0);
      expect(Number.isFinite(density.logDensity(-1))).toBe(true);
    }
  });

  it('is explained', () => {
    expect(forecastMethodExplanations[method].split(/[.;] /).length).toBeGreaterThanOrEqual(2);
  });
});

it('is not thrown off for months by one crash', () => {
  const calm = logReturns.slice(0, 700);
  const crashed = [...calm.slice(0, 650), -0.3, ...calm.slice(651)];
  const ratio = (method: 'pooled' | 'garch-normal') =>
    forecastVolatility({ logReturns: crashed, horizonSessions: 21, method }).dailyVolatility /
    forecastVolatility({ logReturns: calm, horizonSessions: 21, method }).dailyVolatility;
  expect(ratio('pooled')).toBeLessThan(1.25);
  expect(ratio('pooled')).toBeLessThan(ratio('garch-normal'));
});

it('looks at the last 2,520 returns only', () => {
  const long = [
    ...new Array<number>(500).fill(0.2),
    ...garchReturns(2520, 6, { deviation: 0.01, reaction: 0.05, persistence: 0.97, degrees: 6 }),
  ];
  const { returnsUsed, dailyVolatility } = forecastVolatility({ logReturns: long, horizonSessions: 1 });
  expect(returnsUsed).toBe(2520);
  expect(dailyVolatility).toBe(forecastVolatility({ logReturns: long.slice(500), horizonSessions: 1 }).dailyVolatility);
});

it.each([
  ['too-few-returns', { logReturns: logReturns.slice(0, 62), horizonSessions: 1 }],
  ['return-invalid', { logReturns: [...logReturns, Number.NaN], horizonSessions: 1 }],
  ['returns-constant', { logReturns: new Array<number>(100).fill(0), horizonSessions: 1 }],
  ['horizon-invalid', { logReturns, horizonSessions: 0 }],
  ['horizon-invalid', { logReturns, horizonSessions: Number.NaN }],
  ['confidence-out-of-range', { logReturns, horizonSessions: 1, confidence: 1 }],
] as const)('throws %s', (code, question) => {
  expect(() => forecastVolatility(question)).toThrow(code);
});
