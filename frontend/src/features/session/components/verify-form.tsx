import { type FormEvent, useState } from 'react';
import { Button } from '../../../components/ui/button.tsx';
import { Failure, Notice } from '../../../components/ui/states.tsx';
import { TextInput } from '../../../components/ui/text-input.tsx';
import { paths } from '../../../lib/paths.ts';
import { hasCode } from '../../../lib/problem.ts';
import { useVerifyAccount } from '../api/verify-account.ts';
import { LinkNotWhole } from './link-not-whole.tsx';

/** The last step of making an account: the password once more, so that nobody opens one under a stranger's. */
export function VerifyForm({ token, onVerified }: { token: string; onVerified: () => void }) {
  const verify = useVerifyAccount();
  const [password, setPassword] = useState('');
  const again = { to: paths.signUp, label: 'Sign up again' };
  if (token === '') return <LinkNotWhole used={false} again={again} />;
  if (hasCode(verify.error, 'link-expired')) return <LinkNotWhole used again={again} />;

  const send = (event: FormEvent) => {
    event.preventDefault();
    if (password !== '') verify.mutate({ token, password }, { onSuccess: onVerified });
  };
  return (
    <form onSubmit={send} noValidate className="flex flex-col gap-4">
      {hasCode(verify.error, 'wrong-credentials') ? (
        <Notice tone="wrong" role="alert" title="This is not the password chosen when signing up.">
          <p className="text-ink-2">Check it, or sign up again with a new one. If you did not sign up, close this page.</p>
        </Notice>
      ) : (
        verify.isError && <Failure error={verify.error} what="finish the account" />
      )}
      <TextInput
        label="Password"
        help="The one you chose when signing up."
        type="password"
        autoComplete="current-password"
        value={password}
        onChange={(event) => setPassword(event.target.value)}
      />
      <Button kind="main" type="submit" busy={verify.isPending && 'Finishing …'} disabled={password === ''} className="self-start">
        Finish the account
      </Button>
    </form>
  );
}
