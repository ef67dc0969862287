import { zodResolver } from '@hookform/resolvers/zod';
import { SignIn } from '@tiltwright/shared/schemas/account.ts';
import { useForm } from 'react-hook-form';
import { Button } from '../../../components/ui/button.tsx';
import { Failure, Notice } from '../../../components/ui/states.tsx';
import { TextInput } from '../../../components/ui/text-input.tsx';
import { ProblemError } from '../../../lib/problem.ts';
import { useStartSession } from '../api/start-session.ts';

/** E-mail address and password. What was typed stays after an error; the first wrong field takes the focus. */
export function SignInForm({ onSignedIn }: { onSignedIn: () => void }) {
  const start = useStartSession();
  const { register, handleSubmit, formState } = useForm({ resolver: zodResolver(SignIn), defaultValues: { email: '', password: '' } });
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
      <Button kind="main" type="submit" busy={start.isPending && 'Signing in …'} className="self-start">
        Sign in
      </Button>
    </form>
  );
}

function SignInProblem({ error }: { error: unknown }) {
  if (error instanceof ProblemError && error.problem.code === 'wrong-credentials') {
    return (
      <Notice tone="wrong" role="alert" title="E-mail address or password is wrong.">
        <p className="text-ink-2">Check both; capital letters in a password count.</p>
      </Notice>
    );
  }
  if (error instanceof ProblemError && error.problem.code === 'too-many-requests') {
    return (
      <Notice tone="wrong" role="alert" title="Too many attempts.">
        <p className="text-ink-2">Wait a few minutes before you try again.</p>
      </Notice>
    );
  }
  return <Failure error={error} what="sign you in" />;
}
