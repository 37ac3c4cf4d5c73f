import { DomainError } from '@/journal/errors/domain-error';

/** Whether the event happened. */
export type Outcome = boolean | 0 | 1;

export interface ScoredForecast {
  /** Probability given to the event, 0 to 1. */
  readonly forecast: number;
  /** 1 when it happened. */
  readonly outcome: 0 | 1;
}

/**
 * Pairs forecasts with their outcomes, checked.
 * @param forecasts probabilities from 0 to 1, at least one.
 * @param outcomes as many, in the same order.
 * @throws {DomainError} `forecasts-missing`, `outcomes-not-matching`, `probability-invalid` or `outcome-invalid` with the index.
 */
export function scoredForecasts(forecasts: readonly number[], outcomes: readonly Outcome[]): ScoredForecast[] {
  if (forecasts.length === 0) throw new DomainError('forecasts-missing');
  if (forecasts.length !== outcomes.length) {
    throw new DomainError('outcomes-not-matching', { forecasts: forecasts.length, outcomes: outcomes.length });
  }
  return forecasts.map((forecast, index) => scoredForecast(forecast, outcomes[index], index));
}

/**
 * One forecast with its outcome, checked; `index` is named in the error.
 * @throws {DomainError} `probability-invalid`, `outcome-invalid`.
 */
export function scoredForecast(forecast: number, outcome: Outcome | undefined, index = 0): ScoredForecast {
  if (!(forecast >= 0 && forecast <= 1)) throw new DomainError('probability-invalid', { index, probability: forecast });
  if (outcome === true || outcome === 1) return { forecast, outcome: 1 };
  if (outcome === false || outcome === 0) return { forecast, outcome: 0 };
  throw new DomainError('outcome-invalid', { index, outcome: String(outcome) });
}
