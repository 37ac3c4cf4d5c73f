import { normalDensity, normalUpperTail } from '@/journal/distributions/normal-distribution';
import { DomainError } from '@/journal/errors/domain-error';

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
  return uncheckedPrice(option);
}

function uncheckedPrice({
  type,
  spotPrice,
  strikePrice,
  dailyVolatility,
  sessions,
  years,
  ratePerYear,
  dividendYield,
}: EuropeanOption): number {
  const presentSpot = spotPrice * Math.exp(-dividendYield * years);
  const presentStrike = strikePrice * Math.exp(-ratePerYear * years);
  const outOfTheMoney = outOfTheMoneyPrice(presentSpot, presentStrike, dailyVolatility * Math.sqrt(sessions));
  const callIntrinsic = presentSpot - presentStrike;
  const intrinsic = type === 'call' ? callIntrinsic : -callIntrinsic;
  return intrinsic > 0 ? outOfTheMoney + intrinsic : outOfTheMoney;
}

/**
 * Value of whichever of call and put is out of the money, by present values of spot and strike.
 * By symmetry it depends on their larger and smaller only, so both sides keep their digits.
 */
export function outOfTheMoneyPrice(presentSpot: number, presentStrike: number, totalDeviation: number): number {
  if (!(totalDeviation > 0)) return 0;
  const smaller = Math.min(presentSpot, presentStrike);
  const larger = Math.max(presentSpot, presentStrike);
  const moneyness = logRatio(larger, smaller) / totalDeviation;
  const near = moneyness - totalDeviation / 2;
  const far = moneyness + totalDeviation / 2;
  const value = smaller * normalUpperTail(near) - larger * normalUpperTail(far);
  return value > 0 ? value : 0;
}

/** ln(larger / smaller), with all digits where the two are close. */
function logRatio(larger: number, smaller: number): number {
  const excess = (larger - smaller) / smaller;
  return excess < 0.5 ? Math.log1p(excess) : Math.log(larger / smaller);
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
  const carry = Math.exp(-dividendYield * years);
  const discount = Math.exp(-ratePerYear * years);
  const presentSpot = spotPrice * carry;
  const presentStrike = strikePrice * discount;
  const rootSessions = Math.sqrt(sessions);
  const totalDeviation = dailyVolatility * rootSessions;
  const sign = type === 'call' ? 1 : -1;

  const logMoneyness =
    presentSpot > presentStrike ? logRatio(presentSpot, presentStrike) : -logRatio(presentStrike, presentSpot);
  const d2 = totalDeviation > 0 ? logMoneyness / totalDeviation - totalDeviation / 2 : limitOf(logMoneyness);
  const d1 = totalDeviation > 0 ? d2 + totalDeviation : d2;
  const oddsInTheMoney = normalUpperTail(-sign * d2);
  const hedge = normalUpperTail(-sign * d1);
  const intrinsic = sign * (presentSpot - presentStrike);
  const direct = sign * (presentSpot * hedge - presentStrike * oddsInTheMoney);
  const price =
    totalDeviation > 0
      ? intrinsic > 0
        ? intrinsic + sign * (presentStrike * normalUpperTail(sign * d2) - presentSpot * normalUpperTail(sign * d1))
        : direct
      : Math.max(intrinsic, 0);
  const density = totalDeviation > 0 ? normalDensity(d1) : 0;
  const later = uncheckedPrice({
    ...option,
    sessions: Math.max(sessions - 1, 0),
    years: sessions > 1 ? Math.max(years - yearsPerNextSession, 0) : 0,
  });
  return {
    price: price > 0 ? price : 0,
    delta: sign * carry * hedge,
    gamma: totalDeviation > 0 ? (carry * density) / (spotPrice * totalDeviation) : 0,
    vegaPerDailyPoint: presentSpot * density * rootSessions * 0.01,
    thetaPerSession: later - (price > 0 ? price : 0),
    rhoPerPercent: sign * years * presentStrike * oddsInTheMoney * 0.01,
    oddsInTheMoney,
  };
}

/** Where d1 and d2 go as the variance goes to 0: the side of the forward decides, and at the strike neither. */
function limitOf(logMoneyness: number): number {
  if (logMoneyness === 0) return 0;
  return logMoneyness > 0 ? Infinity : -Infinity;
}

function checkOption(option: EuropeanOption): void {
  const { spotPrice, strikePrice, dailyVolatility, sessions, years, ratePerYear, dividendYield } = option;
  const isValid =
    spotPrice > 0 &&
    spotPrice < Infinity &&
    strikePrice > 0 &&
    strikePrice < Infinity &&
    dailyVolatility >= 0 &&
    dailyVolatility < Infinity &&
    sessions >= 0 &&
    sessions < Infinity &&
    years >= 0 &&
    years < Infinity &&
    Math.abs(ratePerYear) < Infinity &&
    Math.abs(dividendYield) < Infinity;
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
