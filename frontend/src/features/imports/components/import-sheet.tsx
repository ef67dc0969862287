import type { Fate, Import } from '@tiltwright/shared/schemas/import.ts';
import { useState } from 'react';
import { Link } from 'react-router';
import { Button, ButtonLink, buttonClass } from '../../../components/ui/button.tsx';
import { Failure, Notice } from '../../../components/ui/states.tsx';
import { apiBase } from '../../../lib/api-client.ts';
import { paths } from '../../../lib/paths.ts';
import { useCheckImport } from '../api/check-import.ts';
import { countOf, leftOutWords, publishableWords, statusWords } from '../import-words.ts';
import { DiscardDialog } from './discard-dialog.tsx';
import { FateFilter } from './fate-filter.tsx';
import { PublishDialog } from './publish-dialog.tsx';
import { RowTable } from './row-table.tsx';

/** What stands under the head of an upload, by how far it has come. */
export function ImportSheet({ record, fate }: { record: Import; fate: Fate | undefined }) {
  return (
    <div className="flex flex-col gap-6">
      <Remarks record={record} />
      <State record={record} />
      {record.counts && record.status !== 'discarded' && (
        <>
          <FateFilter counts={record.counts} total={record.rows ?? 0} chosen={fate} />
          {/* Publishing gives new rows their records: the rows are asked for anew under the new state. */}
          <RowTable key={record.status} id={record.id} table={record.table} fate={fate} published={record.status === 'published'} />
        </>
      )}
    </div>
  );
}

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
      {record.needsMapping && (
        <Notice tone="care" title="Its headings are in words of their own.">
          <p className="text-ink-2">Each column has to be given one of our names before the rows can be checked.</p>
        </Notice>
      )}
      {check.isError && <Failure error={check.error} what="check the table" />}
      <div className="flex flex-wrap gap-3">
        <Button kind="main" onClick={() => check.mutate()} busy={check.isPending && 'Starting …'}>
          {words}
        </Button>
        <Discard record={record} />
      </div>
    </div>
  );
}

function AtWork({ record: { status, checkedRows, rows, ...record } }: { record: Import }) {
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
      {status === 'checking' && <Discard record={{ status, checkedRows, rows, ...record }} words="Stop and discard" />}
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
      </div>
      <div className="flex flex-wrap gap-3">
        {publishable && (
          <Button kind="main" onClick={() => setAsking(true)}>
            Publish …
          </Button>
        )}
        {counts.error > 0 && (
          <a className={buttonClass('plain')} href={`${apiBase}/imports/${encodeURIComponent(record.id)}/errors.csv`} download>
            Download the wrong rows with reasons
          </a>
        )}
        <Discard record={record} />
      </div>
      <PublishDialog id={record.id} counts={counts} open={asking} onOpenChange={setAsking} />
    </div>
  );
}

function Discard({ record, words = 'Discard …' }: { record: Import; words?: string }) {
  const [asking, setAsking] = useState(false);
  return (
    <>
      <Button kind="grave" onClick={() => setAsking(true)}>
        {words}
      </Button>
      <DiscardDialog id={record.id} fileName={record.fileName} open={asking} onOpenChange={setAsking} />
    </>
  );
}

function Published({ record }: { record: Import }) {
  return (
    <div className="flex flex-col items-start gap-3">
      <div role="status">
        <Notice title={`Published as edition ${record.edition}.`}>
          <p className="text-ink-2">{record.counts && publishableWords(record.counts)} reached the catalog and can be found by name now.</p>
        </Notice>
      </div>
      <div className="flex flex-wrap gap-3">
        <ButtonLink to={paths.home}>Look for a boat</ButtonLink>
        <ButtonLink to={paths.steward}>Upload another table</ButtonLink>
      </div>
    </div>
  );
}

function Remarks({ record: { sameFileAs, unknownColumns, status } }: { record: Import }) {
  const cells = unknownColumns.length === 1 ? 'its cells' : 'their cells';
  const leftOut = `${cells} ${status === 'published' ? 'were' : 'will be'} left out`;
  return (
    <>
      {sameFileAs && (
        <Notice tone="care" title="The very same file was uploaded before.">
          <Link to={paths.stewardImport(sameFileAs)} className="inline-flex min-h-11 items-center">
            See what became of it
          </Link>
        </Notice>
      )}
      {unknownColumns.length > 0 && (
        <Notice tone="care" title={`${countOf(unknownColumns.length, 'column', 'columns')} not known: ${leftOut}.`}>
          <p className="text-ink-2">{unknownColumns.join(', ')}</p>
        </Notice>
      )}
    </>
  );
}
