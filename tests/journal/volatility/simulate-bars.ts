import { type PriceBar } from '@/journal/returns/price-bar';
import { type SeededRandom } from '@/journal/random/seeded-random';

/**
 * Bars of a log price without drift, variance 1e-4 a session, a share of it by night. Within each of the day's equal steps the
 * extremes are drawn from the law of a Brownian bridge, so that the range is that of a price seen all the time; without them it is
 * that of a price seen `steps` times a day.
 * @see for the extreme of a bridge between a and b over variance v: (a + b + √((a − b)² − 2·v·ln U))/2, e.g. Glasserman (2003), 6.4.
 */
export function simulateBars(
  random: SeededRandom,
  {
    count,
    nightShare,
    steps,
    isSeenAllTheTime,
  }: { count: number; nightShare: number; steps: number; isSeenAllTheTime: boolean },
): PriceBar[] {
  const variance = 1e-4;
  const night = Math.sqrt(variance * nightShare);
  const stepVariance = (variance * (1 - nightShare)) / steps;
  const extreme = (from: number, to: number) =>
    isSeenAllTheTime
      ? Math.sqrt((to - from) ** 2 - 2 * stepVariance * Math.log(random.uniform()))
      : Math.abs(to - from);
  let price = 0;
  return Array.from({ length: count }, () => {
    price += night * random.normal();
    const open = price;
    let [high, low] = [price, price];
    for (let step = 0; step < steps; step += 1) {
      const next = price + Math.sqrt(stepVariance) * random.normal();
      high = Math.max(high, next, (price + next + extreme(price, next)) / 2);
      low = Math.min(low, next, (price + next - extreme(price, next)) / 2);
      price = next;
    }
    return { open: Math.exp(open), high: Math.exp(high), low: Math.exp(low), close: Math.exp(price) };
  });
}
