import { type Outcome, scoredForecasts } from '@/journal/scoring/outcome';
import { type ClosedEdge, inTenBins } from '@/journal/scoring/ten-bins';

export interface ForecastBin {
  /** 0 to 9. */
  readonly bin: number;
  readonly count: number;
  /** Mean of the bin's forecasts. */
  readonly forecast: number;
  /** How often the bin's events happened. */
  readonly observed: number;
}

export interface BinnedDecomposition {
  readonly brierScore: number;
  readonly reliability: number;
  readonly resolution: number;
  readonly uncertainty: number;
  /** Spread of forecasts inside their bins: makes the score larger than the first three terms say. */
  readonly withinBinVariance: number;
  /** What that spread gained: twice the covariance of forecast and outcome inside the bins. */
  readonly withinBinCovariance: number;
  /** Bins that hold a forecast. */
  readonly bins: readonly ForecastBin[];
}

/**
 * Splits the mean Brier score exactly for forecasts of many values, in ten bins of width 0.1 with the bin's mean forecast as its
 * value: score = reliability - resolution + uncertainty + withinBinVariance - withinBinCovariance.
 * @param closed which edge belongs to a bin.
 * @throws {DomainError} as scoredForecasts.
 * @see Stephenson, Coelho and Jolliffe (2008), Weather and Forecasting 23(4), 752-757.
 */
export function binnedDecomposition(
  forecasts: readonly number[],
  outcomes: readonly Outcome[],
  closed: ClosedEdge = 'left',
): BinnedDecomposition {
  const pairs = scoredForecasts(forecasts, outcomes);
  const { length: count } = pairs;
  const baseRate = pairs.reduce((sum, { outcome }) => sum + outcome, 0) / count;
  const bins: ForecastBin[] = [];
  const terms = { reliability: 0, resolution: 0, withinBinVariance: 0, withinBinCovariance: 0 };
  for (const [bin, members] of inTenBins(pairs, ({ forecast }) => forecast, closed).entries()) {
    if (members.length === 0) continue;
    const forecast = members.reduce((sum, member) => sum + member.forecast, 0) / members.length;
    const observed = members.reduce((sum, { outcome }) => sum + outcome, 0) / members.length;
    bins.push({ bin, count: members.length, forecast, observed });
    terms.reliability += (members.length * (forecast - observed) ** 2) / count;
    terms.resolution += (members.length * (observed - baseRate) ** 2) / count;
    for (const member of members) {
      terms.withinBinVariance += (member.forecast - forecast) ** 2 / count;
      terms.withinBinCovariance += (2 * (member.forecast - forecast) * (member.outcome - observed)) / count;
    }
  }
  const brierScore = pairs.reduce((sum, { forecast, outcome }) => sum + (forecast - outcome) ** 2, 0) / count;
  return { brierScore, uncertainty: baseRate * (1 - baseRate), bins, ...terms };
}
