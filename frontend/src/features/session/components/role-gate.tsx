import type { Role } from '@tiltwright/shared/schemas/account.ts';
import type { ReactNode } from 'react';
import { Failure, NoPermission, Pending, SignInNeeded } from '../../../components/ui/states.tsx';
import { mayAct, useSession } from '../api/get-session.ts';

interface RoleGateProps {
  needs: Role;
  /** What it is needed for, as the end of "you need an account to …". */
  what: string;
  children: ReactNode;
}

const article = (role: Role) => (/^[aeiou]/.test(role) ? 'an' : 'a');

/** Shows its children to those who may; everyone else reads why not. The server decides again on every request. */
export function RoleGate({ needs, what, children }: RoleGateProps) {
  const session = useSession();
  if (session.isPending) return <Pending what="Looking who is signed in" />;
  if (session.isError) return <Failure error={session.error} what="find out who is signed in" retry={() => void session.refetch()} />;
  const { account } = session.data;
  if (!account) return <SignInNeeded what={what} />;
  if (!mayAct(account.roles, needs))
    return (
      <NoPermission>
        Only {article(needs)} {needs} may {what}. You are signed in as {account.name}.
      </NoPermission>
    );
  return children;
}
