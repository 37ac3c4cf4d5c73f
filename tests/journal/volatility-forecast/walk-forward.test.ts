import { logReturns } from '@/journal/returns/log-returns';
import { type ForecastMethod } from '@/journal/volatility-forecast/forecast-method';
import { skillHorizons, type SkillRow, walkForward } from '@/journal/volatility-forecast/walk-forward';
import { inventedSeries } from '@/tests/journal/volatility-forecast/invented-series';
import { indexCloses } from '@/tests/reference/index-closes';

const methods: ForecastMethod[] = ['pooled', 'garch-student', 'ewma-94', 'window-63'];
const MINUTES = 60_000;

const scoresOf = (rows: readonly SkillRow[], method: ForecastMethod) =>
  rows.filter((row) => row.method === method).map(({ logScore }) => Number(logScore.toFixed(3)));

describe('walk over the two index series', () => {
  const rows = new Map<string, SkillRow[]>();
  beforeAll(() => {
    for (const series of ['DAX', 'SMI']) rows.set(series, walkForward(logReturns(indexCloses(series)), methods));
  }, 5 * MINUTES);
  const all = (series: string) => rows.get(series) ?? [];
  const mean = (horizon: number, valueOf: (row: SkillRow) => number) => {
    const both = [...all('DAX'), ...all('SMI')].filter((row) => row.horizon === horizon && row.isDefault);
    return both.reduce((sum, row) => sum + valueOf(row) / both.length, 0);
  };

  // Mean log scores at 1, 5 and 21 sessions that were worked out apart in R for these origins.
  it.each([
    ['DAX', 'ewma-94', [3.142, 2.361, 1.546]],
    ['SMI', 'ewma-94', [3.152, 2.465, 1.546]],
    ['DAX', 'window-63', [3.123, 2.372, 1.584]],
    ['SMI', 'window-63', [3.147, 2.448, 1.549]],
  ] as const)(
    'gives on %s the scores of %s to the third digit, so the origins are the same',
    (series, method, scores) => {
      expect(scoresOf(all(series), method)).toEqual(scores);
    },
  );

  // R's fGarch estimates its long run and mean too; here the long run is the mean square: within 0.02.
  it.each([
    ['DAX', [3.109, 2.395, 1.592]],
    ['SMI', [3.158, 2.469, 1.559]],
  ] as const)('gives on %s the scores of GARCH with Student moves that another program had', (series, scores) => {
    scoresOf(all(series), 'garch-student').forEach((score, index) => {
      expect(Math.abs(score - (scores[index] ?? 0))).toBeLessThan(0.02);
    });
  });

  it('scores every method on the same 267 origins, one of them as the default', () => {
    expect(all('DAX')).toHaveLength(methods.length * skillHorizons.length);
    expect(new Set(all('DAX').map(({ forecasts }) => forecasts))).toEqual(new Set([267]));
    expect(
      all('DAX')
        .filter(({ isDefault }) => isDefault)
        .map(({ method }) => method),
    ).toEqual(Array(3).fill('pooled'));
  });

  // 0.01 above the best average of the comparison methods at each horizon.
  it.each([
    [1, 3.157, 3.172],
    [5, 2.442, 2.449],
    [21, 1.5855, 1.636],
  ])('at %s sessions scores at least %s on average by default, and %s as measured', (horizon, aim, measured) => {
    const score = mean(horizon, ({ logScore }) => logScore);
    expect(score).toBeGreaterThanOrEqual(aim);
    expect(score).toBeCloseTo(measured, 3);
  });

  it('covers within two points of 95 % at every horizon, and of 68 % at 1 and 5 sessions', () => {
    for (const horizon of skillHorizons)
      expect(Math.abs(mean(horizon, (row) => row.coverage95) - 0.95)).toBeLessThan(0.02);
    for (const horizon of [1, 5]) expect(Math.abs(mean(horizon, (row) => row.coverage68) - 0.68)).toBeLessThan(0.02);
    // 21 sessions overlap four times: 64 outcomes apart from one another a series, a standard error of some five points.
    expect(mean(21, (row) => row.coverage68)).toBeCloseTo(0.612, 3);
  });
});

describe('walk over invented series', () => {
  const kinds = Object.entries(inventedSeries).map(([name, series]) => ({ name, series }));
  const defaults: SkillRow[] = [];

  it.each(kinds)(
    'loses little to the best of the plain methods on $name',
    ({ series }) => {
      const rows = walkForward(series(), methods);
      for (const horizon of skillHorizons) {
        const at = rows.filter((row) => row.horizon === horizon);
        const best = at.reduce((most, { logScore }) => Math.max(most, logScore), -Infinity);
        const [own] = at.filter(({ isDefault }) => isDefault);
        expect(best - (own?.logScore ?? -Infinity)).toBeLessThan(0.06);
        if (own) defaults.push(own);
      }
    },
    5 * MINUTES,
  );

  it('covers within two points of both bands on average over them', () => {
    expect(defaults).toHaveLength(3 * kinds.length);
    const mean = (valueOf: (row: SkillRow) => number) =>
      defaults.reduce((sum, row) => sum + valueOf(row) / defaults.length, 0);
    expect(Math.abs(mean(({ coverage68 }) => coverage68) - 0.68)).toBeLessThan(0.02);
    expect(Math.abs(mean(({ coverage95 }) => coverage95) - 0.95)).toBeLessThan(0.02);
  });
});

it('refuses a series in which no forecast can be scored', () => {
  expect(() => walkForward(new Array<number>(524).fill(0.01))).toThrow('too-few-returns');
});
