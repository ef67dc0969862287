import { Session, SignIn } from '@tiltwright/shared/schemas/account.ts';
import { beginSession } from '../../auth/begin-session.ts';
import { cookieName } from '../../auth/identify.ts';
import { checkPassword } from '../../auth/passwords.ts';
import { signInThrottle } from '../../auth/throttle.ts';
import type { Deps } from '../../deps.ts';
import { ApiProblem } from '../../errors.ts';
import { noStore, type Route, route } from '../../http/operation.ts';
import { findUser, findUserByEmail, hasSecondFactor, sessionOf } from '../accounts/queries.ts';
import { audit } from '../audit.ts';
import { takeCode } from '../second-factor/take-code.ts';

const tag = 'Accounts';

export function sessionRoutes(deps: Deps): Route[] {
  const { db } = deps;
  const throttle = signInThrottle();
  return [
    route(
      {
        id: 'signIn',
        method: 'post',
        path: '/session',
        tag,
        summary: 'Sign in',
        description:
          'Sets the session cookie. An account with a second factor is answered `second-factor-needed` until `code` is sent as well. Ten wrong tries in 15 minutes are answered 429.',
        may: 'session.use',
        body: SignIn,
        bodyExample: { email: 'customer@tiltwright.example', password: 'loft-floor-2026' },
        reply: { status: 200, description: 'The session.', schema: Session },
        problems: ['wrong-credentials', 'second-factor-needed', 'wrong-code', 'too-many-requests'],
        cache: noStore,
      },
      async ({ body, req }) => {
        const address = req.ip ?? '';
        await throttle.beforeTry(body.email, address);
        const user = findUserByEmail(db, body.email);
        const matches = await checkPassword(user?.passwordHash, body.password);
        if (!user || !matches || user.disabledAt) {
          audit(db, user?.id ?? null, 'session.refused', null, { address });
          throw new ApiProblem('wrong-credentials', 'E-mail address or password is wrong.');
        }
        if (hasSecondFactor(db, user.id)) {
          if (body.code === undefined)
            throw new ApiProblem('second-factor-needed', 'Send the code of the account’s authenticator as well, or a recovery code.');
          await throttle.beforeCode(user.id);
          if (!takeCode(deps, user, body.code)) {
            audit(db, user.id, 'session.refused', null, { address, code: true });
            throw new ApiProblem('wrong-code', 'The code is wrong or was used before; wait for the next one.');
          }
        }
        await throttle.afterSuccess(body.email, address, user.id);
        audit(db, user.id, 'session.begin', null, { address });
        await beginSession(req, user.id);
        return sessionOf(deps, user);
      },
    ),
    route(
      {
        id: 'getSession',
        method: 'get',
        path: '/session',
        tag,
        summary: 'Who is signed in',
        may: 'session.use',
        reply: { status: 200, description: 'The session; `account` is null for a visitor.', schema: Session },
        cache: noStore,
      },
      ({ actor }): Session => {
        const user = actor.kind === 'person' ? findUser(db, actor.userId) : undefined;
        return user ? sessionOf(deps, user) : { account: null, expiresAt: null };
      },
    ),
    route(
      {
        id: 'signOut',
        method: 'delete',
        path: '/session',
        tag,
        summary: 'Sign out',
        may: 'session.use',
        reply: { status: 204, description: 'Signed out.' },
        cache: noStore,
      },
      async ({ actor, req, res }) => {
        if (actor.kind === 'person') audit(db, actor.userId, 'session.end', null);
        await new Promise<void>((resolve) => (req.session ? req.session.destroy(() => resolve()) : resolve()));
        res.clearCookie(cookieName);
      },
    ),
  ];
}
