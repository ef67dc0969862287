import type { AuditEntry } from '@tiltwright/shared/schemas/desk.ts';
import { buttonClass } from '../../../components/ui/button.tsx';
import { NextPage } from '../../../components/ui/next-page.tsx';
import { Empty, Failure, Pending } from '../../../components/ui/states.tsx';
import { DataTable, NotNoted, type TableColumn } from '../../../components/ui/table.tsx';
import { formatExact, formatMoment } from '../../../lib/format-date.ts';
import { type AuditFilter, auditExportAddress, useAudit } from '../api/audit.ts';

const columns: readonly TableColumn<AuditEntry>[] = [
  {
    id: 'at',
    header: 'When',
    narrow: 'note',
    accessorKey: 'at',
    cell: ({ row: { original } }) => (
      <time dateTime={original.at} title={formatExact(original.at)}>
        {formatMoment(original.at)}
      </time>
    ),
  },
  {
    id: 'action',
    header: 'What',
    narrow: 'head',
    accessorKey: 'action',
    cell: ({ row }) => <span className="font-firm">{row.original.action}</span>,
  },
  {
    id: 'who',
    header: 'Who',
    narrow: 'note',
    accessorFn: whoOf,
    cell: ({ row }) => <span className="break-all">{whoOf(row.original)}</span>,
  },
  {
    id: 'subject',
    header: 'On what',
    accessorFn: ({ subject }) => subject ?? '',
    cell: ({ row: { original } }) => (original.subject ? <span className="break-all">{original.subject}</span> : <NotNoted words="" />),
  },
  {
    id: 'detail',
    header: 'Details',
    accessorFn: detailOf,
    cell: ({ row: { original } }) => (detailOf(original) ? <span className="break-all">{detailOf(original)}</span> : <NotNoted words="" />),
  },
];

function whoOf({ actor, actorName }: AuditEntry): string {
  return actorName ?? actor ?? 'a visitor, or the site itself';
}

function detailOf({ detail }: AuditEntry): string {
  return Object.entries(detail)
    .map(([name, value]) => `${name} ${typeof value === 'string' ? value : JSON.stringify(value)}`)
    .join(', ');
}

export function AuditLog({ filter, cursor }: { filter: AuditFilter; cursor: string | undefined }) {
  const log = useAudit(filter, cursor);
  if (log.isPending) return <Pending what="Fetching the log" />;
  if (log.isError) return <Failure error={log.error} what="fetch the log" retry={() => void log.refetch()} />;
  return (
    <>
      {log.data.data.length === 0 ? (
        <Empty title="Nothing of that kind is in the log." />
      ) : (
        <DataTable caption="Audit log" captionHidden columns={columns} rows={log.data.data} rowId={({ entry }) => String(entry)} />
      )}
      <div className="flex flex-wrap items-end justify-between gap-3">
        <NextPage next={log.data.next} />
        <a href={auditExportAddress(filter)} download="audit.csv" className={buttonClass()}>
          Download these as a table
        </a>
      </div>
    </>
  );
}
