import { type NextFunction, type Request, type Response } from 'express';
import { type Ids } from '@/server/runtime/ids';

const requestIds = new WeakMap<object, string>();

/** Gives each request a number of our own that links answer, log and audit trail. */
export function assignRequestId(ids: Ids) {
  return (request: Request, response: Response, next: NextFunction): void => {
    const id = ids.next();
    requestIds.set(request, id);
    response.set('X-Request-Id', id);
    next();
  };
}

export function requestIdOf(request: Request): string {
  return requestIds.get(request) ?? 'unassigned';
}
