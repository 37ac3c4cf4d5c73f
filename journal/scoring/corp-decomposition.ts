import { meanClippedLogScore } from '@/journal/scoring/log-score';
import { meanBrierScore } from '@/journal/scoring/brier-score';
import { calibratedForecasts } from '@/journal/scoring/calibrated-forecasts';
import { type Outcome } from '@/journal/scoring/outcome';

export type ProperScore = 'brier' | 'log';

export interface CorpDecomposition {
  readonly score: number;
  /** What calibrating the forecasts after the event would have gained; 0 is best. */
  readonly miscalibration: number;
  /** What the calibrated forecasts gain over always saying the base rate; more is better. */
  readonly discrimination: number;
  /** The score of always saying the base rate. */
  readonly uncertainty: number;
}

/**
 * Splits a mean score exactly, without a choice of bins: score = miscalibration - discrimination + uncertainty, by comparing the
 * forecasts with their isotonic calibration and with the base rate.
 * @param forecasts probabilities 0 to 1, at least one. @param outcomes as many.
 * @param score 'log' is the clipped log score (logScoreFloor), so that every term is finite.
 * @returns each term 0 or more, but for rounding.
 * @throws {DomainError} as scoredForecasts.
 * @see Dimitriadis, Gneiting and Jordan (2021), Proceedings of the National Academy of Sciences 118(8), eq. 2.
 */
export function corpDecomposition(
  forecasts: readonly number[],
  outcomes: readonly Outcome[],
  score: ProperScore = 'brier',
): CorpDecomposition {
  const meanOf = (said: readonly number[]) =>
    score === 'brier' ? meanBrierScore(said, outcomes) : meanClippedLogScore(said, outcomes).score;
  const given = meanOf(forecasts);
  const calibrated = meanOf(calibratedForecasts(forecasts, outcomes));
  const baseRate = outcomes.reduce((sum: number, outcome) => sum + Number(outcome), 0) / outcomes.length;
  const uncertainty = meanOf(new Array<number>(outcomes.length).fill(baseRate));
  return {
    score: given,
    miscalibration: given - calibrated,
    discrimination: uncertainty - calibrated,
    uncertainty,
  };
}
