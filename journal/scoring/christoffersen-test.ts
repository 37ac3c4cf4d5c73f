import { normalUpperTail } from '@/journal/distributions/normal-distribution';
import { DomainError } from '@/journal/errors/domain-error';

/**
 * Tests whether misses of a band come in clusters: whether a miss is likelier right after a miss.
 * @param misses in the order of time, at least two.
 * @returns likelihoodRatio 0 or more; pValue from the chi-square distribution with 1 degree of freedom; the rates of a miss after a hit
 *   and after a miss. Null when the sequence cannot tell: no miss or no hit has a follower.
 * @throws {DomainError} `too-few-values`.
 * @see Christoffersen (1998), International Economic Review 39(4), 841-862, section 3.2 (first-order Markov alternative).
 */
export function christoffersenTest(misses: readonly boolean[]): {
  likelihoodRatio: number;
  pValue: number;
  rateAfterHit: number;
  rateAfterMiss: number;
} | null {
  if (misses.length < 2) throw new DomainError('too-few-values', { required: 2, received: misses.length });
  const after = { hit: { misses: 0, count: 0 }, miss: { misses: 0, count: 0 } };
  for (const [index, isMiss] of misses.slice(1).entries()) {
    const state = misses[index] === true ? after.miss : after.hit;
    state.count += 1;
    if (isMiss) state.misses += 1;
  }
  if (after.hit.count === 0 || after.miss.count === 0) return null;
  const pooled = { misses: after.hit.misses + after.miss.misses, count: misses.length - 1 };
  const likelihoodRatio = Math.max(
    0,
    2 * (logLikelihood(after.hit) + logLikelihood(after.miss) - logLikelihood(pooled)),
  );
  return {
    likelihoodRatio,
    pValue: 2 * normalUpperTail(Math.sqrt(likelihoodRatio)),
    rateAfterHit: after.hit.misses / after.hit.count,
    rateAfterMiss: after.miss.misses / after.miss.count,
  };
}

/** Greatest log likelihood of so many misses in so many trials. */
function logLikelihood({ misses, count }: { misses: number; count: number }): number {
  const term = (cases: number) => (cases === 0 ? 0 : cases * Math.log(cases / count));
  return term(misses) + term(count - misses);
}
