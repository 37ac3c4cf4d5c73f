import { type SessionDate } from '@/journal/sessions/session-date';

/** What identifies a series. */
export interface OptionContract {
  readonly underlyingSymbol: string;
  readonly expirySessionDate: SessionDate;
  readonly type: 'call' | 'put';
  /** Decimal text, above 0. */
  readonly strikePrice: string;
}

/** One text per series: equal series give equal keys, however their strike was written ('97' and '97.00'). */
export function contractKey({ underlyingSymbol, expirySessionDate, type, strikePrice }: OptionContract): string {
  return [underlyingSymbol, expirySessionDate, type, withoutTrailingZeros(strikePrice)].join(' ');
}

function withoutTrailingZeros(text: string): string {
  return text.includes('.') ? text.replace(/\.?0+$/, '') : text;
}
