import type { Table } from '@tiltwright/shared/schemas/catalog-record.ts';
import type { CellProblem } from '@tiltwright/shared/schemas/import.ts';
import type { ReactNode } from 'react';
import { FieldChangeWords } from '../../../components/ui/field-change.tsx';
import { formatFieldValue, metaOfField } from '../../../lib/catalog-fields.ts';
import { type UnitChoice, useUnits } from '../../../lib/unit-choice.ts';
import type { ListedRow } from '../api/list-import-rows.ts';
import { fateMeaning, fateWords } from '../import-words.ts';

interface RowFindingsProps {
  row: ListedRow;
  table: Table;
  /** What can be done about a wrong cell. */
  mend: (problem: CellProblem) => ReactNode;
}

/** What is wrong, doubtful or different in a row. */
export function RowFindings({ row, table, mend }: RowFindingsProps) {
  const units = useUnits();
  const { errors, cautions, changes } = row;
  if (errors.length + cautions.length + changes.length === 0) return <p className="text-ink-2">{fateMeaning[row.fate]}</p>;
  return (
    <ul className="flex flex-col gap-1">
      {errors.map((error) => (
        <Cell
          key={`${error.column} ${error.code}`}
          problem={error}
          tone={row.fate === 'error' ? 'border-rust' : 'border-brass'}
          word={fateWords[row.fate]}
        >
          {mend(error)}
        </Cell>
      ))}
      {cautions.map((caution) => (
        <Cell key={`${caution.column} ${caution.code}`} problem={caution} tone="border-brass" word="look again" isCaution />
      ))}
      {row.fate === 'new' && changes.length > 0 && <li className="text-note">{newValues(changes, table, units)}</li>}
      {row.fate !== 'new' &&
        changes.map(({ field = '', before, after }) => (
          <li key={field}>
            <FieldChangeWords table={table} field={field} before={before} after={after} />
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

interface CellProps {
  problem: CellProblem;
  tone: string;
  word: string;
  /** Its word is shown: the ticks speak of it. */
  isCaution?: boolean;
  children?: ReactNode;
}

function Cell({ problem, tone, word, isCaution = false, children }: CellProps) {
  return (
    <li className={`border-l-[3px] pl-2 ${tone}`}>
      <span className={isCaution ? 'text-note' : 'sr-only'}>{word}: </span>
      <code className="font-sans font-firm">{problem.column}</code> {problem.value !== '' && <q className="break-all">{problem.value}</q>}
      <span className="block text-note">{problem.message}</span>
      {children}
    </li>
  );
}
