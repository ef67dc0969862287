import type { Table } from '@tiltwright/shared/schemas/catalog-record.ts';
import type { Fate, ImportStatus } from '@tiltwright/shared/schemas/import.ts';
import { useCallback, useMemo, useRef, useState } from 'react';
import { Link } from 'react-router';
import { Button } from '../../../components/ui/button.tsx';
import { Empty, Failure, Pending } from '../../../components/ui/states.tsx';
import { DataTable, type TableColumn } from '../../../components/ui/table.tsx';
import { paths } from '../../../lib/paths.ts';
import { type ListedRow, useImportRows } from '../api/list-import-rows.ts';
import { fateMeaning, fateWords } from '../import-words.ts';
import { withTouched } from '../touched-rows.ts';
import { FateMark } from './fate-mark.tsx';
import { RowReview } from './row-review.tsx';

interface RowTableProps {
  id: string;
  table: Table;
  fate: Fate | undefined;
  status: ImportStatus;
}

/** The rows with what is wrong, doubtful or different in each, and what can be done about it. */
export function RowTable({ id, table, fate, status }: RowTableProps) {
  const query = useImportRows(id, fate, true);
  // A row that was mended has another fate now; it stays where it is until another list is asked for.
  const [touched, setTouched] = useState<ReadonlyMap<number, ListedRow>>(new Map());
  const [said, setSaid] = useState('');
  const word = useRef<HTMLParagraphElement>(null);
  const onTouched = useCallback((row: ListedRow) => setTouched((before) => new Map(before).set(row.n, row)), []);
  const onAllMended = useCallback((words: string) => {
    setSaid(words);
    requestAnimationFrame(() => word.current?.focus());
  }, []);
  // Kept as they are while rows change: other columns would be other forms, and what is typed in them would be lost.
  const columns = useMemo(() => columnsFor({ id, table, status, onTouched, onAllMended }), [id, table, status, onTouched, onAllMended]);
  const rows = useMemo(() => withTouched(query.data?.pages.flatMap((page) => page.data) ?? [], touched), [query.data, touched]);
  if (query.isPending) return <Pending what="Fetching the rows" />;
  if (query.isError && rows.length === 0) return <Failure error={query.error} what="fetch the rows" retry={() => void query.refetch()} />;
  return (
    <div className="flex flex-col items-start gap-4">
      <p ref={word} role="status" tabIndex={-1} className={said ? 'font-firm' : 'sr-only'}>
        {said}
      </p>
      {rows.length === 0 ? (
        <Empty title={fate ? `No row is ${fateWords[fate]}.` : 'The table has no rows.'} />
      ) : (
        <DataTable
          caption={fate ? fateMeaning[fate] : 'Row numbers as a spreadsheet counts them, the heading row included.'}
          columns={columns}
          rows={rows}
          rowId={(row) => String(row.n)}
        />
      )}
      {query.hasNextPage && (
        <Button onClick={() => void query.fetchNextPage()} busy={query.isFetchingNextPage && 'Fetching …'}>
          Show more rows
        </Button>
      )}
      {query.isError && <Failure error={query.error} what="fetch more rows" retry={() => void query.fetchNextPage()} />}
    </div>
  );
}

interface ColumnNeeds extends Omit<RowTableProps, 'fate'> {
  onTouched: (row: ListedRow) => void;
  onAllMended: (words: string) => void;
}

function columnsFor({ id, table, status, onTouched, onAllMended }: ColumnNeeds): readonly TableColumn<ListedRow>[] {
  return [
    {
      id: 'n',
      header: 'Row',
      narrow: 'note',
      cell: ({ row }) => (
        <span className="text-ink-2">
          <span className="tablet:sr-only">row </span>
          {row.original.n}
        </span>
      ),
    },
    {
      id: 'name',
      header: 'About',
      narrow: 'head',
      cell: ({ row }) => <About row={row.original} table={table} published={status === 'published'} />,
    },
    {
      id: 'fate',
      header: 'Fate',
      narrow: 'side',
      cell: ({ row: { original } }) => (
        <span className="inline-flex items-center gap-2 whitespace-nowrap">
          <FateMark fate={original.fate} />{' '}
          {original.decision === 'skip' ? `${fateWords[original.fate]}, left out` : fateWords[original.fate]}
        </span>
      ),
    },
    {
      id: 'what',
      header: 'What there is to see',
      narrow: 'body',
      cell: ({ row }) => <RowReview {...{ id, table, onTouched, onAllMended }} row={row.original} isOpen={status === 'checked'} />,
    },
  ];
}

function About({ row, table, published }: { row: ListedRow; table: Table; published: boolean }) {
  const to = addressOf(row, table, published);
  if (to === null) return <span className="font-firm">{row.name}</span>;
  return (
    <Link to={to} className="font-firm">
      {row.name}
    </Link>
  );
}

/** The record's sheet; a new boat, which had none when the row was judged, by its name. */
function addressOf({ record, fate, name }: ListedRow, table: Table, published: boolean): string | null {
  if (table === 'trim-points') return null;
  if (record !== null) return paths.part(table, record);
  return published && fate === 'new' && table === 'hulls' ? `${paths.home}?q=${encodeURIComponent(name)}` : null;
}
