import type { Import } from '@tiltwright/shared/schemas/import.ts';
import { Link } from 'react-router';
import { Day } from '../../../components/ui/day.tsx';
import { Empty, Failure, Pending } from '../../../components/ui/states.tsx';
import { DataTable, NotNoted, type TableColumn } from '../../../components/ui/table.tsx';
import { paths } from '../../../lib/paths.ts';
import { tableWords } from '../../../lib/table-words.ts';
import { useImports } from '../api/list-imports.ts';
import { countOf, publishableWords, statusWords } from '../import-words.ts';

const columns: readonly TableColumn<Import>[] = [
  {
    id: 'file',
    header: 'File',
    narrow: 'head',
    accessorKey: 'fileName',
    cell: ({ row: { original } }) => (
      <Link to={paths.stewardImport(original.id)} className="inline-block min-h-6 break-all">
        {original.fileName}
      </Link>
    ),
  },
  { id: 'table', header: 'Table', narrow: 'side', accessorFn: ({ table }) => tableWords[table] },
  {
    id: 'status',
    header: 'State',
    narrow: 'note',
    accessorFn: ({ status }) => statusWords[status],
    cell: ({ row }) => stateOf(row.original),
  },
  {
    id: 'rows',
    header: 'Rows',
    accessorFn: ({ rows }) => rows ?? 0,
    cell: ({ row }) => (row.original.rows === null ? <NotNoted words="not counted" /> : row.original.rows),
  },
  { id: 'at', header: 'Uploaded', narrow: 'note', accessorKey: 'createdAt', cell: ({ row }) => <Day iso={row.original.createdAt} /> },
];

/** Uploads and how far each has come. */
export function ImportList() {
  const imports = useImports();
  if (imports.isPending) return <Pending what="Fetching the uploads" />;
  if (imports.isError) return <Failure error={imports.error} what="fetch the uploads" retry={() => void imports.refetch()} />;
  if (imports.data.data.length === 0) {
    return (
      <Empty title="No table has been uploaded yet.">
        <p>What you upload above is checked row by row and shown here; the catalog changes only when you publish it.</p>
      </Empty>
    );
  }
  return <DataTable caption="Uploads" captionHidden columns={columns} rows={imports.data.data} rowId={(row) => row.id} sortable />;
}

function stateOf({ status, edition, counts }: Import): string {
  if (status === 'published' && edition !== null) return `published as edition ${edition}`;
  if (status === 'checked' && counts) {
    const wrong = counts.error > 0 ? `, ${countOf(counts.error, 'wrong row', 'wrong rows')}` : '';
    return `checked: ${publishableWords(counts) ?? 'nothing to publish'}${wrong}`;
  }
  return statusWords[status];
}
