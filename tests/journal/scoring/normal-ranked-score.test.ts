import { normalRankedScore } from '@/journal/scoring/normal-ranked-score';

describe('normalRankedScore', () => {
  it.each([
    [0, 0.2337],
    [0.9102, 0.5431],
    [-0.9102, 0.5431],
  ])('of an outcome %d deviations out is %d deviations', (z, score) => {
    expect(normalRankedScore({ mean: 2, standardDeviation: 3, observed: 2 + 3 * z }) / 3).toBeCloseTo(score, 4);
  });

  it('nears the absolute error as the forecast loses its spread', () => {
    expect(normalRankedScore({ mean: 1, standardDeviation: 1e-9, observed: 1.4 })).toBeCloseTo(0.4, 8);
  });

  it.each([
    { mean: NaN },
    { standardDeviation: 0 },
    { standardDeviation: -1 },
    { standardDeviation: Infinity },
    { observed: Infinity },
  ])('refuses %p', (bad) => {
    expect(() => normalRankedScore({ mean: 0, standardDeviation: 1, observed: 0, ...bad })).toThrow(
      expect.objectContaining({ code: 'normal-forecast-invalid' }),
    );
  });
});
