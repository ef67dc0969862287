import { Email } from '@tiltwright/shared/schemas/account.ts';
import { Mail, MailSheet, mailStates } from '@tiltwright/shared/schemas/desk.ts';
import * as z from 'zod';
import { actorId } from '../../auth/actor.ts';
import type { Deps } from '../../deps.ts';
import { ApiProblem } from '../../errors.ts';
import { decodeCursor, listOf, page, pageFields } from '../../http/cursor.ts';
import { noStore, type Route, route } from '../../http/operation.ts';
import { outboxIsOpen } from '../accounts/mail-promise.ts';
import { audit } from '../audit.ts';
import { listMails, mailOrProblem, mailsTo, resendMail, toMail, toMailSheet } from './queries.ts';

const tag = 'Administration';
const may = 'site.run';
const cache = noStore;
const params = z.strictObject({ id: z.string().min(1).max(80) });

export function mailRoutes({ db, config }: Deps): Route[] {
  const leaves = config.smtpUrl !== null;
  return [
    route(
      {
        id: 'listMails',
        method: 'get',
        path: '/mail',
        tag,
        summary: 'Mails in and through the queue, newest first',
        may,
        query: z.strictObject({ status: z.enum(mailStates).optional(), ...pageFields }),
        reply: { status: 200, description: 'A page of mails.', schema: listOf(Mail) },
        cache,
      },
      ({ query: { status, limit, cursor } }) => {
        const place = decodeCursor(cursor, 0);
        const { data, next } = page(listMails(db, status, limit, place.after), limit, place);
        return { data: data.map(toMail), next };
      },
    ),
    route(
      {
        id: 'getMail',
        method: 'get',
        path: '/mail/{id}',
        tag,
        summary: 'One mail with its text',
        may,
        params,
        reply: { status: 200, description: 'The mail.', schema: MailSheet },
        problems: ['not-found'],
        cache,
      },
      ({ params: { id } }) => toMailSheet(mailOrProblem(db, id), leaves),
    ),
    route(
      {
        id: 'resendMail',
        method: 'post',
        path: '/mail/{id}/resend',
        tag,
        summary: 'Try a mail again that failed or waits',
        may,
        params,
        reply: { status: 202, description: 'It is at the head of the queue.', schema: Mail },
        problems: ['not-found', 'wrong-state'],
        cache,
      },
      ({ params: { id }, actor }) => {
        db.transaction(
          (tx) => {
            resendMail(tx, mailOrProblem(db, id));
            audit(tx, actorId(actor), 'mail.resend', id);
          },
          { behavior: 'immediate' },
        );
        return toMail(mailOrProblem(db, id));
      },
    ),
    route(
      {
        id: 'readOutbox',
        method: 'get',
        path: '/outbox',
        tag: 'Accounts',
        summary: 'Mails of a trial to one address, newest first',
        description:
          'A trial sends no mail and its passwords are public; where mails are really sent, or in production, nothing is found here.',
        may: 'session.use',
        query: z.strictObject({ to: Email }),
        reply: { status: 200, description: 'At most ten mails.', schema: listOf(MailSheet) },
        problems: ['not-found'],
        cache,
      },
      ({ query: { to } }) => {
        if (!outboxIsOpen(config)) throw new ApiProblem('not-found', 'Mails of this site are read where they were sent to.');
        return { data: mailsTo(db, to, 10).map((row) => toMailSheet(row, leaves)), next: null };
      },
    ),
  ];
}
