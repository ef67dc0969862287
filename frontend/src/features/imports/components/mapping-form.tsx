import type { Import } from '@tiltwright/shared/schemas/import.ts';
import type { ReactNode } from 'react';
import { Button } from '../../../components/ui/button.tsx';
import { ChoiceRow } from '../../../components/ui/select.tsx';
import { Failure, Notice } from '../../../components/ui/states.tsx';
import { hasCode, problemIssues } from '../../../lib/problem.ts';
import type { Mapping, MappingSheet } from '../api/get-mapping.ts';
import { columnWords } from '../mapping-draft.ts';
import { useMappingDraft } from '../use-mapping-draft.ts';
import { ColumnRow } from './column-row.tsx';
import { ConstantList } from './constant-list.tsx';
import { MappingPreview } from './mapping-preview.tsx';

interface MappingFormProps {
  record: Import;
  first: MappingSheet;
  firstDraft: Mapping;
  /** Told each change, for whoever outlives this form. */
  onDraft: (draft: Mapping) => void;
  /** What else can be done with the upload, beside the check. */
  aside: ReactNode;
}

/** What each column of the file holds, what is the same in every row, and how the first rows read that way. */
export function MappingForm({ record, first, firstDraft, onDraft, aside }: MappingFormProps) {
  const { draft, setDraft, sheet, save, check, keepAndCheck, isReading } = useMappingDraft(record.id, first, firstDraft);
  const { table } = record;
  const faults = faultsOf(save.error, draft);
  const change = (next: Mapping) => {
    onDraft(next);
    setDraft(next);
  };
  const atHeader = sheet.top.slice(draft.headerRow);
  return (
    <div className="flex flex-col gap-8">
      <section>
        <h2 className="border-b border-ink pb-2 text-title">What does each column hold?</h2>
        <ol>
          {sheet.header.map((heading, at) => (
            <ColumnRow
              // biome-ignore lint/suspicious/noArrayIndexKey: a column of a file is its place
              key={at}
              table={table}
              heading={heading}
              at={at}
              samples={samplesOf(atHeader, at)}
              mapping={draft}
              onChange={change}
              error={faults.columns.get(at)}
            />
          ))}
        </ol>
      </section>
      <ConstantList table={table} mapping={draft} onChange={change} errors={faults.constants} />
      <DecimalMark mapping={draft} onChange={change} />
      <MappingPreview table={table} rows={sheet.preview} isReading={isReading} />
      <div className="flex flex-col items-start gap-3">
        {sheet.missing.length > 0 && !isReading && (
          <Notice tone="care" role="status" title="Not every row could be told yet.">
            <p className="text-ink-2">
              Nothing fills {sheet.missing.map((name) => columnWords(table, name).toLowerCase()).join(', ')}: choose a column for it, or
              write it for every row.
            </p>
          </Notice>
        )}
        {save.isError && !faults.placed && <Failure error={save.error} what="keep this mapping" />}
        {check.isError && <Failure error={check.error} what="check the rows" />}
        <div className="flex flex-wrap gap-3">
          <Button kind="main" onClick={() => void keepAndCheck()} busy={check.isPending && 'Starting …'}>
            Check the rows
          </Button>
          {aside}
        </div>
      </div>
    </div>
  );
}

function samplesOf(rows: readonly (readonly string[])[], at: number): string[] {
  return rows.flatMap((row) => (row[at]?.trim() ? [row[at]] : [])).slice(0, 3);
}

const commaChoices = [
  { value: 'found', label: 'found by itself' },
  { value: 'point', label: 'point' },
  { value: 'comma', label: 'comma' },
] as const;

function DecimalMark({ mapping, onChange }: { mapping: Mapping; onChange: (mapping: Mapping) => void }) {
  const { decimalComma, ...rest } = mapping;
  return (
    <ChoiceRow
      legend="Decimal mark of its numbers"
      name="decimal-mark"
      choices={commaChoices}
      value={decimalComma === undefined ? 'found' : decimalComma ? 'comma' : 'point'}
      onChange={(mark) => onChange(mark === 'found' ? rest : { ...rest, decimalComma: mark === 'comma' })}
    />
  );
}

/** Refusals of a mapping, by the place in the file or the constant they speak of. */
function faultsOf(error: unknown, { columns }: Mapping) {
  const faults = { columns: new Map<number, string>(), constants: new Map<string, string>(), placed: false };
  if (!hasCode(error, 'invalid-input')) return faults;
  for (const { path, message } of problemIssues(error)) {
    const [kind, name = ''] = path.split('/').slice(1);
    const at = columns[Number(name)]?.at;
    if (kind === 'columns' && at !== undefined) faults.columns.set(at, message);
    else if (kind === 'constants') faults.constants.set(name, message);
    else return { ...faults, placed: false };
    faults.placed = true;
  }
  return faults;
}
