import { type CashDividend } from '@/journal/pricing/escrowed-spot';

/** An American option on a price that moves without chance; rates over the life, times of dividends as fractions of it. */
export interface CertainOption {
  readonly type: 'call' | 'put';
  readonly spotPrice: number;
  readonly strikePrice: number;
  readonly interest: number;
  readonly yieldOverLife: number;
  readonly dividends: readonly CashDividend[];
}

/**
 * Value of an American option without volatility: the best discounted payoff along the one path that the price takes.
 * @returns delta is that of the best time; gamma 0.
 * @see The limit of the option formulas without variance; common practice.
 */
export function certainValue(option: CertainOption): {
  price: number;
  delta: number;
  gamma: number;
  isExercised: boolean;
} {
  const { type, spotPrice, strikePrice, interest, yieldOverLife, dividends } = option;
  const sign = type === 'call' ? 1 : -1;
  const carry = interest - yieldOverLife;
  let [best, bestDelta, bestTime] = [0, 0, 1];
  const look = (time: number, price: number, share: number) => {
    const worth = Math.exp(-interest * time) * sign * (price - strikePrice);
    if (worth > best) [best, bestDelta, bestTime] = [worth, sign * share * Math.exp(-interest * time), time];
  };
  let [time, price, share] = [0, spotPrice, 1];
  for (const { years: until, amount } of [...dividends, { years: 1, amount: 0 }]) {
    look(time, price, share);
    // Between two dividends the discounted payoff can turn once: where interest and yield balance.
    const turn = time + Math.log((yieldOverLife * price) / (interest * strikePrice)) / -carry;
    if (turn > time && turn < until) {
      const growth = Math.exp(carry * (turn - time));
      look(turn, price * growth, share * growth);
    }
    const growth = Math.exp(carry * (until - time));
    [time, price, share] = [until, price * growth, share * growth];
    look(time, price, share); // just before the dividend
    price = Math.max(0, price - amount);
  }
  look(time, price, share);
  return { price: best, delta: bestDelta, gamma: 0, isExercised: best > 0 && bestTime === 0 };
}
