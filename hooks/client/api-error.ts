import { type ApiErrorBody, type ApiErrorCode } from '@/shared/contract/error-codes';

interface ApiProblem {
  readonly field: string;
  readonly message: string;
}

/** An answer that is not a success, or no answer at all (code 'unreachable'). */
export class ApiError extends Error {
  readonly code: ApiErrorCode | 'unreachable';
  /** What the reader can do about it. */
  readonly action: string;
  readonly problems: readonly ApiProblem[];
  readonly current: unknown;

  constructor(
    body: Omit<ApiErrorBody['error'], 'code' | 'requestId' | 'current'> & { code: ApiError['code']; current?: unknown },
  ) {
    super(body.message);
    this.name = 'ApiError';
    this.code = body.code;
    this.action = body.action;
    this.problems = body.problems;
    this.current = body.current;
  }

  /** The message for one field, if the server named it. */
  problemOf(field: string): string | undefined {
    return this.problems.find((problem) => problem.field === field)?.message;
  }
}

export const unreachable = () =>
  new ApiError({
    code: 'unreachable',
    message: 'Brierbook cannot be reached.',
    action: 'Check the connection; what you typed is kept here.',
    problems: [],
  });
