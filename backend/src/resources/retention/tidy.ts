// What is kept no longer than needed: one job a night, each part in a transaction of its own.
import { rm } from 'node:fs/promises';
import path from 'node:path';
import { and, eq, inArray, isNotNull, lt, or, sql } from 'drizzle-orm';
import { invitations, passwordResets, signUps } from '../../db/schema/access.ts';
import { editions } from '../../db/schema/catalog.ts';
import { importRows, imports } from '../../db/schema/imports.ts';
import { mailOutbox, siteState } from '../../db/schema/mail.ts';
import { auditLog, sessions } from '../../db/schema/people.ts';
import type { Deps } from '../../deps.ts';
import { audit } from '../audit.ts';

type Needs = Pick<Deps, 'db' | 'config'>;
const immediate = { behavior: 'immediate' } as const;
export const tidiedKey = 'retention.last';

export const daysBefore = (now: Date, days: number) => new Date(now.getTime() - days * 86_400_000).toISOString();

function yearsBefore(now: Date, years: number): string {
  const then = new Date(now);
  then.setUTCFullYear(then.getUTCFullYear() - years);
  return then.toISOString();
}

/** Removes what is past its time and notes what it did. @returns counts by kind */
export async function tidy(deps: Needs, now = new Date()): Promise<Record<string, number>> {
  const { db, config } = deps;
  const removed = {
    ...(await removeUploads(deps, daysBefore(now, config.keepUploadsDays))),
    mailBodies: await eraseMails(deps, daysBefore(now, config.keepMailDays)),
    ...removeExpired(deps, now),
    auditEntries: removeAudit(deps, yearsBefore(now, config.keepAuditYears)),
  };
  const note = { value: removed, at: now.toISOString() };
  db.transaction((tx) => {
    tx.insert(siteState)
      .values({ key: tidiedKey, ...note })
      .onConflictDoUpdate({ target: siteState.key, set: note })
      .run();
    audit(tx, null, 'retention.run', null, removed);
  }, immediate);
  return removed;
}

/** Files and rows of uploads that were published, or left lying, before the date; the upload's own line stays. */
async function removeUploads({ db, config }: Needs, before: string): Promise<{ uploads: number; importRows: number }> {
  const old = db
    .select({ id: imports.id, storedAs: imports.storedAs, status: imports.status })
    .from(imports)
    .leftJoin(editions, eq(editions.edition, imports.edition))
    .where(
      or(
        and(eq(imports.status, 'published'), lt(editions.publishedAt, before)),
        and(inArray(imports.status, ['uploaded', 'mapped', 'checked', 'discarded', 'failed']), lt(imports.createdAt, before)),
      ),
    )
    .all();
  let files = 0;
  let rows = 0;
  for (const { id, storedAs, status } of old) {
    // The file first: after a kill in between, the rows still lead to it.
    if (await removeFile(path.join(config.uploadsFolder, storedAs))) files += 1;
    db.transaction((tx) => {
      rows += tx.delete(importRows).where(eq(importRows.importId, id)).run().changes;
      if (status !== 'published' && status !== 'discarded') tx.update(imports).set({ status: 'discarded' }).where(eq(imports.id, id)).run();
    }, immediate);
  }
  return { uploads: files, importRows: rows };
}

/** Bodies of mails that went out or failed; who was written to what about stays. Local outbox files go too. */
async function eraseMails({ db, config }: Needs, before: string): Promise<number> {
  const old = and(
    inArray(mailOutbox.status, ['sent', 'failed']),
    lt(mailOutbox.createdAt, before),
    or(isNotNull(mailOutbox.text), isNotNull(mailOutbox.html)),
  );
  const ids = db.select({ id: mailOutbox.id }).from(mailOutbox).where(old).all();
  for (const { id } of ids) await removeFile(path.join(config.outboxFolder, `${id}.eml`));
  return db.update(mailOutbox).set({ text: null, html: null }).where(old).run().changes;
}

function removeExpired({ db }: Needs, now: Date): Record<string, number> {
  const moment = now.toISOString();
  return {
    signUps: db.delete(signUps).where(lt(signUps.expiresAt, moment)).run().changes,
    passwordResets: db.delete(passwordResets).where(lt(passwordResets.expiresAt, moment)).run().changes,
    // Addresses of people who never came; a month leaves time to see what became of an invitation.
    invitations: db
      .delete(invitations)
      .where(lt(invitations.expiresAt, daysBefore(now, 30)))
      .run().changes,
    sessions: db.delete(sessions).where(lt(sessions.expiresAt, now.getTime())).run().changes,
  };
}

/** The log's own trigger refuses deletes: it is lifted inside the transaction that removes the oldest, and put back as it was. */
function removeAudit({ db }: Needs, before: string): number {
  return db.transaction((tx) => {
    const old = lt(auditLog.at, before);
    if (!tx.select({ entry: auditLog.entry }).from(auditLog).where(old).limit(1).get()) return 0;
    const trigger = tx.get<{ sql: string } | undefined>(
      sql`SELECT sql FROM sqlite_master WHERE type = 'trigger' AND name = 'audit_log_no_delete'`,
    );
    if (!trigger) throw new Error('the audit log has lost its trigger');
    tx.run(sql`DROP TRIGGER audit_log_no_delete`);
    const { changes } = tx.delete(auditLog).where(old).run();
    tx.run(sql.raw(trigger.sql));
    return changes;
  }, immediate);
}

async function removeFile(file: string): Promise<boolean> {
  try {
    await rm(file);
    return true;
  } catch (error) {
    if ((error as NodeJS.ErrnoException).code === 'ENOENT') return false;
    throw error;
  }
}
