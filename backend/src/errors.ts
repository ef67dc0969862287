import { type ProblemCode, type ProblemIssue, problems } from '@tiltwright/shared/schemas/problem.ts';

/** Anything a caller should be told; the problem handler turns it into problem+json. */
export class ApiProblem extends Error {
  override name = 'ApiProblem';
  readonly status: number;

  constructor(
    readonly code: ProblemCode,
    detail: string,
    readonly issues: readonly ProblemIssue[] = [],
    readonly headers: Readonly<Record<string, string>> = {},
  ) {
    super(detail);
    this.status = problems[code][0];
  }
}
