import { zodResolver } from '@hookform/resolvers/zod';
import { NewPassword } from '@tiltwright/shared/schemas/access.ts';
import { PersonName } from '@tiltwright/shared/schemas/account.ts';
import type { InvitationOffer } from '@tiltwright/shared/schemas/desk.ts';
import { useForm } from 'react-hook-form';
import { Button, ButtonLink } from '../../../components/ui/button.tsx';
import { Failure, Notice } from '../../../components/ui/states.tsx';
import { TextInput } from '../../../components/ui/text-input.tsx';
import { paths } from '../../../lib/paths.ts';
import { useSession } from '../api/get-session.ts';
import { useAcceptInvitation } from '../api/invitation.ts';

const NewAccount = NewPassword.extend({ name: PersonName });

interface InvitationFormProps {
  token: string;
  offer: InvitationOffer;
  onAccepted: () => void;
}

/** Name and password of a new account; or one button for whoever is signed in with the invited address. */
export function InvitationForm({ token, offer, onAccepted }: InvitationFormProps) {
  const accept = useAcceptInvitation(token);
  const session = useSession();
  const { register, handleSubmit, formState } = useForm({
    resolver: zodResolver(NewAccount),
    defaultValues: { name: '', password: '' },
  });
  const failure = accept.isError && <Failure error={accept.error} what="accept the invitation" />;

  if (offer.hasAccount) {
    if (session.data?.account?.email !== offer.email) {
      return (
        <div className="flex flex-col items-start gap-3">
          <Notice title="This address has an account.">
            <p className="text-ink-2">Sign in with it, then open the link of the mail once more.</p>
          </Notice>
          <ButtonLink kind="main" to={paths.signIn}>
            Sign in
          </ButtonLink>
        </div>
      );
    }
    return (
      <div className="flex flex-col items-start gap-3">
        {failure}
        <Button
          kind="main"
          onClick={() => void accept.mutateAsync({}).then(onAccepted, () => undefined)}
          busy={accept.isPending && 'Accepting …'}
        >
          Accept
        </Button>
      </div>
    );
  }

  const { errors } = formState;
  const send = handleSubmit((values) => accept.mutateAsync(values).then(onAccepted, () => undefined));
  return (
    <form onSubmit={(event) => void send(event)} noValidate className="flex flex-col gap-4">
      {failure}
      <TextInput
        label="Name"
        help="As others see it beside what you share."
        autoComplete="name"
        error={errors.name && 'Type a name.'}
        {...register('name')}
      />
      <TextInput
        label="Password"
        help="12 characters or more; several words do well."
        type="password"
        autoComplete="new-password"
        error={errors.password && 'The password needs 12 characters or more.'}
        {...register('password')}
      />
      <Button kind="main" type="submit" busy={accept.isPending && 'Accepting …'} className="self-start">
        Accept and sign in
      </Button>
    </form>
  );
}
