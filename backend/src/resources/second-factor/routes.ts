import { BegunSecondFactor, CodeProof, PasswordProof, RecoveryCodes, SecondFactor } from '@tiltwright/shared/schemas/access.ts';
import { type Actor, actorId } from '../../auth/actor.ts';
import { signInThrottle } from '../../auth/throttle.ts';
import type { Deps } from '../../deps.ts';
import { ApiProblem } from '../../errors.ts';
import { noStore, type Route, route } from '../../http/operation.ts';
import { demandPassword } from '../accounts/change-password.ts';
import { demandUser, hasSecondFactor } from '../accounts/queries.ts';
import { beginSecondFactor, confirmSecondFactor, readSecondFactor, removeSecondFactor, renewRecoveryCodes } from './set-up.ts';
import { takeCode } from './take-code.ts';

const tag = 'Accounts';
const may = 'account.own';
const path = '/me/second-factor';
const cache = noStore;

export function secondFactorRoutes(deps: Deps): Route[] {
  const { db } = deps;
  const throttle = signInThrottle();
  const self = (actor: Actor) => demandUser(db, actorId(actor));
  /** The password once more: a device left signed in must not be enough to lock its owner out. */
  const proven = async (actor: Actor, password: string) => {
    const user = self(actor);
    await throttle.beforeCode(user.id);
    await demandPassword(user, password);
    return user;
  };
  return [
    route(
      {
        id: 'getSecondFactor',
        method: 'get',
        path,
        tag,
        summary: 'Whether signing in needs a code',
        may,
        reply: { status: 200, description: 'The state of the second factor.', schema: SecondFactor },
        problems: ['not-found'],
        cache,
      },
      ({ actor }) => readSecondFactor(deps, self(actor)),
    ),
    route(
      {
        id: 'beginSecondFactor',
        method: 'post',
        path,
        tag,
        summary: 'Begin a second factor',
        description: 'Time-based codes (RFC 6238: SHA-1, 6 digits, 30 s). It takes effect with `confirm`.',
        may,
        body: PasswordProof,
        bodyExample: { password: 'loft-floor-2026' },
        reply: { status: 201, description: 'The secret, shown once.', schema: BegunSecondFactor },
        problems: ['not-found', 'wrong-credentials', 'wrong-state', 'too-many-requests'],
        cache,
      },
      async ({ actor, body }) => beginSecondFactor(deps, await proven(actor, body.password)),
    ),
    route(
      {
        id: 'confirmSecondFactor',
        method: 'post',
        path: `${path}/confirm`,
        tag,
        summary: 'Put the second factor into effect with its first code',
        may,
        body: CodeProof,
        bodyExample: { code: '123456' },
        reply: { status: 200, description: 'Recovery codes, shown once.', schema: RecoveryCodes },
        problems: ['not-found', 'wrong-code', 'wrong-state', 'too-many-requests'],
        cache,
      },
      async ({ actor, body }) => {
        const user = self(actor);
        await throttle.beforeCode(user.id);
        return { codes: confirmSecondFactor(deps, user, body.code) };
      },
    ),
    route(
      {
        id: 'renewRecoveryCodes',
        method: 'post',
        path: `${path}/recovery-codes`,
        tag,
        summary: 'Ten new recovery codes; the old ones end',
        may,
        body: CodeProof,
        bodyExample: { code: '123456' },
        reply: { status: 201, description: 'The codes, shown once.', schema: RecoveryCodes },
        problems: ['not-found', 'wrong-code', 'wrong-state', 'too-many-requests'],
        cache,
      },
      async ({ actor, body }) => {
        const user = self(actor);
        if (!hasSecondFactor(db, user.id)) throw new ApiProblem('wrong-state', 'There is no second factor to recover.');
        await throttle.beforeCode(user.id);
        if (!takeCode(deps, user, body.code)) throw new ApiProblem('wrong-code', 'The code is wrong or was used before.');
        return { codes: db.transaction((tx) => renewRecoveryCodes(tx, user.id), { behavior: 'immediate' }) };
      },
    ),
    route(
      {
        id: 'removeSecondFactor',
        method: 'delete',
        path,
        tag,
        summary: 'Remove the second factor',
        may,
        body: PasswordProof,
        bodyExample: { password: 'loft-floor-2026' },
        reply: { status: 204, description: 'The password alone signs in again.' },
        problems: ['not-found', 'wrong-credentials', 'too-many-requests'],
        cache,
      },
      async ({ actor, body }) => removeSecondFactor(deps, await proven(actor, body.password), actorId(actor)),
    ),
  ];
}
