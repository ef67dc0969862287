import type { MailPromise } from '@tiltwright/shared/schemas/access.ts';
import { useState } from 'react';
import { Link } from 'react-router';
import { ButtonLink } from '../../components/ui/button.tsx';
import { PageTitle } from '../../components/ui/page-title.tsx';
import { Notice } from '../../components/ui/states.tsx';
import { MailPromised } from '../../features/session/components/mail-promised.tsx';
import { NewPasswordForm } from '../../features/session/components/new-password-form.tsx';
import { ResetRequestForm } from '../../features/session/components/reset-request-form.tsx';
import { useLinkToken } from '../../lib/link-token.ts';
import { paths } from '../../lib/paths.ts';

export default function Reset() {
  const token = useLinkToken();
  const [promise, setPromise] = useState<MailPromise>();
  const [done, setDone] = useState(false);
  return (
    <div className="flex max-w-[30rem] flex-col gap-6 px-4 py-8 desk:px-6">
      <PageTitle title="A new password" />
      {done ? (
        <div className="flex flex-col items-start gap-3">
          <Notice role="status" title="The new password holds.">
            <p className="text-ink-2">The account was signed out everywhere.</p>
          </Notice>
          <ButtonLink kind="main" to={paths.signIn}>
            Sign in
          </ButtonLink>
        </div>
      ) : token !== '' ? (
        <NewPasswordForm token={token} onDone={() => setDone(true)} />
      ) : promise ? (
        <MailPromised promise={promise}>If the address has an account, a link to choose a new password is on its way to it.</MailPromised>
      ) : (
        <>
          <p className="text-ink-2">We send a link to the address of your account; it works once, within an hour.</p>
          <ResetRequestForm onAsked={setPromise} />
        </>
      )}
      <p>
        <Link to={paths.signIn}>Back to signing in</Link>
      </p>
    </div>
  );
}
