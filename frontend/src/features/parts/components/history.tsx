import type { CatalogTable } from '@tiltwright/shared/schemas/catalog-record.ts';
import { Day } from '../../../components/ui/day.tsx';
import { Failure, Pending } from '../../../components/ui/states.tsx';
import { formatFieldValue, metaOfField } from '../../../lib/catalog-fields.ts';
import { useUnits } from '../../../lib/unit-choice.ts';
import { type Revision, useRevisions } from '../api/list-revisions.ts';

/** What changed in a record and when, newest first. */
export function History({ table, id }: { table: CatalogTable; id: string }) {
  const revisions = useRevisions(table, id);
  if (revisions.isPending) return <Pending what="Fetching the history" />;
  if (revisions.isError) return <Failure error={revisions.error} what="fetch the history" retry={() => void revisions.refetch()} />;
  const newestFirst = revisions.data.data.toSorted((a, b) => b.revision - a.revision);
  return (
    <ol className="flex flex-col">
      {newestFirst.map((revision) => (
        <Entry key={revision.revision} table={table} revision={revision} />
      ))}
    </ol>
  );
}

function Entry({ table, revision }: { table: CatalogTable; revision: Revision }) {
  const units = useUnits();
  const { at, edition, why, source, changes } = revision;
  return (
    <li className="grid gap-x-6 border-b border-rule py-3 tablet:grid-cols-[11rem_minmax(0,1fr)]">
      <p className="text-ink-2">
        <Day iso={at} />, edition {edition}
      </p>
      <div>
        <p>{why ?? (revision.revision === 1 ? 'First entry.' : 'No reason was given.')}</p>
        {revision.revision > 1 && changes.length > 0 && (
          <ul className="text-note">
            {changes.map(({ field, before, after }) => (
              <li key={field}>
                {metaOfField(table, field).label}: <del className="text-ink-2">{formatFieldValue(table, field, before, units)}</del>, now{' '}
                <ins className="font-firm no-underline">{formatFieldValue(table, field, after, units)}</ins>
              </li>
            ))}
          </ul>
        )}
        {source && <p className="text-note text-ink-2">From: {source}</p>}
      </div>
    </li>
  );
}
