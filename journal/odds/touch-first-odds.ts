import { expMinusHalfSquare, normalUpperTail, scaledUpperTail } from '@/journal/distributions/normal-distribution';
import { DomainError } from '@/journal/errors/domain-error';

/** Two levels about the spot price, and the law of its log price over a period. */
export interface TouchFirstQuestion {
  /** Strictly between the levels. */
  readonly spotPrice: number;
  readonly lowerLevel: number;
  readonly upperLevel: number;
  /** Standard deviation of the log price over the period, 0 or more. */
  readonly totalDeviation: number;
  /** Mean of the log price change over the period. */
  readonly logDrift: number;
}

/** Which of two levels is reached first. They sum to 1. */
export interface TouchFirstOdds {
  readonly upperFirst: number;
  readonly lowerFirst: number;
  readonly neither: number;
}

/** Distances and drift in deviations of the period. */
interface Corridor {
  readonly toNear: number;
  readonly toFar: number;
  readonly drift: number;
}

/** Width in deviations from which images converge faster than waves. */
const WIDE = 2;
const IMAGES = 6;
const WAVES = 8;
/** Distances in deviations past which chance plays no part and squares might overflow. */
const CERTAIN = 1e100;
/** Distances in deviations that leave no time for a drift to show. */
const VANISHING = 1e-290;

/**
 * Odds that one of two levels is reached before the other within a period, watched without a break: a target before a stop.
 * @returns each in [0, 1], absolute error about 1e-14. Without deviation the drift decides.
 * @throws {DomainError} `touch-first-question-invalid` naming every value.
 * @see Cox and Miller (1965), The Theory of Stochastic Processes, 5.7, both series: images (also Kunitomo and Ikeda 1992,
 *   Mathematical Finance 2) where the levels lie far apart, waves (eigenfunctions) where they lie near; geometric Brownian motion.
 */
export function touchFirstOdds(question: TouchFirstQuestion): TouchFirstOdds {
  check(question);
  const { spotPrice, lowerLevel, upperLevel, totalDeviation, logDrift } = question;
  const up = Math.log(upperLevel / spotPrice);
  const down = Math.log(spotPrice / lowerLevel);
  const toUpper = up / totalDeviation;
  const toLower = down / totalDeviation;
  const drift = logDrift / totalDeviation;
  if (!(toUpper + toLower + Math.abs(drift) < CERTAIN)) return withoutChance({ up, down, logDrift });
  if (!(Math.min(toUpper, toLower) > VANISHING)) {
    const upperFirst = down / (up + down);
    return { upperFirst, lowerFirst: 1 - upperFirst, neither: 0 };
  }
  const upward: Corridor = { toNear: toUpper, toFar: toLower, drift };
  const downward: Corridor = { toNear: toLower, toFar: toUpper, drift: -drift };
  if (toUpper + toLower >= WIDE) {
    const upperFirst = within01(byImages(upward));
    const lowerFirst = Math.min(1 - upperFirst, within01(byImages(downward)));
    return { upperFirst, lowerFirst, neither: within01(1 - upperFirst - lowerFirst) };
  }
  const [laterUp, laterDown] = [within01(laterByWaves(upward)), within01(laterByWaves(downward))];
  const upperFirst = within01(ever(upward) - laterUp);
  return { upperFirst, lowerFirst: within01(ever(downward) - laterDown), neither: within01(laterUp + laterDown) };
}

function check({ spotPrice, lowerLevel, upperLevel, totalDeviation, logDrift }: TouchFirstQuestion): void {
  const isValid =
    lowerLevel > 0 &&
    lowerLevel < spotPrice &&
    spotPrice < upperLevel &&
    upperLevel < Infinity &&
    // Levels so near that their ratio to the spot rounds to 1 leave no corridor.
    Math.log(upperLevel / spotPrice) > 0 &&
    Math.log(spotPrice / lowerLevel) > 0 &&
    Math.log(upperLevel / spotPrice) < Infinity &&
    Math.log(spotPrice / lowerLevel) < Infinity &&
    totalDeviation >= 0 &&
    totalDeviation < Infinity &&
    Math.abs(logDrift) < Infinity;
  if (!isValid)
    throw new DomainError('touch-first-question-invalid', {
      spotPrice,
      lowerLevel,
      upperLevel,
      totalDeviation,
      logDrift,
    });
}

function withoutChance({ up, down, logDrift }: { up: number; down: number; logDrift: number }): TouchFirstOdds {
  const upperFirst = logDrift >= up ? 1 : 0;
  const lowerFirst = -logDrift >= down ? 1 : 0;
  return { upperFirst, lowerFirst, neither: 1 - upperFirst - lowerFirst };
}

/** The near level first within the period: first-passage densities of the images, integrated over time. */
function byImages({ toNear, toFar, drift }: Corridor): number {
  const period = 2 * (toNear + toFar);
  let sum = passage(toNear, toNear, drift);
  for (let image = 1; image <= IMAGES; image += 1) {
    sum += passage(toNear + image * period, toNear, drift) - passage(image * period - toNear, toNear, drift);
  }
  return sum;
}

/**
 * exp(μ·(a − d))·Phi(μ − d) + exp(μ·(a + d))·Phi(−μ − d) for an image at distance d of a level at a, with the exponentials joined:
 * the chance of reaching d under no drift, reweighed to the drift μ at a.
 */
function passage(distance: number, level: number, drift: number): number {
  const joined =
    drift >= 0
      ? expMinusHalfSquare(distance - drift) * Math.exp(drift * (level - distance))
      : expMinusHalfSquare(distance + drift) * Math.exp(drift * (level + distance));
  const straight =
    distance >= drift
      ? joined * scaledUpperTail(distance - drift)
      : Math.exp(drift * (level - distance)) * normalUpperTail(distance - drift);
  const mirrored =
    distance >= -drift
      ? joined * scaledUpperTail(distance + drift)
      : Math.exp(drift * (level + distance)) * normalUpperTail(distance + drift);
  return straight + mirrored;
}

/** The near level first, but only after the period. */
function laterByWaves({ toNear, toFar, drift }: Corridor): number {
  const width = toNear + toFar;
  let sum = 0;
  for (let wave = 1; wave <= WAVES; wave += 1) {
    const root = (wave * Math.PI) / width;
    const rate = (root * root) / 2;
    // (π/c²)·n/(λ + μ²/2) with λ = n²π²/(2c²), divided through so that a narrow corridor does not overflow.
    const weight = 2 / (wave * Math.PI * (1 + (drift / root) ** 2));
    sum += Math.sin((wave * Math.PI * toNear) / width) * weight * Math.exp(drift * toNear - (drift * drift) / 2 - rate);
  }
  return sum;
}

/** The near level first with no end of time. */
function ever({ toNear, toFar, drift }: Corridor): number {
  const width = toNear + toFar;
  if (!(Math.abs(drift * width) > 1e-300)) return toFar / width;
  return drift > 0
    ? Math.expm1(-2 * drift * toFar) / Math.expm1(-2 * drift * width)
    : (Math.exp(2 * drift * toNear) * Math.expm1(2 * drift * toFar)) / Math.expm1(2 * drift * width);
}

function within01(value: number): number {
  return Math.min(1, Math.max(0, value));
}
