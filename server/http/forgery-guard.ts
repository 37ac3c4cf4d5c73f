import { type NextFunction, type Request, type Response } from 'express';
import { ApiFailure } from '@/server/errors/api-failure';
import { requestHeader } from '@/shared/contract/request-headers';

const harmless = new Set(['GET', 'HEAD', 'OPTIONS']);

/**
 * Refuses requests another site makes a browser send: whatever changes something must say it comes from our own pages
 * (Sec-Fetch-Site, or an Origin that is ours) and carry a header that no foreign page can set.
 */
export function forgeryGuard(publicOrigin: string) {
  return (request: Request, _: Response, next: NextFunction): void => {
    if (harmless.has(request.method) || isOurs(request, publicOrigin)) next();
    else next(new ApiFailure('request-forged', 'This request did not come from a page of Brierbook.'));
  };
}

function isOurs(request: Request, publicOrigin: string): boolean {
  if (request.get(requestHeader.name) !== requestHeader.value) return false;
  const site = request.get('sec-fetch-site');
  const origin = request.get('origin');
  if (site !== undefined) return site === 'same-origin';
  return origin === publicOrigin;
}
