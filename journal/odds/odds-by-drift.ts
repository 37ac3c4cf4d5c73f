import { type LowBaseHigh } from '@/journal/forecast/forecast';
import { type Drift, logDrift, type LogDriftQuestion } from '@/journal/odds/log-drift';

/** Any odds under each drift, at low, base and high volatility; `ownView` null when there is none. */
export interface OddsByDrift<Odds> {
  readonly riskNeutral: Record<keyof LowBaseHigh, Odds>;
  readonly zeroReturn: Record<keyof LowBaseHigh, Odds>;
  readonly ownView: Record<keyof LowBaseHigh, Odds> | null;
}

/**
 * Works out odds under the three drifts and three volatilities.
 * @param setting.volatility daily, fractions. @param setting.eventVariance on top of dailyVolatility²·sessions, 0 or more; 0 by default.
 * @param setting.ownView ln(E[S]/S) a session, or null.
 * @param odds the figure at a deviation and log drift of the period, e.g. by touchOdds.
 * @throws {DomainError} `drift-invalid`, and what `odds` throws.
 * @see logDrift.
 */
export function oddsByDrift<Odds>(
  setting: Omit<LogDriftQuestion, 'drift' | 'totalVariance'> & {
    readonly volatility: LowBaseHigh;
    readonly eventVariance?: number;
    readonly ownView: number | null;
  },
  odds: (law: { readonly totalDeviation: number; readonly logDrift: number }) => Odds,
): OddsByDrift<Odds> {
  const { volatility, eventVariance = 0, ownView, sessions } = setting;
  const oddsAt = (drift: Drift, dailyVolatility: number) => {
    const totalVariance = dailyVolatility * dailyVolatility * sessions + eventVariance;
    return odds({ totalDeviation: Math.sqrt(totalVariance), logDrift: logDrift({ ...setting, drift, totalVariance }) });
  };
  const under = (drift: Drift) => ({
    low: oddsAt(drift, volatility.low),
    base: oddsAt(drift, volatility.base),
    high: oddsAt(drift, volatility.high),
  });
  return {
    riskNeutral: under({ kind: 'riskNeutral' }),
    zeroReturn: under({ kind: 'zeroReturn' }),
    ownView: ownView === null ? null : under({ kind: 'ownView', expectedLogReturnPerSession: ownView }),
  };
}
