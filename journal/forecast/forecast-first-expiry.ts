import { structureName } from '@/journal/contracts/structure-name';
import { modelPosition, openingCost } from '@/journal/contracts/position';
import { DomainError } from '@/journal/errors/domain-error';
import { checkForecastInput } from '@/journal/forecast/check-forecast-input';
import { curvedProfitLaw } from '@/journal/forecast/curved-profit-law';
import { describeDistribution } from '@/journal/forecast/describe-distribution';
import { type LowBaseHigh, type ProfitDistribution } from '@/journal/forecast/forecast';
import { type ForecastInput } from '@/journal/forecast/forecast-input';
import { overVolatilities } from '@/journal/forecast/low-base-high';
import { repricedCurve } from '@/journal/forecast/repriced-curve';
import { toDecimalText, toModelNumber } from '@/journal/money/decimal';
import { logDrift } from '@/journal/odds/log-drift';
import { impliedDailyVolatility } from '@/journal/pricing/implied-daily-volatility';
import { type RepricedLeg, valueAtMoment } from '@/journal/scenarios/reprice';
import { calendarYears } from '@/journal/sessions/calendar-years';
import { type ExchangeCalendar } from '@/journal/sessions/exchange-calendar';
import { sessionsToExpiry } from '@/journal/sessions/session-clock';

/** A position of several expiries, valued when the first of them is reached. */
export interface FirstExpiryForecast {
  readonly structureName: string;
  readonly firstExpirySessionDate: string;
  readonly lastExpirySessionDate: string;
  readonly sessions: { readonly toFirstExpiry: number; readonly toLastExpiry: number };
  readonly legs: readonly {
    readonly legId: string;
    /** Of the planned premium; null where no volatility reproduces it. */
    readonly impliedDailyVolatility: number | null;
    /** What the leg is worth then: its pay-off, or a model's price at its implied volatility with the sessions still left. */
    readonly valuedBy: 'pay-off' | 'model';
    readonly sessionsLeft: number;
  }[];
  /** Decimal text, currency: premiums paid, negative when received. */
  readonly netPremium: string;
  /** Model value of the position now under low, base and high volatility, currency. */
  readonly modelValue: LowBaseHigh;
  /** True whenever a leg lives on: ends, break-evens and the distribution then rest on the model. */
  readonly isByModel: boolean;
  /** Currency, after fees; null without limit. */
  readonly greatestGain: number | null;
  readonly greatestLoss: number | null;
  /** Prices of the underlying at the first expiry, within nine deviations, lowest first. */
  readonly breakEvens: readonly number[];
  readonly atFirstExpiry: ProfitDistribution;
}

interface TimedLeg {
  readonly sessions: number;
  readonly years: number;
}

/**
 * Values a position of one or more expiries at the first: legs that end there by their pay-off, the others by the model with the
 * sessions they have left; those are closed then, and pay the fee again.
 * @param input as for makeForecast, but legs may have several expiries; `holding` is not read: the position is held to the first.
 * @returns ends and break-evens by search over nine deviations, since a model's value has no closed break-even.
 * @throws {DomainError} `legs-missing`, `expiry-not-a-session`, `expiry-in-the-past` with the leg's index; `volatility-order`; and as
 *   checkForecastInput.
 * @see Hull, Options, Futures, and Other Derivatives, on calendar spreads; common practice.
 */
