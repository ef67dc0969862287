import type { Invitation } from '@tiltwright/shared/schemas/desk.ts';
import { Button } from '../../../components/ui/button.tsx';
import { Day } from '../../../components/ui/day.tsx';
import { NextPage } from '../../../components/ui/next-page.tsx';
import { Empty, Failure, Pending } from '../../../components/ui/states.tsx';
import { DataTable, type TableColumn } from '../../../components/ui/table.tsx';
import { roleListWords } from '../../../lib/role-words.ts';
import { useInvitations, useRevokeInvitation } from '../api/invitations.ts';

const columns: readonly TableColumn<Invitation>[] = [
  {
    id: 'email',
    header: 'Invited',
    narrow: 'head',
    accessorKey: 'email',
    cell: ({ row }) => <span className="break-all">{row.original.email}</span>,
  },
  { id: 'roles', header: 'As', narrow: 'note', accessorFn: ({ roles }) => roleListWords(roles) },
  { id: 'state', header: 'State', narrow: 'side', accessorKey: 'state' },
  { id: 'at', header: 'Sent', accessorKey: 'createdAt', cell: ({ row }) => <Day iso={row.original.createdAt} /> },
  { id: 'until', header: 'Good until', accessorKey: 'expiresAt', cell: ({ row }) => <Day iso={row.original.expiresAt} /> },
  { id: 'act', header: 'Revoke', narrow: 'note', accessorKey: 'id', cell: ({ row }) => <Revoke invitation={row.original} /> },
];

function Revoke({ invitation }: { invitation: Invitation }) {
  const revoke = useRevokeInvitation();
  if (invitation.state !== 'open') return null;
  return (
    <>
      <Button kind="bare" onClick={() => revoke.mutate(invitation.id)} busy={revoke.isPending && 'Revoking …'}>
        Revoke<span className="sr-only"> the invitation of {invitation.email}</span>
      </Button>
      {revoke.isError && <Failure error={revoke.error} what="revoke it" />}
    </>
  );
}

export function InvitationList({ cursor }: { cursor: string | undefined }) {
  const invitations = useInvitations(cursor);
  if (invitations.isPending) return <Pending what="Fetching the invitations" />;
  if (invitations.isError)
    return <Failure error={invitations.error} what="fetch the invitations" retry={() => void invitations.refetch()} />;
  if (invitations.data.data.length === 0) {
    return (
      <Empty title="Nobody has been invited yet.">
        <p>Owners sign up by themselves; stewards and admins come by invitation.</p>
      </Empty>
    );
  }
  return (
    <>
      <DataTable caption="Invitations" captionHidden columns={columns} rows={invitations.data.data} rowId={({ id }) => id} />
      <NextPage next={invitations.data.next} />
    </>
  );
}
