import { fitGarch, garchLogLikelihood, garchTotalVariance, garchVariances } from '@/journal/volatility-forecast/garch';
import { studentForecast } from '@/journal/volatility-forecast/forecast-density';
import { garchReturns } from '@/tests/journal/volatility-forecast/invented-series';

const squaresOf = (returns: readonly number[]) => returns.map((value) => value * value);

describe('GARCH(1,1)', () => {
  it('finds the parameters of 8,000 simulated returns again', () => {
    const returns = garchReturns(8000, 3, { deviation: 0.01, reaction: 0.08, persistence: 0.97, degrees: 6 });
    const fitted = fitGarch(returns, squaresOf(returns), 'student');
    expect(fitted.reaction).toBeCloseTo(0.08, 1);
    expect(Math.abs(fitted.persistence - 0.97)).toBeLessThan(0.015);
    expect(Math.abs((fitted.degreesOfFreedom ?? 0) - 6)).toBeLessThan(1);
  });

  it('has the likelihood that the densities of the single sessions multiply to', () => {
    const returns = garchReturns(300, 4, { deviation: 0.01, reaction: 0.1, persistence: 0.95, degrees: 5 });
    const model = { longRunVariance: 1e-4, reaction: 0.1, persistence: 0.95, degreesOfFreedom: 5 };
    const variances = garchVariances(model, squaresOf(returns));
    const sum = returns.reduce((total, value, index) => {
      const deviation = Math.sqrt(variances[index] ?? 0);
      return total + studentForecast({ location: 0, deviation, degreesOfFreedom: 5 }).logDensity(value);
    }, 0);
    expect(garchLogLikelihood(model, returns, squaresOf(returns))).toBeCloseTo(sum, 7);
  });

  it('is at a place that no small change of a parameter makes likelier', () => {
    const returns = garchReturns(1500, 9, { deviation: 0.012, reaction: 0.09, persistence: 0.96, degrees: null });
    const squares = squaresOf(returns);
    const best = fitGarch(returns, squares, 'normal');
    const top = garchLogLikelihood(best, returns, squares);
    for (const change of [-0.005, 0.005]) {
      expect(garchLogLikelihood({ ...best, reaction: best.reaction + change }, returns, squares)).toBeLessThan(
        top + 0.01,
      );
      const persistence = Math.min(best.persistence + change, 0.999);
      expect(garchLogLikelihood({ ...best, persistence }, returns, squares)).toBeLessThan(top + 0.01);
    }
  });

  it('sums the variances of the coming sessions', () => {
    const model = { longRunVariance: 1e-4, reaction: 0.1, persistence: 0.9 };
    let variance = 4e-4;
    let sum = 0;
    for (let session = 0; session < 21; session += 1) {
      sum += variance;
      variance = 1e-4 + 0.9 * (variance - 1e-4);
    }
    expect(garchTotalVariance(model, { nextVariance: 4e-4, sessions: 21 })).toBeCloseTo(sum, 12);
  });

  it.each([
    ['too-few-returns', new Array<number>(20).fill(0.01)],
    ['returns-constant', new Array<number>(30).fill(0)],
  ])('throws %s', (code, returns) => {
    expect(() => fitGarch(returns, squaresOf(returns), 'normal')).toThrow(code);
  });
});