export function forecastFirstExpiry(input: ForecastInput, calendar: ExchangeCalendar): FirstExpiryForecast {
  checkForecastInput(input);
  const { low, base, high } = input.volatility;
  if (!(0 < low && low <= base && base <= high && high < Infinity))
    throw new DomainError('volatility-order', { low, base, high });
  const times = input.legs.map((leg, legIndex) => timeOf(input, calendar, leg.expirySessionDate, legIndex));
  const first = times.reduce<TimedLeg | null>(
    (least, time) => (least === null || time.sessions < least.sessions ? time : least),
    null,
  );
  if (first === null) throw new DomainError('legs-missing');

  const spotPrice = toModelNumber(input.spot.price);
  const cost = openingCost(input.legs, {
    multiplier: input.underlying.multiplier,
    feePerContract: input.feePerContract,
  });
  const position = modelPosition(input.legs, input.underlying.multiplier, cost);
  const rates = { ratePerYear: input.ratePerYear, dividendYield: input.underlying.dividendYield };
  const legs = position.legs.map((leg, index) => {
    const time = times[index] ?? first;
    const { type, strikePrice, signedShares, premium } = leg;
    const implied = impliedDailyVolatility({ type, strikePrice, spotPrice, ...time, ...rates, price: premium });
    return {
      legId: leg.legId,
      implied: implied.kind === 'found' ? implied.dailyVolatility : null,
      repriced: {
        type,
        strikePrice,
        signedShares,
        dailyVolatility: implied.kind === 'found' ? implied.dailyVolatility : base,
        sessionsBeyond: time.sessions - first.sessions,
        yearsBeyond: time.years - first.years,
      },
    };
  });
  const repriced = legs.map((leg): RepricedLeg => leg.repriced);
  const livingContracts = input.legs.reduce(
    (sum, leg, index) => sum + ((repriced[index]?.sessionsBeyond ?? 0) > 0 ? leg.quantity : 0),
    0,
  );
  const feesToClose = toModelNumber(input.feePerContract) * livingContracts;
  const curve = repricedCurve({
    legs: repriced,
    moment: { sessions: 0, years: 0, ...rates },
    costs: position.costToOpen + feesToClose,
  });
  const lawAt = (dailyVolatility: number) =>
    curvedProfitLaw(curve, {
      spotPrice,
      totalDeviation: dailyVolatility * Math.sqrt(first.sessions),
      logDrift: logDrift({
        drift: input.drift,
        totalVariance: dailyVolatility ** 2 * first.sessions,
        ...first,
        ...rates,
      }),
    });
  const laws = { low: lawAt(low), base: lawAt(base), high: lawAt(high) };
  const dates = input.legs.map((leg) => leg.expirySessionDate).sort();
  return {
    structureName: structureName(input.legs),
    firstExpirySessionDate: dates[0] ?? '',
    lastExpirySessionDate: dates[dates.length - 1] ?? '',
    sessions: {
      toFirstExpiry: first.sessions,
      toLastExpiry: Math.max(...times.map(({ sessions }) => sessions)),
    },
    legs: legs.map(({ legId, implied, repriced: { sessionsBeyond } }) => ({
      legId,
      impliedDailyVolatility: implied,
      valuedBy: sessionsBeyond > 0 ? 'model' : 'pay-off',
      sessionsLeft: sessionsBeyond,
    })),
    netPremium: toDecimalText(cost.netPremium),
    modelValue: overVolatilities(input.volatility, (dailyVolatility) =>
      valueAtMoment(
        repriced.map((leg) => ({ ...leg, dailyVolatility })),
        { ...first, ...rates },
      )(spotPrice),
    ),
    isByModel: livingContracts > 0,
    greatestGain: laws.base.most < Infinity ? laws.base.most : null,
    greatestLoss: laws.base.least > -Infinity ? laws.base.least : null,
    breakEvens: laws.high
      .rangesAbove(0)
      .flatMap(({ from, to }) => [from, to])
      .filter((price) => price > 0 && price < Infinity),
    atFirstExpiry: describeDistribution('expiry', laws),
  };
}

function timeOf(
  input: ForecastInput,
  calendar: ExchangeCalendar,
  expirySessionDate: string,
  legIndex: number,
): TimedLeg {
  const session = calendar.sessionOn(expirySessionDate);
  if (session === null) throw new DomainError('expiry-not-a-session', { expirySessionDate, legIndex });
  const { at } = input.spot;
  const settlement = input.underlying.settlementTime;
  const settings = { overnightShare: input.overnightShare };
  const sessions = sessionsToExpiry({ calendar, from: at, expirySessionDate, settlement, settings });
  if (!(sessions > 0)) throw new DomainError('expiry-in-the-past', { expirySessionDate, spotAt: at, legIndex });
  return { sessions, years: calendarYears(at, settlement === 'am' ? session.opensAt : session.closesAt) };
}
