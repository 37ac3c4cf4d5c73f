import { normalCumulative } from '@/journal/distributions/normal-distribution';
import { DomainError } from '@/journal/errors/domain-error';
import { christoffersenTest } from '@/journal/scoring/christoffersen-test';
import { kupiecTest } from '@/journal/scoring/kupiec-test';
import { wilsonInterval } from '@/journal/scoring/wilson-interval';

export interface BandCoverage {
  /** Half width of the band in standard deviations. */
  readonly deviations: number;
  /** Share of outcomes that belongs inside: 2 x Phi(deviations) - 1. */
  readonly stated: number;
  readonly hits: number;
  readonly count: number;
  readonly observed: number;
  /** 95 % Wilson interval of the observed share. */
  readonly low: number;
  readonly high: number;
  readonly kupiec: { readonly likelihoodRatio: number; readonly pValue: number };
  /** Null when the sequence cannot tell. */
  readonly clustering: { readonly likelihoodRatio: number; readonly pValue: number } | null;
}

/**
 * How often outcomes fell inside the bands of 1, 2 and 3 standard deviations that went with their forecasts.
 * @param places each outcome's place in its own forecast distribution, 0 to 1, in the order of time, at least one. A place belongs to a
 *   band when it lies in its central share, so that bands fitted with fat tails are judged by their own tails.
 * @param deviations half widths, each above 0.
 * @throws {DomainError} `values-missing`, `probability-invalid` with the index, `deviations-invalid`.
 * @see Wilson (1927); Kupiec (1995); Christoffersen (1998): see the functions for each.
 */
export function bandCoverage(places: readonly number[], deviations: readonly number[] = [1, 2, 3]): BandCoverage[] {
  if (places.length === 0) throw new DomainError('values-missing');
  for (const [index, place] of places.entries()) {
    if (!(place >= 0 && place <= 1)) throw new DomainError('probability-invalid', { index, probability: place });
  }
  return deviations.map((deviation) => {
    if (!(deviation > 0 && deviation < Infinity)) throw new DomainError('deviations-invalid', { deviation });
    const tail = normalCumulative(-deviation);
    const misses = places.map((place) => place < tail || place > 1 - tail);
    const count = places.length;
    const hits = misses.filter((isMiss) => !isMiss).length;
    // So far out no double lies between the share and 1: a test against certainty has no meaning.
    const stated = Math.min(1 - 2 * tail, 1 - Number.EPSILON);
    return {
      deviations: deviation,
      stated,
      hits,
      count,
      observed: hits / count,
      ...wilsonInterval({ hits, count }),
      kupiec: kupiecTest({ hits, count, stated }),
      clustering: count < 2 ? null : christoffersenTest(misses),
    };
  });
}
