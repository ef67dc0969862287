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
  { id: 'basis', accessorKey: 'basis', header: 'Known how', narrow: 'note' },
  { id: 'source', header: 'From where', narrow: 'note', cell: ({ row }) => row.original.source ?? <NotNoted words="not stated" /> },
];

/** Every value of a record with its uncertainty, basis and source; then, in one sentence, what is not known. */
export function ValueTable({ table, sheet }: { table: CatalogTable; sheet: AnySheet }) {
  const units = useUnits();
  const rows = useMemo(() => rowsOf(table, sheet, units), [table, sheet, units]);
  const missing = sheetFields(table).filter((field) => !(field in sheet.values));
  return (
    <>
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
  return sheetFields(table).flatMap((field) => {
    const sourced = sheet.values[field];
    if (!sourced) return [];
    const { label, help } = metaOfField(table, field);
    const { value, sigma, basis, source, sourceDate } = sourced;
    const quantity = quantityOfField(table, field);
    const text =
      typeof value === 'number' && quantity !== 'plain'
        ? formatEstimate(value, sigma, quantity, units)
        : formatFieldValue(table, field, value, units);
    return [
      {
        field,
        label,
        help,
        value: text,
        basis: basisWords(basis),
        source: [source, sourceDate].filter(Boolean).join(', ') || null,
      },
    ];
  });
}

function lowerFirst(text: string): string {
  return text.charAt(0).toLowerCase() + text.slice(1);
}
