import { DomainError } from '@/journal/errors/domain-error';
import { isSessionDate, type SessionDate } from '@/journal/sessions/session-date';

export interface OptionSymbolFields {
  /** 1 to 6 capital letters or digits, letters first or a digit for flexible contracts. */
  readonly root: string;
  readonly expirySessionDate: SessionDate;
  readonly type: 'call' | 'put';
  /** Decimal text, above 0, at most 99999.999. */
  readonly strikePrice: string;
}

const ROOT = /^[A-Z0-9]{1,6}$/;
const ROOT_LENGTH = 6;

/**
 * Writes a series as its 21-character symbol: root padded to six, yymmdd, C or P, strike in thousandths with eight digits.
 * @throws {DomainError} `symbol-field-invalid` with the field.
 * @see Options Symbology Initiative of the US options exchanges (layout from memory).
 */
export function encodeOptionSymbol({ root, expirySessionDate, type, strikePrice }: OptionSymbolFields): string {
  const refuse = (field: string, value: string) =>
    new DomainError('symbol-field-invalid', { field, value: value.slice(0, 40) });
  if (!ROOT.test(root)) throw refuse('root', root);
  if (!isSessionDate(expirySessionDate) || !expirySessionDate.startsWith('20'))
    throw refuse('expirySessionDate', expirySessionDate);
  const match = /^0*(\d{1,5})(?:\.(\d{1,3})0*)?$/.exec(strikePrice);
  const thousandths = match === null ? '' : `${(match[1] ?? '').padStart(5, '0')}${(match[2] ?? '').padEnd(3, '0')}`;
  if (!/[1-9]/.test(thousandths)) throw refuse('strikePrice', strikePrice);
  return `${root.padEnd(ROOT_LENGTH)}${expirySessionDate.slice(2).replaceAll('-', '')}${type === 'call' ? 'C' : 'P'}${thousandths}`;
}

/**
 * Reads a 21-character option symbol.
 * @returns its fields; the strike as decimal text without trailing zeros ('12.5').
 * @throws {DomainError} `symbol-malformed` with what is wrong.
 * @see as {@link encodeOptionSymbol}.
 */
export function decodeOptionSymbol(symbol: string): OptionSymbolFields {
  const refuse = (reason: string) => new DomainError('symbol-malformed', { symbol: symbol.slice(0, 40), reason });
  if (symbol.length !== 21) throw refuse('must have 21 characters');
  const root = symbol.slice(0, ROOT_LENGTH).trimEnd();
  if (!ROOT.test(root)) throw refuse('root');
  const parts = /^(\d{2})(\d{2})(\d{2})([CP])(\d{5})(\d{3})$/.exec(symbol.slice(ROOT_LENGTH));
  if (parts === null) throw refuse('date, type or strike');
  const [, year, month, day, letter, dollars = '', thousandths = ''] = parts;
  const expirySessionDate = `20${year}-${month}-${day}`;
  if (!isSessionDate(expirySessionDate)) throw refuse('date');
  const strikePrice = `${dollars}.${thousandths}`.replace(/^0+(?=\d)/, '').replace(/\.?0+$/, '');
  if (!/[1-9]/.test(strikePrice)) throw refuse('strike');
  return { root, expirySessionDate, type: letter === 'C' ? 'call' : 'put', strikePrice };
}
