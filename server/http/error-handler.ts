import { type ErrorRequestHandler } from 'express';
import { ApiFailure } from '@/server/errors/api-failure';
import { describeFailure } from '@/server/database/describe-failure';
import { isDatabaseUnavailable } from '@/server/database/database-unavailable';
import { type Logger } from '@/server/runtime/logger';
import { apiErrors, type ApiErrorBody, type ApiErrorCode } from '@/shared/contract/error-codes';
import { requestIdOf } from '@/server/http/request-id';

const RETRY_SECONDS = '5';

/** The one place that turns failures into answers; what is unknown is logged and told without detail. */
export function errorHandler(logger: Logger): ErrorRequestHandler {
  return (error: unknown, request, response, next) => {
    if (response.headersSent) {
      const hasLeft = error instanceof Error && 'code' in error && error.code === 'ERR_STREAM_PREMATURE_CLOSE';
      if (!hasLeft) logger.error({ requestId: requestIdOf(request), error: describeFailure(error) }, 'answer cut');
      next(error);
      return;
    }
    const failure = asFailure(error);
    const requestId = requestIdOf(request);
    const { status, action } = apiErrors[failure.code];
    if (status >= 500) logger.error({ requestId, error: describeFailure(error) }, 'request failed');
    if (status === 429 || status === 503) response.set('Retry-After', RETRY_SECONDS);
    const body: ApiErrorBody = {
      error: {
        code: failure.code,
        message: failure.message,
        action,
        problems: [...failure.problems],
        requestId,
        ...(failure.current === undefined ? {} : { current: failure.current }),
      },
    };
    response.status(status).set('Cache-Control', 'no-store').json(body);
  };
}

function asFailure(error: unknown): ApiFailure {
  if (error instanceof ApiFailure) return error;
  if (isDatabaseUnavailable(error)) return new ApiFailure('unavailable', 'The database is busy or out of reach.');
  const code = codeOfFramework(error);
  if (code !== null) return new ApiFailure(code, frameworkMessages[code]);
  return new ApiFailure('internal', 'Something went wrong on our side.');
}

const frameworkMessages = {
  'request-malformed': 'The request cannot be read.',
  'content-type-refused': 'This kind of content is not taken here.',
  'too-large': 'What was sent is larger than is taken here.',
} as const satisfies Partial<Record<ApiErrorCode, string>>;

/** Express and its parsers report by a status on the error. */
function codeOfFramework(error: unknown): keyof typeof frameworkMessages | null {
  if (!(error instanceof Error) || !('status' in error)) return null;
  if (error.status === 413) return 'too-large';
  if (error.status === 415) return 'content-type-refused';
  return typeof error.status === 'number' && error.status >= 400 && error.status < 500 ? 'request-malformed' : null;
}
