import { DomainError } from '@/journal/errors/domain-error';

/** Odds counted on a finite number of paths. */
export interface SampledOdds {
  /** Share of the paths, in [0, 1]. */
  readonly probability: number;
  /** Root of p(1 − p)/paths, of one path in all where the share is 0 or 1: what the draws leave open, not what the source does. */
  readonly monteCarloError: number;
  /** What to show instead of 0 or 1, which no number of paths can show; else null. */
  readonly bound: { readonly kind: 'below' | 'above'; readonly probability: number } | null;
  readonly paths: number;
}

/**
 * Odds from a count of paths.
 * @param question.hits whole, 0 to `paths`. @param question.paths whole, from 1.
 * @returns a bound of one path in all, `below` 1/paths or `above` 1 − 1/paths, where all paths agree.
 * @throws {DomainError} `hit-count-invalid`.
 * @see standard error of a share; Efron (1979); bounds: common practice.
 */
export function sampledOdds({ hits, paths }: { readonly hits: number; readonly paths: number }): SampledOdds {
  const isValid = Number.isInteger(hits) && Number.isInteger(paths) && paths >= 1 && hits >= 0 && hits <= paths;
  if (!isValid) throw new DomainError('hit-count-invalid', { hits, paths });
  const probability = hits / paths;
  const share = Math.min(1 - 1 / paths, Math.max(1 / paths, probability));
  return {
    probability,
    monteCarloError: Math.sqrt(Math.max(0, share * (1 - share)) / paths),
    bound: boundOf(hits, paths),
    paths,
  };
}

function boundOf(hits: number, paths: number): SampledOdds['bound'] {
  if (hits === 0) return { kind: 'below', probability: 1 / paths };
  return hits === paths ? { kind: 'above', probability: 1 - 1 / paths } : null;
}
