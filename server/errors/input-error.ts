import { ApiFailure, type FailureProblem } from '@/server/errors/api-failure';

/** Something the caller sent is missing or wrong, field by field. */
export class InputError extends ApiFailure {
  constructor(problems: readonly FailureProblem[], message = 'Some fields need correcting.') {
    super('input-invalid', message, problems);
  }
}
