import type { Role } from '@tiltwright/shared/schemas/account.ts';
import { type FormEvent, useState } from 'react';
import { Button } from '../../../components/ui/button.tsx';
import { RoleBoxes } from '../../../components/ui/role-boxes.tsx';
import { Failure } from '../../../components/ui/states.tsx';
import { TextInput } from '../../../components/ui/text-input.tsx';
import { hasCode } from '../../../lib/problem.ts';
import { useInvite } from '../api/invitations.ts';

export function InviteForm() {
  const invite = useInvite();
  const [email, setEmail] = useState('');
  const [roles, setRoles] = useState<Role[]>(['steward']);
  const send = (event: FormEvent) => {
    event.preventDefault();
    invite.mutate({ email, roles }, { onSuccess: () => setEmail('') });
  };
  const ofField = hasCode(invite.error, 'email-taken')
    ? 'This address has an account; change its roles under People.'
    : hasCode(invite.error, 'invalid-input')
      ? 'This is not an e-mail address.'
      : undefined;
  return (
    <form onSubmit={send} noValidate className="flex max-w-[30rem] flex-col gap-4">
      {invite.isError && !ofField && <Failure error={invite.error} what="send the invitation" />}
      <TextInput
        label="E-mail address"
        help="A link goes there; it works once, within seven days."
        type="email"
        autoComplete="off"
        error={ofField}
        value={email}
        onChange={(event) => setEmail(event.target.value)}
      />
      <RoleBoxes value={roles} onChange={setRoles} error={roles.length === 0 ? 'At least one role.' : undefined} />
      <div className="flex flex-wrap items-center gap-3">
        <Button kind="main" type="submit" disabled={email === '' || roles.length === 0} busy={invite.isPending && 'Sending …'}>
          Invite
        </Button>
        <span role="status">{invite.isSuccess && `An invitation is on its way to ${invite.data.email}.`}</span>
      </div>
    </form>
  );
}
