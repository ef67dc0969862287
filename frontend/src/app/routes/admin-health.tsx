import { Failure, Pending } from '../../components/ui/states.tsx';
import { useHealth } from '../../features/admin/api/health.ts';
import { HealthSheet } from '../../features/admin/components/health-sheet.tsx';
import { AdminPage } from '../admin-page.tsx';

export default function AdminHealth() {
  return (
    <AdminPage title="Health">
      <Sheet />
    </AdminPage>
  );
}

function Sheet() {
  const health = useHealth();
  if (health.isPending) return <Pending what="Counting" />;
  if (health.isError) return <Failure error={health.error} what="read the site’s health" retry={() => void health.refetch()} />;
  return <HealthSheet health={health.data} />;
}
