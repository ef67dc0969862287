import type { Request, Response } from 'express';

/** Sets the validator and, where the caller has this very version, answers 304: true means there is nothing left to do. */
export function answeredFromCache(req: Request, res: Response, tag: string): boolean {
  res.setHeader('ETag', `"${tag}"`);
  if (!req.fresh) return false;
  res.status(304).end();
  return true;
}
