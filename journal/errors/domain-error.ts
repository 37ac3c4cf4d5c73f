/** What a refused input looked like: plain values that can be logged and shown. */
export type DomainErrorDetails = Readonly<Record<string, string | number | boolean | null>>;

/**
 * The one error `journal/` throws: an input outside its documented range.
 * `code` is kebab-case and stable; `details` names the offending value and, where there is one, its index.
 */
export class DomainError extends Error {
  readonly code: string;
  readonly details: DomainErrorDetails;

  constructor(code: string, details: DomainErrorDetails = {}) {
    super(`${code} ${JSON.stringify(details)}`);
    this.name = 'DomainError';
    this.code = code;
    this.details = details;
  }
}
