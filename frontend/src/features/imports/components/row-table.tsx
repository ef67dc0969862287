import type { Table } from '@tiltwright/shared/schemas/catalog-record.ts';
import type { CellProblem, Fate } from '@tiltwright/shared/schemas/import.ts';
import { useMemo } from 'react';
import { Link } from 'react-router';
import { Button } from '../../../components/ui/button.tsx';
import { Empty, Failure, Pending } from '../../../components/ui/states.tsx';
import { DataTable, type TableColumn } from '../../../components/ui/table.tsx';
import { formatFieldValue, metaOfField } from '../../../lib/catalog-fields.ts';
import { paths } from '../../../lib/paths.ts';
import { type UnitChoice, useUnits } from '../../../lib/unit-choice.ts';
import { type ListedRow, useImportRows } from '../api/list-import-rows.ts';
import { fateMeaning, fateWords } from '../import-words.ts';
import { FateMark } from './fate-mark.tsx';

interface RowTableProps {
  id: string;
  table: Table;
  fate: Fate | undefined;
  /** Its new records can be looked up by name. */
  published: boolean;
}

/** The rows with what is wrong, doubtful or different in each. */
export function RowTable({ id, table, fate, published }: RowTableProps) {
  const units = useUnits();
  const query = useImportRows(id, fate, true);
  const columns = useMemo(() => columnsFor(table, units, published), [table, units, published]);
  const rows = useMemo(() => query.data?.pages.flatMap((page) => page.data) ?? [], [query.data]);
  if (query.isPending) return <Pending what="Fetching the rows" />;
  if (query.isError && rows.length === 0) return <Failure error={query.error} what="fetch the rows" retry={() => void query.refetch()} />;
  if (rows.length === 0) return <Empty title={fate ? `No row is ${fateWords[fate]}.` : 'The table has no rows.'} />;
  return (
    <div className="flex flex-col items-start gap-4">
      <DataTable
        caption={fate ? fateMeaning[fate] : 'Row numbers as a spreadsheet counts them, the heading row included.'}
        columns={columns}
        rows={rows}
        rowId={(row) => String(row.n)}
      />
      {query.hasNextPage && (
        <Button onClick={() => void query.fetchNextPage()} busy={query.isFetchingNextPage && 'Fetching …'}>
          Show more rows
        </Button>
      )}
      {query.isError && <Failure error={query.error} what="fetch more rows" retry={() => void query.fetchNextPage()} />}
    </div>
  );
}

function columnsFor(table: Table, units: UnitChoice, published: boolean): readonly TableColumn<ListedRow>[] {
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
    { id: 'name', header: 'About', narrow: 'head', cell: ({ row }) => <About row={row.original} table={table} published={published} /> },
    {
      id: 'fate',
      header: 'Fate',
      narrow: 'side',
      cell: ({ row: { original } }) => (
        <span className="inline-flex items-center gap-2 whitespace-nowrap">
          <FateMark fate={original.fate} /> {fateWords[original.fate]}
        </span>
      ),
    },
    {
      id: 'what',
      header: 'What there is to see',
      narrow: 'body',
      cell: ({ row }) => <Findings row={row.original} table={table} units={units} />,
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

function Findings({ row, table, units }: { row: ListedRow; table: Table; units: UnitChoice }) {
  const { errors, cautions, changes } = row;
  if (errors.length + cautions.length + changes.length === 0) return <span className="text-ink-2">{fateMeaning[row.fate]}</span>;
  return (
    <ul className="flex flex-col gap-1">
      {errors.map((error) => (
        <Cell
          key={`${error.column} ${error.code}`}
          problem={error}
          tone={row.fate === 'error' ? 'border-rust' : 'border-brass'}
          word={fateWords[row.fate]}
        />
      ))}
      {cautions.map((caution) => (
        <Cell key={`${caution.column} ${caution.code}`} problem={caution} tone="border-brass" word="look again" />
      ))}
      {row.fate === 'new' && changes.length > 0 && <li className="text-note">{newValues(changes, table, units)}</li>}
      {row.fate !== 'new' &&
        changes.map(({ field = '', before, after }) => (
          <li key={field}>
            {metaOfField(table, field).label}: <del className="text-ink-2">{formatFieldValue(table, field, before, units)}</del>, now{' '}
            <ins className="font-firm no-underline">{formatFieldValue(table, field, after, units)}</ins>
          </li>
        ))}
    </ul>
  );
}

/** "Form modified vee, length 4.6 m, …": a new record has nothing to compare with, and its name stands beside it. */
function newValues(changes: ListedRow['changes'], table: Table, units: UnitChoice): string {
  const told = changes.filter(({ field }) => field !== undefined && !nameFields.has(field));
  const text = told.map(
    ({ field = '', after }) => `${lowerFirst(metaOfField(table, field).label)} ${formatFieldValue(table, field, after, units)}`,
  );
  const sentence = text.join(', ');
  return sentence === '' ? fateMeaning.new : `${sentence.charAt(0).toUpperCase()}${sentence.slice(1)}.`;
}

const nameFields = new Set(['maker', 'model', 'package', 'hullMaker', 'hullModel', 'hullPackage']);

function lowerFirst(text: string): string {
  return text.charAt(0).toLowerCase() + text.slice(1);
}

function Cell({ problem, tone, word }: { problem: CellProblem; tone: string; word: string }) {
  return (
    <li className={`border-l-[3px] pl-2 ${tone}`}>
      <span className="sr-only">{word}: </span>
      <code className="font-sans font-firm">{problem.column}</code> {problem.value !== '' && <q className="break-all">{problem.value}</q>}
      <span className="block text-note">{problem.message}</span>
    </li>
  );
}
