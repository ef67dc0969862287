import type { MailSheet } from '@tiltwright/shared/schemas/desk.ts';
import { Button } from '../../../components/ui/button.tsx';
import { Day } from '../../../components/ui/day.tsx';
import { MailText } from '../../../components/ui/mail-text.tsx';
import { Empty, Failure, Pending } from '../../../components/ui/states.tsx';
import { useOutbox } from '../api/read-outbox.ts';

/** A trial's mails to one address, the newest first and whole. */
export function OutboxList({ to }: { to: string }) {
  const outbox = useOutbox(to);
  if (outbox.isPending) return <Pending what="Fetching the mails" />;
  if (outbox.isError) return <Failure error={outbox.error} what="fetch the mails" retry={() => void outbox.refetch()} />;
  const again = (
    <Button onClick={() => void outbox.refetch()} busy={outbox.isFetching && 'Looking …'} className="self-start">
      Look again
    </Button>
  );
  if (outbox.data.data.length === 0) {
    return (
      <>
        <Empty title={`Nothing was written to ${to}.`}>
          <p>Check the address, or ask for the mail again.</p>
        </Empty>
        {again}
      </>
    );
  }
  return (
    <>
      <ol className="flex flex-col gap-6">
        {outbox.data.data.map((mail) => (
          <li key={mail.id}>
            <OneMail mail={mail} />
          </li>
        ))}
      </ol>
      {again}
    </>
  );
}

function OneMail({ mail }: { mail: MailSheet }) {
  return (
    <article className="border border-rule bg-sheet p-4">
      <h2 className="text-lead">{mail.subject}</h2>
      <p className="mb-3 border-b border-rule pb-2 text-note text-ink-2">
        to {mail.to}, <Day iso={mail.createdAt} />
      </p>
      <MailText text={mail.text} />
    </article>
  );
}
