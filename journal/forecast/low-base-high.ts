import { type LowBaseHigh } from '@/journal/forecast/forecast';

/** Applies a function to each of the three volatilities. */
export function overVolatilities(volatility: LowBaseHigh, figure: (dailyVolatility: number) => number): LowBaseHigh {
  return { low: figure(volatility.low), base: figure(volatility.base), high: figure(volatility.high) };
}
