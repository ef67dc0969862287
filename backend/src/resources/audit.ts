import type { Db } from '../db/connect.ts';
import { auditLog } from '../db/schema/people.ts';

export type AuditAction =
  | 'session.begin'
  | 'session.refused'
  | 'session.end'
  | 'account.create'
  | 'account.change'
  | 'account.export'
  | 'account.delete'
  | 'account.disable'
  | 'account.enable'
  | 'account.roles'
  | 'sessions.end'
  | 'password.ask'
  | 'password.change'
  | 'second-factor.add'
  | 'second-factor.remove'
  | 'second-factor.recovery'
  | 'invitation.create'
  | 'invitation.revoke'
  | 'invitation.accept'
  | 'mail.resend'
  | 'audit.export'
  | 'retention.run'
  | 'key.create'
  | 'key.rotate'
  | 'key.revoke'
  | 'limit.change'
  | 'webhook.create'
  | 'webhook.rotate'
  | 'webhook.delete'
  | 'import.upload'
  | 'import.map'
  | 'import.fix'
  | 'import.cancel'
  | 'import.discard'
  | 'edition.publish'
  | 'edition.rollback';

type Writer = Pick<Db, 'insert'>;

/** Adds to the log that nothing leaves; inside a transaction, it stands or falls with it. */
export function audit(
  db: Writer,
  actor: string | null,
  action: AuditAction,
  subject: string | null,
  detail: Record<string, unknown> = {},
): void {
  db.insert(auditLog).values({ at: new Date().toISOString(), actor, action, subject, detail }).run();
}
