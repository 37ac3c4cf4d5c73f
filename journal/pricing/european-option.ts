import { DomainError } from '@/journal/errors/domain-error';
import { outOfTheMoneyPrice, outOfTheMoneyTerms, priceOfRatio } from '@/journal/pricing/out-of-the-money';

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

/**
 * Price of a European option by Black, Scholes and Merton, the variance on the session clock.
 * @param option see {@link EuropeanOption}; with no variance left the forward decides (intrinsic value of the forward).
 * @returns currency per share, 0 or more. Relative accuracy holds far out of the money; in the money by put-call parity.
 * @throws {DomainError} `option-input-invalid` naming the field and its value.
 * @see Black and Scholes (1973), J. Political Economy 81; Merton (1973), Bell J. Economics 4. Two clocks: French (1984).
 */
export function europeanOptionPrice(option: EuropeanOption): number {
  checkOption(option);
  const { type, spotPrice, strikePrice, dailyVolatility, sessions, years, ratePerYear, dividendYield } = option;
  const presentSpot = spotPrice * growth(-dividendYield * years);
  const presentStrike = strikePrice * growth(-ratePerYear * years);
  const outOfTheMoney = outOfTheMoneyPrice(presentSpot, presentStrike, dailyVolatility * Math.sqrt(sessions));
  // In the money by parity, so that the time value keeps its digits.
  const intrinsic = type === 'call' ? presentSpot - presentStrike : presentStrike - presentSpot;
  return intrinsic > 0 ? outOfTheMoney + intrinsic : outOfTheMoney;
}

/**
 * The exponential function. Most stocks pay no yield, and over one session interest is so small that five terms of the series
 * have all digits.
 */
function growth(exponent: number): number {
  if (exponent === 0) return 1;
  if (Math.abs(exponent) > 1e-3) return Math.exp(exponent);
  return 1 + exponent * (1 + exponent * (0.5 + exponent * (1 / 6 + exponent * (1 / 24))));
}

/**
 * Price, five Greeks and risk-neutral odds of a European option.
 * @param option see {@link EuropeanOption}.
 * @param yearsPerNextSession calendar years that pass over the next session, for theta; 1/365 by default.
 * @returns see {@link OptionValue}; theta is a full repricing one session later, at expiry's limit when less is left.
 * @throws {DomainError} `option-input-invalid` naming the field and its value.
 * @see as {@link europeanOptionPrice}; Greeks by differentiation, e.g. Hull, Options, Futures, and Other Derivatives.
 */
export function europeanOptionValue(
  option: EuropeanOption,
  yearsPerNextSession: number = ONE_DAY_IN_YEARS,
): OptionValue {
  checkOption(option);
  const { type, spotPrice, strikePrice, dailyVolatility, sessions, years, ratePerYear, dividendYield } = option;
  const carry = growth(-dividendYield * years);
  const presentSpot = spotPrice * carry;
  const presentStrike = strikePrice * growth(-ratePerYear * years);
  const rootSessions = Math.sqrt(sessions);
  const totalDeviation = dailyVolatility * rootSessions;
  const terms = outOfTheMoneyTerms(presentSpot, presentStrike, totalDeviation);

  const sign = type === 'call' ? 1 : -1;
  const intrinsic = sign * (presentSpot - presentStrike);
  const price = intrinsic > 0 ? terms.price + intrinsic : terms.price;
  // At equal present values the call is the one that the terms take to be out of the money.
  const isInTheMoney = type === 'call' ? intrinsic > 0 : intrinsic >= 0;
  const hedge = isInTheMoney ? 1 - terms.spotTail : terms.spotTail;
  const oddsInTheMoney = isInTheMoney ? 1 - terms.strikeTail : terms.strikeTail;
  const isOver = sessions <= 1;
  const elapsedYears = isOver ? years : Math.min(yearsPerNextSession, years);
  const spotLater = presentSpot * growth(dividendYield * elapsedYears);
  const strikeLater = presentStrike * growth(ratePerYear * elapsedYears);
  const intrinsicLater = sign * (spotLater - strikeLater);
  const timeValueLater = isOver
    ? 0
    : outOfTheMoneyLater(
        spotLater,
        strikeLater,
        terms.logMoneyness + (dividendYield - ratePerYear) * elapsedYears,
        dailyVolatility * Math.sqrt(sessions - 1),
      );
  const priceLater = intrinsicLater > 0 ? timeValueLater + intrinsicLater : timeValueLater;
  return {
    price,
    delta: sign * carry * hedge,
    gamma: totalDeviation > 0 ? terms.spotDensity / (spotPrice * spotPrice * totalDeviation) : 0,
    vegaPerDailyPoint: terms.spotDensity * rootSessions * 0.01,
    thetaPerSession: priceLater - price,
    rhoPerPercent: sign * years * presentStrike * oddsInTheMoney * 0.01,
    oddsInTheMoney,
  };
}

/** As outOfTheMoneyPrice, the logarithm carried on from a session before. */
function outOfTheMoneyLater(spot: number, strike: number, logMoneyness: number, totalDeviation: number): number {
  if (!(totalDeviation > 0)) return 0;
  return priceOfRatio(Math.max(spot, strike), Math.min(spot, strike), Math.abs(logMoneyness), totalDeviation);
}

function checkOption(option: EuropeanOption): void {
  const { spotPrice, strikePrice, dailyVolatility, sessions, years, ratePerYear, dividendYield } = option;
  // One sum tells whether all are finite; this runs before every price.
  const isValid =
    spotPrice > 0 &&
    strikePrice > 0 &&
    dailyVolatility >= 0 &&
    sessions >= 0 &&
    years >= 0 &&
    spotPrice + strikePrice + dailyVolatility + sessions + years + Math.abs(ratePerYear) + Math.abs(dividendYield) <
      Infinity;
  if (!isValid) throw new DomainError('option-input-invalid', firstInvalid(option));
}

function firstInvalid(option: EuropeanOption): { field: string; value: number } {
  const { spotPrice, strikePrice, dailyVolatility, sessions, years, ratePerYear, dividendYield } = option;
  const positive = Object.entries({ spotPrice, strikePrice }).find(([, value]) => !(value > 0 && value < Infinity));
  const nonNegative = Object.entries({ dailyVolatility, sessions, years }).find(
    ([, value]) => !(value >= 0 && value < Infinity),
  );
  const finite = Object.entries({ ratePerYear, dividendYield }).find(([, value]) => !(Math.abs(value) < Infinity));
  const [field, value] = positive ?? nonNegative ?? finite ?? ['option', Number.NaN];
  return { field, value };
}
