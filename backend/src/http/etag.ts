import type { Request, Response } from 'express';
import { ApiProblem } from '../errors.ts';

/** Sets the validator and, where the caller has this very version, answers 304: true means there is nothing left to do. */
export function answeredFromCache(req: Request, res: Response, tag: string): boolean {
  res.setHeader('ETag', `"${tag}"`);
  if (!req.fresh) return false;
  res.status(304).end();
  return true;
}

/** A change made from a stale copy is refused. @throws ApiProblem stale-revision where If-Match names another version */
export function demandMatch(req: Request, tag: string): void {
  const wanted = req.headers['if-match'];
  if (wanted === undefined || wanted.trim() === '*') return;
  const tags = wanted.split(',').map((part) => part.trim());
  if (!tags.includes(`"${tag}"`))
    throw new ApiProblem('stale-revision', `It has changed since; it is "${tag}" now. Read it again, then change it.`);
}
