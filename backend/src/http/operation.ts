// An operation is described once: its address, who may use it, what it takes and gives.
// Express routes, validation, 405 answers and the OpenAPI document all come from the same description.
import type { ProblemCode } from '@tiltwright/shared/schemas/problem.ts';
import type { Request, Response } from 'express';
import type * as z from 'zod';
import type { Actor } from '../auth/actor.ts';
import type { Permission } from '../auth/may.ts';

export type Method = 'get' | 'post' | 'put' | 'patch' | 'delete';
type Fields = z.ZodObject;

export interface Operation<P extends Fields = Fields, Q extends Fields = Fields, B extends z.ZodType = z.ZodType> {
  /** operationId; also the name of the client's method. */
  id: string;
  method: Method;
  /** Below /api/v1, parameters in braces. */
  path: string;
  tag: string;
  summary: string;
  description?: string;
  may: Permission;
  params?: P;
  query?: Q;
  body?: B;
  /** Set where the body is NDJSON that the handler reads itself; the example is its text. */
  lines?: { schema: z.ZodType; example: string };
  /** Set where the body is a form with a file. */
  multipart?: z.ZodObject;
  bodyExample?: unknown;
  reply: { status: 200 | 201 | 202 | 204; description: string; schema?: z.ZodType; contentType?: string };
  /** Beyond those every operation can answer with. */
  problems?: readonly ProblemCode[];
  /** Units it costs; 1 where nothing is said. */
  cost?: number;
  /** Units beyond `cost` that depend on what was asked, and in words for the document. */
  moreCost?: { of: (question: { body: z.output<B>; query: Record<string, unknown> }) => number; words: string };
  /** Set on reads that only an edition or the engine can change: ETag and 304 before any work, answers kept. */
  byEdition?: true;
  /** For creations: what a repeat under the same Idempotency-Key gets; `refuse` where the answer holds a secret. */
  repeat?: 'answer' | 'refuse';
  /** Set where the answer's ETag is the thing's own revision: If-None-Match on reads, If-Match on writes. */
  etag?: true;
  /** Cache-Control of a good answer; private answers say no-store. */
  cache: string;
}

type Output<S, Empty> = S extends z.ZodType ? z.output<S> : Empty;

export interface Call<P, Q, B> {
  params: Output<P, Record<string, never>>;
  query: Output<Q, Record<string, never>>;
  body: Output<B, undefined>;
  actor: Actor;
  req: Request;
  res: Response;
}

export interface Route {
  operation: Operation;
  // biome-ignore lint/suspicious/noExplicitAny: the types meet in route(), where P, Q and B are known
  handle: (call: Call<any, any, any>) => unknown;
}

/** Ties a handler to its description; what it returns is the JSON answer, `undefined` when it answered itself. */
export function route<P extends Fields, Q extends Fields, B extends z.ZodType>(
  operation: Operation<P, Q, B>,
  handle: (call: Call<P, Q, B>) => unknown,
): Route {
  return { operation: operation as unknown as Operation, handle };
}

export const noStore = 'no-store';
/** The catalog changes only by editions: keep, but ask again each time. */
export const revalidate = 'no-cache';

/** What a signed-in caller makes by POST is made once under one Idempotency-Key; a form with a file is not. */
export const takesIdempotencyKey = ({ method, reply, may, body }: Operation): boolean =>
  method === 'post' && (reply.status === 201 || reply.status === 202) && may !== 'session.use' && body !== undefined;

/** Signing in and out, and asking who is, costs nothing; it has a brake of its own against guessing. */
export const costOf = (operation: Operation): number => operation.cost ?? (operation.may === 'session.use' ? 0 : 1);
