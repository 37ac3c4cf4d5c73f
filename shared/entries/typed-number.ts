/**
 * Reads a number a person typed into a form: an optional sign, digits, an optional point with digits.
 * @returns the number, or null when the text is anything else (empty, letters, two points, an exponent).
 */
export function readTypedNumber(text: string): number | null {
  const trimmed = text.trim().replace(/^−/, '-');
  return /^-?\d{1,15}(\.\d{1,12})?$/.test(trimmed) ? Number(trimmed) : null;
}
