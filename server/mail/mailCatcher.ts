import { randomUUID } from 'node:crypto';
import type { AddressInfo } from 'node:net';
import { SMTPServer } from 'smtp-server';
import type { SMTPServerSession } from 'smtp-server';
import { readMail } from './readMail.ts';

type CaughtMail = { id: string; to: string; subject: string; text: string; receivedAt: Date };

export type MailCatcher = {
  /** Address for the mailer. */
  url: string;
  /** Newest first. */
  mails(): CaughtMail[];
  stop(): Promise<void>;
};

/** The newest this many are kept, in memory only. */
const KEPT = 200;

/** A mail server for development and tests: real SMTP on a free loopback port, mails kept in memory. */
export async function startMailCatcher(): Promise<MailCatcher> {
  const caught: CaughtMail[] = [];
  const server = new SMTPServer({
    authOptional: true,
    disabledCommands: ['AUTH', 'STARTTLS'],
    disableReverseLookup: true,
    size: 1_000_000,
    onData(stream, session, done) {
      const parts: Buffer[] = [];
      stream.on('data', (part: Buffer) => parts.push(part));
      stream.on('error', done);
      stream.on('end', () => {
        caught.unshift(toCaughtMail(Buffer.concat(parts), session));
        caught.length = Math.min(caught.length, KEPT);
        done();
      });
    },
  });
  await new Promise<void>((resolve, reject) => {
    server.on('error', reject);
    server.listen(0, '127.0.0.1', resolve);
  });
  const { port } = server.server.address() as AddressInfo;
  return {
    url: `smtp://127.0.0.1:${port}`,
    mails: () => [...caught],
    stop: () => new Promise((resolve) => server.close(() => resolve())),
  };
}

function toCaughtMail(message: Buffer, session: SMTPServerSession): CaughtMail {
  const { subject, text } = readMail(message.toString('utf8'));
  const to = session.envelope.rcptTo.map((recipient) => recipient.address).join(', ');
  return { id: randomUUID(), to, subject, text, receivedAt: new Date() };
}
