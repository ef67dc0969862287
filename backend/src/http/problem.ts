// Every error leaves here, as RFC 9457 problem+json.
import { type Problem, type ProblemCode, problems } from '@tiltwright/shared/schemas/problem.ts';
import type { ErrorRequestHandler, Request } from 'express';
import { MulterError } from 'multer';
import { ApiProblem } from '../errors.ts';

export function problemBody(problem: ApiProblem, req: Request): Problem {
  return {
    type: `/api/docs#problem-${problem.code}`,
    title: problems[problem.code][1],
    status: problem.status,
    detail: problem.message,
    instance: `${req.originalUrl.split('?')[0]}#${String(req.id)}`,
    code: problem.code,
    issues: [...problem.issues],
  };
}

/** What the packages in front of the routes throw, in our words. */
export function translate(error: unknown): ApiProblem {
  if (error instanceof ApiProblem) return error;
  if (error instanceof MulterError) {
    if (error.code === 'LIMIT_FILE_SIZE') return new ApiProblem('body-too-large', 'The file is larger than this site takes.');
    return new ApiProblem('invalid-input', `The form is not as expected: ${error.message}.`, [
      { path: `/${error.field ?? ''}`, code: error.code.toLowerCase().replaceAll('_', '-'), message: error.message },
    ]);
  }
  const { type, status, message } = (error ?? {}) as { type?: string; status?: number; message?: string };
  const known: Record<string, [ProblemCode, string]> = {
    'entity.parse.failed': ['malformed-json', `The body is not valid JSON: ${message}.`],
    'entity.too.large': ['body-too-large', 'The body is larger than 1 MB.'],
    'encoding.unsupported': ['unsupported-media-type', 'This content encoding is not taken here.'],
    'charset.unsupported': ['unsupported-media-type', 'Send the body as UTF-8.'],
    'request.aborted': ['bad-request', 'The request ended before its body did.'],
    'request.size.invalid': ['bad-request', 'The body is not as long as its Content-Length says.'],
  };
  const match = type ? known[type] : undefined;
  if (match) return new ApiProblem(...match);
  if (error instanceof URIError) return new ApiProblem('bad-request', 'The address holds a percent sign that is not an encoding.');
  if (
    (error as NodeJS.ErrnoException | undefined)?.code === 'ENOSPC' ||
    (error as NodeJS.ErrnoException | undefined)?.code === 'SQLITE_FULL'
  ) {
    return new ApiProblem('storage-full', 'The disk is full; nothing was changed.');
  }
  // busboy has no error classes: a broken form is the caller's, with these words.
  if (message && /^(Unexpected end of form|Multipart: |Malformed part header|Malformed urlencoded)/.test(message))
    return new ApiProblem('bad-request', `The form is broken: ${message}.`);
  if (status && status >= 400 && status < 500) return new ApiProblem('bad-request', message ?? 'The request is not understood.');
  return new ApiProblem('internal-error', 'Something went wrong on our side; the request’s id helps to find it.');
}

export const problemHandler: ErrorRequestHandler = (error, req, res, next) => {
  if (res.headersSent) {
    next(error);
    return;
  }
  const problem = translate(error);
  if (problem.code === 'internal-error') req.log?.error({ err: error }, 'unexpected error');
  for (const [name, value] of Object.entries(problem.headers)) res.setHeader(name, value);
  // Set ahead of the work, for an answer that did not come.
  res.removeHeader('ETag');
  res
    .status(problem.status)
    .setHeader('Cache-Control', 'no-store')
    .type('application/problem+json')
    .end(JSON.stringify(problemBody(problem, req)));
};
