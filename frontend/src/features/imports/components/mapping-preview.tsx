import { findColumn } from '@tiltwright/shared/csv/columns.ts';
import type { Table } from '@tiltwright/shared/schemas/catalog-record.ts';
import { useMemo } from 'react';
import { Empty } from '../../../components/ui/states.tsx';
import { DataTable, type TableColumn } from '../../../components/ui/table.tsx';
import { formatFieldValue } from '../../../lib/catalog-fields.ts';
import { type UnitChoice, useUnits } from '../../../lib/unit-choice.ts';
import type { MappingSheet } from '../api/get-mapping.ts';
import { countOf } from '../import-words.ts';
import { columnWords } from '../mapping-draft.ts';

type PreviewRow = MappingSheet['preview'][number];
type PreviewCell = PreviewRow['cells'][number];

/** The first rows as the mapping reads them, each cell that cannot be read with its reason. */
export function MappingPreview({ table, rows, isReading }: { table: Table; rows: readonly PreviewRow[]; isReading: boolean }) {
  const units = useUnits();
  const names = rows[0]?.cells.map(({ column }) => column).join(' ') ?? '';
  const columns = useMemo(() => columnsFor(table, names === '' ? [] : names.split(' '), units), [table, names, units]);
  const wrong = rows.filter(({ cells, problems }) => problems.length > 0 || cells.some(({ problem }) => problem !== null)).length;
  const words =
    wrong === 0
      ? `All of the first ${countOf(rows.length, 'row', 'rows')} can be read.`
      : `${wrong} of the first ${countOf(rows.length, 'row has', 'rows have')} something that cannot be read yet.`;
  return (
    <section className="flex flex-col gap-3">
      <h2 className="border-b border-ink pb-2 text-title">The first rows, as they will be read</h2>
      {rows.length === 0 ? (
        <Empty title="No rows stand below the headings.">
          <p>Choose another row of headings above.</p>
        </Empty>
      ) : (
        <>
          <p role="status" className="text-ink-2">
            {isReading ? 'Reading …' : words}
          </p>
          {/* biome-ignore lint/a11y/noNoninteractiveTabindex: a wide table is scrolled with the keyboard */}
          <section aria-label="First rows" tabIndex={0} className="overflow-x-auto">
            <DataTable
              caption="Read value first, the file’s own text below it where the two differ."
              columns={columns}
              rows={rows}
              rowId={({ n }) => String(n)}
            />
          </section>
        </>
      )}
    </section>
  );
}

function columnsFor(table: Table, names: readonly string[], units: UnitChoice): readonly TableColumn<PreviewRow>[] {
  return [
    {
      id: 'n',
      header: 'Row',
      narrow: 'head',
      cell: ({ row: { original } }) => (
        <>
          <span className="whitespace-nowrap text-ink-2 max-tablet:font-firm max-tablet:text-ink">
            <span className="tablet:sr-only">Row </span>
            {original.n}
          </span>
          {original.problems.map((problem) => (
            <Problem key={problem} words={problem} />
          ))}
        </>
      ),
    },
    ...names.map(
      (name): TableColumn<PreviewRow> => ({
        id: name,
        header: columnWords(table, name),
        cell: ({ row: { original } }) => {
          const cell = original.cells.find(({ column }) => column === name);
          return cell ? <Cell cell={cell} table={table} units={units} /> : null;
        },
      }),
    ),
  ];
}

function Cell({ cell, table, units }: { cell: PreviewCell; table: Table; units: UnitChoice }) {
  const { text, value, problem } = cell;
  if (problem !== null)
    return (
      <div className="min-w-32">
        <q className="font-firm break-words">{text}</q>
        <Problem words={problem} />
      </div>
    );
  if (value === null || value === undefined) return <span className="text-ink-2">–</span>;
  const read = valueWords(cell, table, units);
  return (
    <div className="min-w-16">
      <span className="font-firm">{read}</span>
      {read !== text.trim() && <span className="block text-note text-ink-2">{text}</span>}
    </div>
  );
}

function valueWords({ column: name, value }: PreviewCell, table: Table, units: UnitChoice): string {
  const column = findColumn(table, name);
  if (column?.role === 'value' || column?.role === 'sigma') return formatFieldValue(table, column.field, value, units);
  if (!Array.isArray(value)) return String(value);
  // Model years: first and last, open where nobody stated one.
  const [from, to] = value as (number | null)[];
  return from === to ? String(from) : `${from ?? '…'}–${to ?? '…'}`;
}

function Problem({ words }: { words: string }) {
  return <span className="mt-1 block max-w-72 border-l-[3px] border-rust pl-2 text-note text-rust">{words}</span>;
}
