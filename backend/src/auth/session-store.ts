// express-session store over Drizzle. No timer: expired rows are refused when read and swept when one is written.
import { createHash } from 'node:crypto';
import { eq, lt, sql } from 'drizzle-orm';
import session from 'express-session';
import type { Db } from '../db/connect.ts';
import { sessions } from '../db/schema/people.ts';

type Callback<T = undefined> = (error: unknown, result?: T | null) => void;

const hashed = (sid: string) => createHash('sha256').update(sid).digest('hex');

export class DrizzleSessionStore extends session.Store {
  readonly #db: Db;
  readonly #lifetimeMs: number;
  readonly #find;

  constructor(db: Db, lifetimeMs: number) {
    super();
    this.#db = db;
    this.#lifetimeMs = lifetimeMs;
    this.#find = db
      .select()
      .from(sessions)
      .where(eq(sessions.idHash, sql.placeholder('idHash')))
      .prepare();
  }

  override get(sid: string, done: Callback<session.SessionData>): void {
    const row = this.#find.get({ idHash: hashed(sid) });
    done(null, row && row.expiresAt > Date.now() ? (JSON.parse(row.data) as session.SessionData) : null);
  }

  override set(sid: string, data: session.SessionData, done?: Callback): void {
    const row = { userId: data.passport?.user ?? null, data: JSON.stringify(data), expiresAt: Date.now() + this.#lifetimeMs };
    this.#db.transaction(
      (tx) => {
        tx.delete(sessions).where(lt(sessions.expiresAt, Date.now())).run();
        tx.insert(sessions)
          .values({ idHash: hashed(sid), ...row })
          .onConflictDoUpdate({ target: sessions.idHash, set: row })
          .run();
      },
      { behavior: 'immediate' },
    );
    done?.(null);
  }

  override destroy(sid: string, done?: Callback): void {
    this.#db
      .delete(sessions)
      .where(eq(sessions.idHash, hashed(sid)))
      .run();
    done?.(null);
  }

  /** Moves the end of a session in use; at most once a minute, since each is a durable write. */
  override touch(sid: string, _data: session.SessionData, done?: () => void): void {
    const expiresAt = Date.now() + this.#lifetimeMs;
    // While an edition is being written there is no waiting for it: the next request moves the end as well.
    this.#db.$client.pragma('busy_timeout = 0');
    try {
      this.#db
        .update(sessions)
        .set({ expiresAt })
        .where(sql`${sessions.idHash} = ${hashed(sid)} AND ${sessions.expiresAt} < ${expiresAt - 60_000}`)
        .run();
    } catch (error) {
      if ((error as { code?: string }).code !== 'SQLITE_BUSY') throw error;
    } finally {
      this.#db.$client.pragma('busy_timeout = 5000');
    }
    done?.();
  }
}
