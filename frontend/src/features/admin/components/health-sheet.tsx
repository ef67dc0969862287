import type { Health } from '@tiltwright/shared/schemas/desk.ts';
import type { ReactNode } from 'react';
import { Day } from '../../../components/ui/day.tsx';
import { Notice } from '../../../components/ui/states.tsx';
import { DataTable, type TableColumn } from '../../../components/ui/table.tsx';
import { bytesWords, removedWords } from '../health-words.ts';

type Kind = Health['bytes'][number];
const columns: readonly TableColumn<Kind>[] = [
  { id: 'kind', header: 'Kind', narrow: 'head', accessorKey: 'kind' },
  { id: 'bytes', header: 'Room taken', narrow: 'side', accessorKey: 'bytes', cell: ({ row }) => bytesWords(row.original.bytes) },
];

/** How the site is, in sentences first and figures after. */
export function HealthSheet({ health }: { health: Health }) {
  const { disk, mails, people, lastTidied } = health;
  return (
    <div className="flex flex-col gap-8">
      {health.remarks.length === 0 ? (
        <Notice title="Nothing needs you." />
      ) : (
        <Notice
          tone={health.status === 'bad' ? 'wrong' : 'care'}
          title={health.status === 'bad' ? 'Something needs you now.' : 'Something will need you soon.'}
        >
          <ul>
            {health.remarks.map((remark) => (
              <li key={remark}>{remark}</li>
            ))}
          </ul>
        </Notice>
      )}
      <dl className="grid max-w-[44rem] gap-x-6 tablet:grid-cols-[12rem_minmax(0,1fr)]">
        <Line term="Room on the disk">
          {bytesWords(disk.freeBytes)} of {bytesWords(disk.totalBytes)} free; {bytesWords(disk.reserveBytes)} are kept in reserve
        </Line>
        <Line term="Mail">
          {mails.queued === 0 ? 'none waits' : `${mails.queued} wait`}, {mails.failed === 0 ? 'none failed' : `${mails.failed} failed`};{' '}
          {mails.leaves ? 'sent by the mail server that is set' : 'no mail server is set, mails stay in the outbox'}
        </Line>
        <Line term="People">
          {people.accounts} accounts, {people.disabled} disabled; {people.sessions} devices signed in
        </Line>
        <Line term="Catalog">edition {health.edition}</Line>
        <Line term="Memory">{bytesWords(health.memoryBytes)}</Line>
        <Line term="Up since">
          <Day iso={health.startedAt} />
        </Line>
        <Line term="Last tidied">
          {lastTidied ? (
            <>
              <Day iso={lastTidied.at} />, {removedWords(lastTidied.removed)}
            </>
          ) : (
            'not yet; it is done once a night'
          )}
        </Line>
      </dl>
      <section className="max-w-[44rem]">
        <h2 className="mb-2 border-b border-ink pb-2 text-title">What takes the room</h2>
        <DataTable caption="Room by kind" captionHidden columns={columns} rows={health.bytes} rowId={({ kind }) => kind} />
      </section>
    </div>
  );
}

function Line({ term, children }: { term: string; children: ReactNode }) {
  return (
    <>
      <dt className="pt-2 text-note text-ink-2 tablet:border-b tablet:border-rule tablet:py-2">{term}</dt>
      <dd className="border-b border-rule pb-2 tablet:py-2">{children}</dd>
    </>
  );
}
