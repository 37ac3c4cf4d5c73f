import { type ProfitStep } from '@/components/charts/profit-steps';
import { type SealedEntry } from '@/components/entry/sealed-entry';

type Sources = NonNullable<NonNullable<SealedEntry['outcome']>['sources']>;

/** The parts of a profit in the order they are shown; rates only where they did something. */
export function stepsOf(sources: Sources): ProfitStep[] {
  const { move, time, volatility, carry, markResidual, slippage, fees } = sources;
  return [
    { label: 'Move', amount: move },
    { label: 'Time', amount: time },
    { label: 'Volatility', amount: volatility },
    ...(Number(carry) === 0 ? [] : [{ label: 'Rates', amount: carry }]),
    { label: 'Remainder', amount: markResidual },
    { label: 'Slippage', amount: slippage },
    { label: 'Fees', amount: fees },
  ];
}

/** How far the parts can be trusted; null when everything they rest on was noted. */
export function sourceCaution({ underlyingFrom, isSlippageKnown }: Sources, symbol: string): string | null {
  const missing = [
    ...(underlyingFrom === 'noted' ? [] : [`the price of ${symbol} (closes stand in, so the remainder is larger)`]),
    ...(isSlippageKnown ? [] : ['the mid (slippage hides in volatility)']),
  ];
  return missing.length === 0 ? null : `Not noted with every fill: ${missing.join(' and ')}.`;
}
