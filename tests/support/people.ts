// People a test needs beyond the demo accounts, made the way people come: by a link in a mail.
import { desc, eq } from 'drizzle-orm';
import type TestAgent from 'supertest/lib/agent.js';
import { expect } from 'vitest';
import type { Db } from '../../backend/src/db/connect.ts';
import { mailOutbox } from '../../backend/src/db/schema/mail.ts';
import type { Account, SignUp } from '../../shared/src/schemas/account.ts';
import type { TestApp } from './test-app.ts';

export const mailsTo = (db: Db, to: string) =>
  db.select().from(mailOutbox).where(eq(mailOutbox.toAddress, to)).orderBy(desc(mailOutbox.id)).all();

/** What stands behind `#token=` in the newest mail to this address. */
export function tokenSentTo(db: Db, to: string): string {
  const token = /#token=([\w-]{43})/.exec(mailsTo(db, to)[0]?.text ?? '')?.[1];
  expect(token, `no link was sent to ${to}`).toBeDefined();
  return token!;
}

/** Signs up, follows the mail's link and is signed in. */
export async function newcomer(app: TestApp, wish: Partial<SignUp> & { email: string }): Promise<{ agent: TestAgent; account: Account }> {
  const agent = await app.as('visitor');
  const password = wish.password ?? 'twelve or more';
  await agent
    .post('/api/v1/accounts')
    .send({ name: 'A newcomer', ...wish, password })
    .expect(202);
  const answer = await agent
    .post('/api/v1/accounts/verify')
    .send({ token: tokenSentTo(app.db, wish.email.toLowerCase()), password })
    .expect(201);
  return { agent, account: answer.body.account as Account };
}
