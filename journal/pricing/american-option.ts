import { DomainError } from '@/journal/errors/domain-error';
import { gridValue } from '@/journal/pricing/american-grid';
import { type UnitPutValue, unitPutPrice, unitPutValue } from '@/journal/pricing/american-put';
import { certainValue } from '@/journal/pricing/certain-exercise';
import { type CashDividend, escrowedSpot } from '@/journal/pricing/escrowed-spot';
import {
  type EuropeanOption,
  europeanOptionPrice,
  europeanOptionValue,
  type OptionValue,
} from '@/journal/pricing/european-option';
import { type BoundaryScheme, type UnitPut } from '@/journal/pricing/exercise-boundary';

/** An option that can be exercised at any time, on the two clocks of {@link EuropeanOption}. */
export interface AmericanOption extends EuropeanOption {
  /** Known cash dividends, any order; those after expiry do not count. None by default. */
  readonly dividends?: readonly CashDividend[];
  /**
   * 'spot' (the default): the stock itself is lognormal between the dividends and falls by each, to no less than nothing. 'escrowed':
   * the stock less the present value of the dividends still to come is lognormal.
   */
  readonly dividendModel?: DividendModel;
}
export type DividendModel = 'spot' | 'escrowed';

export interface AmericanOptionValue extends OptionValue {
  /** Exercising at once is worth as much as anything else. */
  readonly exerciseNow: boolean;
  /** At and beyond this price of the underlying it is exercised now; null where that is never, where dividends or two edges leave no
   *  single price, and where no scheme settles on it (rates far above the deviation). */
  readonly exerciseBoundary: number | null;
}

/** Prices within 5e-6 of the spot price (1e-6 up to half a year): for many options at once. */
export const fastScheme: BoundaryScheme = {
  intervals: 6,
  quadrature: 8,
  iterations: 2,
  priceQuadrature: 16,
  tailWithin: 1e-2,
};
/** Within 1e-6 of the spot price over years, 1e-7 over weeks. */
export const fineScheme: BoundaryScheme = {
  intervals: 10,
  quadrature: 16,
  iterations: 4,
  priceQuadrature: 32,
  tailWithin: 2e-3,
};

/** Rates over the life, and deviations of it, beyond which no market lies and no scheme was measured. */
const LARGEST_RATE = 20;
const LARGEST_DEVIATION = 20;
/** Of prices and their ratio, and its inverse the least: squares of them stay in the doubles. */
const LARGEST_PRICE = 1e150;
const ONE_DAY_IN_YEARS = 1 / 365;

/**
 * Price of an American option. Variance runs by sessions and money by years: between now and expiry both are taken to pass in step.
 * @param option see {@link AmericanOption}; all of it finite, prices above 0, volatility, sessions and years 0 or more. Rates times
 *   years and the deviation over the life up to 20 in size, prices and their ratio from 1e-150 to 1e150.
 * @param scheme of the boundary, where it has one edge and there are no dividends; one that does not settle gives way to the fine
 *   one, and that to the grid.
 * @returns currency per share, at least what exercising brings. Within 2e-5 of the larger of spot and strike, however it is worked out.
 * @throws {DomainError} `option-input-invalid` naming the field; `american-out-of-range`; with dividends as escrowedSpot.
 * @see Merton (1973), Bell J. Economics 4; put-call symmetry: McDonald and Schroder (1998), J. Computational Finance 1(3); the
 *   methods: unitPutValue and gridValue.
 */
export function americanOptionPrice(option: AmericanOption, scheme: BoundaryScheme = fineScheme): number {
  const plain = checked(option);
  const { kind } = plain;
  if (kind === 'european') return Math.max(intrinsicValue(option), europeanOptionPrice(option));
  if (kind === 'certain') return certainValue(plain).price;
  if (plain.dividends.length > 0) return gridValue(plain).price;
  const { put, price, scale } = asUnitPut(plain);
  const byBoundary =
    kind === 'grid' ? null : (unitPutPrice(put, price, scheme) ?? unitPutPrice(put, price, fineScheme));
  return Math.max(intrinsicValue(option), scale * (byBoundary ?? gridOfPut(put, price).price));
}

/**
 * Price, five Greeks and risk-neutral odds of an American option, with whether to exercise it now.
 * @param option as for {@link americanOptionPrice}.
 * @param yearsPerNextSession calendar years that pass over the next session, for theta, 0 or more; 1/365 by default.
 * @returns Greeks in the units of {@link OptionValue}. Where it is exercised now: delta 1 or -1, all else 0. Theta is a full
 *   repricing one session later; vega and rho are central differences of full repricings. The odds are those of finishing in the
 *   money at expiry, as if it were held so long; with cash dividends in either model those of the escrowed one, in closed form.
 * @throws {DomainError} as {@link americanOptionPrice}.
 * @see as {@link americanOptionPrice}.
 */
