import { LimitList } from '../../features/admin/components/limit-list.tsx';
import { AdminPage } from '../admin-page.tsx';

export default function AdminLimits() {
  return (
    <AdminPage title="Limits">
      <p className="max-w-[60ch] text-ink-2">
        Every question costs units by how much work it is; the API’s own description names each price. A change holds at once.
      </p>
      <LimitList />
    </AdminPage>
  );
}
