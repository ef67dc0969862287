import { readFileSync } from 'node:fs';
import path from 'node:path';
import { problemCodes } from '@tiltwright/shared/schemas/problem.ts';
import { expect, test } from 'vitest';
import { testApp } from '../../../tests/support/test-app.ts';
import { topFolder } from '../paths.ts';

interface Described {
  operationId: string;
  summary: string;
  tags: string[];
  responses: Record<string, { content?: Record<string, unknown> }>;
  requestBody?: { content: { 'application/json'?: { example?: unknown } } };
}
type Document = { openapi: string; paths: Record<string, Record<string, Described>> };

const operations = (document: Document) =>
  Object.entries(document.paths).flatMap(([address, methods]) =>
    Object.entries(methods).map(([method, operation]) => ({ address, method, operation })),
  );

test('the document served is the one in the repository', async () => {
  const agent = await testApp().as('visitor');
  const { body } = await agent.get('/api/v1/openapi.json').expect(200);
  expect(body.openapi).toBe('3.1.0');
  expect(body).toEqual(JSON.parse(readFileSync(path.join(topFolder, 'openapi/openapi.json'), 'utf8')));
});

test('every operation says what it is, and answers errors in the one shape', async () => {
  const document = (await (await testApp().as('visitor')).get('/api/v1/openapi.json')).body as Document;
  const all = operations(document);
  expect(all.length).toBeGreaterThan(30);
  expect(new Set(all.map(({ operation }) => operation.operationId)).size).toBe(all.length);
  for (const { address, method, operation } of all) {
    expect(operation.summary, `${method} ${address}`).toMatch(/\S/);
    expect(operation.tags, `${method} ${address}`).toHaveLength(1);
    for (const [status, response] of Object.entries(operation.responses)) {
      if (Number(status) >= 400)
        expect(Object.keys(response.content ?? {}), `${method} ${address} ${status}`).toEqual(['application/problem+json']);
    }
  }
});

test('every JSON body has an example, and every example of a question is answered', async () => {
  const agent = await testApp().as('visitor');
  const document = (await agent.get('/api/v1/openapi.json')).body as Document;
  const withBody = operations(document).filter(({ operation }) => operation.requestBody?.content['application/json']);
  expect(withBody.length).toBeGreaterThan(4);
  for (const { address, method, operation } of withBody) {
    const { example } = operation.requestBody!.content['application/json']!;
    expect(example, `${method} ${address}`).toBeDefined();
    if (operation.tags[0] !== 'Questions') continue;
    const answer = await agent.post(`/api/v1${address}`).send(example as object);
    expect(answer.status, `${address} ${answer.text.slice(0, 300)}`).toBe(200);
  }
});

test('the document’s own page is served without anything from elsewhere', async () => {
  const agent = await testApp().as('visitor');
  const { text, headers } = await agent.get('/api/docs/').expect(200);
  expect(text).toContain('swagger-ui');
  expect(text).not.toMatch(/(src|href)="https?:/);
  expect(headers['content-security-policy']).toContain("script-src 'self'");
});

test('the problem codes are a closed list, each with its status and title', async () => {
  const document = (await (await testApp().as('visitor')).get('/api/v1/openapi.json')).body;
  expect(document.components.schemas.Problem.properties.code.enum).toEqual(problemCodes);
});
