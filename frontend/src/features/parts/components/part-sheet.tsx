import type { CatalogTable } from '@tiltwright/shared/schemas/catalog-record.ts';
import type { ReactNode } from 'react';
import { PageTitle } from '../../../components/ui/page-title.tsx';
import { Failure, Pending } from '../../../components/ui/states.tsx';
import { type Sheets, useSheet } from '../api/get-sheet.ts';
import { History } from './history.tsx';
import { SheetHead } from './sheet-head.tsx';
import { ValueTable } from './value-table.tsx';

interface PartSheetProps<T extends CatalogTable> {
  table: T;
  id: string;
  /** "boat", "motor" …, for the words around the sheet. */
  kind: string;
  about: (sheet: Sheets[T]) => string;
  action?: (sheet: Sheets[T]) => ReactNode;
  /** What stands between the head and the values. */
  children?: (sheet: Sheets[T]) => ReactNode;
}

/** The sheet of one catalog record, the same hand for all four kinds. */
export function PartSheet<T extends CatalogTable>({ table, id, kind, about, action, children }: PartSheetProps<T>) {
  const query = useSheet(table, id);
  if (query.isPending) return <Frame title={`A ${kind}’s sheet`} body={<Pending what="Fetching the sheet" />} />;
  if (query.isError) {
    const body = <Failure error={query.error} what={`read this ${kind}’s sheet`} retry={() => void query.refetch()} />;
    return <Frame title={`No ${kind} to show`} body={body} />;
  }
  const sheet = query.data;
  return (
    <article className="flex flex-col gap-10 px-4 py-8 desk:px-6">
      <SheetHead table={table} sheet={sheet} about={about(sheet)} action={action?.(sheet)} />
      {children?.(sheet)}
      <Section title="Values">
        <ValueTable table={table} sheet={sheet} />
      </Section>
      <Section title="What changed, and when">
        <History table={table} id={sheet.id} />
      </Section>
    </article>
  );
}

export function Section({ title, children }: { title: string; children: ReactNode }) {
  return (
    <section>
      <h2 className="mb-2 border-b border-ink pb-2 text-title">{title}</h2>
      {children}
    </section>
  );
}

function Frame({ title, body }: { title: string; body: ReactNode }) {
  return (
    <div className="flex flex-col gap-4 px-4 py-8 desk:px-6">
      <PageTitle title={title} />
      {body}
    </div>
  );
}
