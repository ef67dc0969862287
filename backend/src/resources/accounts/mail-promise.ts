import type { MailPromise } from '@tiltwright/shared/schemas/access.ts';
import type { Config } from '../../config.ts';

/** Whether whoever stands at this machine may read the mails: a trial sends none, and its passwords are public. */
export const outboxIsOpen = ({ mode, smtpUrl }: Pick<Config, 'mode' | 'smtpUrl'>) => mode !== 'production' && smtpUrl === null;

/** What a form that ends in a mail answers, whether or not the address is known. */
export function promiseMail(config: Pick<Config, 'mode' | 'smtpUrl'>, email: string): MailPromise {
  return {
    detail: 'Look into your mail: what comes next is written there.',
    outbox: outboxIsOpen(config) ? `/outbox?to=${encodeURIComponent(email)}` : null,
  };
}
