import { DomainError } from '@/journal/errors/domain-error';
import { europeanOptionValue } from '@/journal/pricing/european-option';
import { type RepricedLeg, type RepriceMoment } from '@/journal/scenarios/reprice';

/** Sensitivities of a whole position, currency and shares. */
export interface PositionGreeks {
  /** Shares of the underlying with the same first effect. */
  readonly shareEquivalent: number;
  /** Change of the share equivalent as the price moves by 1 %. */
  readonly gammaPerPercent: number;
  /** Change of value when the next session has passed, all else equal: a full repricing. */
  readonly thetaNextSession: number;
  /** Per 0.10 point of daily volatility, 0.001 as a fraction. */
  readonly vegaPerTenthDailyPoint: number;
  /** Per 1 point of annual volatility over the given sessions. */
  readonly vegaPerAnnualPoint: number;
  /** Per 1 point of the yearly rate. */
  readonly rhoPerPercent: number;
}

const SESSIONS_PER_YEAR = 252;

/**
 * Greeks of options and shares in the units they are traded in, summed over legs.
 * @param question.moment what is left to the first expiry; `shares` held beside the options; `yearsPerNextSession` calendar years
 *   that pass over the next session; `sessionsPerYear` the convention of annual points, 252 by default.
 * @throws {DomainError} `option-input-invalid`; `position-invalid` where sizes are not finite.
 * @see europeanOptionValue; units: common practice.
 */
export function positionGreeks(question: {
  readonly legs: readonly RepricedLeg[];
  readonly shares?: number;
  readonly spotPrice: number;
  readonly moment: RepriceMoment;
  readonly yearsPerNextSession?: number;
  readonly sessionsPerYear?: number;
}): PositionGreeks {
  const { legs, shares = 0, spotPrice, moment, sessionsPerYear = SESSIONS_PER_YEAR } = question;
  let [shareEquivalent, gamma, thetaNextSession, vegaPerDailyPoint, rhoPerPercent] = [shares, 0, 0, 0, 0];
  for (const { signedShares, sessionsBeyond = 0, yearsBeyond = 0, type, strikePrice, dailyVolatility } of legs) {
    const greeks = europeanOptionValue(
      {
        type,
        strikePrice,
        dailyVolatility,
        spotPrice,
        sessions: moment.sessions + sessionsBeyond,
        years: moment.years + yearsBeyond,
        ratePerYear: moment.ratePerYear,
        dividendYield: moment.dividendYield,
      },
      question.yearsPerNextSession,
    );
    shareEquivalent += signedShares * greeks.delta;
    gamma += signedShares * greeks.gamma;
    thetaNextSession += signedShares * greeks.thetaPerSession;
    vegaPerDailyPoint += signedShares * greeks.vegaPerDailyPoint;
    rhoPerPercent += signedShares * greeks.rhoPerPercent;
  }
  const sum = shareEquivalent + gamma + thetaNextSession + vegaPerDailyPoint + rhoPerPercent;
  if (!Number.isFinite(sum)) throw new DomainError('position-invalid', { shares, legs: legs.length });
  return {
    shareEquivalent,
    gammaPerPercent: gamma * spotPrice * 0.01,
    thetaNextSession,
    vegaPerTenthDailyPoint: vegaPerDailyPoint / 10,
    vegaPerAnnualPoint: vegaPerDailyPoint / Math.sqrt(sessionsPerYear),
    rhoPerPercent,
  };
}
