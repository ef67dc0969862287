import type { RequestHandler } from 'express';
import { ApiProblem } from '../errors.ts';

const safe = new Set(['GET', 'HEAD', 'OPTIONS']);

/** A browser states where a write comes from; from anywhere but this very site it is refused. */
export const sameOrigin: RequestHandler = (req, _res, next) => {
  const { origin } = req.headers;
  // A request with a key counts as the key's, whatever cookie came along; the key itself knows its origins.
  if (safe.has(req.method) || origin === undefined || req.headers.authorization !== undefined) return next();
  const own = `${req.protocol}://${req.get('host')}`;
  if (origin !== own) throw new ApiProblem('foreign-origin', `Writes from ${origin} are refused.`);
  next();
};
