import { type ApiErrorCode } from '@/shared/contract/error-codes';

export interface FailureProblem {
  readonly field: string;
  readonly message: string;
}

/** A refusal that is told to the caller: a code of the contract, a sentence, and the fields it is about. */
export class ApiFailure extends Error {
  constructor(
    readonly code: ApiErrorCode,
    message: string,
    readonly problems: readonly FailureProblem[] = [],
    /** The row as it stands, where someone else changed it. */
    readonly current?: unknown,
  ) {
    super(message);
    this.name = new.target.name;
  }
}
