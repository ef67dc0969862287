// The OpenAPI 3.1 document, from the same descriptions the routes are made of.
import { OpenAPIRegistry, OpenApiGeneratorV31, type ResponseConfig } from '@asteasolutions/zod-to-openapi';
import { Problem, type ProblemCode, problems } from '@tiltwright/shared/schemas/problem.ts';
import { cookieName } from '../auth/identify.ts';
import { describePermission, keyScopeOf, openToAnyone } from '../auth/may.ts';
import type { Operation, Route } from './operation.ts';

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
  Accounts: 'Signing up, in and out.',
  'API keys': 'Keys for programs.',
  Boats: 'A person’s own boats.',
  Imports: 'The steward’s way from a CSV table to an edition.',
};

function describe(registry: OpenAPIRegistry, operation: Operation): void {
  const { id, method, path, tag, summary, description, may, params, query, body, multipart, bodyExample, reply } = operation;
  const scope = keyScopeOf(may);
  const security: Record<string, string[]>[] = [...(openToAnyone(may) ? [{}] : []), { session: [] }, ...(scope ? [{ key: [] }] : [])];
  const content = body
    ? { 'application/json': { schema: body, ...(bodyExample !== undefined && { example: bodyExample }) } }
    : multipart
      ? { 'multipart/form-data': { schema: multipart } }
      : undefined;
  registry.registerPath({
    operationId: id,
    method,
    path,
    tags: [tag],
    summary,
    description: [description, describePermission(may)].filter(Boolean).join('\n\n'),
    security,
    request: {
      ...(params && { params }),
      ...(query && { query }),
      ...(content && { body: { content, required: operation.multipart !== undefined || !acceptsNothing(operation) } }),
    },
    responses: {
      [reply.status]: {
        description: reply.description,
        ...(reply.schema ? { content: { [reply.contentType ?? 'application/json']: { schema: reply.schema } } } : {}),
      },
      ...problemResponses(operation),
    },
  });
}

const acceptsNothing = (operation: Operation) => operation.body?.safeParse({}).success ?? true;

/** What any operation of this shape can answer with, and what it says of itself. */
function problemCodesOf(operation: Operation): ProblemCode[] {
  const codes: ProblemCode[] = ['internal-error', 'bad-request', 'unknown-parameter'];
  if (operation.params || operation.query || operation.body || operation.multipart) codes.push('invalid-input');
  if (operation.body) codes.push('malformed-json', 'unsupported-media-type', 'body-too-large');
  if (operation.multipart) codes.push('unsupported-media-type', 'body-too-large');
  if (operation.method !== 'get') codes.push('foreign-origin');
  if (!openToAnyone(operation.may)) codes.push('sign-in-needed', 'session-expired', 'not-allowed');
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
