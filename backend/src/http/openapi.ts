// The OpenAPI 3.1 document, from the same descriptions the routes are made of.
import { OpenAPIRegistry, OpenApiGeneratorV31, type ResponseConfig } from '@asteasolutions/zod-to-openapi';
import { Problem, type ProblemCode, problems } from '@tiltwright/shared/schemas/problem.ts';
import * as z from 'zod';
import { cookieName } from '../auth/identify.ts';
import { describePermission, isStaffWork, keyScopeOf, openToAnyone } from '../auth/may.ts';
import { costOf, type Operation, type Route, takesIdempotencyKey } from './operation.ts';

export const apiVersion = '1.0.0';

export function openApiDocument(routes: readonly Route[]) {
  const registry = new OpenAPIRegistry();
  registry.registerComponent('securitySchemes', 'session', {
    type: 'apiKey',
    in: 'cookie',
    name: cookieName,
    description: 'Set by POST /session.',
  });
  registry.registerComponent('securitySchemes', 'key', {
    type: 'http',
    scheme: 'bearer',
    description: 'An API key, `tiltwright.<id>.<secret>`.',
  });
  for (const { operation } of routes) describe(registry, operation);
  const document = new OpenApiGeneratorV31(registry.definitions).generateDocument({
    openapi: '3.1.0',
    info: {
      title: 'Tiltwright',
      version: apiVersion,
      description:
        'Where a side-looking transducer goes on a boat, the tilt it needs, and what the motor hides. Answers are estimates with their uncertainty, not approvals, and not for navigation. Follow the boat builder’s, motor’s and transducer’s own instructions and local rules. Within v1 fields are only ever added. Offsets are positive to starboard; angles are degrees, nose-up, bow-up and starboard-down positive; the unit of a number is part of its name.',
      license: { name: 'MIT', identifier: 'MIT' },
    },
    servers: [{ url: '/api/v1' }],
    tags: [...new Set(routes.map(({ operation }) => operation.tag))].map((name) => ({ name, description: tagWords[name] ?? name })),
  });
  return document;
}

const tagWords: Record<string, string> = {
  Catalog: 'Hulls, lower units, transducers and mounts, each value with where it comes from.',
  Questions: 'Tilt, clearance and the whole check.',
  Accounts: 'Signing up, in and out; one’s own account.',
  Administration: 'People, invitations, the audit log, mails and the site’s health.',
  'API keys': 'Keys for programs.',
  Jobs: 'Work that takes longer than a request.',
  Webhooks: 'Messages about what happens, by the Standard Webhooks specification.',
  Limits: 'How much each kind of caller may ask.',
  Boats: 'A person’s own boats.',
  Imports: 'The steward’s way from a CSV table to an edition.',
};

function describe(registry: OpenAPIRegistry, operation: Operation): void {
  const { id, method, path, tag, summary, description, may, params, query, body, multipart, bodyExample, reply } = operation;
  const scope = keyScopeOf(may);
  const security: Record<string, string[]>[] = [...(openToAnyone(may) ? [{}] : []), { session: [] }, ...(scope ? [{ key: [] }] : [])];
  const content = body
    ? { 'application/json': { schema: body, ...(bodyExample !== undefined && { example: bodyExample }) } }
    : operation.lines
      ? { 'application/x-ndjson': { schema: operation.lines.schema } }
      : multipart
        ? { 'multipart/form-data': { schema: multipart } }
        : undefined;
  registry.registerPath({
    operationId: id,
    method,
    path,
    tags: [tag],
    summary,
    description: [description, describeLines(operation), describePermission(may), describeCost(operation)].filter(Boolean).join('\n\n'),
    security,
    request: {
      ...(params && { params }),
      ...(query && { query }),
      ...headerFields(operation),
      ...(content && {
        body: { content, required: operation.multipart !== undefined || operation.lines !== undefined || !acceptsNothing(operation) },
      }),
    },
    responses: {
      [reply.status]: {
        description: reply.description,
        headers: replyHeaders(operation),
        ...(reply.schema ? { content: { [reply.contentType ?? 'application/json']: { schema: reply.schema } } } : {}),
      },
      ...(operation.byEdition || operation.etag ? { 304: { description: 'The caller has the present version.' } } : {}),
      ...problemResponses(operation),
    },
  });
}

