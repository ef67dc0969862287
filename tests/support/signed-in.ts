// A signed-in person over HTTP, for tests that talk to a server of its own.
import { demoPassword } from '../../backend/src/db/seed.ts';

export interface Person {
  json<T>(method: string, address: string, body?: unknown): Promise<{ status: number; body: T }>;
  upload(table: string, text: string): Promise<{ id: string }>;
}

/** Someone signed in, by cookie. */
export async function signedIn(at: string, who: 'steward' | 'admin' = 'steward'): Promise<Person> {
  const signIn = await fetch(`${at}/api/v1/session`, {
    method: 'POST',
    headers: { 'Content-Type': 'application/json' },
    body: JSON.stringify({ email: `${who}@tiltwright.example`, password: demoPassword }),
  });
  if (!signIn.ok) throw new Error(`not signed in: ${signIn.status} ${await signIn.text()}`);
  const Cookie = signIn.headers
    .getSetCookie()
    .map((cookie) => cookie.split(';')[0])
    .join('; ');
  return {
    async json<T>(method: string, address: string, body?: unknown) {
      const sent = body === undefined ? {} : { body: JSON.stringify(body), headers: { 'Content-Type': 'application/json', Cookie } };
      const answer = await fetch(`${at}/api/v1${address}`, { method, headers: { Cookie }, ...sent });
      const text = await answer.text();
      return { status: answer.status, body: (text === '' ? undefined : JSON.parse(text)) as T };
    },
    async upload(table, text) {
      const form = new FormData();
      form.set('table', table);
      form.set('file', new Blob([text]), `${table}.csv`);
      const answer = await fetch(`${at}/api/v1/imports`, { method: 'POST', headers: { Cookie }, body: form });
      if (answer.status !== 201) throw new Error(`not uploaded: ${answer.status} ${await answer.text()}`);
      return (await answer.json()) as { id: string };
    },
  };
}
