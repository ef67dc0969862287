import { type CatalogTable, catalogTables } from '@tiltwright/shared/schemas/catalog-record.ts';
import type { RolledBack } from '@tiltwright/shared/schemas/edition.ts';
import { useEffect, useRef } from 'react';
import { Link } from 'react-router';
import { metaOfField } from '../../../lib/catalog-fields.ts';
import { paths } from '../../../lib/paths.ts';

/** What a rollback did and what it had to leave; takes the focus, which the closed dialog would give to a button elsewhere. */
export function RolledBackNotice({ of, result: { edition, records, withdrawn, kept } }: { of: number; result: RolledBack }) {
  const part = useRef<HTMLDivElement>(null);
  // biome-ignore lint/correctness/useExhaustiveDependencies: once for each rollback
  useEffect(() => part.current?.focus(), [edition]);
  return (
    <div ref={part} tabIndex={-1} role="status" className="border-l-[3px] border-ink py-1 pl-3">
      <p className="font-firm">
        Edition {of} is rolled back: edition {edition} gives{' '}
        {records === 1 ? 'one record its earlier values' : `${records} records their earlier values`}.
      </p>
      {withdrawn > 0 && (
        <p className="text-ink-2">
          {withdrawn === 1 ? 'One of them, which it had first published, is' : `${withdrawn} of them, which it had first published, are`}{' '}
          withdrawn.
        </p>
      )}
      {kept.length > 0 && (
        <>
          <p className="mt-2">Set again by a later edition, and therefore left as they are:</p>
          <ul className="list-disc pl-5">
            {kept.map(({ record, fields }) => (
              <Kept key={record} record={record} fields={fields} />
            ))}
          </ul>
        </>
      )}
      <Link to={paths.stewardEdition(edition)} preventScrollReset className="inline-flex min-h-11 items-center">
        What edition {edition} changed
      </Link>
    </div>
  );
}

const tableOfPrefix: Record<string, CatalogTable> = { hul: 'hulls', low: 'lower-units', trd: 'transducers', mnt: 'mounts' };

function Kept({ record, fields }: { record: string; fields: readonly string[] }) {
  const table = tableOfPrefix[record.split('_')[0] ?? ''];
  const words = fields.map((field) => (table ? metaOfField(table, field).label : field)).join(', ');
  return (
    <li className="break-words">
      {table && catalogTables.includes(table) ? <Link to={paths.part(table, record)}>{record}</Link> : record}: {words}
    </li>
  );
}
