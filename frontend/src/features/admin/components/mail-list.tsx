import type { Mail } from '@tiltwright/shared/schemas/desk.ts';
import { Link } from 'react-router';
import { Day } from '../../../components/ui/day.tsx';
import { NextPage } from '../../../components/ui/next-page.tsx';
import { Empty, Failure, Pending } from '../../../components/ui/states.tsx';
import { DataTable, type TableColumn } from '../../../components/ui/table.tsx';
import { paths } from '../../../lib/paths.ts';
import { type MailState, useMails } from '../api/mail.ts';
import { mailStateWords } from '../mail-words.ts';

const columns: readonly TableColumn<Mail>[] = [
  {
    id: 'subject',
    header: 'Mail',
    narrow: 'head',
    accessorKey: 'subject',
    cell: ({ row: { original } }) => (
      <Link to={paths.adminMailSheet(original.id)} className="-my-2.5 inline-flex min-h-11 items-center">
        {original.subject}
      </Link>
    ),
  },
  { id: 'to', header: 'To', narrow: 'note', accessorKey: 'to', cell: ({ row }) => <span className="break-all">{row.original.to}</span> },
  { id: 'state', header: 'State', narrow: 'side', accessorFn: mailStateWords },
  { id: 'at', header: 'Written', accessorKey: 'createdAt', cell: ({ row }) => <Day iso={row.original.createdAt} /> },
];

export function MailList({ status, cursor }: { status: MailState | undefined; cursor: string | undefined }) {
  const mails = useMails(status, cursor);
  if (mails.isPending) return <Pending what="Fetching the mails" />;
  if (mails.isError) return <Failure error={mails.error} what="fetch the mails" retry={() => void mails.refetch()} />;
  if (mails.data.data.length === 0) {
    return (
      <Empty title={status ? 'No mail is in this state.' : 'No mail has been written yet.'}>
        <p>Mails are written when someone signs up, loses a password or is invited, and when something needs you.</p>
      </Empty>
    );
  }
  return (
    <>
      <DataTable caption="Mails" captionHidden columns={columns} rows={mails.data.data} rowId={({ id }) => id} />
      <NextPage next={mails.data.next} />
    </>
  );
}
