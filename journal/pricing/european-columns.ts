import { exponentialLessOne } from '@/journal/distributions/exponential';
import { DomainError } from '@/journal/errors/domain-error';
import { logRatio } from '@/journal/pricing/log-ratio';
import { fillOutOfTheMoney, outOfTheMoneyRows, Term } from '@/journal/pricing/out-of-the-money';

/** European options in columns, one option a row; units and ranges as in EuropeanOption. All of one length. */
export interface OptionColumns {
  /** 1 for a call, -1 for a put. */
  readonly direction: Int8Array;
  readonly spotPrice: Float64Array;
  readonly strikePrice: Float64Array;
  readonly dailyVolatility: Float64Array;
  readonly sessions: Float64Array;
  readonly years: Float64Array;
  readonly ratePerYear: Float64Array;
  readonly dividendYield: Float64Array;
}

/** Where the answers go; units as in OptionValue. At least as long as the options. */
export interface ValueColumns {
  readonly price: Float64Array;
  readonly delta: Float64Array;
  readonly gamma: Float64Array;
  readonly vegaPerDailyPoint: Float64Array;
  readonly thetaPerSession: Float64Array;
  readonly rhoPerPercent: Float64Array;
  readonly oddsInTheMoney: Float64Array;
}

/** Rows worked on at a time, so that what lies between two steps stays in the nearest cache. */
const CHUNK = 128;
/** What one step hands to the next for the options of one chunk: now, and one session later. */
const now = outOfTheMoneyRows(CHUNK);
const later = outOfTheMoneyRows(CHUNK);
/** Places within one row of {@link forwards}. */
const enum Forward {
  /** What a share is worth now that pays no dividends until expiry, over its price. */
  Carry,
  /** Present spot less present strike. */
  Value,
  /** The change of that over the next session. */
  Change,
  RowLength = 4,
}
const forwards = new Float64Array(CHUNK * Forward.RowLength);

export function optionColumns(length: number): OptionColumns {
  const column = () => new Float64Array(length);
  return {
    direction: new Int8Array(length).fill(1),
    spotPrice: column(),
    strikePrice: column(),
    dailyVolatility: column(),
    sessions: column(),
    years: column(),
    ratePerYear: column(),
    dividendYield: column(),
  };
}

export function valueColumns(length: number): ValueColumns {
  const column = () => new Float64Array(length);
  return {
    price: column(),
    delta: column(),
    gamma: column(),
    vegaPerDailyPoint: column(),
    thetaPerSession: column(),
    rhoPerPercent: column(),
    oddsInTheMoney: column(),
  };
}

/**
 * Prices of European options in columns, by Black, Scholes and Merton, the variance on the session clock.
 * @param options see {@link OptionColumns}.
 * @param price where the prices go, currency per share, 0 or more.
 * @throws {DomainError} `option-input-invalid` naming the field, its value and, where there are several, the row;
 *   `option-value-out-of-range` with the row whose price leaves the doubles.
 * @see Black and Scholes (1973), J. Political Economy 81; Merton (1973), Bell J. Economics 4. Two clocks: French (1984).
 */
export function europeanPriceColumns(options: OptionColumns, price: Float64Array): void {
  const { direction } = options;
  for (let from = 0; from < direction.length; from += CHUNK) {
    const count = Math.min(CHUNK, direction.length - from);
    prepare(options, from, count);
    fillOutOfTheMoney(now, count);
    const [terms, forward] = [now, forwards];
    for (let i = 0; i < count; i += 1) {
      const row = from + i;
      // In the money by parity, so that the time value keeps its digits.
      const intrinsic = Math.max((direction[row] ?? NaN) * (forward[i * Forward.RowLength + Forward.Value] ?? NaN), 0);
      const value = (terms[i * Term.RowLength + Term.Price] ?? NaN) + intrinsic;
      if (!(value < Infinity)) throw new DomainError('option-value-out-of-range', { row });
      price[row] = value;
    }
  }
}

/**
 * Prices, five Greeks and risk-neutral odds of European options in columns.
 * @param options see {@link OptionColumns}.
 * @param values where the answers go, see {@link ValueColumns}.
 * @param yearsPerNextSession calendar years that pass over the next session, for theta; 0 or more.
 * @throws {DomainError} as {@link europeanPriceColumns}.
 * @see as {@link europeanPriceColumns}; Greeks by differentiation, e.g. Hull, Options, Futures, and Other Derivatives.
 */
