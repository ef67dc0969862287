import { useParams } from 'react-router';
import { Failure, Pending } from '../../components/ui/states.tsx';
import { usePerson } from '../../features/admin/api/people.ts';
import { PersonSheet } from '../../features/admin/components/person-sheet.tsx';
import { AdminPage } from '../admin-page.tsx';

export default function AdminPerson() {
  const { id = '' } = useParams();
  return (
    <AdminPage title="A person">
      <Person id={id} />
    </AdminPage>
  );
}

function Person({ id }: { id: string }) {
  const person = usePerson(id);
  if (person.isPending) return <Pending what="Fetching the account" />;
  if (person.isError) return <Failure error={person.error} what="fetch the account" retry={() => void person.refetch()} />;
  return (
    <>
      <h2 className="text-title break-words">{person.data.name}</h2>
      <PersonSheet key={person.data.roles.join()} person={person.data} />
    </>
  );
}
