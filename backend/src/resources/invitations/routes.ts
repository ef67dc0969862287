import { Session } from '@tiltwright/shared/schemas/account.ts';
import { Invitation, InvitationAnswer, InvitationOffer, NewInvitation } from '@tiltwright/shared/schemas/desk.ts';
import * as z from 'zod';
import { actorId } from '../../auth/actor.ts';
import { beginSession } from '../../auth/begin-session.ts';
import { signInThrottle } from '../../auth/throttle.ts';
import type { Deps } from '../../deps.ts';
import { decodeCursor, listOf, page, pageFields } from '../../http/cursor.ts';
import { noStore, type Route, route } from '../../http/operation.ts';
import { findUserByEmail, sessionOf } from '../accounts/queries.ts';
import { audit } from '../audit.ts';
import { acceptInvitation } from './accept-invitation.ts';
import { invite, revokeInvitation } from './invite.ts';
import { listInvitations, openInvitation, toInvitation } from './queries.ts';

const tag = 'Administration';
const cache = noStore;
const byToken = z.strictObject({ token: z.string().min(1).max(200).describe('From the mail’s link.') });
const byId = z.strictObject({ token: z.string().min(1).max(200).describe('The invitation’s id, from the list.') });

export function invitationRoutes(deps: Deps): Route[] {
  const { db } = deps;
  const throttle = signInThrottle();
  return [
    route(
      {
        id: 'listInvitations',
        method: 'get',
        path: '/invitations',
        tag,
        summary: 'Invitations, newest first',
        may: 'site.run',
        query: z.strictObject(pageFields),
        reply: { status: 200, description: 'A page of invitations.', schema: listOf(Invitation) },
        cache,
      },
      ({ query: { limit, cursor } }) => {
        const place = decodeCursor(cursor, 0);
        const { data, next } = page(listInvitations(db, limit, place.after), limit, place);
        return { data: data.map((row) => toInvitation(row)), next };
      },
    ),
    route(
      {
        id: 'createInvitation',
        method: 'post',
        path: '/invitations',
        tag,
        summary: 'Invite someone by mail',
        description: 'The link works once, within seven days. Inviting the same address again replaces the first link.',
        may: 'site.run',
        body: NewInvitation,
        bodyExample: { email: 'keeper@tiltwright.example', roles: ['steward'] },
        reply: { status: 201, description: 'The invitation.', schema: Invitation },
        problems: ['email-taken'],
        cache,
      },
      ({ actor, body }) => toInvitation(invite(deps, actorId(actor), body)),
    ),
    route(
      {
        id: 'revokeInvitation',
        method: 'delete',
        path: '/invitations/{token}',
        tag,
        summary: 'Revoke an invitation',
        may: 'site.run',
        params: byId,
        reply: { status: 204, description: 'Its link opens nothing any more.' },
        problems: ['not-found', 'wrong-state'],
        cache,
      },
      ({ actor, params }) => revokeInvitation(db, actorId(actor), params.token),
    ),
    route(
      {
        id: 'getInvitation',
        method: 'get',
        path: '/invitations/{token}',
        tag: 'Accounts',
        summary: 'What an invitation offers',
        may: 'session.use',
        params: byToken,
        reply: { status: 200, description: 'The offer.', schema: InvitationOffer },
        problems: ['link-expired', 'too-many-requests'],
        cache,
      },
      async ({ params, req }) => {
        await throttle.beforeTry('an invitation', req.ip ?? '');
        const { email, roles, expiresAt } = openInvitation(db, params.token);
        await throttle.afterSuccess('an invitation', req.ip ?? '', '');
        return { email, roles, expiresAt, hasAccount: findUserByEmail(db, email) !== undefined };
      },
    ),
    route(
      {
        id: 'acceptInvitation',
        method: 'post',
        path: '/invitations/{token}',
        tag: 'Accounts',
        summary: 'Accept an invitation and be signed in',
        description: 'Makes the account; or, for the signed-in account of the same address, adds the roles.',
        may: 'session.use',
        params: byToken,
        body: InvitationAnswer,
        bodyExample: { name: 'A keeper', password: 'a long enough one' },
        reply: { status: 201, description: 'The session.', schema: Session },
        problems: ['link-expired', 'sign-in-needed', 'email-taken', 'too-many-requests'],
        cache,
      },
      async ({ params, body, actor, req }) => {
        const address = req.ip ?? '';
        await throttle.beforeTry('an invitation', address);
        const signedInAs = actor.kind === 'person' ? actor.userId : undefined;
        const user = await acceptInvitation(db, params.token, body, signedInAs);
        if (user.id !== signedInAs) {
          audit(db, user.id, 'session.begin', null, { address });
          await beginSession(req, user.id);
        }
        return sessionOf(deps, user);
      },
    ),
  ];
}
