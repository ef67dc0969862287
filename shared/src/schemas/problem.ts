// RFC 9457 problem details, one shape everywhere, with a closed list of codes.
import * as z from 'zod';

/** Every problem the API can answer with: its status and its title. The list is closed; detail says the rest. */
export const problems = {
  'bad-request': [400, 'The request is not understood'],
  'malformed-json': [400, 'The body is not valid JSON'],
  'invalid-input': [422, 'A value is missing or not acceptable'],
  'unknown-parameter': [400, 'A query parameter is not known here'],
  'sign-in-needed': [401, 'Sign in first'],
  'session-expired': [401, 'The session has ended'],
  'wrong-credentials': [401, 'E-mail address or password is wrong'],
  'second-factor-needed': [401, 'A code is needed as well'],
  'wrong-code': [401, 'The code is wrong, or was used before'],
  'invalid-key': [401, 'The API key is not valid'],
  'token-misplaced': [400, 'A token belongs in the Authorization header'],
  'not-allowed': [403, 'This role may not do that'],
  'second-factor-required': [403, 'Staff work here needs a second factor'],
  'scope-missing': [403, 'The key lacks the scope'],
  'foreign-origin': [403, 'Writes from another site are refused'],
  'not-found': [404, 'Nothing is found here'],
  'route-not-found': [404, 'There is no such address'],
  'method-not-allowed': [405, 'This address does not take that method'],
  'wrong-state': [409, 'The state of this thing does not allow that'],
  'email-taken': [409, 'An account with this address exists'],
  'stale-edition': [409, 'The catalog has changed meanwhile'],
  'already-created': [409, 'This was made already'],
  'idempotency-at-work': [409, 'The first request is still at work'],
  'idempotency-mismatch': [422, 'The Idempotency-Key stood for another request'],
  'stale-revision': [412, 'It has changed meanwhile'],
  'link-expired': [410, 'The link has expired or was used'],
  'body-too-large': [413, 'The body is too large'],
  'unsupported-media-type': [415, 'This kind of body is not taken here'],
  'binary-file': [422, 'The file is not a text table'],
  'wrong-encoding': [422, 'The file’s text encoding is not readable'],
  'no-header': [422, 'The table has no header row'],
  'bad-table': [422, 'The table cannot be read'],
  'incomplete-mapping': [422, 'A required column is not filled'],
  'unknown-part': [422, 'A catalog id is not known'],
  'too-many-requests': [429, 'Too many requests'],
  'internal-error': [500, 'Something went wrong on our side'],
  'storage-full': [507, 'There is no room left to store this'],
} as const satisfies Record<string, readonly [status: number, title: string]>;
export type ProblemCode = keyof typeof problems;
export const problemCodes = Object.keys(problems) as [ProblemCode, ...ProblemCode[]];

export const ProblemIssue = z
  .strictObject({
    path: z.string().describe('JSON Pointer into the body, or the name of the parameter.'),
    code: z.string(),
    message: z.string(),
  })
  .meta({ id: 'ProblemIssue' });
export type ProblemIssue = z.infer<typeof ProblemIssue>;

export const Problem = z
  .strictObject({
    type: z.string().describe('Address of the code’s description.'),
    title: z.string(),
    status: z.int(),
    detail: z.string(),
    instance: z.string().describe('The request’s path and id.'),
    code: z.enum(problemCodes),
    issues: z.array(ProblemIssue),
  })
  .meta({ id: 'Problem' });
export type Problem = z.infer<typeof Problem>;
