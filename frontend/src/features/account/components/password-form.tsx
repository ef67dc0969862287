import { zodResolver } from '@hookform/resolvers/zod';
import { PasswordChange } from '@tiltwright/shared/schemas/access.ts';
import { useForm } from 'react-hook-form';
import { Button } from '../../../components/ui/button.tsx';
import { Failure } from '../../../components/ui/states.tsx';
import { TextInput } from '../../../components/ui/text-input.tsx';
import { hasCode } from '../../../lib/problem.ts';
import { useChangePassword } from '../api/change-password.ts';

export function PasswordForm() {
  const change = useChangePassword();
  const { register, handleSubmit, formState, reset, setError } = useForm({
    resolver: zodResolver(PasswordChange),
    defaultValues: { current: '', password: '' },
  });
  const { errors } = formState;
  const send = handleSubmit(async (values) => {
    try {
      await change.mutateAsync(values);
      reset();
    } catch (error) {
      if (hasCode(error, 'wrong-credentials'))
        setError('current', { type: 'server', message: 'This is not your password.' }, { shouldFocus: true });
    }
  });
  return (
    <form onSubmit={(event) => void send(event)} noValidate className="flex max-w-[30rem] flex-col gap-4">
      {change.isError && !hasCode(change.error, 'wrong-credentials') && <Failure error={change.error} what="change the password" />}
      <TextInput
        label="Password as it is"
        type="password"
        autoComplete="current-password"
        error={errors.current && (errors.current.type === 'server' ? errors.current.message : 'Type your password.')}
        {...register('current')}
      />
      <TextInput
        label="New password"
        help="12 characters or more; several words do well. Your other devices are signed out."
        type="password"
        autoComplete="new-password"
        error={errors.password && 'The password needs 12 characters or more.'}
        {...register('password')}
      />
      <div className="flex flex-wrap items-center gap-3">
        <Button type="submit" busy={change.isPending && 'Changing …'}>
          Change the password
        </Button>
        <span role="status">{change.isSuccess && 'Changed.'}</span>
      </div>
    </form>
  );
}
