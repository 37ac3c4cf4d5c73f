import { type AmericanOption } from '@/journal/pricing/american-option';
import { europeanOptionPrice } from '@/journal/pricing/european-option';

/**
 * An American option by a binomial tree (Cox, Ross and Rubinstein 1979) whose last step is priced in closed form and whose result is
 * extrapolated from half as many steps (Broadie and Detemple 1996): a voice of its own, of another method.
 */
export function binomialAmerican(option: AmericanOption, steps: number): number {
  return 2 * tree(option, steps) - tree(option, steps / 2);
}

function tree(option: AmericanOption, steps: number): number {
  const { type, spotPrice, strikePrice, dailyVolatility, sessions, years, ratePerYear, dividendYield } = option;
  const up = Math.exp(dailyVolatility * Math.sqrt(sessions / steps));
  const [discount, growth] = [
    Math.exp((-ratePerYear * years) / steps),
    Math.exp(((ratePerYear - dividendYield) * years) / steps),
  ];
  const chance = (growth - 1 / up) / (up - 1 / up);
  const payoff = (price: number) => Math.max(0, type === 'call' ? price - strikePrice : strikePrice - price);
  const priceAt = (step: number, ups: number) => spotPrice * up ** (2 * ups - step);
  const last = steps - 1;
  let values = Array.from({ length: last + 1 }, (_, ups) => {
    const price = priceAt(last, ups);
    const held = europeanOptionPrice({ ...option, spotPrice: price, sessions: sessions / steps, years: years / steps });
    return Math.max(payoff(price), held);
  });
  for (let step = last - 1; step >= 0; step -= 1) {
    values = Array.from({ length: step + 1 }, (_, ups) =>
      Math.max(
        payoff(priceAt(step, ups)),
        discount * (chance * (values[ups + 1] ?? 0) + (1 - chance) * (values[ups] ?? 0)),
      ),
    );
  }
  return values[0] ?? NaN;
}
