import { zodResolver } from '@hookform/resolvers/zod';
import { SignIn } from '@tiltwright/shared/schemas/account.ts';
import { useEffect } from 'react';
import { useForm } from 'react-hook-form';
import { Button } from '../../../components/ui/button.tsx';
import { Failure, Notice } from '../../../components/ui/states.tsx';
import { TextInput } from '../../../components/ui/text-input.tsx';
import { hasCode } from '../../../lib/problem.ts';
import { useStartSession } from '../api/start-session.ts';

/** E-mail address and password, and the code where the account asks for one. What was typed stays after an error. */
export function SignInForm({ onSignedIn }: { onSignedIn: () => void }) {
  const start = useStartSession();
  const { register, handleSubmit, formState, setFocus, watch } = useForm({
    resolver: zodResolver(SignIn),
    defaultValues: { email: '', password: '', code: undefined as string | undefined },
  });
  // Once asked for, the code stays asked for: a wrong one is typed again beside the same address and password.
  const needsCode = hasCode(start.error, 'second-factor-needed') || hasCode(start.error, 'wrong-code') || watch('code') !== undefined;
  useEffect(() => {
    if (needsCode) setFocus('code');
  }, [needsCode, setFocus]);

  const send = handleSubmit((values) => start.mutateAsync(values).then(onSignedIn, () => undefined));
  return (
    <form onSubmit={(event) => void send(event)} noValidate className="flex flex-col gap-4">
      {start.isError && <SignInProblem error={start.error} />}
      <TextInput
        label="E-mail address"
        type="email"
        autoComplete="username"
        error={formState.errors.email && 'This is not an e-mail address.'}
        {...register('email')}
      />
      <TextInput
        label="Password"
        type="password"
        autoComplete="current-password"
        error={formState.errors.password && 'Type your password.'}
        {...register('password')}
      />
      {needsCode && (
        <TextInput
          label="Code"
          help="Six digits from your authenticator, or one of your recovery codes."
          inputMode="text"
          autoComplete="one-time-code"
          error={formState.errors.code && 'Type the six digits.'}
          {...register('code')}
        />
      )}
      <Button kind="main" type="submit" busy={start.isPending && 'Signing in …'} className="self-start">
        Sign in
      </Button>
    </form>
  );
}

function SignInProblem({ error }: { error: unknown }) {
  if (hasCode(error, 'second-factor-needed')) {
    return (
      <Notice role="status" title="One more step.">
        <p className="text-ink-2">This account asks for a code as well.</p>
      </Notice>
    );
  }
  if (hasCode(error, 'wrong-code')) {
    return (
      <Notice tone="wrong" role="alert" title="The code is wrong, or was used already.">
        <p className="text-ink-2">Each code works once; wait for the next one.</p>
      </Notice>
    );
  }
  if (hasCode(error, 'wrong-credentials')) {
    return (
      <Notice tone="wrong" role="alert" title="E-mail address or password is wrong.">
        <p className="text-ink-2">Check both; capital letters in a password count.</p>
      </Notice>
    );
  }
  if (hasCode(error, 'too-many-requests')) {
    return (
      <Notice tone="wrong" role="alert" title="Too many attempts.">
        <p className="text-ink-2">Wait a few minutes before you try again.</p>
      </Notice>
    );
  }
  return <Failure error={error} what="sign you in" />;
}
