/** Signs a spreadsheet takes for the beginning of a formula, their full-width forms, and control characters that hide one. */
const formulaStart = /^[=+\-@\t\r\n\0\uFF1D\uFF0B\uFF0D\uFF20]/u;

/** Text as a spreadsheet shows it and never computes it. */
export const harmlessText = (text: string): string => (formulaStart.test(text) ? `'${text}` : text);
