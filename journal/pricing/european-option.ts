import {
  europeanPriceColumns,
  europeanValueColumns,
  optionColumns,
  valueColumns,
} from '@/journal/pricing/european-columns';

/** A European option on two clocks: variance by sessions, money by calendar years. */
export interface EuropeanOption {
  readonly type: 'call' | 'put';
  /** Above 0, currency per share. */
  readonly spotPrice: number;
  /** Above 0, currency per share. */
  readonly strikePrice: number;
  /** Standard deviation of the log return of one session, a fraction, 0 or more. */
  readonly dailyVolatility: number;
  /** Sessions of variance left, 0 or more, fractions allowed. */
  readonly sessions: number;
  /** Calendar years left (actual/365), 0 or more. */
  readonly years: number;
  /** Continuous, a fraction per calendar year. */
  readonly ratePerYear: number;
  /** Continuous, a fraction per calendar year. */
  readonly dividendYield: number;
}

export interface OptionValue {
  /** Currency per share. */
  readonly price: number;
  /** Shares per share. */
  readonly delta: number;
  /** Change of delta per 1.00 of the spot price. */
  readonly gamma: number;
  /** Per 0.01 of daily volatility, currency per share. */
  readonly vegaPerDailyPoint: number;
  /** Value one session later less value now, all else equal, currency per share. */
  readonly thetaPerSession: number;
  /** Per 0.01 of the yearly rate, currency per share. */
  readonly rhoPerPercent: number;
  /** Risk-neutral probability of finishing in the money. */
  readonly oddsInTheMoney: number;
}

/** A calendar day: what passes between two sessions of one week. */
const ONE_DAY_IN_YEARS = 1 / 365;

/** One row of each, so that a single option goes through the same formulas as a column of them. */
const question = optionColumns(1);
const answer = valueColumns(1);

/**
 * Price of a European option by Black, Scholes and Merton, the variance on the session clock.
 * @param option see {@link EuropeanOption}; with no variance left the forward decides (intrinsic value of the forward).
 * @returns currency per share, 0 or more. Relative accuracy holds far out of the money; in the money by put-call parity.
 * @throws {DomainError} `option-input-invalid` naming the field and its value; `option-value-out-of-range` where rates over years
 *   take a present value out of the doubles.
 * @see as {@link europeanPriceColumns}, for many options.
 */
export function europeanOptionPrice(option: EuropeanOption): number {
  ask(option);
  europeanPriceColumns(question, answer.price);
  return answer.price[0] ?? NaN;
}

/**
 * Price, five Greeks and risk-neutral odds of a European option.
 * @param option see {@link EuropeanOption}.
 * @param yearsPerNextSession calendar years that pass over the next session, for theta, 0 or more; 1/365 by default.
 * @returns see {@link OptionValue}; theta is a full repricing one session later, at expiry's limit when less is left.
 * @throws {DomainError} as {@link europeanOptionPrice}; also where a Greek leaves the doubles.
 * @see as {@link europeanValueColumns}, for many options.
 */
export function europeanOptionValue(
  option: EuropeanOption,
  yearsPerNextSession: number = ONE_DAY_IN_YEARS,
): OptionValue {
  ask(option);
  europeanValueColumns(question, answer, yearsPerNextSession);
  return {
    price: answer.price[0] ?? NaN,
    delta: answer.delta[0] ?? NaN,
    gamma: answer.gamma[0] ?? NaN,
    vegaPerDailyPoint: answer.vegaPerDailyPoint[0] ?? NaN,
    thetaPerSession: answer.thetaPerSession[0] ?? NaN,
    rhoPerPercent: answer.rhoPerPercent[0] ?? NaN,
    oddsInTheMoney: answer.oddsInTheMoney[0] ?? NaN,
  };
}

function ask(option: EuropeanOption): void {
  question.direction[0] = option.type === 'call' ? 1 : -1;
  question.spotPrice[0] = option.spotPrice;
  question.strikePrice[0] = option.strikePrice;
  question.dailyVolatility[0] = option.dailyVolatility;
  question.sessions[0] = option.sessions;
  question.years[0] = option.years;
  question.ratePerYear[0] = option.ratePerYear;
  question.dividendYield[0] = option.dividendYield;
}
