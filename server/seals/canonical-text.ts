import serialize from 'canonicalize';

/** Values a seal can hold: JSON without undefined. */
export type SealedValue =
  null | boolean | number | string | readonly SealedValue[] | { readonly [key: string]: SealedValue };

const NUMBER_MARK = '#';

/**
 * The one text of a value: RFC 8785 JSON with text in Unicode NFC and every number as text behind a '#', so that no
 * reader's own floating-point printing can change it. Text that starts with '#' gets a second one.
 * @throws {TypeError} for NaN and infinities, which a forecast never holds.
 */
export function toCanonicalText(value: SealedValue): string {
  const text = serialize(marked(value));
  if (text === undefined) throw new TypeError('A seal holds JSON values only.');
  return text;
}

/** The value a canonical text stands for. */
export function fromCanonicalText(text: string): SealedValue {
  const parsed: SealedValue = JSON.parse(text);
  return unmarked(parsed);
}

function marked(value: SealedValue): SealedValue {
  if (typeof value === 'number') {
    if (!Number.isFinite(value)) throw new TypeError(`A seal cannot hold ${value}.`);
    return NUMBER_MARK + String(Object.is(value, -0) ? 0 : value);
  }
  if (typeof value === 'string') return (value.startsWith(NUMBER_MARK) ? NUMBER_MARK : '') + value.normalize('NFC');
  return mapped(value, marked);
}

function unmarked(value: SealedValue): SealedValue {
  if (typeof value !== 'string') return mapped(value, unmarked);
  if (!value.startsWith(NUMBER_MARK)) return value;
  return value.startsWith(NUMBER_MARK, 1) ? value.slice(1) : Number(value.slice(1));
}

function mapped(value: SealedValue, map: (item: SealedValue) => SealedValue): SealedValue {
  if (value === null || typeof value !== 'object') return value;
  if (isList(value)) return value.map(map);
  return Object.fromEntries(Object.entries(value).map(([key, item]) => [key.normalize('NFC'), map(item)]));
}

function isList(value: SealedValue): value is readonly SealedValue[] {
  return Array.isArray(value);
}
