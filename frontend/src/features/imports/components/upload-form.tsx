import type { Table } from '@tiltwright/shared/schemas/catalog-record.ts';
import { type FormEvent, useRef, useState } from 'react';
import { Button } from '../../../components/ui/button.tsx';
import { controlClass, Field } from '../../../components/ui/field.tsx';
import { Select } from '../../../components/ui/select.tsx';
import { Failure } from '../../../components/ui/states.tsx';
import { TextInput } from '../../../components/ui/text-input.tsx';
import { hasCode, ProblemError } from '../../../lib/problem.ts';
import { allTables, tableWords } from '../../../lib/table-words.ts';
import { useUploadTable } from '../api/upload-table.ts';

const choices = allTables.map((value) => ({ value, label: tableWords[value] }));

/** Which table, which file. The choice stays after a refusal, so only the file has to be picked again. */
export function UploadForm({ onUploaded }: { onUploaded: (id: string) => void }) {
  const upload = useUploadTable();
  const [table, setTable] = useState<Table>('hulls');
  const [missing, setMissing] = useState(false);
  const [headingRow, setHeadingRow] = useState('');
  const file = useRef<HTMLInputElement>(null);

  const send = (event: FormEvent) => {
    event.preventDefault();
    const picked = file.current?.files?.[0];
    setMissing(!picked);
    const row = Number(headingRow);
    if (!picked) file.current?.focus();
    else
      upload.mutate(
        { table, file: picked, headerRow: Number.isInteger(row) && row > 0 ? row : undefined },
        { onSuccess: onUploaded, onError: () => file.current?.focus() },
      );
  };

  const refusal = fileRefusal(upload.error);
  return (
    <form onSubmit={send} noValidate className="flex max-w-[36rem] flex-col gap-4">
      {upload.isError && !refusal && <Failure error={upload.error} what="upload the table" />}
      <Select label="Table" choices={choices} value={table} onChange={setTable} />
      <Field
        label="File"
        help="Text with commas, semicolons or tabs. Its headings may be its own: what each column holds is asked next. Nothing is published yet."
        error={missing ? 'Choose a file.' : refusal}
      >
        {(control) => (
          <input
            {...control}
            ref={file}
            type="file"
            accept=".csv,.tsv,.txt,text/csv,text/tab-separated-values,text/plain"
            className={`${controlClass} py-2 file:mr-3 file:border-0 file:bg-transparent file:font-firm file:text-ink file:underline`}
            onChange={() => setMissing(false)}
          />
        )}
      </Field>
      {(headingRow !== '' || hasCode(upload.error, 'no-header')) && (
        <TextInput
          label="Row of the headings"
          help="Counted from 1, as a spreadsheet does. The headings may be in words of their own: the next page asks what each column holds."
          inputMode="numeric"
          maxLength={4}
          value={headingRow}
          onChange={(event) => setHeadingRow(event.target.value)}
        />
      )}
      <Button kind="main" type="submit" busy={upload.isPending && 'Uploading …'} className="self-start">
        Upload and check
      </Button>
    </form>
  );
}

/** What is wrong with the file itself belongs beside the file; anything else is an error of the page. */
function fileRefusal(error: unknown): string | null {
  if (!(error instanceof ProblemError)) return null;
  const { status, code, detail, issues } = error.problem;
  if (status === 413) return detail;
  if (code === 'no-header') return detail;
  const about = issues.find((issue) => issue.path === '/file');
  return about ? about.message : null;
}
