import { type NextFunction, type Request, type Response, Router } from 'express';
import * as z from 'zod';
import { actorId } from '../auth/actor.ts';
import { demand } from '../auth/may.ts';
import type { Deps } from '../deps.ts';
import { ApiProblem } from '../errors.ts';
import { type AnswerCache, answerCache } from './answer-cache.ts';
import { beginCreation } from './idempotency.ts';
import { type Call, costOf, type Method, type Route, takesIdempotencyKey } from './operation.ts';
import { parseBody, parseParameters } from './validate.ts';

const noFields = z.strictObject({});
const expressPath = (path: string) => path.replace(/\{(\w+)\}/g, ':$1');
type AnyCall = Call<never, never, never>;

/**
 * Every route under one router: who may, what is left of the limit, what was asked, whether it is answered already, then
 * the handler; 405 for other methods of a known address.
 */
export function mountRoutes(routes: readonly Route[], { db, limits }: Deps): Router {
  const router = Router({ caseSensitive: true, strict: false });
  const answers = answerCache(db);
  for (const known of routes) {
    const { operation } = known;
    router[operation.method](expressPath(operation.path), async (req: Request, res: Response) => {
      demand(req.actor, operation.may);
      await limits.charge(req, res, req.actor, costOf(operation));
      if (operation.byEdition && answeredBefore(answers, operation.cache, req, res)) return;
      const edition = operation.byEdition ? answers.edition() : 0;
      const params = parseParameters(operation.params ?? noFields, req.params);
      const query = parseParameters(operation.query ?? noFields, req.query);
      const body = operation.body ? parseBody(operation.body, bodyOf(req, operation.method)) : undefined;
      if (operation.moreCost) await limits.chargeMore(req, req.actor, operation.moreCost.of({ body, query }));
      res.setHeader('Cache-Control', operation.cache);
      const call = { params, query, body, actor: req.actor, req, res } as AnyCall;
      const answer = await (takesIdempotencyKey(operation) ? once(db, known, call) : known.handle(call));
      if (res.headersSent || res.writableEnded) return;
      res.status(operation.reply.status);
      if (answer === undefined) res.end();
      else if (operation.byEdition) sendAndKeep(answers, edition, answer, req, res);
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

/** Kept answers, and 304 for a caller who has the present one: before any parameter is read. */
function answeredBefore(answers: AnswerCache, cache: string, req: Request, res: Response): boolean {
  const kept = answers.find(req.originalUrl);
  const tag = kept?.etag ?? `"${answers.tagOf(req.originalUrl)}"`;
  res.setHeader('ETag', tag);
  if (req.fresh) {
    res.setHeader('Cache-Control', cache).status(304).end();
    return true;
  }
  if (kept) {
    res.setHeader('Cache-Control', cache).type('json').send(kept.body);
    return true;
  }
  return false;
}

function sendAndKeep(answers: AnswerCache, edition: number, answer: unknown, req: Request, res: Response): void {
  const body = JSON.stringify(answer);
  answers.keep(req.originalUrl, edition, { etag: String(res.getHeader('ETag')), body });
  res.type('json').send(body);
}

/** A creation under the caller's Idempotency-Key; without one it is simply made. */
async function once(db: Deps['db'], { operation, handle }: Route, call: AnyCall): Promise<unknown> {
  const key = call.req.get('Idempotency-Key');
  if (key === undefined) return handle(call);
  const request = { params: call.params, body: call.body };
  const begun = beginCreation(db, { userId: actorId(call.actor), operation: operation.id, key, request });
  if ('earlier' in begun) {
    if (operation.repeat !== 'refuse') return begun.earlier;
    throw new ApiProblem(
      'already-created',
      `This made ${JSON.stringify(begun.earlier)} already; its secret was shown once and is not kept.`,
    );
  }
  try {
    const answer = await handle(call);
    begun.keep(operation.repeat === 'refuse' ? (answer as { id: string }).id : answer);
    return answer;
  } catch (error) {
    begun.forget();
    throw error;
  }
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
