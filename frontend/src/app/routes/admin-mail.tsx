import { mailStates } from '@tiltwright/shared/schemas/desk.ts';
import { useSearchParams } from 'react-router';
import { Select } from '../../components/ui/select.tsx';
import { MailList } from '../../features/admin/components/mail-list.tsx';
import { mailStateWords } from '../../features/admin/mail-words.ts';
import { AdminPage } from '../admin-page.tsx';

export default function AdminMail() {
  const [search, setSearch] = useSearchParams();
  const status = mailStates.find((state) => state === search.get('status'));
  return (
    <AdminPage title="Mail">
      <search className="max-w-60">
        <Select
          label="State"
          none="any"
          choices={mailStates.map((value) => ({ value, label: mailStateWords({ status: value, attempts: 0 }) }))}
          value={status ?? ''}
          onChange={(state) => setSearch(state ? { status: state } : {})}
        />
      </search>
      <MailList status={status} cursor={search.get('cursor') ?? undefined} />
    </AdminPage>
  );
}
