import { zodResolver } from '@hookform/resolvers/zod';
import { type MailPromise, ResetRequest } from '@tiltwright/shared/schemas/access.ts';
import { useForm } from 'react-hook-form';
import { Button } from '../../../components/ui/button.tsx';
import { Failure } from '../../../components/ui/states.tsx';
import { TextInput } from '../../../components/ui/text-input.tsx';
import { useRequestReset } from '../api/reset-password.ts';

export function ResetRequestForm({ onAsked }: { onAsked: (promise: MailPromise) => void }) {
  const request = useRequestReset();
  const { register, handleSubmit, formState } = useForm({ resolver: zodResolver(ResetRequest), defaultValues: { email: '' } });
  const send = handleSubmit(({ email }) => request.mutateAsync(email).then(onAsked, () => undefined));
  return (
    <form onSubmit={(event) => void send(event)} noValidate className="flex flex-col gap-4">
      {request.isError && <Failure error={request.error} what="send a link" />}
      <TextInput
        label="E-mail address"
        type="email"
        autoComplete="username"
        error={formState.errors.email && 'This is not an e-mail address.'}
        {...register('email')}
      />
      <Button kind="main" type="submit" busy={request.isPending && 'Sending …'} className="self-start">
        Send me a link
      </Button>
    </form>
  );
}
