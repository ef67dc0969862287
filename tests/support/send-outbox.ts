// Sends one database's due mails and ends; a test kills it in the middle.
import { connect } from '../../backend/src/db/connect.ts';
import { deliverDueMail } from '../../backend/src/mail/deliver-mail.ts';
import { mailTransport } from '../../backend/src/mail/transport.ts';

const [file, smtpUrl, outboxFolder] = process.argv.slice(2) as [string, string, string];
const transport = mailTransport({ smtpUrl, outboxFolder, mailFrom: 'Test <test@tiltwright.example>' });
await deliverDueMail(connect(file), transport);
transport.close();
