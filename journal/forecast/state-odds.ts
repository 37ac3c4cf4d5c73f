import { type LowBaseHigh, type StatedOdds } from '@/journal/forecast/forecast';
import { oddsOfProfit } from '@/journal/forecast/describe-distribution';
import { overVolatilities } from '@/journal/forecast/low-base-high';
import { clockOf, lawAt, planLogDrift, type PlanModel } from '@/journal/forecast/plan-model';
import { type Drift } from '@/journal/odds/log-drift';
import { oddsBeyondLevel } from '@/journal/odds/odds-beyond-level';
import { touchOdds } from '@/journal/odds/touch-odds';
import { toModelNumber } from '@/journal/money/decimal';

const riskNeutral: Drift = { kind: 'riskNeutral' };

/** Every probability a plan states, under its own drift, with the market-implied one beside it. */
export function stateOdds(model: PlanModel): StatedOdds[] {
  const { horizon, input } = model;
  const stated: StatedOdds[] = input.legs.map((leg, index) => {
    const found = model.implied[index];
    return {
      key: `in-the-money:${leg.id}`,
      event: { kind: 'in-the-money', legId: leg.id },
      probability: overVolatilities(input.volatility, (volatility) =>
        oddsInTheMoney(model, index, volatility, input.drift),
      ),
      marketImplied: found?.kind === 'found' ? oddsInTheMoney(model, index, found.dailyVolatility, riskNeutral) : null,
      dueSessionDate: horizon.expirySessionDate,
    };
  });
  stated.push(profitOdds(model, 'expiry'));
  if (!horizon.holdsToExpiry) stated.push(profitOdds(model, 'exit'));
  if (input.targetPrice !== null) stated.push(levelOdds(model, 'touch-target', input.targetPrice));
  if (input.stopPrice !== null) stated.push(levelOdds(model, 'touch-stop', input.stopPrice));
  return stated;
}

function oddsInTheMoney(model: PlanModel, legIndex: number, dailyVolatility: number, drift: Drift): number {
  const leg = model.position.legs[legIndex];
  if (leg === undefined) throw new RangeError('A plan has one model leg a leg.');
  const { above, below } = oddsBeyondLevel({
    spotPrice: model.spotPrice,
    level: leg.strikePrice,
    totalDeviation: dailyVolatility * Math.sqrt(model.horizon.sessions.toExpiry),
    logDrift: planLogDrift(model, drift, dailyVolatility, 'expiry'),
  });
  return leg.type === 'call' ? above : below;
}

function profitOdds(model: PlanModel, which: 'expiry' | 'exit'): StatedOdds {
  const { horizon, input, impliedDailyVolatility: implied } = model;
  const kind = which === 'expiry' ? 'profit-at-expiry' : 'profit-at-exit';
  return {
    key: kind,
    event: { kind },
    probability: overVolatilities(input.volatility, (volatility) =>
      oddsOfProfit(lawAt(model, which, volatility, input.drift)),
    ),
    marketImplied: implied === null ? null : oddsOfProfit(lawAt(model, which, implied, riskNeutral)),
    dueSessionDate: which === 'expiry' ? horizon.expirySessionDate : horizon.exitSessionDate,
  };
}

function levelOdds(model: PlanModel, kind: 'touch-target' | 'touch-stop', level: string): StatedOdds {
  const { horizon, input, impliedDailyVolatility: implied } = model;
  const { sessions } = clockOf(model, 'exit');
  const oddsAt = (dailyVolatility: number, drift: Drift) =>
    touchOdds({
      spotPrice: model.spotPrice,
      level: toModelNumber(level),
      totalDeviation: dailyVolatility * Math.sqrt(sessions),
      logDrift: planLogDrift(model, drift, dailyVolatility, 'exit'),
    });
  const probability: LowBaseHigh = overVolatilities(input.volatility, (volatility) => oddsAt(volatility, input.drift));
  return {
    key: kind,
    event: { kind, level },
    probability,
    marketImplied: implied === null ? null : oddsAt(implied, riskNeutral),
    dueSessionDate: horizon.exitSessionDate,
  };
}
