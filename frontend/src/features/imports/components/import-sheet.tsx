import type { Fate, Import } from '@tiltwright/shared/schemas/import.ts';
import { type ReactNode, useEffect, useRef, useState } from 'react';
import { Link } from 'react-router';
import { Button, ButtonLink, buttonClass } from '../../../components/ui/button.tsx';
import { Failure, Notice } from '../../../components/ui/states.tsx';
import { apiBase } from '../../../lib/api-client.ts';
import { paths } from '../../../lib/paths.ts';
import { useCancelCheck } from '../api/cancel-check.ts';
import { useCheckImport } from '../api/check-import.ts';
import { useEdition } from '../api/get-edition.ts';
import { countOf, leftOutWords, publishableWords, statusWords } from '../import-words.ts';
import { DiscardDialog } from './discard-dialog.tsx';
import { FateFilter } from './fate-filter.tsx';
import { MappingStep } from './mapping-step.tsx';
import { PublishDialog } from './publish-dialog.tsx';
import { RowTable } from './row-table.tsx';

interface ImportSheetProps {
  record: Import;
  fate: Fate | undefined;
  /** How its columns are read is asked for, though it may be clear already. */
  atColumns?: boolean;
}

/** What stands under the head of an upload, by how far it has come. */
export function ImportSheet(props: ImportSheetProps) {
  return (
    <FocusedOnChange of={props.record.status}>
      <Sheet {...props} />
    </FocusedOnChange>
  );
}

function Sheet({ record, fate, atColumns = false }: ImportSheetProps) {
  if (isMappable(record) && (atColumns || record.needsMapping || record.status === 'mapped')) {
    return (
      <div className="flex flex-col gap-6">
        <SameFile record={record} />
        <MappingStep
          record={record}
          aside={
            <>
              {record.counts && <ButtonLink to="?">Back to the checked rows</ButtonLink>}
              <Discard record={record} />
            </>
          }
        />
      </div>
    );
  }
  return (
    <div className="flex flex-col gap-6">
      <SameFile record={record} />
      <LeftOutColumns record={record} />
      <State record={record} />
      {record.counts && record.status !== 'discarded' && (
        <>
          <FateFilter counts={record.counts} total={record.rows ?? 0} chosen={fate} />
          {/* Publishing gives new rows their records: the rows are asked for anew under the new state. */}
          <RowTable key={`${record.status} ${fate}`} id={record.id} table={record.table} fate={fate} status={record.status} />
        </>
      )}
    </div>
  );
}

/** What was pressed is gone once the state has changed: the focus goes on to the new state and not off the page. */
function FocusedOnChange({ of: state, children }: { of: string; children: ReactNode }) {
  const part = useRef<HTMLDivElement>(null);
  const before = useRef(state);
  useEffect(() => {
    if (before.current === state) return;
    before.current = state;
    if (document.activeElement === document.body) part.current?.focus();
  }, [state]);
  return (
    <div ref={part} tabIndex={-1} className="focus:outline-none">
      {children}
    </div>
  );
}

const isMappable = ({ status }: Import) => status === 'uploaded' || status === 'mapped' || status === 'checked' || status === 'failed';

function State({ record }: { record: Import }) {
  switch (record.status) {
    case 'uploaded':
    case 'mapped':
      return <ToCheck record={record} words="Check the rows" />;
    case 'checking':
    case 'publishing':
      return <AtWork record={record} />;
    case 'checked':
      return <ToDecide record={record} />;
    case 'published':
      return <Published record={record} />;
    case 'discarded':
      return <Notice title="Discarded. Nothing of it reached the catalog." />;
    case 'failed':
      return (
        <>
          <Notice tone="wrong" role="alert" title="The check could not be carried through.">
            <p className="text-ink-2">{record.problem?.message ?? 'The reason is not known.'}</p>
          </Notice>
          <ToCheck record={record} words="Check again" />
        </>
      );
    default:
      return record.status satisfies never;
  }
}

function ToCheck({ record, words }: { record: Import; words: string }) {
  const check = useCheckImport(record.id);
  return (
    <div className="flex flex-col items-start gap-3">
      {check.isError && <Failure error={check.error} what="check the table" />}
      <div className="flex flex-wrap gap-3">
        <Button kind="main" onClick={() => check.mutate()} busy={check.isPending && 'Starting …'}>
          {words}
        </Button>
        <ToColumns />
        <Discard record={record} />
      </div>
    </div>
  );
}

