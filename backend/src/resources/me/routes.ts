import { PasswordChange, PasswordProof, ProfileChange } from '@tiltwright/shared/schemas/access.ts';
import { Account } from '@tiltwright/shared/schemas/account.ts';
import { eq } from 'drizzle-orm';
import * as z from 'zod';
import { type Actor, actorId } from '../../auth/actor.ts';
import { cookieName } from '../../auth/identify.ts';
import { signInThrottle } from '../../auth/throttle.ts';
import { profiles } from '../../db/schema/access.ts';
import { users } from '../../db/schema/people.ts';
import type { Deps } from '../../deps.ts';
import { noStore, type Route, route } from '../../http/operation.ts';
import { changePassword, demandPassword } from '../accounts/change-password.ts';
import { accountOf, demandUser } from '../accounts/queries.ts';
import { audit } from '../audit.ts';
import { deletePerson } from './delete-person.ts';
import { exportPerson } from './export-person.ts';

const tag = 'Accounts';
const may = 'account.own';
const cache = noStore;

export function meRoutes(deps: Deps): Route[] {
  const { db } = deps;
  const throttle = signInThrottle();
  const self = (actor: Actor) => demandUser(db, actorId(actor));
  return [
    route(
      {
        id: 'getMe',
        method: 'get',
        path: '/me',
        tag,
        summary: 'The account that is signed in',
        may,
        reply: { status: 200, description: 'The account.', schema: Account },
        problems: ['not-found'],
        cache,
      },
      ({ actor }) => accountOf(deps, self(actor)),
    ),
    route(
      {
        id: 'changeMe',
        method: 'patch',
        path: '/me',
        tag,
        summary: 'Change one’s name or units',
        may,
        body: ProfileChange,
        bodyExample: { units: { length: 'in', speed: 'mph', mass: 'lb' } },
        reply: { status: 200, description: 'The account as it is now.', schema: Account },
        problems: ['not-found'],
        cache,
      },
      ({ actor, body: { name, units } }) => {
        const user = self(actor);
        db.transaction(
          (tx) => {
            if (name !== undefined) tx.update(users).set({ name }).where(eq(users.id, user.id)).run();
            if (units) {
              tx.insert(profiles).values({ userId: user.id, units }).onConflictDoUpdate({ target: profiles.userId, set: { units } }).run();
            }
            if (name !== undefined) audit(tx, user.id, 'account.change', user.id, { fields: ['name'] });
          },
          { behavior: 'immediate' },
        );
        return accountOf(deps, self(actor));
      },
    ),
    route(
      {
        id: 'changePassword',
        method: 'put',
        path: '/me/password',
        tag,
        summary: 'Choose a new password',
        description: 'Ends the account’s other sessions; this one goes on.',
        may,
        body: PasswordChange,
        bodyExample: { current: 'loft-floor-2026', password: 'another long one' },
        reply: { status: 204, description: 'The new password holds.' },
        problems: ['not-found', 'wrong-credentials', 'too-many-requests'],
        cache,
      },
      async ({ actor, body, req }) => {
        const user = self(actor);
        await throttle.beforeCode(user.id);
        await changePassword(deps, user, body.current, body.password, req.sessionID);
      },
    ),
    route(
      {
        id: 'exportMe',
        method: 'get',
        path: '/me/export',
        tag,
        summary: 'Everything kept about the account, as JSON',
        description: 'Rows by table, without passwords, keys and other secrets.',
        may,
        reply: {
          status: 200,
          description: 'The rows.',
          schema: z.record(z.string(), z.array(z.record(z.string(), z.unknown()))).meta({ id: 'PersonExport' }),
        },
        problems: ['not-found'],
        cache,
      },
      ({ actor, res }) => {
        const { id } = self(actor);
        audit(db, id, 'account.export', id);
        res.attachment('tiltwright-account.json');
        return exportPerson(db, id);
      },
    ),
    route(
      {
        id: 'deleteMe',
        method: 'delete',
        path: '/me',
        tag,
        summary: 'Delete the account and all that is one’s own',
        description:
          'Boats, rigs, saved checks and keys go at once. What was published from them stays in the catalog’s history under an id that names nobody any more. The last admin cannot go.',
        may,
        body: PasswordProof,
        bodyExample: { password: 'loft-floor-2026' },
        reply: { status: 204, description: 'Gone.' },
        problems: ['not-found', 'wrong-credentials', 'wrong-state', 'too-many-requests'],
        cache,
      },
      async ({ actor, body, req, res }) => {
        const user = self(actor);
        await throttle.beforeCode(user.id);
        await demandPassword(user, body.password);
        deletePerson(db, user);
        await new Promise<void>((resolve) => req.session.destroy(() => resolve()));
        res.clearCookie(cookieName);
      },
    ),
  ];
}
