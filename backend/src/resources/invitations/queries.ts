import type { Invitation } from '@tiltwright/shared/schemas/desk.ts';
import { and, desc, eq, gt, isNull } from 'drizzle-orm';
import { hashSecret } from '../../auth/keys.ts';
import type { Db } from '../../db/connect.ts';
import { invitations } from '../../db/schema/access.ts';
import { linkExpired } from '../accounts/finish-sign-up.ts';

export type InvitationRow = typeof invitations.$inferSelect;

export const isOpen = (now: Date) =>
  and(isNull(invitations.acceptedAt), isNull(invitations.revokedAt), gt(invitations.expiresAt, now.toISOString()));

export function toInvitation(
  { id, email, roles, invitedBy, createdAt, expiresAt, acceptedAt, revokedAt }: InvitationRow,
  now = new Date(),
): Invitation {
  const state = acceptedAt ? 'accepted' : revokedAt ? 'revoked' : expiresAt <= now.toISOString() ? 'expired' : 'open';
  return { id, email, roles, state, invitedBy, createdAt, expiresAt };
}

export const listInvitations = (db: Db, limit: number, offset: number): InvitationRow[] =>
  db
    .select()
    .from(invitations)
    .orderBy(desc(invitations.id))
    .limit(limit + 1)
    .offset(offset)
    .all();

/** @throws ApiProblem link-expired for one that is unknown, used, revoked or too old */
export function openInvitation(db: Pick<Db, 'select'>, token: string, now = new Date()): InvitationRow {
  const row = db
    .select()
    .from(invitations)
    .where(and(eq(invitations.tokenHash, hashSecret(token)), isOpen(now)))
    .get();
  if (!row) throw linkExpired('Ask whoever invited you for a new one.');
  return row;
}
