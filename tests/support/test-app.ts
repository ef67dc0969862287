// The whole server on a copy of the seeded database, asked through supertest.
import { cpSync, mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import path from 'node:path';
import supertest from 'supertest';
import type TestAgent from 'supertest/lib/agent.js';
import { expect, inject, onTestFinished } from 'vitest';
import type * as z from 'zod';
import { createApp } from '../../backend/src/app.ts';
import { type Config, readConfig } from '../../backend/src/config.ts';
import { connect, type Db, databaseFile } from '../../backend/src/db/connect.ts';
import { demoPassword } from '../../backend/src/db/seed.ts';
import { createDeps, type Deps } from '../../backend/src/deps.ts';
import { Problem, type ProblemCode } from '../../shared/src/schemas/problem.ts';

declare module 'vitest' {
  interface ProvidedContext {
    seededDataFolder: string;
  }
}

export const callers = ['visitor', 'customer', 'integrator', 'steward', 'admin'] as const;
export type Caller = (typeof callers)[number];

export interface TestApp {
  db: Db;
  deps: Deps;
  config: Config;
  /** Someone with a cookie jar of their own. */
  as(caller: Caller): Promise<TestAgent>;
  /** The server started again on the same database. */
  again(): TestApp;
}

/** Limits are a matter of their own tests. */
const unlimited = { LIMIT_ANONYMOUS: '1000000', LIMIT_PAGE: '1000000', LIMIT_ACCOUNT: '1000000' };

/** Ends with the test that made it. */
export function testApp(settings: Record<string, string> = {}): TestApp {
  const folder = mkdtempSync(path.join(tmpdir(), 'tiltwright-test-'));
  cpSync(databaseFile(inject('seededDataFolder')), databaseFile(folder));
  const config = readConfig({ DATA_DIR: folder, NODE_ENV: 'test', LOG_LEVEL: 'silent', ...unlimited, ...settings });
  const db = connect(databaseFile(folder));
  onTestFinished(() => {
    db.$client.close();
    rmSync(folder, { recursive: true, force: true });
  });
  return serving(db, config);
}

function serving(db: Db, config: Config): TestApp {
  const deps = createDeps(db, config);
  const app = createApp(deps);
  return {
    db,
    deps,
    config,
    again() {
      deps.usage.flush();
      return serving(db, config);
    },
    async as(caller) {
      const agent = supertest.agent(app);
      if (caller === 'visitor') return agent;
      await agent
        .post('/api/v1/session')
        .send({ email: `${caller}@tiltwright.example`, password: demoPassword })
        .expect(200);
      return agent;
    },
  };
}

/** The answer parsed by the very schema that documents it: a field too many or too few fails. */
export function parsed<S extends z.ZodType>(schema: S, answer: supertest.Response): z.output<S> {
  const result = schema.safeParse(answer.body);
  expect(result.success ? [] : result.error.issues, JSON.stringify(answer.body).slice(0, 400)).toEqual([]);
  return result.data as z.output<S>;
}

/** The answer is this problem, in the one shape. */
export function expectProblem(answer: supertest.Response, code: ProblemCode): Problem {
  expect(answer.headers['content-type']).toMatch(/^application\/problem\+json/);
  const problem = parsed(Problem, answer);
  expect(problem.code).toBe(code);
  expect(answer.status).toBe(problem.status);
  return problem;
}