function ToColumns() {
  return <ButtonLink to="?step=columns">How its columns are read</ButtonLink>;
}

function AtWork({ record: { id, status, checkedRows, rows } }: { record: Import }) {
  const cancel = useCancelCheck(id);
  const words =
    status === 'publishing' ? 'Publishing' : rows === null ? `${checkedRows} rows checked` : `${checkedRows} of ${rows} rows checked`;
  return (
    <div className="flex flex-col items-start gap-3">
      <p role="status">{words} …</p>
      <progress
        aria-label={statusWords[status]}
        className="h-3 w-full max-w-[36rem] accent-slate"
        {...(rows ? { max: rows, value: checkedRows } : {})}
      />
      {cancel.isError && <Failure error={cancel.error} what="stop the check" />}
      {status === 'checking' && (
        <Button onClick={() => cancel.mutate()} busy={cancel.isPending && 'Stopping …'}>
          Stop the check
        </Button>
      )}
    </div>
  );
}

function ToDecide({ record }: { record: Import }) {
  const [asking, setAsking] = useState(false);
  const { counts } = record;
  if (!counts) return null;
  const publishable = publishableWords(counts);
  const left = leftOutWords(counts);
  return (
    <div className="flex flex-col items-start gap-3">
      <div role="status">
        <p className="text-lead font-firm">{publishable ? `${publishable} to publish.` : 'Nothing to publish.'}</p>
        <p className="text-ink-2">{left ? `${left}.` : 'No row is left out.'}</p>
        {publishable && (
          <p className="text-ink-2">A row that says “look again” goes along once you have ticked it; one you leave out stays out.</p>
        )}
      </div>
      <div className="flex flex-wrap gap-3">
        {publishable && (
          <Button kind="main" onClick={() => setAsking(true)}>
            Publish …
          </Button>
        )}
        {counts.error + counts.conflict > 0 && (
          <a className={buttonClass('plain')} href={`${apiBase}/imports/${encodeURIComponent(record.id)}/errors.csv`} download>
            Download the wrong rows with reasons
          </a>
        )}
        <ToColumns />
        <Discard record={record} />
      </div>
      <PublishDialog id={record.id} counts={counts} open={asking} onOpenChange={setAsking} />
    </div>
  );
}

function Discard({ record }: { record: Import }) {
  const [asking, setAsking] = useState(false);
  return (
    <>
      <Button kind="grave" onClick={() => setAsking(true)}>
        Discard …
      </Button>
      <DiscardDialog id={record.id} fileName={record.fileName} open={asking} onOpenChange={setAsking} />
    </>
  );
}

function Published({ record }: { record: Import }) {
  const edition = useEdition(record.edition);
  return (
    <div className="flex flex-col items-start gap-3">
      <div role="status">
        <Notice title={`Published as edition ${record.edition}.`}>
          <p className="text-ink-2">
            {edition.data ? `${countOf(edition.data.records, 'record', 'records')} reached the catalog and` : 'What it brought'} can be
            found by name now.
          </p>
        </Notice>
      </div>
      <div className="flex flex-wrap gap-3">
        <ButtonLink to={paths.home}>Look for a boat</ButtonLink>
        {record.edition !== null && (
          <ButtonLink to={paths.stewardEdition(record.edition)}>What edition {record.edition} changed</ButtonLink>
        )}
        <ButtonLink to={paths.steward}>Upload another table</ButtonLink>
      </div>
    </div>
  );
}

function SameFile({ record: { sameFileAs } }: { record: Import }) {
  if (!sameFileAs) return null;
  return (
    <Notice tone="care" title="The very same file was uploaded before.">
      <Link to={paths.stewardImport(sameFileAs)} className="inline-flex min-h-11 items-center">
        See what became of it
      </Link>
    </Notice>
  );
}

function LeftOutColumns({ record: { unknownColumns, status } }: { record: Import }) {
  if (unknownColumns.length === 0) return null;
  const cells = unknownColumns.length === 1 ? 'its cells' : 'their cells';
  const leftOut = `${cells} ${status === 'published' ? 'were' : 'will be'} left out`;
  return (
    <Notice tone="care" title={`${countOf(unknownColumns.length, 'column is', 'columns are')} not read: ${leftOut}.`}>
      <p className="text-ink-2">{unknownColumns.join(', ')}</p>
    </Notice>
  );
}
