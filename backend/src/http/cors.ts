// Pages of other sites may ask with a browser key. Cookies never travel: no answer allows credentials.
import type { RequestHandler, Response } from 'express';

const readable = ['ETag', 'RateLimit', 'RateLimit-Policy', 'Retry-After', 'X-Request-Id', 'Deprecation'];
const sendable = ['Authorization', 'Content-Type', 'If-None-Match', 'X-Request-Id'];

/**
 * Answers a browser's question ahead of the real one. It carries no key, so it says only what could be asked with one;
 * whether this origin may is decided when the key is seen.
 */
export const preflight: RequestHandler = (req, res, next) => {
  if (req.method !== 'OPTIONS' || !req.headers.origin || !req.headers['access-control-request-method']) return next();
  res
    .status(204)
    .set({
      'Access-Control-Allow-Origin': '*',
      'Access-Control-Allow-Methods': 'GET, HEAD, POST',
      'Access-Control-Allow-Headers': sendable.join(', '),
      'Access-Control-Max-Age': '600',
      'Cache-Control': 'no-store',
    })
    .end();
};

/** Lets the page of an origin that the key lists read the answer, good or bad. */
export function allowOrigin(res: Response, origin: string): void {
  res.vary('Origin');
  res.setHeader('Access-Control-Allow-Origin', origin);
  res.setHeader('Access-Control-Expose-Headers', readable.join(', '));
}
