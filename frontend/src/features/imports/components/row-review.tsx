import { findColumn } from '@tiltwright/shared/csv/columns.ts';
import type { Table } from '@tiltwright/shared/schemas/catalog-record.ts';
import type { CellProblem } from '@tiltwright/shared/schemas/import.ts';
import { useEffect, useRef, useState } from 'react';
import { Button } from '../../../components/ui/button.tsx';
import { Select } from '../../../components/ui/select.tsx';
import type { ListedRow } from '../api/list-import-rows.ts';
import { usePatchRow } from '../api/patch-row.ts';
import { fateWords } from '../import-words.ts';
import { columnChoices, columnWords } from '../mapping-draft.ts';
import { MendForm } from './mend-form.tsx';
import { RowDecision } from './row-decision.tsx';
import { RowFindings } from './row-findings.tsx';
import { StaleCatalog } from './stale-catalog.tsx';

interface RowReviewProps {
  id: string;
  table: Table;
  row: ListedRow;
  /** Only while the table waits for decisions. */
  isOpen: boolean;
  onTouched: (row: ListedRow) => void;
  onAllMended: (words: string) => void;
}

/** The whole row is meant, not the one cell that is named: its repetition is no matter of spelling. */
const wholeRow = new Set(['same-as-row', 'same-record-twice']);

/** What there is to see in a row, and what can be done about it. What was done is said, and takes the focus, in its place. */
export function RowReview({ id, table, row, isOpen, onTouched, onAllMended }: RowReviewProps) {
  const [said, setSaid] = useState({ words: '' });
  const [other, setOther] = useState('');
  const word = useRef<HTMLParagraphElement>(null);
  // Once what was pressed is gone the focus would fall off the page.
  useEffect(() => {
    if (said.words !== '' && document.activeElement === document.body) word.current?.focus();
  }, [said]);
  const done = (after: ListedRow, words: string) => {
    onTouched(after);
    setSaid({ words });
    setOther('');
  };
  const mended = (after: ListedRow) =>
    done(after, after.fate === 'error' ? `Row ${after.n} is still wrong.` : `Mended: row ${after.n} is ${fateWords[after.fate]} now.`);
  const form = (column: string, text: string, mayMendAll: boolean) => (
    <MendForm key={`${column} ${text}`} {...{ id, table, column, text, mayMendAll, onAllMended }} n={row.n} onMended={mended} />
  );
  const mend = ({ column, code, value }: CellProblem) => {
    if (!isOpen || row.fate !== 'error' || wholeRow.has(code) || !findColumn(table, column)) return null;
    return form(column, row.edits[column] ?? value, row.edits[column] === undefined && code !== 'not-two-values');
  };
  return (
    <div className="flex flex-col gap-1">
      <RowFindings row={row} table={table} mend={mend} />
      <p ref={word} tabIndex={-1} role="status" className={said.words ? 'font-firm' : 'sr-only'}>
        {said.words}
      </p>
      {isOpen && (
        <>
          <Edits id={id} table={table} row={row} onBack={(after) => done(after, `Taken back: row ${row.n} reads as in the file.`)} />
          <RowDecision id={id} row={row} onDecided={(after, words) => done(after, `Row ${row.n} ${words}.`)}>
            {row.fate !== 'unchanged' && (
              <details className="min-w-0 open:basis-full">
                <summary className="flex min-h-11 w-fit items-center px-2 text-ink-2 underline underline-offset-4">
                  The whole row<span className="sr-only">, row {row.n}</span>
                </summary>
                <div className="border-l border-rule pb-2 pl-3 ml-2">
                  <FileCells cells={row.cells} />
                  <Select
                    label="Mend another cell"
                    className="max-w-[28rem]"
                    none="choose which"
                    choices={columnChoices(table).filter(({ value }) => findColumn(table, value))}
                    value={other}
                    onChange={setOther}
                  />
                  {other !== '' && form(other, row.edits[other] ?? row.cells[other] ?? '', false)}
                </div>
              </details>
            )}
          </RowDecision>
        </>
      )}
    </div>
  );
}

function FileCells({ cells }: { cells: ListedRow['cells'] }) {
  return (
    <dl className="flex flex-wrap gap-x-6 gap-y-1 pb-3 text-note">
      {Object.entries(cells).map(([heading, text]) => (
        <div key={heading} className="min-w-0">
          <dt className="inline text-ink-2">{heading}: </dt>
          <dd className="inline break-words">{text.trim() === '' ? '–' : text}</dd>
        </div>
      ))}
    </dl>
  );
}

interface EditsProps {
  id: string;
  table: Table;
  row: ListedRow;
  onBack: (row: ListedRow) => void;
}

/** Cells a person mended, each of which can be taken back. */
function Edits({ id, table, row: { n, edits }, onBack }: EditsProps) {
  const patch = usePatchRow(id);
  const mended = Object.entries(edits);
  if (mended.length === 0) return null;
  return (
    <>
      <ul className="text-note">
        {mended.map(([column, text]) => (
          <li key={column} className="flex flex-wrap items-center gap-x-2">
            <span>
              {columnWords(table, column)}, as you wrote it: <q className="break-all">{text}</q>
            </span>
            <Button
              kind="bare"
              disabled={patch.isPending}
              onClick={() => patch.mutate({ n, patch: { cells: { [column]: null } } }, { onSuccess: onBack })}
            >
              Take back
              <span className="sr-only">
                , row {n}, {columnWords(table, column)}
              </span>
            </Button>
          </li>
        ))}
      </ul>
      {patch.isError && <StaleCatalog id={id} error={patch.error} what="take this back" />}
    </>
  );
}
