import { DomainError } from '@/journal/errors/domain-error';
import { europeanOptionPrice } from '@/journal/pricing/european-option';

export interface DividendDecision {
  /** Of the stock just before it goes ex, above 0. */
  readonly spotPrice: number;
  readonly strikePrice: number;
  /** Currency per share, 0 or more, less than the spot price. */
  readonly dividend: number;
  /** From the ex-date to expiry. */
  readonly sessions: number;
  readonly years: number;
  readonly dailyVolatility: number;
  readonly ratePerYear: number;
}

export interface DividendAdvice {
  /** What is given up by exercising: the protection below the strike and the interest on it, currency per share. */
  readonly putValue: number;
  readonly interestOnStrike: number;
  /** What exercising brings now, and what the call is worth just after the dividend. */
  readonly exerciseValue: number;
  readonly holdingValue: number;
  readonly isExerciseBetter: boolean;
}

/**
 * Whether the holder of an American call should exercise it just before a dividend, the last one before expiry: it pays where the
 * dividend is more than the put of the same strike and the interest on the strike for the rest of the life.
 * @throws {DomainError} `dividend-invalid`, and as europeanOptionPrice.
 * @see Merton (1973), Bell J. Economics 4; Roll (1977), J. Financial Economics 5.
 */
export function exerciseBeforeDividend(decision: DividendDecision): DividendAdvice {
  const { spotPrice, strikePrice, dividend, ...rest } = decision;
  if (!(dividend >= 0 && dividend < spotPrice))
    throw new DomainError('dividend-invalid', { amount: dividend, spotPrice });
  const after = { ...rest, strikePrice, spotPrice: spotPrice - dividend, dividendYield: 0 };
  const putValue = europeanOptionPrice({ ...after, type: 'put' });
  const interestOnStrike = -strikePrice * Math.expm1(-rest.ratePerYear * rest.years);
  const exerciseValue = Math.max(0, spotPrice - strikePrice);
  const holdingValue = europeanOptionPrice({ ...after, type: 'call' });
  return {
    putValue,
    interestOnStrike,
    exerciseValue,
    holdingValue,
    isExerciseBetter: exerciseValue > 0 && dividend > putValue + interestOnStrike,
  };
}
