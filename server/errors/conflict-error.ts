import { ApiFailure, type FailureProblem } from '@/server/errors/api-failure';
import { type ApiErrorCode } from '@/shared/contract/error-codes';

/** The request does not fit the state things are in. */
export class ConflictError extends ApiFailure {
  constructor(code: ApiErrorCode, message: string, problems: readonly FailureProblem[] = [], current?: unknown) {
    super(code, message, problems, current);
  }
}