export function europeanValueColumns(options: OptionColumns, values: ValueColumns, yearsPerNextSession: number): void {
  if (!(yearsPerNextSession >= 0 && yearsPerNextSession < Infinity))
    throw new DomainError('option-input-invalid', {
      field: 'yearsPerNextSession',
      value: yearsPerNextSession,
    });
  const rows = options.direction.length;
  for (let from = 0; from < rows; from += CHUNK) {
    const count = Math.min(CHUNK, rows - from);
    prepare(options, from, count);
    fillOutOfTheMoney(now, count);
    prepareLater(options, from, count, yearsPerNextSession);
    fillOutOfTheMoney(later, count);
    combine(options, values, from, count);
  }
}

/** Present values and the terms of the out-of-the-money options of one chunk. */
function prepare(options: OptionColumns, from: number, count: number): void {
  const { direction, spotPrice, strikePrice, dailyVolatility, sessions, years, ratePerYear, dividendYield } = options;
  const terms = now;
  const forward = forwards;
  for (let i = 0; i < count; i += 1) {
    const row = from + i;
    const spot = spotPrice[row] ?? NaN;
    const strike = strikePrice[row] ?? NaN;
    const volatility = dailyVolatility[row] ?? NaN;
    const left = sessions[row] ?? NaN;
    const time = years[row] ?? NaN;
    const rate = ratePerYear[row] ?? NaN;
    const carryRate = dividendYield[row] ?? NaN;
    // One sum tells that all are finite; only where it says nothing is every field looked at.
    const isPlain =
      spot > 0 &&
      strike > 0 &&
      volatility >= 0 &&
      left >= 0 &&
      time >= 0 &&
      spot + strike + volatility + left + time + Math.abs(rate) + Math.abs(carryRate) < Infinity &&
      Math.abs(direction[row] ?? NaN) === 1;
    if (!isPlain) checkRow(options, row);
    const interest = rate * time;
    const dividends = carryRate * time;
    // What discounting takes off keeps its own digits: over hours it is far below a rounding of the price.
    const carryLoss = exponentialLessOne(-dividends);
    const spotLoss = spot * carryLoss;
    const strikeLoss = strike * exponentialLessOne(-interest);
    const forwardValue = spot - strike + (spotLoss - strikeLoss);
    const deviation = volatility * Math.sqrt(left);
    const at = i * Term.RowLength;
    terms[at + Term.PresentSpot] = spot + spotLoss;
    terms[at + Term.PresentStrike] = strike + strikeLoss;
    // From the prices as given, so that no rounding of a present value is magnified by a small deviation.
    terms[at + Term.LogMoneyness] =
      deviation === 0 && forwardValue === 0 ? 0 : logRatio(spot, strike) + (interest - dividends);
    terms[at + Term.TotalDeviation] = deviation;
    forward[i * Forward.RowLength + Forward.Carry] = 1 + carryLoss;
    forward[i * Forward.RowLength + Forward.Value] = forwardValue;
  }
}

/** The same one session later, at expiry's limit when less is left. */
function prepareLater(options: OptionColumns, from: number, count: number, yearsPerNextSession: number): void {
  const { dailyVolatility, sessions, years, ratePerYear, dividendYield } = options;
  const [terms, termsLater, forward] = [now, later, forwards];
  for (let i = 0; i < count; i += 1) {
    const row = from + i;
    const left = sessions[row] ?? NaN;
    const time = years[row] ?? NaN;
    const elapsed = left <= 1 ? time : Math.min(yearsPerNextSession, time);
    const interest = (ratePerYear[row] ?? NaN) * elapsed;
    const dividends = (dividendYield[row] ?? NaN) * elapsed;
    const at = i * Term.RowLength;
    const spot = terms[at + Term.PresentSpot] ?? NaN;
    const strike = terms[at + Term.PresentStrike] ?? NaN;
    const spotGain = spot * exponentialLessOne(dividends);
    const strikeGain = strike * exponentialLessOne(interest);
    termsLater[at + Term.PresentSpot] = spot + spotGain;
    termsLater[at + Term.PresentStrike] = strike + strikeGain;
    termsLater[at + Term.LogMoneyness] = (terms[at + Term.LogMoneyness] ?? NaN) + (dividends - interest);
    termsLater[at + Term.TotalDeviation] = (dailyVolatility[row] ?? NaN) * Math.sqrt(Math.max(left - 1, 0));
    forward[i * Forward.RowLength + Forward.Change] = spotGain - strikeGain;
  }
}

