import { Account, Session, SignIn, SignUp } from '@tiltwright/shared/schemas/account.ts';
import type { Request } from 'express';
import { cookieName } from '../../auth/identify.ts';
import { checkPassword } from '../../auth/passwords.ts';
import { signInThrottle } from '../../auth/throttle.ts';
import type { Deps } from '../../deps.ts';
import { ApiProblem } from '../../errors.ts';
import { noStore, type Route, route } from '../../http/operation.ts';
import { createAccount } from '../accounts/create-account.ts';
import { accountOf, findUser, findUserByEmail, type User } from '../accounts/queries.ts';
import { audit } from '../audit.ts';

const tag = 'Accounts';

export function sessionRoutes({ db, config }: Deps): Route[] {
  const throttle = signInThrottle();

  const begin = async (req: Request, user: User): Promise<Session> => {
    // A new session id, so that one planted before signing in is worth nothing.
    await new Promise<void>((resolve, reject) => req.login({ id: user.id }, (error) => (error ? reject(error) : resolve())));
    return { account: accountOf({ db, config }, user), expiresAt: new Date(Date.now() + config.sessionMs).toISOString() };
  };

  return [
    route(
      {
        id: 'signIn',
        method: 'post',
        path: '/session',
        tag,
        summary: 'Sign in',
        description: 'Sets the session cookie. Ten wrong tries in 15 minutes are answered 429.',
        may: 'session.use',
        body: SignIn,
        bodyExample: { email: 'customer@tiltwright.example', password: 'loft-floor-2026' },
        reply: { status: 200, description: 'The session.', schema: Session },
        problems: ['wrong-credentials', 'too-many-requests'],
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
        await throttle.afterSuccess(body.email, address);
        audit(db, user.id, 'session.begin', null, { address });
        return begin(req, user);
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
      ({ actor }) => {
        const user = actor.kind === 'person' ? findUser(db, actor.userId) : undefined;
        return {
          account: user ? accountOf({ db, config }, user) : null,
          expiresAt: user ? new Date(Date.now() + config.sessionMs).toISOString() : null,
        };
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
    route(
      {
        id: 'signUp',
        method: 'post',
        path: '/accounts',
        tag,
        summary: 'Make an account and sign in',
        may: 'session.use',
        body: SignUp,
        bodyExample: { email: 'skipper@tiltwright.example', password: 'a long enough one', name: 'A skipper' },
        reply: { status: 201, description: 'The session of the new account.', schema: Session },
        problems: ['email-taken', 'too-many-requests'],
        cache: noStore,
      },
      async ({ body, req }) => {
        await throttle.beforeTry('new account', req.ip ?? '');
        const user = await createAccount(db, {
          email: body.email,
          name: body.name,
          password: body.password,
          roles: body.integrator ? ['customer', 'integrator'] : ['customer'],
        });
        return begin(req, user);
      },
    ),
    route(
      {
        id: 'getMe',
        method: 'get',
        path: '/me',
        tag,
        summary: 'The account that is signed in',
        may: 'account.own',
        reply: { status: 200, description: 'The account.', schema: Account },
        problems: ['not-found'],
        cache: noStore,
      },
      ({ actor }) => {
        const user = actor.kind === 'visitor' ? undefined : findUser(db, actor.userId);
        if (!user) throw new ApiProblem('not-found', 'This account is gone.');
        return accountOf({ db, config }, user);
      },
    ),
  ];
}