export function americanOptionValue(
  option: AmericanOption,
  yearsPerNextSession: number = ONE_DAY_IN_YEARS,
  scheme: BoundaryScheme = fineScheme,
): AmericanOptionValue {
  const plain = checked(option);
  const oddsInTheMoney = oddsAtExpiry(option);
  if (plain.kind === 'european') {
    const european = europeanOptionValue(option, yearsPerNextSession);
    const isOver = option.sessions === 0 && option.years === 0 && european.price > 0;
    const price = Math.max(intrinsicValue(option), european.price);
    return { ...european, price, exerciseNow: isOver, exerciseBoundary: null };
  }
  const spot = atSpot(plain, scheme);
  if (spot.isExercised) {
    return {
      price: spot.price,
      delta: spot.delta,
      gamma: 0,
      vegaPerDailyPoint: 0,
      thetaPerSession: priceLater(option, yearsPerNextSession, scheme) - spot.price,
      rhoPerPercent: 0,
      oddsInTheMoney,
      exerciseNow: true,
      exerciseBoundary: spot.boundary,
    };
  }
  return {
    price: spot.price,
    delta: spot.delta,
    gamma: spot.gamma,
    vegaPerDailyPoint: 0.01 * slopeBy('dailyVolatility', option, scheme),
    thetaPerSession: priceLater(option, yearsPerNextSession, scheme) - spot.price,
    rhoPerPercent: 0.01 * slopeBy('ratePerYear', option, scheme),
    oddsInTheMoney,
    exerciseNow: false,
    exerciseBoundary: spot.boundary,
  };
}

const intrinsicValue = ({ type, spotPrice, strikePrice }: EuropeanOption) =>
  Math.max(0, type === 'call' ? spotPrice - strikePrice : strikePrice - spotPrice);

/** An option with rates and deviation over its life, and how it is to be valued. */
interface PlainOption {
  readonly kind: 'european' | 'certain' | 'boundary' | 'grid';
  readonly type: 'call' | 'put';
  readonly spotPrice: number;
  readonly strikePrice: number;
  readonly interest: number;
  readonly yieldOverLife: number;
  readonly deviation: number;
  readonly dividends: readonly CashDividend[];
  readonly model: DividendModel;
}

function checked(option: AmericanOption): PlainOption {
  europeanOptionPrice(option); // refuses what no option can be
  const { type, spotPrice, strikePrice, dailyVolatility, sessions, years, dividendModel = 'spot' } = option;
  const interest = option.ratePerYear * years;
  const yieldOverLife = option.dividendYield * years;
  const deviation = dailyVolatility * Math.sqrt(sessions);
  const areWithin = [spotPrice, strikePrice, spotPrice / strikePrice].every(
    (price) => price >= 1 / LARGEST_PRICE && price <= LARGEST_PRICE,
  );
  const isWithin =
    areWithin &&
    Math.abs(interest) <= LARGEST_RATE &&
    Math.abs(yieldOverLife) <= LARGEST_RATE &&
    deviation <= LARGEST_DEVIATION;
  if (!isWithin)
    throw new DomainError('american-out-of-range', { spotPrice, strikePrice, interest, yieldOverLife, deviation });
  const dividends = dividendsOfLife(option);
  const plain = { type, spotPrice, strikePrice, interest, yieldOverLife, deviation, dividends, model: dividendModel };
  return { ...plain, kind: kindOf(plain) };
}

/** Exercising early adds at most this share of the strike: as good as nothing. */
const NOTHING_EARNED = 1e-9;
/** Below this no price differs from that of a certain future by a millionth of the spot price. */
const LEAST_DEVIATION = 1e-7;

function kindOf({
  type,
  interest,
  yieldOverLife,
  deviation,
  dividends,
}: Omit<PlainOption, 'kind'>): PlainOption['kind'] {
  // Of a call the yield does what interest does of a put.
  const [earned, lost] = type === 'put' ? [interest, yieldOverLife] : [yieldOverLife, interest];
  const isNeverEarly = earned <= NOTHING_EARNED && earned <= lost + NOTHING_EARNED;
  if (dividends.length === 0 && isNeverEarly) return 'european';
  if (deviation < LEAST_DEVIATION) return 'certain';
  // A negative rate above the yield: exercised between two prices only.
  return dividends.length > 0 || earned < 0 ? 'grid' : 'boundary';
}

