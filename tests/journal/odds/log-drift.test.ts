import { type Drift, logDrift } from '@/journal/odds/log-drift';

const period = { totalVariance: 0.00225, sessions: 10, years: 14 / 365, ratePerYear: 0.04, dividendYield: 0.01 };

describe('log drift', () => {
  it('leaves the expected price where it is under zero return', () => {
    expect(logDrift({ drift: { kind: 'zeroReturn' }, ...period })).toBe(-0.001125);
  });

  it('carries rate less yield over calendar time when risk-neutral', () => {
    expect(logDrift({ drift: { kind: 'riskNeutral' }, ...period })).toBeCloseTo((0.03 * 14) / 365 - 0.001125, 16);
  });

  it('carries an own view over sessions', () => {
    const drift: Drift = { kind: 'ownView', expectedLogReturnPerSession: 0.002 };
    expect(logDrift({ drift, ...period })).toBeCloseTo(0.02 - 0.001125, 16);
  });

  it('is the zero-return drift for an own view of nothing', () => {
    const drift: Drift = { kind: 'ownView', expectedLogReturnPerSession: 0 };
    expect(logDrift({ drift, ...period })).toBe(logDrift({ drift: { kind: 'zeroReturn' }, ...period }));
  });

  it.each([
    { drift: { kind: 'zeroReturn' }, totalVariance: -0.1 },
    { drift: { kind: 'zeroReturn' }, totalVariance: NaN },
    { drift: { kind: 'riskNeutral' }, ratePerYear: NaN },
    { drift: { kind: 'ownView', expectedLogReturnPerSession: NaN } },
    { drift: { kind: 'ownView', expectedLogReturnPerSession: Infinity } },
  ] as const)('throws drift-invalid for %j', (change) => {
    expect(() => logDrift({ ...period, ...change })).toThrow(expect.objectContaining({ code: 'drift-invalid' }));
  });
});
