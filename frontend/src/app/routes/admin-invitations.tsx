import { useSearchParams } from 'react-router';
import { InvitationList } from '../../features/admin/components/invitation-list.tsx';
import { InviteForm } from '../../features/admin/components/invite-form.tsx';
import { AdminPage } from '../admin-page.tsx';

export default function AdminInvitations() {
  const [search] = useSearchParams();
  return (
    <AdminPage title="Invitations">
      <InviteForm />
      <section>
        <h2 className="mb-2 border-b border-ink pb-2 text-title">Sent</h2>
        <InvitationList cursor={search.get('cursor') ?? undefined} />
      </section>
    </AdminPage>
  );
}
