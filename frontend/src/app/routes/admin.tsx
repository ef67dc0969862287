import { useSearchParams } from 'react-router';
import { PeopleFilter, readPeopleFilter } from '../../features/admin/components/people-filter.tsx';
import { PeopleList } from '../../features/admin/components/people-list.tsx';
import { AdminPage } from '../admin-page.tsx';

export default function Admin() {
  const [search] = useSearchParams();
  return (
    <AdminPage title="People">
      <PeopleFilter />
      <PeopleList filter={readPeopleFilter(search)} />
    </AdminPage>
  );
}