function dividendsOfLife({ dividends = [], spotPrice, years, ratePerYear }: AmericanOption): CashDividend[] {
  if (dividends.length === 0) return [];
  escrowedSpot({ spotPrice, dividends, years, ratePerYear }); // refuses what no dividend can be
  return dividends
    .filter(({ years: due, amount }) => due > 0 && due <= years && amount > 0)
    .map(({ years: due, amount }) => ({ years: due / years, amount }))
    .sort((one, other) => one.years - other.years);
}

/** A call is a put on the strike with the price as its strike, interest and yield changed about. */
function asUnitPut({ type, spotPrice, strikePrice, interest, yieldOverLife, deviation }: PlainOption) {
  return type === 'put'
    ? { put: { interest, yieldOverLife, deviation }, price: spotPrice / strikePrice, scale: strikePrice }
    : {
        put: { interest: yieldOverLife, yieldOverLife: interest, deviation },
        price: strikePrice / spotPrice,
        scale: spotPrice,
      };
}

interface AtSpot {
  readonly price: number;
  readonly delta: number;
  readonly gamma: number;
  readonly isExercised: boolean;
  readonly boundary: number | null;
}

function atSpot(plain: PlainOption, scheme: BoundaryScheme): AtSpot {
  if (plain.kind === 'certain') return { ...certainValue(plain), boundary: null };
  if (plain.dividends.length > 0) return { ...gridValue(plain), boundary: null };
  const { put, price, scale } = asUnitPut(plain);
  const byBoundary =
    plain.kind === 'grid' ? null : (unitPutValue(put, price, scheme) ?? unitPutValue(put, price, fineScheme));
  return unscaled(plain, byBoundary ?? gridOfPut(put, price), { price, scale });
}

/** A call too is put on the grid as a put, whose value has a bound: several times as accurate on long lives. */
function gridOfPut(put: UnitPut, price: number): Omit<UnitPutValue, 'boundary'> & { readonly boundary: null } {
  const grid = gridValue({ ...put, type: 'put', spotPrice: price, strikePrice: 1, dividends: [], model: 'spot' });
  return { price: grid.price, slope: grid.delta, bend: grid.gamma, isExercised: grid.isExercised, boundary: null };
}

function unscaled(
  { type, spotPrice, strikePrice }: PlainOption,
  unit: Omit<UnitPutValue, 'boundary'> & { readonly boundary: number | null },
  { price, scale }: { price: number; scale: number },
): AtSpot {
  const { isExercised, boundary } = unit;
  if (type === 'put') {
    return {
      price: isExercised ? strikePrice - spotPrice : scale * unit.price,
      delta: unit.slope,
      gamma: unit.bend / strikePrice,
      isExercised,
      boundary: boundary === null ? null : boundary * strikePrice,
    };
  }
  return {
    price: isExercised ? spotPrice - strikePrice : scale * unit.price,
    delta: unit.price - price * unit.slope,
    gamma: (price * price * unit.bend) / spotPrice,
    isExercised,
    boundary: boundary === null ? null : strikePrice / boundary,
  };
}

/** One session and its calendar time later, no further than expiry. */
function priceLater(option: AmericanOption, yearsPerNextSession: number, scheme: BoundaryScheme): number {
  const { sessions, years, dividends = [] } = option;
  const isOver = sessions <= 1;
  const passed = isOver ? years : Math.min(years, yearsPerNextSession);
  const due = dividends.filter((dividend) => dividend.years > 0 && dividend.years <= passed);
  const fallen = due.reduce((sum, { amount }) => sum + amount, 0);
  return americanOptionPrice(
    {
      ...option,
      spotPrice: Math.max(option.spotPrice - fallen, option.spotPrice * 1e-9),
      sessions: isOver ? 0 : sessions - 1,
      years: years - passed,
      dividends: dividends
        .filter((dividend) => dividend.years > passed)
        .map((dividend) => ({ ...dividend, years: dividend.years - passed })),
    },
    scheme,
  );
}

/** Steps small against what they change and large against the error of a price. */
const steps = { dailyVolatility: 1e-3, ratePerYear: 1e-3 } as const;

function slopeBy(field: keyof typeof steps, option: AmericanOption, scheme: BoundaryScheme): number {
  const value = option[field];
  const step = field === 'dailyVolatility' ? value * steps[field] : steps[field];
  if (!(step > 0)) return 0;
  const at = (changed: number) => americanOptionPrice({ ...option, [field]: changed }, scheme);
  return (at(value + step) - at(value - step)) / (2 * step);
}

function oddsAtExpiry(option: AmericanOption): number {
  const { dividends = [] } = option;
  return europeanOptionValue({ ...option, spotPrice: escrowedSpot({ ...option, dividends }) }).oddsInTheMoney;
}
