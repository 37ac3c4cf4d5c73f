import { type Random } from '@/server/demo/seeded-random';
import { type DemoUnderlying } from '@/server/demo/demo-scenario';

export interface SimulatedBar {
  readonly sessionDate: string;
  readonly open: string;
  readonly high: string;
  readonly low: string;
  readonly close: string;
}

const PERSISTENCE = 0.94;
const REACTION = 0.05;
const OVERNIGHT = 0.3;
const STEPS = 26;

/**
 * Bars of an invented underlying: volatility clusters about its long-run level (GARCH(1,1), Bollerslev 1986), a night, then a
 * walk through the session whose ends and extremes make the bar.
 */
export function simulateBars(
  { startPrice, dailyVolatility }: DemoUnderlying,
  sessionDates: readonly string[],
  random: Random,
): SimulatedBar[] {
  const level = dailyVolatility ** 2;
  let variance = level;
  let price = startPrice;
  return sessionDates.map((sessionDate) => {
    const deviation = Math.sqrt(variance);
    const open = price * Math.exp(deviation * Math.sqrt(OVERNIGHT) * random.normal());
    const walk = [open];
    for (let step = 0; step < STEPS; step += 1) {
      walk.push(
        (walk[step] ?? open) * Math.exp(deviation * Math.sqrt((1 - OVERNIGHT) / STEPS) * random.normal() + 0.00001),
      );
    }
    const close = walk[STEPS] ?? open;
    const moved = Math.log(close / price);
    variance = level * (1 - PERSISTENCE - REACTION) + PERSISTENCE * variance + REACTION * moved ** 2;
    price = close;
    const text = (value: number) => value.toFixed(2);
    return {
      sessionDate,
      open: text(open),
      high: text(Math.max(...walk)),
      low: text(Math.min(...walk)),
      close: text(close),
    };
  });
}
