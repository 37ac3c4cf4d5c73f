/** A UUID as text in a binary collation, so that equal means identical. */
export const idColumn = (name: string) =>
  ({ name, type: 'char', length: 36, charset: 'ascii', collation: 'ascii_bin' }) as const;

/** Hexadecimal SHA-256. */
export const digestColumn = (name: string) =>
  ({ name, type: 'char', length: 64, charset: 'ascii', collation: 'ascii_bin' }) as const;

/** An instant in UTC, to the microsecond. */
export const instantColumn = (name: string) => ({ name, type: 'datetime', precision: 6 }) as const;
