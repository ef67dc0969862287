import { type NextFunction, type Request, type Response, Router } from 'express';
import * as z from 'zod';
import { demand } from '../auth/may.ts';
import { ApiProblem } from '../errors.ts';
import type { Method, Route } from './operation.ts';
import { parseBody, parseParameters } from './validate.ts';

const noFields = z.strictObject({});
const expressPath = (path: string) => path.replace(/\{(\w+)\}/g, ':$1');

/** Every route under one router: first who may, then what was asked, then the handler; 405 for other methods of a known address. */
export function mountRoutes(routes: readonly Route[]): Router {
  const router = Router({ caseSensitive: true, strict: false });
  for (const { operation, handle } of routes) {
    router[operation.method](expressPath(operation.path), async (req: Request, res: Response) => {
      demand(req.actor, operation.may);
      const params = parseParameters(operation.params ?? noFields, req.params);
      const query = parseParameters(operation.query ?? noFields, req.query);
      const body = operation.body ? parseBody(operation.body, bodyOf(req, operation.method)) : undefined;
      res.setHeader('Cache-Control', operation.cache);
      const answer = await handle({ params, query, body, actor: req.actor, req, res });
      if (res.headersSent || res.writableEnded) return;
      res.status(operation.reply.status);
      if (answer === undefined) res.end();
      else res.json(answer);
    });
  }
  for (const [path, methods] of methodsByPath(routes)) {
    const allow = [...methods, ...(methods.includes('get') ? ['head'] : [])].join(', ').toUpperCase();
    router.all(expressPath(path), (req: Request, res: Response, next: NextFunction) => {
      if (req.method === 'OPTIONS') {
        res.setHeader('Allow', allow).status(204).end();
        return;
      }
      next(new ApiProblem('method-not-allowed', `This address takes ${allow}.`, [], { Allow: allow }));
    });
  }
  return router;
}

/** An absent body is an empty object, so that an order without wishes needs none; other kinds than JSON are refused. */
function bodyOf(req: Request, method: Method): unknown {
  const sent = Number(req.headers['content-length'] ?? 0) > 0 || req.headers['transfer-encoding'] !== undefined;
  if (sent && !req.is('json')) throw new ApiProblem('unsupported-media-type', 'Send application/json.');
  return sent || method === 'get' ? req.body : {};
}

function methodsByPath(routes: readonly Route[]): Map<string, Method[]> {
  const byPath = new Map<string, Method[]>();
  for (const { operation } of routes) byPath.set(operation.path, [...(byPath.get(operation.path) ?? []), operation.method]);
  return byPath;
}
