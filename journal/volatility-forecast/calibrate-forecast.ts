import { studentLogConstant } from '@/journal/volatility-forecast/forecast-density';

// By their own names: the loops below call them a million times, and a look-up on the global object costs more than they do
// wherever that object is not the plain one.
const { log1p } = Math;

/** What the past forecasts of a series say about the coming one. */
export interface Calibration {
  /** Variance of the summed return of the horizon. */
  readonly totalVariance: number;
  /** Of the Student law, from 3 to 1,000. */
  readonly degreesOfFreedom: number;
  /** Share of the first source of variance; the rest is the second's. */
  readonly firstShare: number;
  /** What the blend was multiplied by. */
  readonly stretch: number;
  /** Past stretches of the horizon's length that were looked at; they overlap. */
  readonly pastForecasts: number;
}

const STRETCHES = [0.7, 0.84, 1, 1.19, 1.41];
const DEGREES = [3, 4, 6, 10, 20, 1000];
/** A past forecast has half the weight of one two years later. */
const HALF_LIFE_SESSIONS = 504;
/** Before the first past forecast is believed: the logarithm of the stretch is 0 ± 0.2, one over the degrees 0.1 ± 0.1. */
const LOG_STRETCH_DOUBT = 0.2;
const INVERSE_DEGREES = 0.1;

/**
 * Weighs how much of two sources of variance, how wide and how fat-tailed a forecast should be by what each choice would have made of
 * the past of the series at the same horizon: thirty laws for each share, each with the weight exp(prior + log score), and the mean of their
 * variances and of one over their degrees of freedom.
 * @param question.sums running sums of the log returns: sums[t] of the first t, one more than there are returns.
 * @param question.centre expected log return of one session that is taken out.
 * @param question.totals by each source the variance of the summed return of the horizon as known at each t, above 0 from `from` on.
 * @param question.sessions whole number from 1: overlapping stretches count one for every `sessions` of them.
 * @param question.from index of the first past forecast to use. @param question.shares of the first source that are weighed, at least 1,
 *   each 0 to 1.
 * @see Bayesian model averaging, e.g. Hoeting, Madigan, Raftery and Volinsky (1999), Statistical Science 14, 382-417; choosing weights
 *   of forecasts by their log score: Geweke and Amisano (2011), J. of Econometrics 164, 130-141; forgetting: Raftery, Kárný and Ettler (2010), Technometrics
 *   52, 52-66. That the result is collapsed to one
 *   Student law, and the prior, are from experience.
 */
export function calibrateForecast(question: {
  readonly sums: ArrayLike<number>;
  readonly centre: number;
  readonly totals: (knownReturns: number) => { readonly first: number; readonly second: number };
  readonly sessions: number;
  readonly from: number;
  readonly shares: readonly number[];
}): Calibration {
  const { sums, centre, totals, sessions, from, shares } = question;
  const now = sums.length - 1;
  const choices = priorChoices(shares);
  const stride = Math.max(1, Math.floor(sessions / 4));
  let pastForecasts = 0;
  for (let at = now - sessions; at >= from; at -= stride) {
    const move = (sums[at + sessions] ?? 0) - (sums[at] ?? 0) - centre * sessions;
    const { first, second } = totals(at);
    const weight = (stride / sessions) * 0.5 ** ((now - sessions - at) / HALF_LIFE_SESSIONS);
    let place = 0;
    for (const share of shares) {
      addLogScores(choices, { place, square: move * move, variance: share * first + (1 - share) * second }, weight);
      place += CHOICES_PER_SHARE;
    }
    pastForecasts += 1;
  }
  return { ...meanChoice(choices, { shares, ...totals(now) }), pastForecasts };
}

const CHOICES_PER_SHARE = STRETCHES.length * DEGREES.length;

/** A Student law of one choice, and its prior. */
const LAWS = DEGREES.flatMap((degrees) =>
  STRETCHES.map((stretch) => ({
    degrees,
    stretch,
    prior:
      -((Math.log(stretch) / LOG_STRETCH_DOUBT) ** 2) / 2 -
      ((1 / degrees - INVERSE_DEGREES) / INVERSE_DEGREES) ** 2 / 2,
  })),
);
/** The parts of the log densities that do not depend on the outcome, worked out once. */
const CONSTANTS = Float64Array.from(
  LAWS,
  ({ degrees, stretch }) => studentLogConstant(degrees) - Math.log((stretch * (degrees - 2)) / degrees) / 2,
);
const INVERSES = Float64Array.from(LAWS, ({ degrees, stretch }) => 1 / (stretch * (degrees - 2)));
const POWERS = Float64Array.from(LAWS, ({ degrees }) => (degrees + 1) / 2);

function priorChoices(shares: readonly number[]): Float64Array {
  return Float64Array.from(shares.flatMap(() => LAWS.map(({ prior }) => prior)));
}

function addLogScores(
  choices: Float64Array,
  { place, square, variance }: { place: number; square: number; variance: number },
  weight: number,
): void {
  const half = Math.log(variance) / 2;
  const ratio = square / variance;
  for (let index = 0; index < CHOICES_PER_SHARE; index += 1) {
    const surprise = (POWERS[index] ?? 0) * log1p(ratio * (INVERSES[index] ?? 0));
    const score = (CONSTANTS[index] ?? 0) - half - surprise;
    choices[place + index] = (choices[place + index] ?? 0) + weight * score;
  }
}

function meanChoice(
  choices: Float64Array,
  { shares, first, second }: { shares: readonly number[]; first: number; second: number },
): Omit<Calibration, 'pastForecasts'> {
  const best = choices.reduce((most, value) => Math.max(most, value), -Infinity);
  const sum = { weight: 0, variance: 0, inverseDegrees: 0, share: 0, blend: 0 };
  for (const [row, share] of shares.entries()) {
    const blend = share * first + (1 - share) * second;
    for (const [column, { stretch, degrees }] of LAWS.entries()) {
      const weight = Math.exp((choices[row * CHOICES_PER_SHARE + column] ?? -Infinity) - best);
      sum.weight += weight;
      sum.variance += weight * blend * stretch;
      sum.blend += weight * blend;
      sum.inverseDegrees += weight / degrees;
      sum.share += weight * share;
    }
  }
  return {
    totalVariance: sum.variance / sum.weight,
    degreesOfFreedom: sum.weight / sum.inverseDegrees,
    firstShare: sum.share / sum.weight,
    stretch: sum.variance / sum.blend,
  };
}
