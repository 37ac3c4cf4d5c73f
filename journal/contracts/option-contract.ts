import { type SessionDate } from '@/journal/sessions/session-date';

/** What identifies a series. */
export interface OptionContract {
  readonly underlyingSymbol: string;
  readonly expirySessionDate: SessionDate;
  readonly type: 'call' | 'put';
  /** Decimal text, above 0. */
  readonly strikePrice: string;
}

const months = ['Jan', 'Feb', 'Mar', 'Apr', 'May', 'Jun', 'Jul', 'Aug', 'Sep', 'Oct', 'Nov', 'Dec'] as const;

/** One text per series: equal series give equal keys, however their strike was written ('97' and '97.00'). */
export function contractKey({ underlyingSymbol, expirySessionDate, type, strikePrice }: OptionContract): string {
  return [underlyingSymbol, expirySessionDate, type, withoutTrailingZeros(strikePrice)].join(' ');
}

/**
 * A series as it is spoken of: "23 Dec 97 put".
 * @param options.withYear adds the year: "23 Dec 2026 97 put".
 */
export function contractLabel(
  contract: OptionContract,
  { withYear = false }: { readonly withYear?: boolean } = {},
): string {
  const [year, month, day] = contract.expirySessionDate.split('-');
  const name = months[Number(month) - 1] ?? '';
  return [
    Number(day),
    name,
    ...(withYear ? [year] : []),
    withoutTrailingZeros(contract.strikePrice),
    contract.type,
  ].join(' ');
}

function withoutTrailingZeros(text: string): string {
  return text.includes('.') ? text.replace(/\.?0+$/, '') : text;
}
