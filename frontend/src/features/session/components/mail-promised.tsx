import type { MailPromise } from '@tiltwright/shared/schemas/access.ts';
import { useEffect, useRef } from 'react';
import { ButtonLink } from '../../../components/ui/button.tsx';

/** After a form whose next step is in a mail. On a trial it leads to the page where that mail can be read. */
export function MailPromised({ promise, children }: { promise: MailPromise; children: string }) {
  const heading = useRef<HTMLHeadingElement>(null);
  useEffect(() => heading.current?.focus(), []);
  return (
    <section className="flex flex-col items-start gap-3 border-l-[3px] border-ink py-1 pl-3">
      <h2 ref={heading} tabIndex={-1} className="text-lead focus:outline-none">
        Look into your mail
      </h2>
      <p>{children}</p>
      {promise.outbox ? (
        <>
          <p className="text-ink-2">
            This is a trial: no mail leaves this machine. What would have been sent is kept, and you can read it here.
          </p>
          <ButtonLink kind="main" to={promise.outbox}>
            Read the mail
          </ButtonLink>
        </>
      ) : (
        <p className="text-ink-2">It may take a minute, and it may lie among the unwanted ones.</p>
      )}
    </section>
  );
}
