import { zodResolver } from '@hookform/resolvers/zod';
import { NewPassword } from '@tiltwright/shared/schemas/access.ts';
import { useForm } from 'react-hook-form';
import { Button } from '../../../components/ui/button.tsx';
import { Failure } from '../../../components/ui/states.tsx';
import { TextInput } from '../../../components/ui/text-input.tsx';
import { paths } from '../../../lib/paths.ts';
import { hasCode } from '../../../lib/problem.ts';
import { useResetPassword } from '../api/reset-password.ts';
import { LinkNotWhole } from './link-not-whole.tsx';

export function NewPasswordForm({ token, onDone }: { token: string; onDone: () => void }) {
  const reset = useResetPassword();
  const { register, handleSubmit, formState } = useForm({ resolver: zodResolver(NewPassword), defaultValues: { password: '' } });
  if (hasCode(reset.error, 'link-expired')) return <LinkNotWhole used again={{ to: paths.reset, label: 'Ask for a new link' }} />;
  const send = handleSubmit(({ password }) => reset.mutateAsync({ token, password }).then(onDone, () => undefined));
  return (
    <form onSubmit={(event) => void send(event)} noValidate className="flex flex-col gap-4">
      {reset.isError && <Failure error={reset.error} what="set the password" />}
      <TextInput
        label="New password"
        help="12 characters or more; several words do well."
        type="password"
        autoComplete="new-password"
        error={formState.errors.password && 'The password needs 12 characters or more.'}
        {...register('password')}
      />
      <Button kind="main" type="submit" busy={reset.isPending && 'Setting …'} className="self-start">
        Set the new password
      </Button>
    </form>
  );
}
