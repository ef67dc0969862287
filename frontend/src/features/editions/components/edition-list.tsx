import type { Edition, RolledBack } from '@tiltwright/shared/schemas/edition.ts';
import { useMemo, useState } from 'react';
import { Link } from 'react-router';
import { Button } from '../../../components/ui/button.tsx';
import { Day } from '../../../components/ui/day.tsx';
import { Empty, Failure, Pending } from '../../../components/ui/states.tsx';
import { DataTable, NotNoted, type TableColumn } from '../../../components/ui/table.tsx';
import { paths } from '../../../lib/paths.ts';
import { useEditions } from '../api/list-editions.ts';
import { RollBackDialog } from './roll-back-dialog.tsx';
import { RolledBackNotice } from './rolled-back-notice.tsx';

/** Editions with their reasons; each can be looked at and rolled back. */
export function EditionList() {
  const query = useEditions();
  const [asked, setAsked] = useState<Edition>();
  const [done, setDone] = useState<{ of: number; result: RolledBack }>();
  const columns = useMemo(() => columnsFor(setAsked), []);
  const editions = useMemo(() => query.data?.pages.flatMap((page) => page.data) ?? [], [query.data]);
  if (query.isPending) return <Pending what="Fetching the editions" />;
  if (query.isError && editions.length === 0)
    return <Failure error={query.error} what="fetch the editions" retry={() => void query.refetch()} />;
  if (editions.length === 0)
    return (
      <Empty title="Nothing has been published yet.">
        <p>The first table you publish becomes edition 1.</p>
      </Empty>
    );
  return (
    <div className="flex flex-col items-start gap-4">
      {done && <RolledBackNotice of={done.of} result={done.result} />}
      <DataTable
        caption="Editions of the catalog, newest first"
        captionHidden
        columns={columns}
        rows={editions}
        rowId={({ edition }) => String(edition)}
      />
      {query.hasNextPage && (
        <Button onClick={() => void query.fetchNextPage()} busy={query.isFetchingNextPage && 'Fetching …'}>
          Show earlier editions
        </Button>
      )}
      {query.isError && <Failure error={query.error} what="fetch earlier editions" retry={() => void query.fetchNextPage()} />}
      <RollBackDialog edition={asked} onClose={() => setAsked(undefined)} onDone={(of, result) => setDone({ of, result })} />
    </div>
  );
}

function columnsFor(ask: (edition: Edition) => void): readonly TableColumn<Edition>[] {
  return [
    {
      id: 'edition',
      header: 'Edition',
      narrow: 'head',
      cell: ({ row }) => (
        <span className="font-firm">
          <span className="tablet:sr-only">Edition </span>
          {row.original.edition}
        </span>
      ),
    },
    { id: 'at', header: 'Published', narrow: 'side', cell: ({ row }) => <Day iso={row.original.publishedAt} /> },
    {
      id: 'why',
      header: 'Why',
      narrow: 'body',
      cell: ({ row }) =>
        row.original.why ? <span className="break-words">{row.original.why}</span> : <NotNoted words="no reason noted" />,
    },
    { id: 'records', header: 'Records', cell: ({ row }) => row.original.records },
    {
      id: 'ways',
      header: 'What can be done',
      narrow: 'body',
      cell: ({ row: { original } }) => (
        <div className="-ml-2 flex flex-wrap items-center">
          <Link to={paths.stewardEdition(original.edition)} preventScrollReset className="inline-flex min-h-11 items-center px-2">
            What it changed<span className="sr-only">, edition {original.edition}</span>
          </Link>
          <Button kind="bare" onClick={() => ask(original)}>
            Roll back …<span className="sr-only">, edition {original.edition}</span>
          </Button>
        </div>
      ),
    },
  ];
}
