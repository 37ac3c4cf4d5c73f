/** `reading-invalid` is a fault of how the file was asked to be read, not of the file. */
export type PriceFileProblem = 'file-unreadable' | 'too-large' | 'reading-invalid';

/** The file as a whole cannot be read; the message says what is wrong, where, and what to do. */
export class PriceFileError extends Error {
  readonly code: PriceFileProblem;

  constructor(code: PriceFileProblem, message: string) {
    super(message);
    this.name = 'PriceFileError';
    this.code = code;
  }
}

export const unreadable = (message: string): PriceFileError => new PriceFileError('file-unreadable', message);

export const readingInvalid = (message: string): PriceFileError => new PriceFileError('reading-invalid', message);
