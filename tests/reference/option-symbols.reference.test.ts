import { decodeOptionSymbol, encodeOptionSymbol } from '@/journal/contracts/option-symbol';
import { DomainError } from '@/journal/errors/domain-error';
import reference from '@/tests/reference/data/occ_symbols.json';
import { casesOf, numberOf, type ReferenceCase } from '@/tests/reference/reference-file';

const fieldsOf = (one: ReferenceCase) => ({
  root: String(one.root),
  expirySessionDate: String(one.expiration),
  type: one.type === 'call' ? ('call' as const) : ('put' as const),
  strikePrice: String(numberOf(one, 'strike')),
});

describe('21-character option symbols', () => {
  it.each(casesOf(reference, 'valid'))('reads and writes $symbol', (one) => {
    expect(decodeOptionSymbol(String(one.symbol))).toEqual(fieldsOf(one));
    expect(encodeOptionSymbol(fieldsOf(one))).toBe(one.symbol);
  });

  it.each(casesOf(reference, 'malformed'))('refuses $symbol ($reason)', (one) => {
    expect(() => decodeOptionSymbol(String(one.symbol))).toThrow(DomainError);
  });

  it.each(casesOf(reference, 'cannot-encode'))('cannot write $root at $strike ($error)', (one) => {
    expect(() => encodeOptionSymbol(fieldsOf(one))).toThrow('symbol-field-invalid');
  });

  it.each(casesOf(reference, 'compact'))(
    'refuses $symbol, which is no standard symbol but where nothing was to pad',
    (one) => {
      const symbol = String(one.symbol);
      if (symbol === one.standard) expect(decodeOptionSymbol(symbol)).toEqual(fieldsOf(one));
      else expect(() => decodeOptionSymbol(symbol)).toThrow('symbol-malformed');
    },
  );
});
