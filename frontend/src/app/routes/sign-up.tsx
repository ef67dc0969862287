import type { MailPromise } from '@tiltwright/shared/schemas/access.ts';
import { useState } from 'react';
import { Link, useSearchParams } from 'react-router';
import { PageTitle } from '../../components/ui/page-title.tsx';
import { MailPromised } from '../../features/session/components/mail-promised.tsx';
import { SignUpForm } from '../../features/session/components/sign-up-form.tsx';
import { wayAfterSignUp } from '../../lib/link-token.ts';
import { paths } from '../../lib/paths.ts';

export default function SignUp() {
  const [search] = useSearchParams();
  const [promise, setPromise] = useState<MailPromise>();
  const next = search.get('next');
  const asked = (given: MailPromise) => {
    wayAfterSignUp.set(next ?? '');
    setPromise(given);
  };
  return (
    <div className="flex max-w-[30rem] flex-col gap-6 px-4 py-8 desk:px-6">
      <PageTitle title="Make an account" />
      {promise ? (
        <MailPromised promise={promise}>
          A link is on its way to the address you gave; it finishes the account. If the address has an account already, the mail says so.
        </MailPromised>
      ) : (
        <>
          <p className="text-ink-2">With an account you keep boats and checks. The address is used to sign in and for nothing else.</p>
          <SignUpForm onAsked={asked} />
        </>
      )}
      <p>
        Have one already? <Link to={`${paths.signIn}${next ? `?next=${encodeURIComponent(next)}` : ''}`}>Sign in</Link>
      </p>
    </div>
  );
}
