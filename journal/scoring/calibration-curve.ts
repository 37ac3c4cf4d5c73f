import { consistencyInterval } from '@/journal/scoring/consistency-interval';
import { isotonicRegression } from '@/journal/scoring/isotonic-regression';
import { groupByForecast } from '@/journal/scoring/murphy-decomposition';
import { type Outcome, scoredForecasts } from '@/journal/scoring/outcome';
import { inTenBins } from '@/journal/scoring/ten-bins';
import { wilsonInterval } from '@/journal/scoring/wilson-interval';

export interface CalibrationPoint {
  /** A probability that was said. */
  readonly probability: number;
  /** The calibrated probability: the frequency fitted so that it never falls as the forecast rises. */
  readonly observed: number;
  readonly count: number;
}

export interface CalibrationBin {
  /** Mean of the bin's forecasts. */
  readonly forecast: number;
  /** How often its events happened. */
  readonly observed: number;
  readonly count: number;
  /** 95 % Wilson interval of the frequency. */
  readonly low: number;
  readonly high: number;
  /** Where the frequency would fall 90 % of the time were the forecasts right. */
  readonly consistentLow: number;
  readonly consistentHigh: number;
}

export interface CalibrationCurve {
  /** One a distinct forecast, rising. */
  readonly points: readonly CalibrationPoint[];
  /** Bins of width 0.1 that hold a forecast, rising; an edge belongs to the bin above it. */
  readonly bins: readonly CalibrationBin[];
}

/**
 * The reliability curve, without a choice of bins (isotonic fit by pooled adjacent violators), and for the eye ten bins beside it.
 * @param forecasts probabilities 0 to 1, at least one. @param outcomes as many.
 * @throws {DomainError} as scoredForecasts.
 * @see Dimitriadis, Gneiting and Jordan (2021), Proceedings of the National Academy of Sciences 118(8) (CORP).
 */
export function calibrationCurve(forecasts: readonly number[], outcomes: readonly Outcome[]): CalibrationCurve {
  const groups = groupByForecast(forecasts, outcomes);
  const fitted = isotonicRegression(groups.map(({ observed, weight }) => ({ value: observed, weight })));
  const points = groups.map(({ forecast, weight, observed }, index) => ({
    probability: forecast,
    observed: fitted[index] ?? observed,
    count: weight,
  }));
  const bins = inTenBins(scoredForecasts(forecasts, outcomes), ({ forecast }) => forecast)
    .filter((members) => members.length > 0)
    .map((members) => {
      const count = members.length;
      const hits = members.reduce((sum, { outcome }) => sum + outcome, 0);
      const consistent = consistencyInterval(members.map(({ forecast }) => forecast));
      return {
        forecast: members.reduce((sum, { forecast }) => sum + forecast, 0) / count,
        observed: hits / count,
        count,
        ...wilsonInterval({ hits, count }),
        consistentLow: consistent.low,
        consistentHigh: consistent.high,
      };
    });
  return { points, bins };
}
