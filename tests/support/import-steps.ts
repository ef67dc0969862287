// The steps of an import as a program takes them.
import type supertest from 'supertest';
import { CreatedImport, Import, PublishedEdition } from '../../shared/src/schemas/import.ts';
import { parsed, type TestApp } from './test-app.ts';

export type Agent = Awaited<ReturnType<TestApp['as']>>;

export const upload = (agent: Agent, text: string | Buffer, table = 'hulls', name = 'hulls.csv'): supertest.Test =>
  agent.post('/api/v1/imports').field('table', table).attach('file', Buffer.from(text), name);

export async function uploaded(agent: Agent, text: string | Buffer, table = 'hulls'): Promise<string> {
  return parsed(CreatedImport, await upload(agent, text, table).expect(201)).id;
}

export async function settled(agent: Agent, id: string): Promise<Import> {
  for (let tries = 0; tries < 400; tries++) {
    const found = parsed(Import, await agent.get(`/api/v1/imports/${id}`).expect(200));
    if (found.status !== 'checking' && found.status !== 'publishing') return found;
    await new Promise((resolve) => setTimeout(resolve, 10));
  }
  throw new Error('the check did not end');
}

export async function check(agent: Agent, id: string): Promise<Import> {
  await agent.post(`/api/v1/imports/${id}/check`).expect(202);
  return settled(agent, id);
}

export const checked = async (agent: Agent, text: string | Buffer, table = 'hulls'): Promise<Import> =>
  check(agent, await uploaded(agent, text, table));

export async function publish(agent: Agent, id: string, order: object = {}): Promise<number> {
  return parsed(PublishedEdition, await agent.post(`/api/v1/imports/${id}/publish`).send(order).expect(200)).edition;
}

/** From the table to the edition. */
export const published = async (agent: Agent, text: string, table = 'hulls', order: object = {}): Promise<number> =>
  publish(agent, (await checked(agent, text, table)).id, order);
