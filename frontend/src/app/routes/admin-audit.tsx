import { useSearchParams } from 'react-router';
import { AuditFilter, readAuditFilter } from '../../features/admin/components/audit-filter.tsx';
import { AuditLog } from '../../features/admin/components/audit-log.tsx';
import { AdminPage } from '../admin-page.tsx';

export default function AdminAudit() {
  const [search] = useSearchParams();
  return (
    <AdminPage title="Audit log">
      <AuditFilter />
      <AuditLog filter={readAuditFilter(search)} cursor={search.get('cursor') ?? undefined} />
    </AdminPage>
  );
}
