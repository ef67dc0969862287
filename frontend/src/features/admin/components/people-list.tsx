import type { Person } from '@tiltwright/shared/schemas/desk.ts';
import { Link } from 'react-router';
import { Day } from '../../../components/ui/day.tsx';
import { NextPage } from '../../../components/ui/next-page.tsx';
import { Empty, Failure, Pending } from '../../../components/ui/states.tsx';
import { DataTable, type TableColumn } from '../../../components/ui/table.tsx';
import { paths } from '../../../lib/paths.ts';
import { roleListWords } from '../../../lib/role-words.ts';
import { type PeopleFilter, usePeople } from '../api/people.ts';

const columns: readonly TableColumn<Person>[] = [
  {
    id: 'name',
    header: 'Name',
    narrow: 'head',
    accessorKey: 'name',
    cell: ({ row: { original } }) => (
      <Link to={paths.adminPerson(original.id)} className="-my-2.5 inline-flex min-h-11 items-center break-words">
        {original.name}
      </Link>
    ),
  },
  {
    id: 'email',
    header: 'E-mail address',
    narrow: 'note',
    accessorKey: 'email',
    cell: ({ row }) => <span className="break-all">{row.original.email}</span>,
  },
  { id: 'roles', header: 'Roles', narrow: 'note', accessorFn: ({ roles }) => roleListWords(roles) },
  { id: 'state', header: 'State', narrow: 'side', accessorFn: stateOf },
  { id: 'since', header: 'Since', accessorKey: 'createdAt', cell: ({ row }) => <Day iso={row.original.createdAt} /> },
];

function stateOf({ disabledAt, sessions, secondFactor }: Person): string {
  if (disabledAt) return 'disabled';
  return [sessions > 0 ? 'signed in' : 'not signed in', secondFactor && 'second factor'].filter(Boolean).join(', ');
}

export function PeopleList({ filter }: { filter: PeopleFilter }) {
  const people = usePeople(filter);
  if (people.isPending) return <Pending what="Fetching the people" />;
  if (people.isError) return <Failure error={people.error} what="fetch the people" retry={() => void people.refetch()} />;
  if (people.data.data.length === 0) {
    return (
      <Empty title="Nobody is found.">
        <p>Take a shorter part of the name or the address, or another role.</p>
      </Empty>
    );
  }
  return (
    <>
      <DataTable caption="People" captionHidden columns={columns} rows={people.data.data} rowId={({ id }) => id} />
      <NextPage next={people.data.next} />
    </>
  );
}