/** An example of many lines is no example of the line's schema. */
function describeLines({ lines }: Operation): string | undefined {
  return lines && `\`\`\`\n${lines.example}\n\`\`\``;
}

function describeCost(operation: Operation): string {
  const units = costOf(operation);
  if (units === 0) return 'Costs nothing.';
  const more = operation.moreCost ? `, and ${operation.moreCost.words}` : '';
  return `Costs ${units} ${units === 1 ? 'unit' : 'units'}${more}.`;
}

const idempotencyHeader = {
  'Idempotency-Key': z
    .string()
    .min(1)
    .max(200)
    .optional()
    .describe('A mark of the caller’s own: the same creation sent again under it within a day happens once.'),
};
const ifNoneMatch = { 'If-None-Match': z.string().optional().describe('ETag the caller has; 304 where it is still the present one.') };

function headerFields(operation: Operation) {
  const fields = {
    ...(takesIdempotencyKey(operation) && idempotencyHeader),
    ...((operation.byEdition || operation.etag) && operation.method === 'get' && ifNoneMatch),
    ...(operation.etag &&
      operation.method !== 'get' && {
        'If-Match': z.string().optional().describe('ETag it was changed from; 412 where it has changed since.'),
      }),
  };
  return Object.keys(fields).length > 0 ? { headers: z.object(fields) } : {};
}

function replyHeaders(operation: Operation) {
  return {
    'X-Request-Id': { description: 'The caller’s own, or one of ours.', schema: { type: 'string' as const } },
    ...(costOf(operation) > 0 && {
      RateLimit: {
        description: 'What is left, by the IETF’s RateLimit header fields: r units for t seconds.',
        schema: { type: 'string' as const },
      },
      'RateLimit-Policy': { description: 'The limit: q units in w seconds.', schema: { type: 'string' as const } },
    }),
    ...((operation.byEdition || operation.etag) &&
      operation.reply.schema && { ETag: { description: 'Version of the answer.', schema: { type: 'string' as const } } }),
  };
}

const acceptsNothing = (operation: Operation) => operation.body?.safeParse({}).success ?? true;

/** What any operation of this shape can answer with, and what it says of itself. */
function problemCodesOf(operation: Operation): ProblemCode[] {
  const codes: ProblemCode[] = ['internal-error', 'bad-request', 'unknown-parameter'];
  if (operation.params || operation.query || operation.body || operation.multipart) codes.push('invalid-input');
  if (operation.body) codes.push('malformed-json', 'unsupported-media-type', 'body-too-large');
  if (operation.multipart) codes.push('unsupported-media-type', 'body-too-large');
  if (operation.method !== 'get') codes.push('foreign-origin');
  if (costOf(operation) > 0) codes.push('too-many-requests');
  if (takesIdempotencyKey(operation)) codes.push('idempotency-at-work', 'idempotency-mismatch');
  if (operation.repeat === 'refuse') codes.push('already-created');
  if (operation.etag && operation.method !== 'get') codes.push('stale-revision');
  if (!openToAnyone(operation.may)) codes.push('sign-in-needed', 'session-expired', 'not-allowed');
  if (isStaffWork(operation.may)) codes.push('second-factor-required');
  codes.push('invalid-key', 'not-allowed');
  return [...codes, ...(operation.problems ?? [])];
}

function problemResponses(operation: Operation): Record<string, ResponseConfig> {
  const byStatus = new Map<number, Set<ProblemCode>>();
  for (const code of problemCodesOf(operation)) {
    const status = problems[code][0];
    byStatus.set(status, (byStatus.get(status) ?? new Set()).add(code));
  }
  return Object.fromEntries(
    [...byStatus]
      .sort(([a], [b]) => a - b)
      .map(([status, codes]) => [
        String(status),
        {
          description: [...codes].map((code) => `\`${code}\`: ${problems[code][1]}.`).join(' '),
          content: { 'application/problem+json': { schema: Problem } },
        },
      ]),
  );
}
