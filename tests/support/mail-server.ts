// A real mail server on loopback that keeps what it takes; what it says can be changed by a test.
import type { AddressInfo } from 'node:net';
import { SMTPServer, type SMTPServerDataStream } from 'smtp-server';
import { onTestFinished } from 'vitest';

export interface ReceivedMail {
  to: string[];
  raw: string;
  messageId: string;
}

export interface MailServer {
  url: string;
  received: ReceivedMail[];
  /** Answers the next mails with this code and words instead of taking them. */
  refuse(code: number | null): void;
  /** Called with a whole mail before it is acknowledged. */
  beforeAnswer(hook: (() => Promise<void>) | null): void;
}

export async function mailServer(): Promise<MailServer> {
  const received: ReceivedMail[] = [];
  let refusal: number | null = null;
  let hook: (() => Promise<void>) | null = null;
  const server = new SMTPServer({
    authOptional: true,
    disabledCommands: ['STARTTLS', 'AUTH'],
    logger: false,
    onData(stream, session, done) {
      readAll(stream).then(async (raw) => {
        await hook?.();
        if (refusal !== null) return done(Object.assign(new Error('not now'), { responseCode: refusal }));
        received.push({
          to: session.envelope.rcptTo.map(({ address }) => address),
          raw,
          messageId: /^Message-ID: (.+)$/im.exec(raw)?.[1]?.trim() ?? '',
        });
        done();
      }, done);
    },
  });
  // A client that is killed in the middle is an event here, not a failure of the test.
  server.on('error', () => undefined);
  await new Promise<void>((resolve) => server.listen(0, '127.0.0.1', () => resolve()));
  onTestFinished(() => new Promise<void>((resolve) => server.close(() => resolve())));
  return {
    url: `smtp://127.0.0.1:${(server.server.address() as AddressInfo).port}`,
    received,
    refuse: (code) => {
      refusal = code;
    },
    beforeAnswer: (next) => {
      hook = next;
    },
  };
}

async function readAll(stream: SMTPServerDataStream): Promise<string> {
  const parts: Buffer[] = [];
  for await (const part of stream) parts.push(part as Buffer);
  return Buffer.concat(parts).toString('utf8');
}
