import { findColumn } from '@tiltwright/shared/csv/columns.ts';
import type { Table } from '@tiltwright/shared/schemas/catalog-record.ts';
import { type FormEvent, useId, useState } from 'react';
import { Button } from '../../../components/ui/button.tsx';
import { TextInput } from '../../../components/ui/text-input.tsx';
import { useFixCells } from '../api/fix-cells.ts';
import type { ListedRow } from '../api/list-import-rows.ts';
import { usePatchRow } from '../api/patch-row.ts';
import { countOf } from '../import-words.ts';
import { columnWords } from '../mapping-draft.ts';
import { StaleCatalog } from './stale-catalog.tsx';

interface MendFormProps {
  id: string;
  table: Table;
  n: number;
  column: string;
  /** Text of the cell as it is read now. */
  text: string;
  /** Whether every other cell that reads so may be mended with it. */
  mayMendAll: boolean;
  onMended: (row: ListedRow) => void;
  onAllMended: (words: string) => void;
}

/** New text for one cell, or for every cell that reads the same. */
export function MendForm({ id, table, n, column, text, mayMendAll, onMended, onAllMended }: MendFormProps) {
  const patch = usePatchRow(id);
  const fix = useFixCells(id);
  const [typed, setTyped] = useState(text);
  const [all, setAll] = useState(false);
  const list = useId();
  const words = findColumn(table, column)?.values ?? [];
  const label = columnWords(table, column);

  const send = (event: FormEvent) => {
    event.preventDefault();
    if (mayMendAll && all)
      fix.mutate(
        { column, from: text, to: typed },
        { onSuccess: ({ rows }) => onAllMended(`${label}: “${text}” is read as “${typed}” now, in ${countOf(rows, 'row', 'rows')}.`) },
      );
    else patch.mutate({ n, patch: { cells: { [column]: typed } } }, { onSuccess: onMended });
  };
  const error = fix.error ?? patch.error;
  return (
    <form onSubmit={send} className="flex flex-col items-start gap-1 py-1">
      <div className="flex w-full max-w-[28rem] flex-wrap items-end gap-2">
        <TextInput
          label={
            <span className="text-note">
              <span className="sr-only">Row {n}, </span>
              {label}
            </span>
          }
          className="min-w-0 flex-[1_1_10rem]"
          maxLength={2000}
          list={words.length > 0 ? list : undefined}
          value={typed}
          onChange={(event) => setTyped(event.target.value)}
        />
        {words.length > 0 && (
          <datalist id={list}>
            {words.map((word) => (
              <option key={word} value={word} />
            ))}
          </datalist>
        )}
        <Button type="submit" busy={(patch.isPending || fix.isPending) && 'Reading …'}>
          Mend
        </Button>
      </div>
      {mayMendAll && (
        <label className="flex min-h-11 items-center gap-3 text-note">
          <input
            type="checkbox"
            className="h-5 w-5 flex-none accent-ink"
            checked={all}
            onChange={(event) => setAll(event.target.checked)}
          />
          {text === '' ? 'and wherever this cell is empty' : `and every other cell here that reads “${text}”`}
        </label>
      )}
      {error && <StaleCatalog id={id} error={error} what="mend this cell" />}
    </form>
  );
}
