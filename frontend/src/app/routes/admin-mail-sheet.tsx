import { Link, useParams } from 'react-router';
import { Failure, Pending } from '../../components/ui/states.tsx';
import { useMail } from '../../features/admin/api/mail.ts';
import { MailSheet } from '../../features/admin/components/mail-sheet.tsx';
import { paths } from '../../lib/paths.ts';
import { AdminPage } from '../admin-page.tsx';

export default function AdminMailSheet() {
  const { id = '' } = useParams();
  return (
    <AdminPage title="A mail">
      <OneMail id={id} />
      <p>
        <Link to={paths.adminMail}>All mails</Link>
      </p>
    </AdminPage>
  );
}

function OneMail({ id }: { id: string }) {
  const mail = useMail(id);
  if (mail.isPending) return <Pending what="Fetching the mail" />;
  if (mail.isError) return <Failure error={mail.error} what="fetch the mail" retry={() => void mail.refetch()} />;
  return (
    <>
      <h2 className="text-title">{mail.data.subject}</h2>
      <MailSheet mail={mail.data} />
    </>
  );
}
