import type { MailSheet as Sheet } from '@tiltwright/shared/schemas/desk.ts';
import { Button } from '../../../components/ui/button.tsx';
import { Day } from '../../../components/ui/day.tsx';
import { MailText } from '../../../components/ui/mail-text.tsx';
import { Failure, Notice } from '../../../components/ui/states.tsx';
import { useResendMail } from '../api/mail.ts';
import { mailStateWords } from '../mail-words.ts';

export function MailSheet({ mail }: { mail: Sheet }) {
  const resend = useResendMail(mail.id);
  const waits = mail.status === 'failed' || mail.status === 'queued';
  return (
    <div className="flex max-w-[44rem] flex-col items-start gap-4">
      <p className="text-ink-2">
        To <span className="break-all">{mail.to}</span>, written <Day iso={mail.createdAt} />, {mailStateWords(mail)}
        {mail.sentAt && (
          <>
            {' '}
            <Day iso={mail.sentAt} />
          </>
        )}
        .
      </p>
      {mail.problem && (
        <Notice tone="wrong" title="What the mail server said">
          <p className="break-words">{mail.problem}</p>
        </Notice>
      )}
      {waits && (
        <Button onClick={() => resend.mutate()} busy={resend.isPending && 'Trying …'}>
          Try again now
        </Button>
      )}
      {resend.isError && <Failure error={resend.error} what="try it again" />}
      <article className="w-full border border-rule bg-sheet p-4">
        <MailText text={mail.text} />
      </article>
    </div>
  );
}
