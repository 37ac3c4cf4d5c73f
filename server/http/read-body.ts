import express, { type RequestHandler } from 'express';
import { ApiFailure } from '@/server/errors/api-failure';
import { type Endpoint } from '@/shared/contract/define-endpoint';

const JSON_LIMIT = '100kb';
const parseJson = express.json({
  limit: JSON_LIMIT,
  strict: true,
  inflate: false,
  type: 'application/json',
  reviver: (_: string, value: unknown) => (typeof value === 'string' ? wholeLetters(value) : value),
});

/** Half a letter (a lone surrogate, left by a text cut in the middle of one) has no form in UTF-8. */
function wholeLetters(text: string): string {
  return text.replace(/\p{Surrogate}/gu, '\uFFFD');
}

/** Parses a JSON body where the endpoint takes one, and refuses a body of any other kind. */
export function readBody({ body }: Endpoint): RequestHandler {
  return (request, response, next) => {
    if (body === 'file') {
      next();
      return;
    }
    const hasBody =
      request.headers['transfer-encoding'] !== undefined || Number(request.headers['content-length'] ?? 0) > 0;
    if (hasBody && request.is('application/json') === false) {
      next(new ApiFailure('content-type-refused', 'Only application/json is taken here.'));
      return;
    }
    parseJson(request, response, next);
  };
}
