import { MailPromise, NewPassword, ResetRequest, Verification } from '@tiltwright/shared/schemas/access.ts';
import { Session, SignUp } from '@tiltwright/shared/schemas/account.ts';
import * as z from 'zod';
import { beginSession } from '../../auth/begin-session.ts';
import { signInThrottle } from '../../auth/throttle.ts';
import type { Deps } from '../../deps.ts';
import { noStore, type Route, route } from '../../http/operation.ts';
import { audit } from '../audit.ts';
import { beginSignUp } from './begin-sign-up.ts';
import { resetByLink } from './change-password.ts';
import { finishSignUp } from './finish-sign-up.ts';
import { promiseMail } from './mail-promise.ts';
import { sessionOf } from './queries.ts';
import { requestReset } from './request-reset.ts';

const tag = 'Accounts';
const may = 'session.use';

export function accountRoutes(deps: Deps): Route[] {
  const { db, config } = deps;
  const throttle = signInThrottle();
  return [
    route(
      {
        id: 'signUp',
        method: 'post',
        path: '/accounts',
        tag,
        summary: 'Ask for an account',
        description:
          'A mail goes to the address; its link finishes the account. The answer is the same whether or not the address has an account.',
        may,
        body: SignUp,
        bodyExample: { email: 'skipper@tiltwright.example', password: 'a long enough one', name: 'A skipper' },
        reply: { status: 202, description: 'A mail is on its way.', schema: MailPromise },
        problems: ['too-many-requests'],
        cache: noStore,
      },
      async ({ body, req }) => {
        await throttle.beforeTry('new account', req.ip ?? '');
        await beginSignUp(deps, body);
        return promiseMail(config, body.email);
      },
    ),
    route(
      {
        id: 'verifyAccount',
        method: 'post',
        path: '/accounts/verify',
        tag,
        summary: 'Finish an account by the mail’s link, and sign in',
        may,
        body: Verification,
        bodyExample: { token: 'of-the-link', password: 'a long enough one' },
        reply: { status: 201, description: 'The session of the new account.', schema: Session },
        problems: ['link-expired', 'wrong-credentials', 'email-taken', 'too-many-requests'],
        cache: noStore,
      },
      async ({ body, req }) => {
        const address = req.ip ?? '';
        const user = await finishSignUp(db, body, (email) => throttle.beforeTry(email, address));
        audit(db, user.id, 'session.begin', null, { address });
        await beginSession(req, user.id);
        return sessionOf(deps, user);
      },
    ),
    route(
      {
        id: 'requestPasswordReset',
        method: 'post',
        path: '/password-resets',
        tag,
        summary: 'Ask for a link to choose a new password',
        description: 'The answer is the same whether or not the address has an account.',
        may,
        body: ResetRequest,
        bodyExample: { email: 'customer@tiltwright.example' },
        reply: { status: 202, description: 'A mail is on its way, if the address has an account.', schema: MailPromise },
        problems: ['too-many-requests'],
        cache: noStore,
      },
      async ({ body, req }) => {
        await throttle.beforeTry('new password', req.ip ?? '');
        requestReset(deps, body.email);
        return promiseMail(config, body.email);
      },
    ),
    route(
      {
        id: 'resetPassword',
        method: 'post',
        path: '/password-resets/{token}',
        tag,
        summary: 'Choose a new password by the mail’s link',
        description: 'Ends every session of the account. A second factor stays.',
        may,
        params: z.strictObject({ token: z.string().min(1).max(200) }),
        body: NewPassword,
        bodyExample: { password: 'another long one' },
        reply: { status: 204, description: 'The new password holds.' },
        problems: ['link-expired', 'too-many-requests'],
        cache: noStore,
      },
      async ({ params, body, req }) => {
        await throttle.beforeTry('reset by link', req.ip ?? '');
        await resetByLink(deps, params.token, body.password);
      },
    ),
  ];
}
