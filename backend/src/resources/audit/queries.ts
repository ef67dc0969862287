import type { AuditEntry } from '@tiltwright/shared/schemas/desk.ts';
import { and, desc, eq, gte, lt, type SQL, sql } from 'drizzle-orm';
import type { Db } from '../../db/connect.ts';
import { auditLog, users } from '../../db/schema/people.ts';

export interface AuditFilter {
  actor?: string | undefined;
  action?: string | undefined;
  subject?: string | undefined;
  /** First day or moment. */
  from?: string | undefined;
  /** Up to, not with. */
  to?: string | undefined;
}

const wanted = ({ actor, action, subject, from, to }: AuditFilter): SQL | undefined =>
  and(
    actor === undefined ? undefined : eq(auditLog.actor, actor),
    // `session` finds session.begin and session.end.
    action === undefined
      ? undefined
      : sql`(${auditLog.action} = ${action} OR substr(${auditLog.action}, 1, ${action.length + 1}) = ${`${action}.`})`,
    subject === undefined ? undefined : eq(auditLog.subject, subject),
    from === undefined ? undefined : gte(auditLog.at, from),
    to === undefined ? undefined : lt(auditLog.at, to),
  );

/** Newest first, those before the entry `before` where one is given. */
export function listAudit(db: Db, filter: AuditFilter, limit: number, before: number | undefined): AuditEntry[] {
  return db
    .select({ row: auditLog, actorName: users.name })
    .from(auditLog)
    .leftJoin(users, eq(users.id, auditLog.actor))
    .where(and(wanted(filter), before === undefined ? undefined : lt(auditLog.entry, before)))
    .orderBy(desc(auditLog.entry))
    .limit(limit)
    .all()
    .map(({ row: { entry, at, actor, action, subject, detail }, actorName }) => ({
      entry,
      at,
      actor,
      actorName,
      action,
      subject,
      detail: detail ?? {},
    }));
}
