import { readingLimits } from '@/server/prices/reading/reading-limits';
import { type SourceCell } from '@/server/prices/reading/source-table';
import { type Reading } from '@/shared/prices/price-upload';

export type DecimalMark = Reading['decimalMark'];

const grammars: Record<DecimalMark, RegExp> = {
  // Whole digits, or groups of three behind one kind of mark, then the decimals.
  point: /^(\d+|[1-9]\d{0,2}(?:([, '\u2019\u00a0\u202f\u2009])\d{3}(?:\2\d{3})*))(?:\.(\d+))?$/,
  comma: /^(\d+|[1-9]\d{0,2}(?:([. '\u2019\u00a0\u202f\u2009])\d{3}(?:\2\d{3})*))(?:,(\d+))?$/,
};

/** A decimal number in one spelling: no leading or trailing zeros beyond need. */
export const plainDecimal = (whole: string, decimals: string): string => {
  const kept = decimals.replace(/0+$/, '');
  const digits = whole.replace(/^0+(?=\d)/, '');
  return kept === '' ? digits : `${digits}.${kept}`;
};

export type ReadPrice = { readonly price: string } | { readonly problem: string };

const explain = (text: string, mark: DecimalMark): string => {
  if (text.includes('%')) return 'carries a percent sign; a price is a plain number';
  if (/\p{L}/u.test(text)) return 'holds a letter; a price is a plain number';
  if (/^[-\u2212(]/.test(text)) return 'is below 0; a price is above 0';
  const other = mark === 'point' ? 'comma' : 'point';
  if (grammars[other].test(text)) return `does not have a decimal ${mark} like the other prices`;
  return 'is not a plain number';
};

/** Reads a price by one strict grammar; nothing is rounded and nothing is guessed. */
export function readPrice(cell: SourceCell, mark: DecimalMark): ReadPrice {
  const text = cell.text.trim();
  if (cell.kind === 'error') return { problem: 'is an error of the worksheet, not a price' };
  if (cell.kind === 'date') return { problem: 'is a date, not a price' };
  const match = grammars[cell.kind === 'number' ? 'point' : mark].exec(text);
  if (match === null) return { problem: explain(text, mark) };
  const whole = (match[1] ?? '').replace(/\D/g, '');
  const decimals = match[3] ?? '';
  if (decimals.replace(/0+$/, '').length > readingLimits.decimals) {
    return {
      problem: `has ${decimals.length} decimals; at most ${readingLimits.decimals} are kept, so round the column`,
    };
  }
  if (whole.length > readingLimits.integerDigits) return { problem: 'is too large to be a price' };
  const price = plainDecimal(whole, decimals);
  return price === '0' ? { problem: 'is 0; a price is above 0' } : { price };
}

/** Which decimal mark the prices were written with; `isCertain` is false when every price could be read both ways. */
export function detectDecimalMark(cells: readonly SourceCell[]): {
  mark: DecimalMark;
  isCertain: boolean;
  example: string;
} {
  let pointOnly = 0;
  let commaOnly = 0;
  let differing: string | null = null;
  for (const cell of cells) {
    if (cell.kind !== 'text') continue;
    const text = cell.text.trim();
    const isPoint = grammars.point.test(text);
    const isComma = grammars.comma.test(text);
    if (isPoint && !isComma) pointOnly += 1;
    if (isComma && !isPoint) commaOnly += 1;
    if (isPoint && isComma && /[.,]/.test(text)) differing ??= text;
  }
  const mark = commaOnly > pointOnly ? 'comma' : 'point';
  return { mark, isCertain: differing === null || pointOnly + commaOnly > 0, example: differing ?? '' };
}