function combine(options: OptionColumns, values: ValueColumns, from: number, count: number): void {
  const { direction, spotPrice, sessions, years } = options;
  const { price, delta, gamma, vegaPerDailyPoint, thetaPerSession, rhoPerPercent, oddsInTheMoney } = values;
  const [terms, termsLater, forward] = [now, later, forwards];
  for (let i = 0; i < count; i += 1) {
    const row = from + i;
    const at = i * Term.RowLength;
    const sign = direction[row] ?? NaN;
    const spot = spotPrice[row] ?? NaN;
    const presentStrike = terms[at + Term.PresentStrike] ?? NaN;
    const timeValue = terms[at + Term.Price] ?? NaN;
    const spotTail = terms[at + Term.SpotTail] ?? NaN;
    const strikeTail = terms[at + Term.StrikeTail] ?? NaN;
    const spotDensity = terms[at + Term.SpotDensity] ?? NaN;
    const deviation = terms[at + Term.TotalDeviation] ?? NaN;

    const isSpotLarger = (terms[at + Term.PresentSpot] ?? NaN) > presentStrike;
    const isInTheMoney = sign > 0 ? isSpotLarger : !isSpotLarger;
    const hedge = isInTheMoney ? 1 - spotTail : spotTail;
    const odds = isInTheMoney ? 1 - strikeTail : strikeTail;

    const intrinsic = sign * (forward[i * Forward.RowLength + Forward.Value] ?? NaN);
    const intrinsicChange = sign * (forward[i * Forward.RowLength + Forward.Change] ?? NaN);
    const intrinsicLater = intrinsic + intrinsicChange;
    const staysInTheMoney = intrinsic > 0 && intrinsicLater > 0;
    const parityChange = staysInTheMoney ? intrinsicChange : Math.max(intrinsicLater, 0) - Math.max(intrinsic, 0);

    const value = timeValue + Math.max(intrinsic, 0);
    const slope = sign * (forward[i * Forward.RowLength + Forward.Carry] ?? NaN) * hedge;
    const curvature = deviation > 0 ? spotDensity / spot / (spot * deviation) : 0;
    const vega = spotDensity * Math.sqrt(sessions[row] ?? NaN) * 0.01;
    const theta = (termsLater[at + Term.Price] ?? NaN) - timeValue + parityChange;
    const rho = sign * (years[row] ?? NaN) * presentStrike * odds * 0.01;
    const isInRange = value + Math.abs(slope) + curvature + vega + Math.abs(theta) + Math.abs(rho) + odds < Infinity;
    if (!isInRange) throw new DomainError('option-value-out-of-range', { row });
    price[row] = value;
    delta[row] = slope;
    gamma[row] = curvature;
    vegaPerDailyPoint[row] = vega;
    thetaPerSession[row] = theta;
    rhoPerPercent[row] = rho;
    oddsInTheMoney[row] = odds;
  }
}

function checkRow(options: OptionColumns, row: number): void {
  const at = (field: keyof OptionColumns) => ({
    field,
    value: options[field][row] ?? NaN,
  });
  const invalid =
    [at('spotPrice'), at('strikePrice')].find(({ value }) => !(value > 0 && value < Infinity)) ??
    [at('dailyVolatility'), at('sessions'), at('years')].find(({ value }) => !(value >= 0 && value < Infinity)) ??
    [at('ratePerYear'), at('dividendYield')].find(({ value }) => !(Math.abs(value) < Infinity)) ??
    [at('direction')].find(({ value }) => Math.abs(value) !== 1);
  if (invalid !== undefined)
    throw new DomainError('option-input-invalid', options.direction.length > 1 ? { row, ...invalid } : invalid);
}
