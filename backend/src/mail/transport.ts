// Two ways out: a real mail server, or a folder where each mail becomes a file.
import { rename, writeFile } from 'node:fs/promises';
import path from 'node:path';
import { createTransport } from 'nodemailer';
import type { Config } from '../config.ts';

export interface OutgoingMail {
  id: string;
  messageId: string;
  to: string;
  subject: string;
  text: string;
  html: string;
}

export interface MailTransport {
  /** Whether mails leave this machine. */
  leaves: boolean;
  /** Resolves once the other side has taken the mail; rejects with what it said. */
  send(mail: OutgoingMail): Promise<void>;
  close(): void;
}

type MailSettings = Pick<Config, 'smtpUrl' | 'mailFrom' | 'outboxFolder'>;

export const mailTransport = (settings: MailSettings): MailTransport =>
  settings.smtpUrl === null ? folderTransport(settings) : smtpTransport(settings.smtpUrl, settings.mailFrom);

/** A server that does not answer within these times is tried again later. */
const patience = { connectionTimeout: 10_000, greetingTimeout: 10_000, socketTimeout: 30_000 };

function smtpTransport(url: string, from: string): MailTransport {
  const transport = createTransport({ url, ...patience });
  return {
    leaves: true,
    async send(mail) {
      await transport.sendMail({ from, ...envelope(mail) });
    },
    close: () => transport.close(),
  };
}

/** The file's name is the mail's own id and it appears whole: sending twice leaves one. */
function folderTransport({ outboxFolder, mailFrom }: MailSettings): MailTransport {
  const writer = createTransport({ streamTransport: true, buffer: true, newline: 'unix' });
  return {
    leaves: false,
    async send(mail) {
      const { message } = await writer.sendMail({ from: mailFrom, ...envelope(mail) });
      const file = path.join(outboxFolder, `${mail.id}.eml`);
      await writeFile(`${file}.part`, message as Buffer, { mode: 0o600 });
      await rename(`${file}.part`, file);
    },
    close: () => writer.close(),
  };
}

const envelope = ({ to, subject, text, html, messageId }: OutgoingMail) => ({
  to,
  subject,
  text,
  html,
  messageId,
  // Tells other machines not to answer (RFC 3834).
  headers: { 'Auto-Submitted': 'auto-generated' },
  disableFileAccess: true,
  disableUrlAccess: true,
});
