import { type RequestHandler } from 'express';

const loopback = new Set(['127.0.0.1', '::1', '::ffff:127.0.0.1']);

/**
 * Session cookies are always Secure. Over plain HTTP they are set on loopback connections only: from this machine itself, whose
 * browsers treat localhost as trustworthy, or from a proxy on it that ends TLS.
 */
export const secureOnLoopback: RequestHandler = (request, _, next) => {
  if (loopback.has(request.socket.remoteAddress ?? '')) Object.defineProperty(request, 'secure', { value: true });
  next();
};
