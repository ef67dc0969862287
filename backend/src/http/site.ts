// The built site, on the API's own port.
import { existsSync } from 'node:fs';
import path from 'node:path';
import express, { type RequestHandler, Router } from 'express';
import { ApiProblem } from '../errors.ts';

export function site(folder: string): Router {
  const router = Router();
  const index = path.join(folder, 'index.html');
  // Built names carry a hash of the content: they never change.
  router.use('/assets', express.static(path.join(folder, 'assets'), { immutable: true, maxAge: '365d', fallthrough: false }));
  router.use(express.static(folder, { index: false, maxAge: '1h' }));
  const page: RequestHandler = (req, res, next) => {
    if (req.method !== 'GET' && req.method !== 'HEAD')
      return next(new ApiProblem('method-not-allowed', 'This address takes GET.', [], { Allow: 'GET, HEAD' }));
    if (!req.accepts('html') || !existsSync(index)) return next(new ApiProblem('route-not-found', `There is no ${req.path} here.`));
    res.setHeader('Cache-Control', 'no-cache');
    res.sendFile(index);
  };
  router.use(page);
  return router;
}
