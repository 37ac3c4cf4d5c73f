import { type BinnedDecomposition, binnedDecomposition } from '@/journal/scoring/binned-decomposition';
import { brierSkill } from '@/journal/scoring/brier-score';
import { type CalibrationCurve, calibrationCurve } from '@/journal/scoring/calibration-curve';
import { type CountAgainstForecast, countAgainstForecast, spiegelhalterTest } from '@/journal/scoring/calibration-test';
import { meanClippedLogScore } from '@/journal/scoring/log-score';
import { type MurphyDecomposition, murphyDecomposition } from '@/journal/scoring/murphy-decomposition';
import { type Outcome } from '@/journal/scoring/outcome';
import { type SampleRule, sampleSizeRule } from '@/journal/scoring/sample-size-rule';

export interface ForecastScores {
  readonly meanBrierScore: number;
  /** With probabilities below logScoreFloor raised to it; to be shown with how many were. */
  readonly meanLogScore: number;
  readonly clippedCount: number;
  readonly baseRate: number;
  /** Against always saying the base rate; null when all or none happened. */
  readonly skill: number | null;
  /** By distinct forecasts: exact, but with nearly every forecast distinct its reliability says nothing. */
  readonly decomposition: MurphyDecomposition;
  /** In ten bins, for forecasts of many values. */
  readonly binned: BinnedDecomposition;
  readonly count: CountAgainstForecast;
  readonly spiegelhalter: { readonly z: number; readonly pValue: number } | null;
  readonly curve: CalibrationCurve;
}

export interface ScoringSummary {
  readonly count: number;
  readonly sampleRule: SampleRule;
  /** Null while the sample is too small for any rate. */
  readonly scores: ForecastScores | null;
}

/**
 * All scores of a set of resolved forecasts, however few.
 * @param forecasts probabilities 0 to 1, at least one. @param outcomes as many.
 * @throws {DomainError} as scoredForecasts.
 */
export function forecastScores(forecasts: readonly number[], outcomes: readonly Outcome[]): ForecastScores {
  const decomposition = murphyDecomposition(forecasts, outcomes);
  const logScores = meanClippedLogScore(forecasts, outcomes);
  const { brierScore, uncertainty, baseRate } = decomposition;
  return {
    meanBrierScore: brierScore,
    meanLogScore: logScores.score,
    clippedCount: logScores.clippedCount,
    baseRate,
    skill: brierSkill({ score: brierScore, referenceScore: uncertainty }),
    decomposition,
    binned: binnedDecomposition(forecasts, outcomes),
    count: countAgainstForecast(forecasts, outcomes),
    spiegelhalter: spiegelhalterTest(forecasts, outcomes),
    curve: calibrationCurve(forecasts, outcomes),
  };
}

/**
 * What a reader may be shown of a set of resolved forecasts: no rates while there are too few.
 * @param forecasts probabilities 0 to 1; may be none. @param outcomes as many.
 * @throws {DomainError} as scoredForecasts, once there are enough for rates.
 */
export function scoringSummary(forecasts: readonly number[], outcomes: readonly Outcome[]): ScoringSummary {
  const sampleRule = sampleSizeRule(forecasts.length);
  return {
    count: forecasts.length,
    sampleRule,
    scores: sampleRule === 'list-only' ? null : forecastScores(forecasts, outcomes),
  };
}
