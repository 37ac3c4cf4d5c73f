import { formatNumber } from '@/components/ui/number-format';

/** Decimals that tell values `step` apart from one another without noise: 2.6 needs 1, 22 needs none. */
export function decimalsForStep(step: number): number {
  if (!(step > 0) || step === Infinity) return 2;
  return Math.min(6, Math.max(0, 1 - Math.floor(Math.log10(step))));
}

/** An underlying's price as it stands in a key: cents, and more below 1. */
export function priceText(price: number): string {
  return formatNumber(price, Math.abs(price) > 0 && Math.abs(price) < 1 ? 4 : 2);
}
