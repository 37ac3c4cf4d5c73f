import { type AttributedLeg, type AttributionOptions } from '@/journal/attribution/attributed-leg';
import { legPrice, signedShares } from '@/journal/attribution/leg-value';
import { legVolatilities } from '@/journal/attribution/leg-volatility';
import { DomainError } from '@/journal/errors/domain-error';
import { Decimal, type DecimalText, fromModelNumber, toDecimalText } from '@/journal/money/decimal';
import { largestRemainder } from '@/journal/money/rounding';
import { europeanOptionValue } from '@/journal/pricing/european-option';

/** The model's change of value told by the Greeks at entry: amounts to the cent that add up to `modelChange` exactly. */
export interface GreeksAttribution {
  readonly delta: DecimalText;
  readonly gamma: DecimalText;
  readonly theta: DecimalText;
  readonly vega: DecimalText;
  /** Rho and its like for the dividend yield; '0' where they did not change. */
  readonly carry: DecimalText;
  /** What first and second order miss. A large one says: reprice in full, day by day. */
  readonly residual: DecimalText;
  readonly modelChange: DecimalText;
}

/**
 * Tells the change of a model's value by delta, gamma, theta, vega and rho at entry, each times what its factor changed by, gamma
 * times half the square. Theta is the slope at entry (over sessions for variance, calendar years for money), not a full session.
 * For a full, exact attribution see attributeProfit.
 * @param legs at least one.
 * @throws {DomainError} `legs-missing`, and as legPrice, signedShares and legVolatilities.
 * @see Taylor expansion at entry; common practice. Greeks of the European formula whatever prices the corners.
 */
export function attributeByGreeks(legs: readonly AttributedLeg[], options: AttributionOptions): GreeksAttribution {
  if (legs.length === 0) throw new DomainError('legs-missing');
  const sums = [0, 0, 0, 0, 0, 0];
  for (const leg of legs) {
    const shares = signedShares(leg).toNumber();
    for (const [index, effect] of legEffects(leg, options).entries())
      sums[index] = (sums[index] ?? 0) + shares * effect;
  }
  const parts = largestRemainder(sums.map(fromModelNumber));
  const [delta, gamma, theta, vega, carry, residual] = parts.map(toDecimalText);
  const text = (amount: DecimalText | undefined) => amount ?? '0';
  return {
    delta: text(delta),
    gamma: text(gamma),
    theta: text(theta),
    vega: text(vega),
    carry: text(carry),
    residual: text(residual),
    modelChange: toDecimalText(parts.reduce((sum, part) => sum.plus(part), new Decimal(0))),
  };
}

/** Per share: delta, gamma, theta, vega, carry and what they leave of the model's change. */
function legEffects(leg: AttributedLeg, options: AttributionOptions): number[] {
  const { state: from } = leg.entry;
  const { state: to } = leg.exit;
  const volatilities = legVolatilities(leg, options.fallbackDailyVolatility);
  const { dailyVolatility } = volatilities.entry;
  const modelChange =
    legPrice(leg, { state: to, dailyVolatility: volatilities.exit.dailyVolatility }, options) -
    legPrice(leg, { state: from, dailyVolatility }, options);
  const moved = to.spotPrice - from.spotPrice;
  const { instrument } = leg;
  if (instrument.kind === 'stock') return [moved, 0, 0, 0, 0, modelChange - moved];
  const { type, strikePrice } = instrument;
  const greeks = europeanOptionValue({ ...from, type, strikePrice, dailyVolatility });
  const vega = greeks.vegaPerDailyPoint / 0.01;
  const perSession = from.sessions > 0 ? (vega * dailyVolatility) / (2 * from.sessions) : 0;
  const heldInShares = from.spotPrice * greeks.delta;
  const perYear = -from.dividendYield * heldInShares - from.ratePerYear * (greeks.price - heldInShares);
  const effects = [
    greeks.delta * moved,
    0.5 * greeks.gamma * moved ** 2,
    perSession * (to.sessions - from.sessions) + perYear * (to.years - from.years),
    vega * (volatilities.exit.dailyVolatility - dailyVolatility),
    (greeks.rhoPerPercent / 0.01) * (to.ratePerYear - from.ratePerYear) -
      from.years * heldInShares * (to.dividendYield - from.dividendYield),
  ];
  return [...effects, modelChange - effects.reduce((sum, effect) => sum + effect, 0)];
}
