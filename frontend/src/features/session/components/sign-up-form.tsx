import { zodResolver } from '@hookform/resolvers/zod';
import type { MailPromise } from '@tiltwright/shared/schemas/access.ts';
import { SignUp } from '@tiltwright/shared/schemas/account.ts';
import { type FieldError, type FieldPath, useForm } from 'react-hook-form';
import { Button } from '../../../components/ui/button.tsx';
import { Failure } from '../../../components/ui/states.tsx';
import { TextInput } from '../../../components/ui/text-input.tsx';
import { ProblemError, problemIssues } from '../../../lib/problem.ts';
import { useCreateAccount } from '../api/create-account.ts';

type Values = { name: string; email: string; password: string; integrator: boolean };
const fields: readonly FieldPath<Values>[] = ['name', 'email', 'password', 'integrator'];

/** Asks for an account; one schema for this form and the server. */
export function SignUpForm({ onAsked }: { onAsked: (promise: MailPromise) => void }) {
  const create = useCreateAccount();
  const { register, handleSubmit, formState, setError } = useForm({
    resolver: zodResolver(SignUp),
    defaultValues: { name: '', email: '', password: '', integrator: false },
  });
  const { errors } = formState;

  const send = handleSubmit(async ({ email, password, name, integrator }) => {
    try {
      onAsked(await create.mutateAsync({ email, password, name, integrator }));
    } catch (error) {
      for (const issue of problemIssues(error)) {
        const field = fields.find((name) => issue.path === `/${name}`);
        if (field) setError(field, { type: 'server', message: issue.message }, { shouldFocus: true });
      }
    }
  });

  const shown = create.error instanceof ProblemError && create.error.problem.issues.length > 0;
  return (
    <form onSubmit={(event) => void send(event)} noValidate className="flex flex-col gap-4">
      {create.isError && !shown && <Failure error={create.error} what="make the account" />}
      <TextInput
        label="Name"
        help="As others see it beside what you share."
        autoComplete="name"
        error={errors.name && said(errors.name, 'Type a name.')}
        {...register('name')}
      />
      <TextInput
        label="E-mail address"
        type="email"
        autoComplete="email"
        error={errors.email && said(errors.email, 'This is not an e-mail address.')}
        {...register('email')}
      />
      <TextInput
        label="Password"
        help="12 characters or more; several words do well."
        type="password"
        autoComplete="new-password"
        error={errors.password && said(errors.password, 'The password needs 12 characters or more.')}
        {...register('password')}
      />
      <label className="flex min-h-11 items-start gap-3">
        <input type="checkbox" className="mt-0.5 size-5 flex-none accent-ink" {...register('integrator')} />
        <span>
          I rig boats for others or build on the API
          <span className="block text-note text-ink-2">Adds API keys to the account; everything else stays the same.</span>
        </span>
      </label>
      <Button kind="main" type="submit" busy={create.isPending && 'Making the account …'} className="self-start">
        Make an account
      </Button>
    </form>
  );
}

/** What the server said about a field, else our own words for what the form's schema refused. */
function said({ type, message }: FieldError, words: string): string {
  return type === 'server' && message ? message : words;
}
