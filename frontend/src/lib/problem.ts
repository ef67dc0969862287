import type { Problem, ProblemIssue } from '@tiltwright/shared/schemas/problem.ts';

/** The API answered with a problem (RFC 9457). */
export class ProblemError extends Error {
  override name = 'ProblemError';
  readonly problem: Problem;
  constructor(problem: Problem) {
    super(problem.detail || problem.title);
    this.problem = problem;
  }
}

/** Nothing answered: no network, or the server is down. */
export class OfflineError extends Error {
  override name = 'OfflineError';
}

/** What came back was no problem document; the status is all there is to say. */
export class UnexpectedReplyError extends Error {
  override name = 'UnexpectedReplyError';
  readonly status: number;
  constructor(status: number) {
    super(`The server answered with status ${status} and no explanation.`);
    this.status = status;
  }
}

/** Whether the API answered with this very problem. */
export const hasCode = (error: unknown, code: Problem['code']): boolean => error instanceof ProblemError && error.problem.code === code;

export type ProblemKind = 'offline' | 'sign-in' | 'not-allowed' | 'not-found' | 'busy' | 'other';

/** How a screen should meet an error. */
export function problemKind(error: unknown): ProblemKind {
  if (error instanceof OfflineError) return 'offline';
  const status = error instanceof ProblemError ? error.problem.status : error instanceof UnexpectedReplyError ? error.status : 0;
  if (status === 401) return 'sign-in';
  if (status === 403) return 'not-allowed';
  if (status === 404) return 'not-found';
  if (status === 429) return 'busy';
  // A gateway answers 502 to 504 for a server that is away.
  if (status >= 502 && status <= 504) return 'offline';
  return 'other';
}

export function problemIssues(error: unknown): readonly ProblemIssue[] {
  return error instanceof ProblemError ? error.problem.issues : [];
}

/** True where asking again at once cannot help. */
export function isFinal(error: unknown): boolean {
  const kind = problemKind(error);
  return (
    kind === 'sign-in' || kind === 'not-allowed' || kind === 'not-found' || (error instanceof ProblemError && error.problem.status < 500)
  );
}
