import type { Role } from '@tiltwright/shared/schemas/account.ts';
import type { NewInvitation } from '@tiltwright/shared/schemas/desk.ts';
import { and, eq } from 'drizzle-orm';
import { hoursLater, newToken, tokenLink } from '../../auth/tokens.ts';
import { invitations } from '../../db/schema/access.ts';
import type { Deps } from '../../deps.ts';
import { ApiProblem } from '../../errors.ts';
import { newId } from '../../ids.ts';
import { enqueueMail } from '../../mail/enqueue-mail.ts';
import { invitation } from '../../mail/letters.ts';
import { findUserByEmail } from '../accounts/queries.ts';
import { audit } from '../audit.ts';
import { type InvitationRow, isOpen } from './queries.ts';

const days = 7;
const immediate = { behavior: 'immediate' } as const;

const article: Record<Role, string> = { customer: 'a customer', integrator: 'an integrator', steward: 'a steward', admin: 'an admin' };
const roleWords = (roles: readonly Role[]) => roles.map((role) => article[role]).join(' and ');

/** Sends a link; an open invitation of the same address is replaced by this one. @throws ApiProblem email-taken */
export function invite({ db, config }: Pick<Deps, 'db' | 'config'>, admin: string, wish: NewInvitation, now = new Date()): InvitationRow {
  return db.transaction((tx) => {
    if (findUserByEmail(db, wish.email)) {
      throw new ApiProblem('email-taken', 'This address has an account; change its roles instead.', [
        { path: '/email', code: 'email-taken', message: 'This address has an account; change its roles instead.' },
      ]);
    }
    tx.update(invitations)
      .set({ revokedAt: now.toISOString() })
      .where(and(eq(invitations.email, wish.email), isOpen(now)))
      .run();
    const { token, tokenHash } = newToken();
    const row: InvitationRow = {
      id: newId('inv'),
      tokenHash,
      email: wish.email,
      roles: wish.roles,
      invitedBy: admin,
      createdAt: now.toISOString(),
      expiresAt: hoursLater(now, 24 * days),
      acceptedAt: null,
      acceptedBy: null,
      revokedAt: null,
    };
    tx.insert(invitations).values(row).run();
    audit(tx, admin, 'invitation.create', row.id, { roles: row.roles });
    enqueueMail(tx, row.email, invitation(tokenLink(config.siteUrl, 'invitation', token), roleWords(row.roles), days), { now });
    return row;
  }, immediate);
}

/** @throws ApiProblem not-found, or wrong-state for one that was accepted */
export function revokeInvitation(db: Deps['db'], admin: string, id: string, now = new Date()): void {
  db.transaction((tx) => {
    const row = tx.select().from(invitations).where(eq(invitations.id, id)).get();
    if (!row) throw new ApiProblem('not-found', `There is no invitation ${id}.`);
    if (row.acceptedAt) throw new ApiProblem('wrong-state', 'It was accepted; change the person’s roles, or disable the account.');
    if (row.revokedAt) return;
    tx.update(invitations).set({ revokedAt: now.toISOString() }).where(eq(invitations.id, id)).run();
    audit(tx, admin, 'invitation.revoke', id);
  }, immediate);
}
