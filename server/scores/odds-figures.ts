import { calibrationCurve, type CalibrationBin } from '@/journal/scoring/calibration-curve';
import { countAgainstForecast } from '@/journal/scoring/calibration-test';
import { brierScore, meanBrierScore } from '@/journal/scoring/brier-score';
import { comparePaired } from '@/journal/scoring/clustered-mean';
import { clusteredMeanInterval } from '@/journal/scoring/clustered-mean-interval';
import { corpDecomposition } from '@/journal/scoring/corp-decomposition';
import { clippedLogScore, meanClippedLogScore } from '@/journal/scoring/log-score';
import { reliabilityBand } from '@/journal/scoring/reliability-band';
import { sampled, type SampleOptions } from '@/server/scores/sampled';
import { callClusters, effectiveCount, type ScoredCall } from '@/server/scores/score-clusters';
import { type Scores } from '@/shared/scores/scores';

/** The same record gives the same band. */
const SEED = 1;
/** More corners than a chart shows apart. */
const MOST_CORNERS = 200;

interface OddsReport {
  readonly odds: Scores['odds'];
  /** The tenths of the curve, for the sentence; none while there are too few. */
  readonly bins: readonly CalibrationBin[];
}

/** Whether stated odds came true: the curve, the scores and their parts. */
export function oddsFigures(calls: readonly ScoredCall[], options: SampleOptions): OddsReport {
  const forecasts = calls.map(({ odds }) => odds.probability);
  const outcomes = calls.map(({ odds }) => odds.happened);
  const spoken: CalibrationBin[] = [];
  const odds = sampled(calls.length, options, () => {
    const { bins, points } = calibrationCurve(forecasts, outcomes);
    spoken.push(...bins);
    const { expected, observed, z } = countAgainstForecast(forecasts, outcomes);
    return {
      effectiveCount: effectiveCount(
        calls.map(({ odds: { probability, happened } }) => Number(happened) - probability),
        callClusters(calls),
      ),
      events: observed,
      expectedEvents: expected,
      z,
      brier: corpDecomposition(forecasts, outcomes),
      log: corpDecomposition(forecasts, outcomes, 'log'),
      clippedCount: meanClippedLogScore(forecasts, outcomes).clippedCount,
      bins: bins.map(({ forecast, observed: seen, count, consistentLow, consistentHigh }) => ({
        forecast,
        observed: seen,
        count,
        low: consistentLow,
        high: consistentHigh,
      })),
      curve: corners(points.map(({ probability, observed: seen }) => ({ forecast: probability, observed: seen }))),
      band: reliabilityBand(forecasts, { seed: SEED }).points.map(({ probability, low, high }) => ({
        forecast: probability,
        low,
        high,
      })),
    };
  });
  return { odds, bins: spoken };
}

/** Of odds sealed after the first fill. */
export function lateFigures(calls: readonly ScoredCall[], options: SampleOptions): Scores['late'] {
  const forecasts = calls.map(({ odds }) => odds.probability);
  const outcomes = calls.map(({ odds }) => odds.happened);
  return sampled(calls.length, options, () => ({
    stated: forecasts.reduce((sum, one) => sum + one, 0) / forecasts.length,
    observed: outcomes.filter(Boolean).length / outcomes.length,
    brierScore: meanBrierScore(forecasts, outcomes),
  }));
}

/** One's own odds against those of the market on the same calls. */
export function marketFigures(calls: readonly ScoredCall[], options: SampleOptions): Scores['market'] {
  const pairs = calls.flatMap((call) =>
    call.odds.marketImplied === null ? [] : [{ call, market: call.odds.marketImplied }],
  );
  const clusters = callClusters(pairs.map(({ call }) => call));
  const paired = (score: (forecast: number, happened: boolean) => number) => {
    const scores = pairs.map(({ call: { odds } }) => score(odds.probability, odds.happened));
    const otherScores = pairs.map(({ call: { odds }, market }) => score(market, odds.happened));
    const compared = comparePaired({ scores, otherScores, clusters });
    const interval = clusteredMeanInterval(compared);
    return {
      own: meanOf(scores),
      market: meanOf(otherScores),
      difference: compared.mean,
      allowance: interval === null ? null : (interval.high - interval.low) / 2,
    };
  };
  return sampled(pairs.length, options, () => ({
    brier: paired(brierScore),
    log: paired((forecast, happened) => clippedLogScore(forecast, happened).score),
  }));
}

const meanOf = (values: readonly number[]) => values.reduce((sum, one) => sum + one, 0) / values.length;

type CurvePoint = NonNullable<Scores['odds']['figures']>['curve'][number];

/** Both ends of each level part of a rising curve, evenly thinned when they are more than a chart shows. */
function corners(points: readonly CurvePoint[]): CurvePoint[] {
  const kept = points.filter(
    ({ observed }, index) => observed !== points[index - 1]?.observed || observed !== points[index + 1]?.observed,
  );
  const step = Math.max(1, (kept.length - 1) / (MOST_CORNERS - 1));
  const shown = Array.from({ length: Math.min(kept.length, MOST_CORNERS) }, (_, index) => Math.round(index * step));
  return shown.flatMap((index) => kept[index] ?? []);
}
