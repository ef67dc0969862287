import type { CatalogTable } from '@tiltwright/shared/schemas/catalog-record.ts';
import { useMemo } from 'react';
import { DataTable, NotNoted, type TableColumn } from '../../../components/ui/table.tsx';
import { basisWords } from '../../../lib/basis-words.ts';
import { formatFieldValue, metaOfField, quantityOfField, sheetFields } from '../../../lib/catalog-fields.ts';
import { formatEstimate } from '../../../lib/format-units.ts';
import { type UnitChoice, useUnits } from '../../../lib/unit-choice.ts';
import type { AnySheet } from '../api/get-sheet.ts';

interface Row {
  field: string;
  label: string;
  help: string | undefined;
  value: string;
  basis: string;
  source: string | null;
  /** True where it is known in the same way and from the same place as most of the record. */
  asMost: boolean;
}

const columns: readonly TableColumn<Row>[] = [
  {
    id: 'label',
    accessorKey: 'label',
    header: 'What',
    narrow: 'head',
    cell: ({ row: { original } }) => (
      <>
        {original.label}
        {original.help && <span className="block text-note text-ink-2">{original.help}</span>}
      </>
    ),
  },
  {
    id: 'value',
    accessorKey: 'value',
    header: 'Value',
    narrow: 'side',
    cell: ({ row }) => <span className="font-firm">{row.original.value}</span>,
  },
  {
    id: 'basis',
    header: 'Known how',
    narrow: 'note',
    cell: ({ row: { original } }) => <span className={original.asMost ? 'narrow-skip' : ''}>{original.basis}</span>,
  },
  {
    id: 'source',
    header: 'From where',
    narrow: 'note',
    cell: ({ row: { original } }) =>
      original.source === null ? (
        <NotNoted words="not stated" />
      ) : (
        <span className={original.asMost ? 'narrow-skip' : ''}>{original.source}</span>
      ),
  },
];

/** Every value of a record with its uncertainty, basis and source; then, in one sentence, what is not known. */
export function ValueTable({ table, sheet }: { table: CatalogTable; sheet: AnySheet }) {
  const units = useUnits();
  const rows = useMemo(() => rowsOf(table, sheet, units), [table, sheet, units]);
  const missing = sheetFields(table).filter((field) => !(field in sheet.values));
  const most = rows.find((row) => row.asMost);
  return (
    <>
      {most && <p className="pb-2 text-note text-ink-2 tablet:hidden">Where nothing else is said: {originOf(most)}.</p>}
      <DataTable
        caption="Values, how they are known, and where they come from"
        captionHidden
        columns={columns}
        rows={rows}
        rowId={(row) => row.field}
      />
      {missing.length > 0 && (
        <p className="max-w-[72ch] pt-3 text-note text-ink-2">
          Not known here: {missing.map((field) => lowerFirst(metaOfField(table, field).label)).join(', ')}. Where a check needs one of these
          it takes the usual value for the class, and says so.
        </p>
      )}
    </>
  );
}

function rowsOf(table: CatalogTable, sheet: AnySheet, units: UnitChoice): Row[] {
  const rows = sheetFields(table).flatMap((field) => {
    const sourced = sheet.values[field];
    if (!sourced) return [];
    const { label, help } = metaOfField(table, field);
    const { value, sigma, basis, source, sourceDate } = sourced;
    const quantity = quantityOfField(table, field);
    const text =
      typeof value === 'number' && quantity !== 'plain'
        ? formatEstimate(value, sigma, quantity, units)
        : formatFieldValue(table, field, value, units);
    const from = [source, sourceDate].filter(Boolean).join(', ') || null;
    return [{ field, label, help, value: text, basis: basisWords(basis), source: from, asMost: false }];
  });
  const most = mostOf(rows);
  return rows.map((row) => ({ ...row, asMost: most !== null && originOf(row) === originOf(most) }));
}

function originOf({ basis, source }: Pick<Row, 'basis' | 'source'>): string {
  return source === null ? basis : `${basis}, ${source}`;
}

/** A row of the origin that more than half of the values share, if there is one: on a narrow screen it is said once. */
function mostOf(rows: readonly Row[]): Row | null {
  return rows.find((row) => rows.filter((other) => originOf(other) === originOf(row)).length * 2 > rows.length) ?? null;
}

function lowerFirst(text: string): string {
  return text.charAt(0).toLowerCase() + text.slice(1);
}
