import { type AttributedLeg, type AttributionOptions, type LegEnd } from '@/journal/attribution/attributed-leg';
import { averagedEffects } from '@/journal/attribution/averaged-effects';
import { legPrice, signedShares } from '@/journal/attribution/leg-value';
import { type EndVolatility, legVolatilities } from '@/journal/attribution/leg-volatility';
import { DomainError } from '@/journal/errors/domain-error';
import { Decimal, type DecimalText, fromModelNumber, toDecimal, toDecimalText } from '@/journal/money/decimal';
import { largestRemainder, roundMoney } from '@/journal/money/rounding';

/** Where a profit came from: amounts to the cent, signed as they act on it, which add up to `realisedProfit` exactly. */
export interface ProfitParts {
  /** Of the underlying. */
  readonly move: DecimalText;
  /** Of sessions and calendar days that passed. */
  readonly time: DecimalText;
  readonly volatility: DecimalText;
  /** Of a changed rate or dividend yield; '0' where they did not change. */
  readonly carry: DecimalText;
  /** What the middle prices moved by beyond the model's values. */
  readonly markResidual: DecimalText;
  /** Fills against the middle prices at the decision; a worse fill is negative. */
  readonly slippage: DecimalText;
  /** Paid is negative. */
  readonly fees: DecimalText;
  readonly realisedProfit: DecimalText;
}

export interface LegAttribution extends ProfitParts {
  readonly legId: string;
  /** Null for stock. */
  readonly volatilities: { readonly entry: EndVolatility; readonly exit: EndVolatility } | null;
  /** False when a middle price was not noted at one end, so that slippage is only that of the other. */
  readonly isSlippageKnown: boolean;
}

export interface ProfitAttribution {
  /** Sums of the legs' parts, to the cent. */
  readonly total: ProfitParts & { readonly modelChange: DecimalText };
  readonly legs: readonly LegAttribution[];
}

const partNames = ['move', 'time', 'volatility', 'carry', 'markResidual', 'slippage', 'fees'] as const;

/** Model amounts are doubles; decimals beyond this say nothing. */
const MODEL_PLACES = 12;

/**
 * Attributes the realised profit of what was opened and closed: the model's change of value to the move of the underlying, to time
 * and to volatility (and to rates and dividends where they changed), each averaged over all orders of full revaluations; what the
 * middle prices did beyond it; what was lost between them and the fills; fees. Legs are attributed one by one and added. Rounded
 * to cents by largest remainder, legs first, so that parts, legs and totals all add up.
 * @param legs at least one, all in one currency.
 * @throws {DomainError} `legs-missing`; as legPrice, signedShares, legVolatilities and averagedEffects; and as largestRemainder for
 *   amounts beyond 1e26, whose cents 40 digits do not hold.
 * @see averagedEffects for the orders; Perold (1988), J. Portfolio Management 14(3), 4-9, for slippage against the middle price at
 *   the decision (implementation shortfall).
 */
export function attributeProfit(legs: readonly AttributedLeg[], options: AttributionOptions): ProfitAttribution {
  if (legs.length === 0) throw new DomainError('legs-missing');
  const exact = legs.map((leg) => exactParts(leg, options));
  const profits = largestRemainder(exact.map(({ parts }) => sumOf(parts)));
  const rounded = exact.map(({ parts }, index) => largestRemainder(parts, 2, profits[index]));
  const totals = partNames.map((_, part) => sumOf(rounded.map((amounts) => amounts[part] ?? new Decimal(0))));
  return {
    total: { ...namedParts(totals), modelChange: toDecimalText(sumOf(totals.slice(0, 4))) },
    legs: exact.map(({ legId, volatilities, isSlippageKnown }, index) => ({
      legId,
      volatilities,
      isSlippageKnown,
      ...namedParts(rounded[index] ?? []),
    })),
  };
}

function namedParts(amounts: readonly Decimal[]): ProfitParts {
  const [move, time, volatility, carry, markResidual, slippage, fees] = amounts.map(toDecimalText);
  const text = (amount: DecimalText | undefined) => amount ?? '0';
  return {
    move: text(move),
    time: text(time),
    volatility: text(volatility),
    carry: text(carry),
    markResidual: text(markResidual),
    slippage: text(slippage),
    fees: text(fees),
    realisedProfit: toDecimalText(sumOf(amounts)),
  };
}

function exactParts(leg: AttributedLeg, options: AttributionOptions) {
  const { entry, exit, legId, instrument } = leg;
  const shares = signedShares(leg);
  const found = legVolatilities(leg, options.fallbackDailyVolatility);
  const effects = modelEffects(leg, found, options).map((effect) =>
    roundMoney(fromModelNumber(effect).times(shares), MODEL_PLACES),
  );
  const [bought, sold] = [pricesOf(entry), pricesOf(exit)];
  const markChange = sold.mid.minus(bought.mid).times(shares);
  const slippage = bought.mid.minus(bought.fill).plus(sold.fill.minus(sold.mid)).times(shares);
  const fees = toDecimal(entry.fees).plus(toDecimal(exit.fees)).negated();
  return {
    legId,
    volatilities: instrument.kind === 'stock' ? null : found,
    isSlippageKnown: entry.midPrice !== null && exit.midPrice !== null,
    parts: [...effects, markChange.minus(sumOf(effects)), slippage, fees],
  };
}

/** Effects of move, time, volatility and carry on the price per share; the last 0 where rates and dividends stood still. */
function modelEffects(
  leg: AttributedLeg,
  volatilities: { readonly entry: EndVolatility; readonly exit: EndVolatility },
  options: AttributionOptions,
): number[] {
  const [from, to] = [leg.entry.state, leg.exit.state];
  const hasCarry = from.ratePerYear !== to.ratePerYear || from.dividendYield !== to.dividendYield;
  const effects = averagedEffects(
    ([isMoved = false, isLater = false, isRevalued = false, isRecarried = false]) => {
      const [clock, carry] = [isLater ? to : from, isRecarried ? to : from];
      return legPrice(
        leg,
        {
          state: {
            spotPrice: (isMoved ? to : from).spotPrice,
            sessions: clock.sessions,
            years: clock.years,
            ratePerYear: carry.ratePerYear,
            dividendYield: carry.dividendYield,
          },
          dailyVolatility: (isRevalued ? volatilities.exit : volatilities.entry).dailyVolatility,
        },
        options,
      );
    },
    hasCarry ? 4 : 3,
  );
  return hasCarry ? effects : [...effects, 0];
}

function pricesOf({ fillPrice, midPrice }: LegEnd): { fill: Decimal; mid: Decimal } {
  const fill = toDecimal(fillPrice);
  return { fill, mid: midPrice === null ? fill : toDecimal(midPrice) };
}

function sumOf(amounts: readonly Decimal[]): Decimal {
  return amounts.reduce((sum, amount) => sum.plus(amount), new Decimal(0));
}
