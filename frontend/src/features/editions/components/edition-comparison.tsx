import { type FormEvent, useMemo, useState } from 'react';
import { Link } from 'react-router';
import { Button } from '../../../components/ui/button.tsx';
import { FieldChangeWords } from '../../../components/ui/field-change.tsx';
import { Empty, Failure, Pending } from '../../../components/ui/states.tsx';
import { DataTable, type TableColumn } from '../../../components/ui/table.tsx';
import { TextInput } from '../../../components/ui/text-input.tsx';
import { paths } from '../../../lib/paths.ts';
import { tableWords } from '../../../lib/table-words.ts';
import { type ListedDifference, useDifferences } from '../api/compare-editions.ts';
import type { Between } from '../edition-pair.ts';

interface ComparisonFormProps {
  /** As they stand in the address, sense or not. */
  from: string;
  to: string;
  error: string | null;
  onCompare: (from: string, to: string) => void;
}

/** Two numbers; the answer stands below and in the address. */
export function ComparisonForm({ from, to, error, onCompare }: ComparisonFormProps) {
  const [earlier, setEarlier] = useState(from);
  const [later, setLater] = useState(to);
  const send = (event: FormEvent) => {
    event.preventDefault();
    onCompare(earlier.trim(), later.trim());
  };
  return (
    <form onSubmit={send} noValidate className="flex flex-col gap-2">
      <div className="flex flex-wrap items-end gap-3">
        <TextInput
          label="From edition"
          className="w-32"
          inputMode="numeric"
          maxLength={9}
          value={earlier}
          onChange={(event) => setEarlier(event.target.value)}
        />
        <TextInput
          label="to edition"
          className="w-32"
          inputMode="numeric"
          maxLength={9}
          value={later}
          onChange={(event) => setLater(event.target.value)}
        />
        <Button type="submit">Compare</Button>
      </div>
      {error && (
        <p role="alert" className="border-l-[3px] border-rust pl-2 text-note text-rust">
          {error}
        </p>
      )}
    </form>
  );
}

/** Record by record, what lies between two editions. */
export function Differences({ from, to }: Between) {
  const query = useDifferences({ from, to });
  const rows = useMemo(() => query.data?.pages.flatMap((page) => page.data) ?? [], [query.data]);
  if (query.isPending) return <Pending what="Comparing" />;
  if (query.isError && rows.length === 0) return <Failure error={query.error} what="compare them" retry={() => void query.refetch()} />;
  if (rows.length === 0)
    return (
      <Empty title={`Nothing differs between edition ${from} and edition ${to}.`}>
        <p>Edition 0 is the empty catalog before the first one.</p>
      </Empty>
    );
  return (
    <div className="flex flex-col items-start gap-4">
      <DataTable
        caption={`From edition ${from} to edition ${to}, whatever happened in between.`}
        columns={columns}
        rows={rows}
        rowId={({ id }) => id}
      />
      {query.hasNextPage && (
        <Button onClick={() => void query.fetchNextPage()} busy={query.isFetchingNextPage && 'Fetching …'}>
          Show more records
        </Button>
      )}
      {query.isError && <Failure error={query.error} what="fetch more records" retry={() => void query.fetchNextPage()} />}
    </div>
  );
}

const columns: readonly TableColumn<ListedDifference>[] = [
  {
    id: 'name',
    header: 'Record',
    narrow: 'head',
    cell: ({ row: { original } }) =>
      original.kind === 'trim-points' ? (
        <span className="font-firm">{original.name}</span>
      ) : (
        <Link to={paths.part(original.kind, original.id)} className="font-firm">
          {original.name}
        </Link>
      ),
  },
  { id: 'kind', header: 'Table', narrow: 'side', cell: ({ row }) => tableWords[row.original.kind] },
  {
    id: 'changes',
    header: 'What differs',
    narrow: 'body',
    cell: ({ row: { original } }) => <Changes difference={original} />,
  },
];

/** They stand beside a new record as its name. */
const nameFields = new Set(['maker', 'model', 'package', 'hullMaker', 'hullModel', 'hullPackage']);

function Changes({ difference: { kind, isNew, changes } }: { difference: ListedDifference }) {
  const told = isNew ? changes.filter(({ field }) => field === undefined || !nameFields.has(field)) : changes;
  if (changes.length === 0) return <span className="text-ink-2">Came back to what it was.</span>;
  return (
    <>
      {isNew && <p className="font-firm">New.</p>}
      {/* A new record says a lot: side by side it stays short. */}
      <ul className={isNew ? 'flex flex-wrap gap-x-4 text-note' : 'text-note'}>
        {told.map(({ field = '', before, after }) => (
          <li key={field}>
            <FieldChangeWords table={kind} field={field} before={before} after={after} isNew={isNew} />
          </li>
        ))}
      </ul>
    </>
  );
}
