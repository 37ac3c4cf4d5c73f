import { normalCumulative } from '@/journal/distributions/normal-distribution';
import { DomainError } from '@/journal/errors/domain-error';
import { type RepricedLeg, valueAtMoment } from '@/journal/scenarios/reprice';

export interface LatticeQuestion {
  readonly legs: readonly RepricedLeg[];
  /** Currency, what opening cost. */
  readonly costToOpen: number;
  readonly spotPrice: number;
  /** Moves of the underlying in total deviations of the hold, highest first. */
  readonly sigmas: readonly number[];
  /** Standard deviation of the log price over the hold: what one sigma is. */
  readonly holdDeviation: number;
  /** Per session: spreads the likelihood. */
  readonly dailyVolatility: number;
  readonly sessionsElapsed: readonly number[];
  readonly sessionsToExpiry: number;
  readonly yearsToExpiry: number;
  readonly ratePerYear: number;
  readonly dividendYield: number;
}

export interface LatticeGrid {
  readonly prices: readonly number[];
  /** [row][column], currency, before closing costs. */
  readonly profit: readonly (readonly number[])[];
  /** [row][column]; sums to 1 down each column. */
  readonly likelihood: readonly (readonly number[])[];
}

/**
 * Profit by move of the underlying and sessions elapsed, every cell repriced in full.
 * Calendar time is taken to pass evenly with the sessions. The likelihood of a cell is that of the moves nearer to its row
 * than to any other, of a driftless log price; at the start all of it is on the row of no move.
 * @throws {DomainError} `lattice-input-invalid`; `reprice-input-invalid` with the leg's index.
 * @see Taleb (1997), Dynamic Hedging, on repricing instead of Greeks near expiry; common practice.
 */
export function latticeGrid(question: LatticeQuestion): LatticeGrid {
  checkLattice(question);
  const { sigmas, spotPrice, holdDeviation, sessionsElapsed, sessionsToExpiry, yearsToExpiry, costToOpen } = question;
  const prices = sigmas.map((sigma) => spotPrice * Math.exp(sigma * holdDeviation));
  const columns = sessionsElapsed.map((elapsed) => {
    const share = sessionsToExpiry > 0 ? Math.max(0, 1 - elapsed / sessionsToExpiry) : 0;
    const valueAt = valueAtMoment(question.legs, {
      sessions: sessionsToExpiry * share,
      years: yearsToExpiry * share,
      ratePerYear: question.ratePerYear,
      dividendYield: question.dividendYield,
    });
    return prices.map((price) => valueAt(price) - costToOpen);
  });
  const likelihoods = sessionsElapsed.map((elapsed) => {
    const deviation = question.dailyVolatility * Math.sqrt(elapsed);
    return rowLikelihoods(sigmas, deviation > 0 ? holdDeviation / deviation : Infinity);
  });
  const turned = (values: readonly (readonly number[])[]) =>
    sigmas.map((_, row) => values.map((column) => column[row] ?? 0));
  return { prices, profit: turned(columns), likelihood: turned(likelihoods) };
}

const FARTHEST_LOG_PRICE = 600;

function checkLattice(question: LatticeQuestion): void {
  const { sigmas, spotPrice, holdDeviation, dailyVolatility, sessionsElapsed, costToOpen } = question;
  const farthest = sigmas.reduce((most, sigma) => Math.max(most, Math.abs(sigma)), 0) * holdDeviation;
  const isValid =
    holdDeviation >= 0 &&
    Math.abs(Math.log(spotPrice)) + farthest < FARTHEST_LOG_PRICE &&
    dailyVolatility >= 0 &&
    dailyVolatility < Infinity &&
    sessionsElapsed.every((elapsed) => elapsed >= 0 && elapsed < Infinity) &&
    question.sessionsToExpiry >= 0 &&
    question.sessionsToExpiry < Infinity &&
    question.yearsToExpiry >= 0 &&
    Math.abs(costToOpen) < Infinity;
  if (!isValid)
    throw new DomainError('lattice-input-invalid', { spotPrice, holdDeviation, dailyVolatility, costToOpen });
}

/** Chance of each row: of the moves between the halfway points to its neighbours, with `scale` deviations a sigma. */
function rowLikelihoods(sigmas: readonly number[], scale: number): number[] {
  const edge = (upper: number | undefined, lower: number | undefined, open: number) => {
    if (upper === undefined || lower === undefined) return open;
    const middle = (upper + lower) / 2;
    return middle === 0 ? 0 : middle * scale;
  };
  return sigmas.map((sigma, row) => {
    const above = edge(sigmas[row - 1], sigma, Infinity);
    const below = edge(sigma, sigmas[row + 1], -Infinity);
    return normalCumulative(above) - normalCumulative(below);
  });
}
