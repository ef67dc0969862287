import { describe, expect, it } from 'vitest';
import { bodyOf } from './api-client.ts';
import { isFinal, OfflineError, ProblemError, problemKind, UnexpectedReplyError } from './problem.ts';

const problem = {
  type: 'about:not-allowed',
  title: 'This role may not do that',
  status: 403,
  detail: 'Only a steward may do that.',
  instance: '/api/v1/imports',
  code: 'not-allowed',
  issues: [],
};
const response = (status: number) => new Response(null, { status });

describe('what a request ends in', () => {
  it('is its body', async () => {
    await expect(bodyOf(Promise.resolve({ data: { id: 'hul_1' }, response: response(200) }))).resolves.toEqual({ id: 'hul_1' });
  });

  it('is a problem with its own words, which asking again would not mend', async () => {
    const error = await bodyOf(Promise.resolve({ error: problem, response: response(403) })).catch((reason: unknown) => reason);
    expect(error).toBeInstanceOf(ProblemError);
    expect((error as ProblemError).message).toBe('Only a steward may do that.');
    expect(problemKind(error)).toBe('not-allowed');
    expect(isFinal(error)).toBe(true);
  });

  it('is "no connection" where nothing answered, or a gateway stands before a server that is away', async () => {
    const error = await bodyOf(Promise.reject(new TypeError('failed to fetch'))).catch((reason: unknown) => reason);
    expect(error).toBeInstanceOf(OfflineError);
    expect(isFinal(error)).toBe(false);
    const away = await bodyOf(Promise.resolve({ error: '<html>', response: response(502) })).catch((reason: unknown) => reason);
    expect(away).toBeInstanceOf(UnexpectedReplyError);
    expect(problemKind(away)).toBe('offline');
  });

  it('is an abort where the screen no longer wants it', async () => {
    const abort = new DOMException('stopped', 'AbortError');
    await expect(bodyOf(Promise.reject(abort))).rejects.toBe(abort);
  });
});
