// The only place that talks to the API. Types come from the generated OpenAPI document.
import type { Problem } from '@tiltwright/shared/schemas/problem.ts';
import createClient from 'openapi-fetch';
import type { paths } from './api-schema.generated.ts';
import { OfflineError, ProblemError, UnexpectedReplyError } from './problem.ts';

export const apiBase = '/api/v1';

export const api = createClient<paths>({
  // Whole address: a Request made outside a browser (in tests) takes no relative one.
  baseUrl: `${globalThis.location?.origin ?? ''}${apiBase}`,
  // Looked up at each call, so that a test can put its own in place.
  fetch: (request) => globalThis.fetch(request),
});

interface Reply<T> {
  data?: T;
  error?: unknown;
  response: Response;
}

/**
 * Waits for a reply and gives its body; throws ProblemError for a problem document, OfflineError where nothing answered,
 * UnexpectedReplyError for anything else. An aborted request keeps its AbortError.
 */
export async function bodyOf<T>(pending: Promise<Reply<T>>): Promise<T> {
  const reply = await settled(pending);
  if (reply.error !== undefined) throw asError(reply.error, reply.response.status);
  if (!reply.response.ok) throw new UnexpectedReplyError(reply.response.status);
  return reply.data as T;
}

async function settled<T>(pending: Promise<Reply<T>>): Promise<Reply<T>> {
  try {
    return await pending;
  } catch (error) {
    if (error instanceof DOMException && error.name === 'AbortError') throw error;
    // fetch rejects with a TypeError where no connection came about; a body that is not JSON ends in a SyntaxError.
    if (error instanceof SyntaxError) throw new UnexpectedReplyError(0);
    throw new OfflineError('No answer came. The network or the server may be away.', { cause: error });
  }
}

function asError(body: unknown, status: number): Error {
  return isProblem(body) ? new ProblemError(body) : new UnexpectedReplyError(status);
}

function isProblem(body: unknown): body is Problem {
  if (typeof body !== 'object' || body === null) return false;
  const { title, status, code, issues } = body as Record<string, unknown>;
  return typeof title === 'string' && typeof status === 'number' && typeof code === 'string' && Array.isArray(issues);
}
